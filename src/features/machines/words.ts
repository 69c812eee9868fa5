/** Words of the register, and the ways between lists and the text in which people type them. */
import { PANEL_QUANTITY } from '@shared/machines/panel-quantities.ts'
import { MODE_KINDS, PANEL_QUANTITIES, type CalibrationState, type MachineMode, type PanelControl, type WriteMachine } from '@shared/schemas/machines.ts'
import { PROCESSES, TRANSFER_MODES } from '@shared/schemas/welding.ts'

export const KIND_WORDS: Record<WriteMachine['kind'], string> = { wire: 'Wire', 'wire-and-stick': 'Wire and stick', stick: 'Stick', tig: 'TIG', plasma: 'Plasma', 'submerged-arc': 'Submerged arc', several: 'Several processes' }
export const MODE_WORDS: Record<MachineMode['kind'], string> = { 'constant-voltage': 'Constant voltage', 'one-knob': 'One-knob programs', 'pulsed-one-knob': 'Pulsed, one knob', 'manual-pulse': 'Manual pulse', 'double-pulse': 'Double pulse', 'constant-current': 'Constant current', ac: 'Alternating current' }
export const GUN_WORDS: Record<WriteMachine['gunTypes'][number], string> = { standard: 'Standard gun', 'spool-gun': 'Spool gun', 'push-pull': 'Push-pull gun', 'machine-mounted': 'Machine-mounted torch', 'tig-torch': 'TIG torch', 'electrode-holder': 'Electrode holder' }
export const CALIBRATION_WORDS: Record<CalibrationState, string> = { current: 'Calibrated', 'due-soon': 'Due soon', lapsed: 'Lapsed', unknown: 'Not recorded' }
export const WHEN_WORDS: Record<MachineMode['displays'][number]['when'], string> = { always: 'always', 'while-welding': 'while welding', 'after-welding': 'held after welding' }
export const HAS_WORDS: Record<keyof MachineMode['has'], string> = { craterFill: 'Crater fill', hotStart: 'Hot start', ramp: 'Ramp', preFlow: 'Pre-flow', postFlow: 'Post-flow' }

const words = (text: string) => `${text[0]?.toUpperCase() ?? ''}${text.slice(1).replaceAll('-', ' ')}`
const options = <K extends string>(of: Record<K, string>) => (Object.entries(of) as [K, string][]).map(([value, label]) => ({ value, label }))
export const KIND_OPTIONS = options(KIND_WORDS)
export const MODE_OPTIONS = MODE_KINDS.map((value) => ({ value, label: MODE_WORDS[value] }))
export const GUN_OPTIONS = options(GUN_WORDS)
export const CALIBRATION_OPTIONS = options(CALIBRATION_WORDS)
export const WHEN_OPTIONS = options(WHEN_WORDS)
export const HAS_KEYS = Object.keys(HAS_WORDS) as (keyof MachineMode['has'])[]
export const QUANTITY_OPTIONS = PANEL_QUANTITIES.map((value) => ({ value, label: PANEL_QUANTITY[value].label }))
export const PROCESS_OPTIONS = PROCESSES.map((value) => ({ value }))
export const TRANSFER_OPTIONS = TRANSFER_MODES.map((value) => ({ value, label: words(value) }))
export const POLARITY_OPTIONS = (['DCEP', 'DCEN', 'AC'] as const).map((value) => ({ value }))

/** "ER4043, ER5356" → each of them. */
export const readWords = (text: string): string[] => text.split(/[,;\n]/).map((one) => one.trim()).filter((one) => one !== '')
/** "0.9, 1.2" → figures; what is no figure stays out and is told by `unreadFigures`. */
export const readFigures = (text: string): number[] => text.split(/[;\s]+|,\s+|,$/).map((one) => one.trim().replace(',', '.')).filter((one) => one !== '' && Number.isFinite(Number(one))).map(Number)
export const unreadFigures = (text: string): string[] => text.split(/[;\s]+|,\s+|,$/).map((one) => one.trim()).filter((one) => one !== '' && !Number.isFinite(Number(one.replace(',', '.'))))

/** A figure as typed into the form: a decimal comma is read, an empty box is no figure, anything else stays to be told of. */
export const asFigure = (text: unknown): number | null => {
  if (typeof text === 'number') return text
  if (typeof text !== 'string' || text.trim() === '') return null
  return Number(text.trim().replace(',', '.'))
}
/** What is wrong with a box of the form, in a sentence. */
export const wrong = (error: { type?: unknown; message?: string | undefined } | undefined): string | undefined => (error === undefined ? undefined : error.type === 'invalid_type' || error.type === 'invalid_union' ? 'Give a figure, e.g. 12.5.' : error.message)

export const scaleOf = ({ min, max, step, unit }: Pick<PanelControl, 'min' | 'max' | 'step' | 'unit'>): string => `${min} to ${max}${unit ? ` ${unit}` : ''}${step === null ? ', stepless' : `, step ${step}`}`
