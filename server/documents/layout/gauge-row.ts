import type { Judged } from '../judgements.ts'
import { CLASS_WORD } from '../words.ts'
import type { Figures } from './figures.ts'
import { drawGauge, GAUGE_HEIGHT, gaugeInWords } from './gauge.ts'
import { drawMark, VERDICT_COLOUR, VERDICT_WORD } from './marks.ts'
import { BODY, PAD, SOFT, STRONG, type Sheet } from './sheet.ts'
import { drawLines, heightOf, setText, type Style } from './text.ts'
import { COLOUR } from './tokens.ts'

export interface GaugeRow { label: string; note?: string; value: string; judged: readonly Judged[] }

const CLAUSE: Style = { face: 'head', size: 7.6, colour: COLOUR.soft, leading: 9.4 }

/**
 * A numeric variable over the sheet's width: name, value, range gauge, and the verdict with its class, range in words and clause.
 * Several standards stand below each other; without a judgement the value stands alone.
 */
export function drawGaugeRow(sheet: Sheet, figures: Figures, row: GaugeRow): void {
  const { faces, doc } = sheet
  const inner = sheet.width - 2 * PAD
  const columns = { label: inner * 0.2, value: inner * 0.18, gauge: inner * 0.37, words: inner * 0.25 }
  const lefts = { label: sheet.left + PAD, value: sheet.left + PAD + columns.label, gauge: sheet.left + PAD + columns.label + columns.value, words: sheet.left + PAD + columns.label + columns.value + columns.gauge }
  const label = setText(faces, STRONG, row.label, columns.label - 8)
  const note = row.note ? setText(faces, SOFT, row.note, columns.label - 8) : []
  const value = setText(faces, BODY, row.value, columns.value - 8)
  const entries: readonly (Judged | null)[] = row.judged.length > 0 ? row.judged : [null]
  entries.forEach((judged, index) => {
    const verdict = judged?.verdict ? `${VERDICT_WORD[judged.verdict]} · ${CLASS_WORD[judged.class]}` : judged ? CLASS_WORD[judged.class] : ''
    const verdictStyle: Style = { ...STRONG, size: 7, leading: 9.4, colour: judged?.verdict ? VERDICT_COLOUR[judged.verdict] : COLOUR.soft }
    const indent = judged?.verdict ? 9 : 0
    const words = judged ? setText(faces, verdictStyle, verdict, columns.words - 12 - indent) : []
    const ranged = judged ? setText(faces, SOFT, `qualified: ${figures.range(judged.gauge.range)}`, columns.words - 12) : []
    const clause = judged ? setText(faces, CLAUSE, [judged.standard, judged.clause].filter(Boolean).join(' · '), columns.words - 12) : []
    const side = heightOf(words, verdictStyle) + heightOf(ranged, SOFT) + heightOf(clause, CLAUSE)
    const own = index === 0 ? Math.max(heightOf(label, STRONG) + heightOf(note, SOFT), heightOf(value, BODY)) : 0
    const height = Math.max(judged ? GAUGE_HEIGHT : 0, side, own) + 5
    sheet.ensure(height)
    const top = sheet.y + 2.5
    if (judged?.verdict === 'outside') sheet.artifact(() => doc.rect(sheet.left + 0.5, sheet.y, 2.5, height).fill(COLOUR.oxide))
    const middle = (block: number) => top + (height - 5 - block) / 2
    if (index === 0) {
      sheet.tag('P', () => {
        const start = middle(heightOf(label, STRONG) + heightOf(note, SOFT))
        drawLines(faces, STRONG, label, lefts.label, start)
        drawLines(faces, SOFT, note, lefts.label, start + heightOf(label, STRONG))
        drawLines(faces, BODY, value, lefts.value, middle(heightOf(value, BODY)))
      })
    }
    if (judged) {
      sheet.tag('Figure', () => drawGauge(doc, faces, figures, judged.gauge, lefts.gauge, middle(GAUGE_HEIGHT), columns.gauge), { alt: gaugeInWords(figures, row.label, judged.gauge) })
      sheet.tag('P', () => {
        const start = middle(side)
        const left = lefts.words + 12
        if (judged.verdict) drawMark(doc, judged.verdict, left + 3, start + 4.7)
        drawLines(faces, verdictStyle, words, left + indent, start)
        drawLines(faces, SOFT, ranged, left, start + heightOf(words, verdictStyle))
        drawLines(faces, CLAUSE, clause, left, start + heightOf(words, verdictStyle) + heightOf(ranged, SOFT))
      })
    }
    sheet.y += height
    sheet.rule(index === entries.length - 1 ? COLOUR.hair : '#EFEDE7', 0.4, PAD)
  })
}
