/** Words and figures of the dial-in log. */
import { gasText } from '@shared/machines/wires.ts'
import { formatInterval, formatQuantity } from '@shared/units/format.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import type { Machine, MachineMode, PanelControl } from '@shared/schemas/machines.ts'
import type { Bead, BeadContent, BeadSetting } from '@shared/schemas/trials.ts'
import { MEASURE, type Measure } from '@shared/trials/bead-values.ts'
import { figure } from '@/lib/figures.ts'
import { panelFigure } from '@shared/machines/panel-lines.ts'

const wireInWords = ({ wire, wireId, wireDiameter }: Pick<BeadContent, 'wire' | 'wireId' | 'wireDiameter'>, system: UnitSystem): string => [wire ?? wireId, wireDiameter && formatQuantity(wireDiameter, 'length', system, { asTyped: true }).text].filter(Boolean).join(' ')

/** One line that says on what a bead was welded. */
export function setUpInWords(content: BeadContent, machine: Machine | null | undefined, mode: MachineMode | null, system: UnitSystem): string[] {
  const size = (value: Quantity | null) => value && formatQuantity(value, 'length', system, { asTyped: true }).text
  return [
    [machine?.number, mode?.name ?? content.modeKey].filter(Boolean).join(', '),
    wireInWords(content, system),
    gasText(content.gas) ?? content.gas?.name ?? '',
    [content.metal ?? content.metalId, size(content.thickness)].filter(Boolean).join(', '),
    [content.joint, content.position].filter(Boolean).join(', '),
    content.stickOut ? `stick-out ${size(content.stickOut) ?? ''}` : '',
  ].filter((part) => part !== '')
}

export const measuredText = (value: Interval | Quantity | null, measure: Measure, system: UnitSystem): string | null =>
  value === null ? null : 'all' in value ? formatInterval(value, MEASURE[measure].dimension, system, { asTyped: true }).text : formatQuantity(value, MEASURE[measure].dimension, system, { asTyped: true }).text

/** A setting as it stands on the panel, with the decimals of its steps where the machine is known. */
export const settingText = (value: number, control: PanelControl | null | undefined): string => (control ? panelFigure(value, control) : figure(value))

export interface Column { control: string; label: string; unit: string }
/** Every control that any bead has, in the order of the last bead's panel. */
export function columnsOf(beads: readonly Pick<Bead, 'content'>[]): Column[] {
  const found = new Map<string, Column>()
  for (const { content } of [...beads].reverse()) for (const { control, label, unit } of content.settings) if (!found.has(control)) found.set(control, { control, label, unit })
  return [...found.values()]
}
export const settingOf = (content: Pick<BeadContent, 'settings'>, control: string): BeadSetting | undefined => content.settings.find((one) => one.control === control)

/** Shapes by score, so that nothing rests on colour alone. */
export type ScoreShape = 'good' | 'fair' | 'bad' | 'none'
export const shapeOf = (score: number | null): ScoreShape => (score === null ? 'none' : score >= 4 ? 'good' : score === 3 ? 'fair' : 'bad')
export const SHAPE_WORDS: Record<ScoreShape, string> = { good: '4 or 5', fair: '3', bad: '1 or 2', none: 'not scored' }
