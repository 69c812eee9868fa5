import QRCode from 'qrcode'
import type { Signature } from '@shared/schemas/records.ts'
import { capital, MEANING_WORD, timeWords } from '../words.ts'
import { BODY, PAD, SOFT, STRONG, type Sheet } from './sheet.ts'
import { drawLines, heightOf, setText, type Style } from './text.ts'
import { COLOUR } from './tokens.ts'

const HASH: Style = { face: 'text', size: 6.4, colour: COLOUR.ink, leading: 8.4 }
const MEANING: Style = { face: 'headStrong', size: 11, colour: COLOUR.ink, leading: 13, tracking: 0.3 }

/** A link as a square code of vector modules, with the link in words beside it. */
function drawCode(sheet: Sheet, url: string, x: number, y: number, size: number): void {
  const { modules } = QRCode.create(url, { errorCorrectionLevel: 'M' })
  const step = size / modules.size
  sheet.tag('Figure', () => {
    for (let row = 0; row < modules.size; row += 1) for (let column = 0; column < modules.size; column += 1) if (modules.get(row, column)) sheet.doc.rect(x + column * step, y + row * step, step + 0.02, step + 0.02)
    sheet.doc.fill(COLOUR.ink)
  }, { alt: `Square code that opens ${url}` })
}

/** The signatures with time, person, role, meaning, statement and the fingerprint of what was signed. */
export function drawSignatures(sheet: Sheet, signatures: readonly Signature[], record: { contentSha256: string; verifyUrl: string | null; statement: string; none: string }): void {
  sheet.paragraph(record.statement)
  const inner = sheet.width - 2 * PAD
  const meaningWidth = inner * 0.16
  const textWidth = inner - meaningWidth - 8
  for (const signature of [...signatures].sort((a, b) => a.signedAt.localeCompare(b.signedAt))) {
    const who = setText(sheet.faces, STRONG, `${signature.person.name}, ${signature.role}`, textWidth)
    const when = setText(sheet.faces, SOFT, `signed ${timeWords(signature.signedAt)} · signature ${signature.id}`, textWidth)
    const statement = setText(sheet.faces, BODY, signature.statement, textWidth)
    const reason = signature.reason ? setText(sheet.faces, BODY, `Reason given: ${signature.reason}`, textWidth) : []
    const same = signature.contentSha256 === record.contentSha256
    const hash = setText(sheet.faces, HASH, `SHA-256 of the content signed: ${signature.contentSha256}${same ? '' : ' (differs from the content printed here)'}`, textWidth)
    const height = heightOf(who, STRONG) + heightOf(when, SOFT) + heightOf([...statement, ...reason], BODY) + heightOf(hash, HASH) + 12
    sheet.ensure(height)
    const top = sheet.y + 5
    const left = sheet.left + PAD
    sheet.tag('P', () => {
      drawLines(sheet.faces, MEANING, setText(sheet.faces, MEANING, MEANING_WORD[signature.meaning].toUpperCase(), meaningWidth), left, top)
      let y = top
      for (const [lines, style] of [[who, STRONG], [when, SOFT], [statement, BODY], [reason, BODY], [hash, HASH]] as const) {
        drawLines(sheet.faces, style, lines, left + meaningWidth + 8, y)
        y += heightOf(lines, style)
      }
    })
    sheet.y += height
    sheet.rule(COLOUR.rule, 0.5, PAD)
  }
  if (signatures.length === 0) sheet.callout('Not signed', record.none, 'straw')

  const code = record.verifyUrl ? 62 : 0
  sheet.ensure(code + 34)
  const top = sheet.y + 8
  const textLeft = sheet.left + PAD + (code ? code + 12 : 0)
  const width = inner - (code ? code + 12 : 0)
  const hash = setText(sheet.faces, HASH, `SHA-256 of the content printed here: ${record.contentSha256}`, width)
  const words = record.verifyUrl ? setText(sheet.faces, SOFT, `To see whether this is still the current issue, scan the square or open ${record.verifyUrl}`, width) : []
  const note = setText(sheet.faces, SOFT, capital('a digital signature over the whole file, where there is one, shows in the signature panel of a PDF reader: it fails if a single byte of this file has been altered.'), width)
  if (record.verifyUrl) drawCode(sheet, record.verifyUrl, sheet.left + PAD, top, code)
  sheet.tag('P', () => {
    drawLines(sheet.faces, HASH, hash, textLeft, top)
    drawLines(sheet.faces, SOFT, words, textLeft, top + heightOf(hash, HASH) + 3)
    drawLines(sheet.faces, SOFT, note, textLeft, top + heightOf(hash, HASH) + heightOf(words, SOFT) + 6)
  })
  sheet.y = top + Math.max(code, heightOf(hash, HASH) + heightOf(words, SOFT) + heightOf(note, SOFT) + 6) + 8
}
