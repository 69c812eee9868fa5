import type { Verdict } from '@shared/schemas/assessment.ts'
import { drawMark, VERDICT_WORD } from './marks.ts'
import { BODY, PAD, SOFT, type Sheet } from './sheet.ts'
import { drawLines, heightOf, setText, type Style } from './text.ts'
import { COLOUR } from './tokens.ts'

/** A name and what it is; `verdicts` are drawn as marks after it, each with its clause. */
export interface Fact { label: string; value: string; strong?: boolean; verdicts?: readonly { verdict: Verdict; clause: string }[] }

const CLAUSE: Style = { face: 'head', size: 6.8, colour: COLOUR.soft, leading: 10.6 }
const LABEL_STYLE: Style = { ...SOFT, size: 7, leading: 10.6 }

/** Height of facts set in one column of the given width. */
function measure(sheet: Sheet, fact: Fact, labelWidth: number, valueWidth: number) {
  const marks = (fact.verdicts ?? []).slice(0, 3)
  const clauses = marks.map((mark) => ({ ...mark, lines: setText(sheet.faces, CLAUSE, `${VERDICT_WORD[mark.verdict]} ${mark.clause}`, 90).slice(0, 1) }))
  const markWidth = clauses.length > 0 ? Math.max(...clauses.map((clause) => clause.lines[0]?.width ?? 0)) + 14 : 0
  const label = setText(sheet.faces, LABEL_STYLE, fact.label, labelWidth - 6)
  const style: Style = fact.strong ? { ...BODY, face: 'strong' } : BODY
  const value = setText(sheet.faces, style, fact.value, valueWidth - markWidth - 4)
  const height = Math.max(heightOf(label, LABEL_STYLE), heightOf(value, style), clauses.length * 10.6) + 3.4
  return { label, value, style, clauses, markWidth, height }
}

export function factsHeight(sheet: Sheet, facts: readonly Fact[], width: number, labelShare = 0.36): number {
  return facts.reduce((sum, fact) => sum + measure(sheet, fact, width * labelShare, width * (1 - labelShare)).height, 0)
}

function drawFact(sheet: Sheet, list: PDFKit.PDFStructureElement, fact: Fact, x: number, y: number, width: number, labelShare: number): void {
  const labelWidth = width * labelShare
  const set = measure(sheet, fact, labelWidth, width - labelWidth)
  const item = sheet.group('LI', list)
  sheet.tag('Lbl', () => drawLines(sheet.faces, LABEL_STYLE, set.label, x, y + 1.7), { into: item })
  sheet.tag('LBody', () => {
    drawLines(sheet.faces, set.style, set.value, x + labelWidth, y + 1.7)
    set.clauses.forEach((clause, index) => {
      const left = x + width - set.markWidth
      drawMark(sheet.doc, clause.verdict, left + 6, y + 1.7 + index * 10.6 + 5.3, 4.6)
      drawLines(sheet.faces, CLAUSE, clause.lines, left + 12, y + 1.7 + index * 10.6)
    })
  }, { into: item })
}

/** Facts one below another at a fixed place, for a column beside a drawing. Gives the height used. */
export function drawFactColumn(sheet: Sheet, facts: readonly Fact[], x: number, y: number, width: number, labelShare = 0.42): number {
  let at = y
  const list = sheet.group('L')
  for (const fact of facts) {
    drawFact(sheet, list, fact, x, at, width, labelShare)
    at += measure(sheet, fact, width * labelShare, width * (1 - labelShare)).height
  }
  return at - y
}

/** Facts in ruled rows over the sheet's width, two (or more) to a row, read from left to right. */
export function drawFacts(sheet: Sheet, facts: readonly Fact[], columns = 2, labelShare = 0.34): void {
  const gutter = 14
  const list = sheet.group('L')
  const width = (sheet.width - 2 * PAD - gutter * (columns - 1)) / columns
  for (let at = 0; at < facts.length; at += columns) {
    const row = facts.slice(at, at + columns)
    const height = Math.max(...row.map((fact) => measure(sheet, fact, width * labelShare, width * (1 - labelShare)).height))
    sheet.ensure(height)
    row.forEach((fact, index) => drawFact(sheet, list, fact, sheet.left + PAD + index * (width + gutter), sheet.y, width, labelShare))
    sheet.y += height
    sheet.rule(COLOUR.hair, 0.4, PAD)
  }
}

/** One fact over the whole width, broken between lines at a page's end when it is long. */
export function drawWideFact(sheet: Sheet, fact: Fact, labelShare = 0.167): void {
  const width = sheet.width - 2 * PAD
  const set = measure(sheet, fact, width * labelShare, width * (1 - labelShare))
  if (set.height < sheet.fullRoom * 0.5) {
    sheet.ensure(set.height)
    drawFact(sheet, sheet.group('L'), fact, sheet.left + PAD, sheet.y, width, labelShare)
    sheet.y += set.height
  } else {
    sheet.paragraph(fact.label, LABEL_STYLE)
    sheet.paragraph(fact.value)
  }
  sheet.rule(COLOUR.hair, 0.4, PAD)
}
