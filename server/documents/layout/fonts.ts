import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import PDFDocument from 'pdfkit'
import { unpackWoff } from './woff.ts'

export type Face = 'text' | 'strong' | 'head' | 'headStrong'
type Document = PDFKit.PDFDocument

/** Inter ships one file a script; a name in any of these is set in its own letters, with the next file in the row as a fallback. */
const SCRIPTS = ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese'] as const
const inter = (weight: number) => SCRIPTS.map((script) => `inter/files/inter-${script}-${weight}-normal.woff`)
const barlow = (weight: number) => ['latin', 'latin-ext', 'vietnamese'].map((script) => `barlow-condensed/files/barlow-condensed-${script}-${weight}-normal.woff`)
const FILES: Readonly<Record<Face, readonly string[]>> = {
  text: inter(400),
  strong: inter(600),
  head: [...barlow(500), ...inter(500)],
  headStrong: [...barlow(600), ...inter(600)],
}

/** Cap height as a share of the type size, to centre a line in its leading. */
export const CAP_HEIGHT: Readonly<Record<Face, number>> = { text: 0.727, strong: 0.727, head: 0.7, headStrong: 0.7 }

const require = createRequire(import.meta.url)
const loaded = new Map<string, Buffer>()
function bytes(file: string): Buffer {
  const known = loaded.get(file)
  if (known) return known
  const read = unpackWoff(readFileSync(require.resolve(`@fontsource/${file}`)))
  loaded.set(file, read)
  return read
}

/** Signs that the shipped faces lack, in words or plain letters. */
const IN_WORDS: Readonly<Record<string, string>> = {
  '≤': 'at most ', '≥': 'at least ', '≈': 'about ', '≠': 'not ', '∞': 'unlimited', '→': 'to', '←': 'from', '√': 'root of ', '⌀': 'Ø', '∅': 'Ø',
  'μ': 'µ', 'Ω': 'ohm', '℃': '°C', '℉': '°F', '⅛': '1/8', '⅜': '3/8', '⅝': '5/8', '⅞': '7/8', '₂': '2', '₃': '3', '∠': 'angle ', '✓': 'yes', '‑': '-', '‐': '-',
  '\u202f': '\u00a0', '\u2007': '\u00a0', '\u2009': '\u00a0', '\u200a': '\u00a0', '\u200b': '', '\u00ad': '', '\ufeff': '', '\t': ' ', '\r': '',
}

/** Text with every sign replaced that no shipped face can show. */
export const printable = (text: string): string =>
  Array.from(text.normalize('NFC').replace(/([≤≥≈≠√∠])\s+/gu, '$1'), (character) => IN_WORDS[character] ?? (character !== '\n' && /\p{Cc}/u.test(character) ? '' : character)).join('')

interface FontKitFont { hasGlyphForCodePoint(codePoint: number): boolean }
/** pdfkit keeps the parsed face here; its types leave it out. */
const parsed = (document: Document): FontKitFont => (document as unknown as { _font: { font: FontKitFont } })._font.font

/** Which file of a face shows a character: index into FILES, or -1 for none. Font files never change, so this outlives a document. */
const shows = new Map<string, number>()
const widths = new Map<string, number>()

export interface Run { font: string; text: string; width: number; setting: Setting }

type Setting = 'plain' | 'tabular' | 'decimal'
type Features = PDFKit.Mixins.OpenTypeFeatures[]
/**
 * Tabular: figures of one width, for columns; they widen the hyphen too, so running text goes without.
 * Decimal: kerning would pull a 1 over the point before it, so that 3.1 reads as 31. The font engine takes features to leave out as an object.
 */
const FEATURES: Readonly<Record<Setting, Features | undefined>> = { plain: undefined, tabular: ['tnum'], decimal: { kern: false } as unknown as Features }
const settingOf = (text: string, tabular: boolean): Setting => (tabular ? 'tabular' : /[.,]\d/.test(text) ? 'decimal' : 'plain')
const withFeatures = (setting: Setting) => (FEATURES[setting] ? { features: FEATURES[setting] } : {})

function use(document: Document, registered: Set<string>, file: string): void {
  if (!registered.has(file)) {
    document.registerFont(file, bytes(file))
    registered.add(file)
  }
  document.font(file)
}

/**
 * Text is measured on a document that is never written, so that a real one opens its faces in the order in which they are drawn:
 * the same record gives the same bytes whatever was measured before, and the parsed faces are kept.
 */
const ruler = { document: new PDFDocument({ autoFirstPage: false, font: null as unknown as string }), registered: new Set<string>() }

function fileFor(face: Face, character: string): number {
  const key = face + character
  const known = shows.get(key)
  if (known !== undefined) return known
  const found = FILES[face].findIndex((file) => {
    use(ruler.document, ruler.registered, file)
    return parsed(ruler.document).hasGlyphForCodePoint(character.codePointAt(0) ?? 32)
  })
  shows.set(key, found)
  return found
}

function widthAtOne(file: string, text: string, setting: Setting): number {
  const key = `${file}|${setting}|${text}`
  const known = widths.get(key)
  if (known !== undefined) return known
  use(ruler.document, ruler.registered, file)
  const width = ruler.document.fontSize(100).widthOfString(text, withFeatures(setting)) / 100
  if (widths.size > 40_000) widths.clear()
  widths.set(key, width)
  return width
}

/** The faces of one document: measuring and drawing with fallback from script to script. */
export class Faces {
  private readonly registered = new Set<string>()
  constructor(private readonly document: Document) {}

  /** Runs of one font each, widths at size 1. A character that no face has is shown as "?" rather than lost. */
  runs(face: Face, text: string, tabular = false): Run[] {
    const runs: { index: number; text: string }[] = []
    for (const character of text) {
      const index = fileFor(face, character)
      const last = runs.at(-1)
      const shown = index < 0 ? '?' : character
      const at = Math.max(0, index)
      if (last?.index === at) last.text += shown
      else runs.push({ index: at, text: shown })
    }
    return runs.map((run) => {
      const setting = settingOf(run.text, tabular)
      const font = FILES[face][run.index]!
      return { font, text: run.text, setting, width: widthAtOne(font, run.text, setting) }
    })
  }

  /** Draws one line of runs with its baseline at y. */
  draw(runs: readonly Run[], x: number, baseline: number, size: number, colour: string, tracking = 0): void {
    let at = x
    for (const run of runs) {
      use(this.document, this.registered, run.font)
      this.document.fontSize(size).fillColor(colour)
      this.document.text(run.text, at, baseline, { lineBreak: false, baseline: 'alphabetic', characterSpacing: tracking, ...withFeatures(run.setting) })
      at += run.width * size + tracking * run.text.length
    }
  }
}
