import type { Faces } from './fonts.ts'
import { drawLines, heightOf, leadingOf, setText, widthOf, type Style } from './text.ts'
import { COLOUR } from './tokens.ts'

export interface TitleBlock {
  organization: { name: string; address: string }
  kind: string
  number: string
  revision: string | null
  title: string
  /** Three or four cells: heading and the lines below it. */
  cells: readonly { label: string; lines: readonly string[]; share?: number }[]
  stamp: { text: string; tone: 'straw' | 'plum' | 'jade' | 'oxide' | 'soft'; edge: 'single' | 'double' | 'dashed' }
  stampNote: string
}

const LABEL: Style = { face: 'head', size: 6.6, colour: COLOUR.soft, leading: 8.4, tracking: 0.4 }
const VALUE: Style = { face: 'text', size: 7, colour: COLOUR.ink, leading: 9.2 }
const TITLE: Style = { face: 'strong', size: 7.6, colour: COLOUR.ink, leading: 9.8 }
const FIRM: Style = { face: 'strong', size: 7.2, colour: COLOUR.ink, leading: 9 }
const PLACE: Style = { face: 'text', size: 6.6, colour: COLOUR.soft, leading: 9 }
const NUMBER: Style = { face: 'headStrong', size: 25, colour: COLOUR.ink, leading: 25 }
const REVISION: Style = { face: 'head', size: 13, colour: COLOUR.soft, leading: 25 }
const INSET = 7
const STRIP = 15
const SHARES = { first: 0.275, stamp: 0.145 }

const firstWidth = (width: number) => width * SHARES.first
function cellWidths(block: TitleBlock, width: number): number[] {
  const sum = block.cells.reduce((all, cell) => all + (cell.share ?? 1), 0)
  return block.cells.map((cell) => (width * (1 - SHARES.first - SHARES.stamp) * (cell.share ?? 1)) / sum)
}

/** The number shrinks until it and the revision fit on one line. */
function numberStyles(faces: Faces, block: TitleBlock, width: number): { number: Style; revision: Style } {
  const room = firstWidth(width) - 2 * INSET
  const text = block.revision ? ` rev ${block.revision}` : ''
  for (let size = NUMBER.size; size > 9; size -= 0.5) {
    const number = { ...NUMBER, size }
    const revision = { ...REVISION, size: Math.min(REVISION.size, size) }
    if (widthOf(faces, number, block.number) + widthOf(faces, revision, text) <= room) return { number, revision }
  }
  return { number: { ...NUMBER, size: 9 }, revision: { ...REVISION, size: 8 } }
}

const titleLines = (faces: Faces, block: TitleBlock, width: number) => setText(faces, TITLE, block.title, firstWidth(width) - 2 * INSET)
const cellLines = (faces: Faces, block: TitleBlock, width: number) => {
  const widths = cellWidths(block, width)
  return block.cells.map((cell, index) => cell.lines.flatMap((line) => setText(faces, VALUE, line, widths[index]! - 2 * INSET)))
}

/** Height that the block needs at this width: the tallest of its cells, never less than a drawing's. */
export function titleBlockHeight(faces: Faces, block: TitleBlock, width: number): number {
  const first = 6 + leadingOf(LABEL) + leadingOf(NUMBER) + heightOf(titleLines(faces, block, width), TITLE) + 6
  const cells = cellLines(faces, block, width).map((lines) => 6 + leadingOf(LABEL) + 2 + heightOf(lines, VALUE) + 6)
  return STRIP + Math.max(58, first, ...cells)
}

