import { rowHeatInput, summarizeRunSheet, type Span } from '@shared/calculations/run-sheet.ts'
import type { Interval } from '@shared/schemas/common.ts'
import type { RunRow } from '@shared/schemas/welding.ts'
import { PAD, SOFT } from './layout/sheet.ts'
import { drawTable, type Column } from './layout/table.ts'
import { LAYER, processName, said } from './words.ts'
import type { Context } from './weld-sections.ts'

const right = (title: string, unit: string, share: number): Column => ({ title, unit, share, align: 'right' })

/** The same doubt about many passes is said once. */
function gathered(doubts: readonly string[]): string[] {
  const passes = new Map<string, string[]>()
  for (const doubt of doubts) {
    const [, pass, rest] = /^Pass ([^:]+): (.*)$/s.exec(doubt) ?? [null, '', doubt]
    passes.set(rest ?? doubt, [...(passes.get(rest ?? doubt) ?? []), pass ?? ''])
  }
  return [...passes].map(([doubt, found]) => {
    const named = found.filter(Boolean)
    if (named.length === 0) return doubt
    return named.length === 1 ? `Pass ${named[0]}: ${doubt}` : named.length <= 8 ? `Passes ${named.join(', ')}: ${doubt}` : `${named.length} passes, ${named[0]} to ${named.at(-1)}: ${doubt}`
  })
}

/** The run sheet as welded, with heat input computed from its readings. */
export function drawRunSheet(context: Context, rows: readonly RunRow[]): void {
  const { sheet, figures, variables } = context
  if (rows.length === 0) return
  const blocks = new Map(variables.processes.map((block) => [block.id, block]))
  const span = (value: Interval | null, dimension: 'current' | 'voltage' | 'wireFeed' | 'travelSpeed') => figures.cellInterval(value, dimension)
  const computed = (value: Span | null, dimension: 'travelSpeed' | 'heatInput'): string => {
    if (!value) return ''
    const [min, max] = [figures.cellValue(value.min, dimension), figures.cellValue(value.max, dimension)]
    return min === max ? min : `${min}–${max}`
  }
  sheet.section('Run sheet', `${rows.length} ${rows.length === 1 ? 'bead' : 'beads'}, as welded`, () => {
    drawTable(
      sheet,
      [{ title: 'Pass', share: 6 }, { title: 'Layer', share: 7 }, { title: 'Process', share: 9 }, right('Dia.', figures.unit('length'), 8), right('Current', figures.unit('current'), 9), right('Volts', figures.unit('voltage'), 9), right('Wire feed', figures.unit('wireFeed'), 10), right('Travel', figures.unit('travelSpeed'), 11), right('Length', figures.unit('length'), 9), right('Arc time', figures.unit('duration'), 8), right('Interpass', figures.unit('temperature'), 9), right('Heat input', figures.unit('heatInput'), 10), { title: 'Note', share: 14 }],
      rows.map((row) => {
        const block = blocks.get(row.processId)
        const reading = rowHeatInput(row, block?.electrical.waveformControlled ?? null)
        return [
          { text: row.pass, strong: true }, said(LAYER, row.layer), block ? (processName(block).split(',')[0] ?? '') : '', figures.cell(row.fillerDiameter, 'length'), span(row.current, 'current'), span(row.voltage, 'voltage'), span(row.wireFeed, 'wireFeed'), row.travelSpeed ? span(row.travelSpeed, 'travelSpeed') : { text: computed(reading.travelSpeed, 'travelSpeed'), soft: true },
          figures.cell(row.length, 'length'), figures.cell(row.arcTime, 'duration'), figures.cell(row.interpass, 'temperature'), reading.heatInput ? { text: computed(reading.heatInput, 'heatInput'), strong: true } : 'cannot tell', { text: row.note ?? '', soft: true },
        ]
      }),
      { size: 6.6 },
    )
    sheet.paragraph('Heat input is computed from the readings of each bead, without process efficiency: lowest and highest where the readings span a range. A travel speed in the lighter tone is computed from length and arc time.', SOFT, PAD, 2)
    sheet.subhead('By process', '', 50)
    drawTable(sheet, [{ title: 'Process', share: 24 }, right('Beads', '', 10), right('Heat input', figures.unit('heatInput'), 20), right('Highest interpass', figures.unit('temperature'), 20), { title: 'Missing', share: 40 }], summarizeRunSheet(rows, variables.processes).filter((summary) => summary.passes > 0).map((summary) => {
      const block = blocks.get(summary.processId)
      const missing = summary.missing.length > 3 ? [...summary.missing.slice(0, 3), `and ${summary.missing.length - 3} more`] : summary.missing
      return [{ text: block ? processName(block) : summary.processId, strong: true }, String(summary.passes), summary.heatInput ? computed(summary.heatInput, 'heatInput') : 'cannot tell', summary.maxInterpass === null ? 'not recorded' : figures.cellValue(summary.maxInterpass, 'temperature'), missing.join('; ')]
    }))
    const doubts = rows.flatMap((row) => rowHeatInput(row, blocks.get(row.processId)?.electrical.waveformControlled ?? null).doubts)
    if (doubts.length > 0) sheet.callout('Readings in doubt', gathered(doubts).join('\n'), 'straw')
  }, 70)
}
