/** What the shop view shows of a procedure, in the words and figures of the person who welds. Pure. */
import { isoPosition } from '@shared/library/positions.ts'
import type { Interval } from '@shared/schemas/common.ts'
import type { BaseMetal, Electrical, GasMixture, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatInterval, formatQuantity, type Formatted } from '@shared/units/format.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'

export interface Dial {
  label: string
  hint: string | null
  figure: string
  unit: string
  /** Share of the scale, 0 to 1, that may be dialled; null where no scale is known. */
  window: { from: number; to: number } | null
}

type Setting = NonNullable<Electrical['panel']>['settings'][number]

/** Where min to max lies on the panel's scale; null without a scale or when the ends make no sense. */
export function windowOf({ scaleMin, scaleMax, min, max }: Pick<Setting, 'scaleMin' | 'scaleMax' | 'min' | 'max'>): Dial['window'] {
  if (scaleMin === null || scaleMax === null || scaleMax <= scaleMin || (min === null && max === null)) return null
  const share = (value: number) => Math.max(0, Math.min(1, (value - scaleMin) / (scaleMax - scaleMin)))
  const [from, to] = [share(min ?? scaleMin), share(max ?? scaleMax)]
  return to < from ? null : { from, to }
}

const ELECTRICAL: readonly (readonly [key: keyof Electrical, label: string, dimension: Dimension])[] = [
  ['wireFeed', 'Wire feed', 'wireFeed'],
  ['current', 'Amps', 'current'],
  ['voltage', 'Volts', 'voltage'],
  ['peakCurrent', 'Peak', 'current'],
  ['backgroundCurrent', 'Background', 'current'],
  ['backgroundVoltage', 'Background', 'voltage'],
  ['pulseFrequency', 'Frequency', 'frequency'],
  ['pulseOnTime', 'Pulse on-time', 'pulseTime'],
  ['acFrequency', 'AC frequency', 'frequency'],
  ['travelSpeed', 'Travel', 'travelSpeed'],
]

/** What to dial: the panel's own settings where one machine's are written, else the electrical ranges of the process. */
export function dialsOf({ electrical }: Pick<ProcessBlock, 'electrical'>, system: UnitSystem): { head: string; dials: Dial[]; caution: string | null } {
  const { panel } = electrical
  if (panel && panel.settings.length > 0) {
    const head = `Dial this${panel.machine ? ` on ${panel.machine}` : ''}${panel.mode ? ` · ${panel.mode}` : ''}`
    return { head, caution: panel.caution, dials: panel.settings.map((setting) => ({ label: setting.control, hint: setting.hint, figure: setting.value, unit: setting.unit, window: windowOf(setting) })) }
  }
  const dials = ELECTRICAL.flatMap(([key, label, dimension]): Dial[] => {
    const value = electrical[key] as Interval | null
    const text = value && formatInterval(value, dimension, system)
    return text && text.figure !== '' ? [{ label, hint: null, figure: text.figure, unit: text.unit || SHOWN_UNIT[system][dimension], window: null }] : []
  })
  return { head: 'Keep within', dials, caution: panel?.caution ?? null }
}

const name = ({ specification, grade, pNumber }: BaseMetal) => [specification, grade].filter(Boolean).join(' ') || (pNumber ? `P-No. ${pNumber}` : '')
const text = (value: Formatted | null | undefined) => value?.text ?? ''
const or = (parts: readonly (string | null | undefined | false)[], between = ' · ') => parts.filter(Boolean).join(between) || 'not stated'

function gasOf(gas: GasMixture | null, system: UnitSystem): string | null {
  if (!gas) return null
  const parts = gas.components.length === 1 && gas.components[0]?.gas === 'Ar' ? 'Argon' : gas.components.map(({ gas: one, percent }) => `${one} ${percent} %`).join(' + ')
  return [`${parts || (gas.name ?? '')}${gas.isoSymbol ? ` (${gas.isoSymbol})` : ''}`.trim(), gas.flow && text(formatInterval(gas.flow, 'gasFlow', system))].filter(Boolean).join(' ')
}

export interface Cell {
  label: string
  value: string
}

/** The cells under the head: metal, wire, gas, position, and what the arc needs to know besides. */
export function cellsOf(variables: WeldingVariables, block: ProcessBlock, system: UnitSystem): Cell[] {
  const { baseMetals, thickness, diameter, preheat, joint, product } = variables
  const [a, b] = [name(baseMetals.a), name(baseMetals.b)]
  const { filler, positions, progression, electrical } = block
  const wire = block.process === 'SMAW' ? 'Electrode' : block.process === 'GTAW' || block.process === 'PAW' ? 'Rod' : 'Wire'
  const position = positions.map((one) => {
    const { iso, decided } = isoPosition(one, joint.weld, product, progression)
    return decided && iso[0] ? `${one} / ${iso[0]}` : one
  })
  const cells: Cell[] = [
    { label: 'Metal', value: or([b && b !== a ? or([a, b], ' to ') : a, thickness && text(formatInterval(thickness, 'length', system))], '\n') },
    { label: wire, value: filler.added === false ? 'none, autogenous' : or([filler.classification, filler.diameters.map((size) => formatQuantity(size, 'length', system).text).join(', ')]) },
    { label: 'Gas', value: gasOf(block.shieldingGas, system) ?? 'none' },
    { label: 'Position', value: or([position.map((one) => one.replaceAll(' / ', '\u00a0/\u00a0')).join(', '), progression && (progression === 'both' ? 'up or down' : progression)]) },
  ]
  if (block.backingGas) cells.push({ label: 'Backing gas', value: gasOf(block.backingGas, system) ?? 'none' })
  if (diameter && !diameter.all) cells.push({ label: 'Pipe', value: or([text(formatInterval(diameter, 'length', system))]) })
  cells.push({ label: 'Current', value: or([electrical.currentType, electrical.pulsed || electrical.transferMode === 'pulsed-spray' ? 'pulsed' : electrical.transferMode?.replace('-', ' ')], ', ') })
  cells.push({ label: 'Preheat, at least', value: preheat.minimum ? formatQuantity(preheat.minimum, 'temperature', system).text : 'not stated' })
  cells.push({ label: 'Interpass, at most', value: preheat.interpassMaximum ? formatQuantity(preheat.interpassMaximum, 'temperature', system).text : 'not stated' })
  return cells
}