function drawStamp(doc: PDFKit.PDFDocument, faces: Faces, block: TitleBlock, x: number, y: number, width: number, height: number): void {
  const colour = COLOUR[block.stamp.tone]
  const text = block.stamp.text.toUpperCase()
  let style: Style = { face: 'headStrong', size: 16, colour, leading: 20 }
  while (style.size > 7 && widthOf(faces, style, text) > width - 36) style = { ...style, size: style.size - 0.5 }
  const note: Style = { face: 'text', size: 6.4, colour: COLOUR.soft, leading: 8.2 }
  const notes = setText(faces, note, block.stampNote, width - 2 * INSET).slice(0, 3)
  const box = { width: widthOf(faces, style, text) + 14, height: 21 }
  const top = y + (height - box.height - heightOf(notes, note) - 5) / 2
  const left = x + (width - box.width) / 2
  doc.save().rotate(-2.5, { origin: [x + width / 2, top + box.height / 2] })
  doc.lineWidth(1.1).strokeColor(colour)
  if (block.stamp.edge === 'dashed') doc.dash(3, { space: 2 })
  doc.rect(left, top, box.width, box.height).stroke()
  if (block.stamp.edge === 'dashed') doc.undash()
  if (block.stamp.edge === 'double') doc.lineWidth(0.5).rect(left - 2, top - 2, box.width + 4, box.height + 4).stroke()
  drawLines(faces, style, setText(faces, style, text, box.width), left, top + 0.5, box.width + 1, 'center')
  doc.restore()
  drawLines(faces, note, notes, x + INSET, top + box.height + 6, width - 2 * INSET, 'center')
}

/** Draws the ruled block: firm's strip, number and title, cells, status stamp. */
export function drawTitleBlock(doc: PDFKit.PDFDocument, faces: Faces, block: TitleBlock, x: number, y: number, width: number, height: number): void {
  const top = y + STRIP
  doc.rect(x, y, width, height).fill(COLOUR.white)
  doc.lineWidth(0.7).strokeColor(COLOUR.ink)
  doc.moveTo(x, y + height).lineTo(x + width, y + height).stroke()
  doc.lineWidth(0.5).moveTo(x, top).lineTo(x + width, top).stroke()
  drawLines(faces, FIRM, setText(faces, FIRM, block.organization.name, width * 0.45).slice(0, 1), x + INSET, y + 3)
  drawLines(faces, PLACE, setText(faces, PLACE, block.organization.address.replace(/\n+/g, ', '), width * 0.5).slice(0, 1), x + INSET, y + 3, width - 2 * INSET, 'right')

  const first = firstWidth(width)
  drawLines(faces, LABEL, setText(faces, LABEL, block.kind.toUpperCase(), first - 2 * INSET).slice(0, 1), x + INSET, top + 5)
  const styles = numberStyles(faces, block, width)
  const numberTop = top + 5 + leadingOf(LABEL)
  drawLines(faces, styles.number, setText(faces, styles.number, block.number, first), x + INSET, numberTop)
  if (block.revision) {
    const after = x + INSET + widthOf(faces, styles.number, block.number)
    const share = (styles.number.size - styles.revision.size) * 0.35
    drawLines(faces, styles.revision, setText(faces, styles.revision, `\u00a0rev ${block.revision}`, first), after, numberTop + share)
  }
  drawLines(faces, TITLE, titleLines(faces, block, width), x + INSET, numberTop + leadingOf(NUMBER))

  const widths = cellWidths(block, width)
  const lines = cellLines(faces, block, width)
  block.cells.forEach((cell, index) => {
    const each = widths[index]!
    const left = x + first + widths.slice(0, index).reduce((sum, one) => sum + one, 0)
    doc.lineWidth(0.5).strokeColor(COLOUR.ink).moveTo(left, top).lineTo(left, y + height).stroke()
    drawLines(faces, LABEL, setText(faces, LABEL, cell.label.toUpperCase(), each - 2 * INSET).slice(0, 1), left + INSET, top + 5)
    drawLines(faces, VALUE, lines[index] ?? [], left + INSET, top + 5 + leadingOf(LABEL) + 2)
  })
  const stampLeft = x + width * (1 - SHARES.stamp)
  doc.lineWidth(0.5).strokeColor(COLOUR.ink).moveTo(stampLeft, top).lineTo(stampLeft, y + height).stroke()
  drawStamp(doc, faces, block, stampLeft, top, width * SHARES.stamp, height - STRIP)
}
