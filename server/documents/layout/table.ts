import type { Verdict } from '@shared/schemas/assessment.ts'
import { drawMark, VERDICT_COLOUR, VERDICT_WORD } from './marks.ts'
import { LABEL, PAD, type Sheet } from './sheet.ts'
import { drawLines, heightOf, leadingOf, setText, type Line, type Style } from './text.ts'
import { COLOUR } from './tokens.ts'

export interface Column {
  title: string
  /** A second, soft line below the title, e.g. the unit. */
  unit?: string
  /** Share of the table's width. */
  share: number
  align?: 'left' | 'right' | 'center'
}
export type Cell = string | { text: string; strong?: boolean; soft?: boolean; colour?: string; verdict?: Verdict }

const BODY: Style = { face: 'text', size: 7, colour: COLOUR.ink, leading: 9.2 }
const UNIT: Style = { face: 'text', size: 6.2, colour: COLOUR.soft, leading: 8 }
const GAP = 3.2
const MARK = 9

interface SetCell { lines: Line[]; style: Style; verdict?: Verdict; align: 'left' | 'right' | 'center' }

/**
 * A ruled table over the sheet's width. It breaks between rows and repeats its head; a row taller than a page
 * is continued on the next. Cells are text; a verdict gives its shape and word.
 */
export function drawTable(sheet: Sheet, columns: readonly Column[], rows: readonly (readonly Cell[])[], options: { size?: number } = {}): void {
  const total = sheet.width - 2 * PAD
  const sum = columns.reduce((all, column) => all + column.share, 0)
  const widths = columns.map((column) => (column.share / sum) * total)
  const lefts = widths.map((_, index) => sheet.left + PAD + widths.slice(0, index).reduce((all, width) => all + width, 0))
  const body: Style = options.size ? { ...BODY, size: options.size, leading: options.size * 1.31 } : BODY
  // A left-aligned column after a right-aligned one would touch it.
  const indentOf = (index: number) => (index > 0 && columns[index - 1]?.align === 'right' && columns[index]?.align !== 'right' ? 7 : 0)
  // The first column stands flush with the section's text.
  const gapOf = (index: number) => (index === 0 ? 0 : GAP)
  const inner = (index: number) => (widths[index] ?? 0) - GAP - gapOf(index) - indentOf(index)
  const leftOf = (index: number) => (lefts[index] ?? 0) + gapOf(index) + indentOf(index)

  const heads = columns.map((column, index) => ({
    title: setText(sheet.faces, { ...LABEL, size: 6.8, leading: 8.2 }, column.title.toUpperCase(), inner(index)),
    unit: column.unit ? setText(sheet.faces, UNIT, column.unit, inner(index)) : [],
  }))
  const headHeight = 5 + Math.max(...heads.map((head) => head.title.length * 8.2 + heightOf(head.unit, UNIT)))

  const cells = (row: readonly Cell[]): SetCell[] =>
    columns.map((column, index) => {
      const cell = row[index] ?? ''
      const given = typeof cell === 'string' ? { text: cell } : cell
      const style: Style = { ...body, tabular: column.align === 'right', face: given.strong || (given.verdict && !given.text) ? 'strong' : 'text', colour: given.colour ?? (given.verdict && !given.text ? VERDICT_COLOUR[given.verdict] : given.soft ? COLOUR.soft : COLOUR.ink) }
      const text = given.verdict && !given.text ? VERDICT_WORD[given.verdict] : given.text
      return { lines: setText(sheet.faces, style, text, inner(index) - (given.verdict ? MARK : 0)), style, verdict: given.verdict, align: column.align ?? 'left' }
    })

  const table = sheet.group('Table')
  const drawHead = (first: boolean): void => {
    const top = sheet.y + 2
    const line = (index: number) => {
      const head = heads[index]!
      const offset = headHeight - 3 - head.title.length * 8.2 - heightOf(head.unit, UNIT)
      const align = columns[index]!.align ?? 'left'
      drawLines(sheet.faces, { ...LABEL, size: 6.8, leading: 8.2 }, head.title, leftOf(index), top + offset, inner(index), align)
      drawLines(sheet.faces, UNIT, head.unit, leftOf(index), top + offset + head.title.length * 8.2, inner(index), align)
    }
    if (first) {
      const row = sheet.group('TR', table)
      columns.forEach((_, index) => sheet.tag('TH', () => line(index), { into: row }))
    } else sheet.artifact(() => columns.forEach((_, index) => line(index)))
    sheet.y = top + headHeight
    sheet.rule(COLOUR.ink, 0.5, PAD)
  }

  sheet.ensure(headHeight + leadingOf(body) + 8)
  drawHead(true)
  rows.forEach((row, at) => {
    let set = cells(row)
    const heightWith = (parts: readonly SetCell[]) => Math.max(leadingOf(body), ...parts.map((cell) => heightOf(cell.lines, cell.style))) + 4
    if (heightWith(set) > sheet.room && heightWith(set) < sheet.fullRoom - headHeight) {
      sheet.newPage()
      drawHead(false)
    }
    const element = sheet.group('TR', table)
    for (let firstPart = true; firstPart || set.some((cell) => cell.lines.length > 0); firstPart = false) {
      if (sheet.room < leadingOf(body) + 4) {
        sheet.newPage()
        drawHead(false)
      }
      const fit = Math.max(1, Math.floor((sheet.room - 4) / leadingOf(body)))
      const part = set.map((cell) => ({ ...cell, lines: cell.lines.slice(0, fit) }))
      const top = sheet.y + 2
      part.forEach((cell, index) => {
        sheet.tag('TD', () => {
          if (cell.verdict && firstPart) drawMark(sheet.doc, cell.verdict, leftOf(index) + 3, top + leadingOf(body) / 2)
          const indent = cell.verdict ? MARK : 0
          drawLines(sheet.faces, cell.style, cell.lines, leftOf(index) + indent, top, inner(index) - indent, cell.align)
        }, { into: element })
      })
      sheet.y += heightWith(part)
      set = set.map((cell) => ({ ...cell, lines: cell.lines.slice(fit) }))
    }
    sheet.rule(at === rows.length - 1 ? COLOUR.rule : COLOUR.hair, 0.4, PAD)
  })
  sheet.y += 4
}
