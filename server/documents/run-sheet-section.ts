import type { Interval } from '@shared/schemas/common.ts'
import type { RunRow } from '@shared/schemas/welding.ts'
import { drawTable, type Column } from './layout/table.ts'
import { LAYER, processName, said } from './words.ts'
import type { Context } from './weld-sections.ts'

const right = (title: string, unit: string, share: number): Column => ({ title, unit, share, align: 'right' })

/** The run sheet as welded, with heat input computed from its readings. */
export function drawRunSheet(context: Context, rows: readonly RunRow[]): void {
  const { sheet, figures, variables } = context
  if (rows.length === 0) return
  const blocks = new Map(variables.processes.map((block) => [block.id, block]))
  const span = (value: Interval | null, dimension: 'current' | 'voltage' | 'wireFeed' | 'travelSpeed') => figures.cellInterval(value, dimension)
  sheet.section('Run sheet', `${rows.length} ${rows.length === 1 ? 'bead' : 'beads'}, as welded`, () => {
    drawTable(
      sheet,
      [{ title: 'Pass', share: 6 }, { title: 'Layer', share: 7 }, { title: 'Process', share: 9 }, right('Dia.', figures.unit('length'), 8), right('Current', figures.unit('current'), 9), right('Volts', figures.unit('voltage'), 9), right('Wire feed', figures.unit('wireFeed'), 10), right('Travel', figures.unit('travelSpeed'), 11), right('Length', figures.unit('length'), 9), right('Arc time', figures.unit('duration'), 8), right('Interpass', figures.unit('temperature'), 9), right('Heat input', figures.unit('heatInput'), 10), { title: 'Note', share: 14 }],
      rows.map((row) => {
        const block = blocks.get(row.processId)
        return [
          { text: row.pass, strong: true }, said(LAYER, row.layer), block ? (processName(block).split(',')[0] ?? '') : '', figures.cell(row.fillerDiameter, 'length'), span(row.current, 'current'), span(row.voltage, 'voltage'), span(row.wireFeed, 'wireFeed'), span(row.travelSpeed, 'travelSpeed'),
          figures.cell(row.length, 'length'), figures.cell(row.arcTime, 'duration'), figures.cell(row.interpass, 'temperature'), '', { text: row.note ?? '', soft: true },
        ]
      }),
      { size: 6.6 },
    )
  }, 70)
}
