import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'

function withFile<T>(pdf: Buffer, use: (file: string) => T): T {
  const folder = mkdtempSync(join(tmpdir(), 'document-test-'))
  try {
    const file = join(folder, 'document.pdf')
    writeFileSync(file, pdf)
    return use(file)
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}

const tidy = (text: string): string => text.replace(/[\u00a0 ]+/g, ' ')

/** Text of each page as an outside reader sees it; runs of spaces made one. */
export const pagesOf = (pdf: Buffer): string[] => withFile(pdf, (file) => tidy(execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' })).split('\f').slice(0, -1))

/** All words in reading order with single spaces, for sentences that wrap. */
export const wordsOf = (pdf: Buffer): string => withFile(pdf, (file) => tidy(execFileSync('pdftotext', [file, '-'], { encoding: 'utf8' })).replace(/\s+/g, ' '))

export const infoOf = (pdf: Buffer, ...options: string[]): string => withFile(pdf, (file) => execFileSync('pdfinfo', [...options, file], { encoding: 'utf8' }))

/** Bounding boxes of every word: page size and extremes, to prove that nothing runs off a page. */
export function boxesOf(pdf: Buffer): { width: number; height: number; words: { text: string; xMin: number; xMax: number; yMin: number; yMax: number }[] }[] {
  const html = withFile(pdf, (file) => execFileSync('pdftotext', ['-bbox', file, '-'], { encoding: 'utf8' }))
  return [...html.matchAll(/<page width="([\d.]+)" height="([\d.]+)">(.*?)<\/page>/gs)].map(([, width, height, body]) => ({
    width: Number(width),
    height: Number(height),
    words: [...(body ?? '').matchAll(/<word xMin="([\d.-]+)" yMin="([\d.-]+)" xMax="([\d.-]+)" yMax="([\d.-]+)">(.*?)<\/word>/g)].map(([, xMin, yMin, xMax, yMax, text]) => ({ text: text ?? '', xMin: Number(xMin), yMin: Number(yMin), xMax: Number(xMax), yMax: Number(yMax) })),
  }))
}

/** What an outside verifier says of the file's signature; it exits with an error when there is none. */
export const verifierOf = (pdf: Buffer): string =>
  withFile(pdf, (file) => {
    try {
      return execFileSync('pdfsig', ['-nocert', file], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'] })
    } catch (error) {
      return String((error as { stdout?: string }).stdout ?? '')
    }
  })
