import type { Verdict } from '@shared/schemas/assessment.ts'
import { COLOUR } from './tokens.ts'

export const VERDICT_WORD: Readonly<Record<Verdict, string>> = { within: 'within', outside: 'outside', 'cannot-tell': 'cannot tell' }
export const VERDICT_COLOUR: Readonly<Record<Verdict, string>> = { within: COLOUR.jade, outside: COLOUR.oxide, 'cannot-tell': COLOUR.straw }

/** A verdict's own shape, so that it reads without colour: square within, diamond outside, ring cannot tell. */
export function drawMark(doc: PDFKit.PDFDocument, verdict: Verdict, x: number, y: number, size = 5): void {
  const half = size / 2
  const colour = VERDICT_COLOUR[verdict]
  if (verdict === 'within') doc.rect(x - half, y - half, size, size).fill(colour)
  else if (verdict === 'outside') doc.polygon([x, y - half * 1.3], [x + half * 1.3, y], [x, y + half * 1.3], [x - half * 1.3, y]).fill(colour)
  else doc.lineWidth(1.3).circle(x, y, half * 0.85).stroke(colour)
}
