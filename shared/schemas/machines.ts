/**
 * Power sources and feeders, told by what stands on their panel: modes, controls with unit, range and step,
 * what is displayed, which wires the programs cover. Make-neutral.
 */
import { z } from 'zod'
import { idSchema, textOrNull } from './common.ts'
import { processSchema, TRANSFER_MODES } from './welding.ts'

/** What a mode asks of the welder. */
export const MODE_KINDS = ['constant-voltage', 'one-knob', 'pulsed-one-knob', 'manual-pulse', 'double-pulse', 'constant-current', 'ac'] as const
export const modeKindSchema = z.enum(MODE_KINDS)
export type ModeKind = z.infer<typeof modeKindSchema>

/** The variable of the weld that a control sets or a display shows; `knob` and `trim` mean something only through the machine's own points. */
export const PANEL_QUANTITIES = [
  'current', 'voltage', 'wireFeed', 'peakCurrent', 'backgroundCurrent', 'peakVoltage', 'backgroundVoltage', 'pulseFrequency', 'pulseOnTime',
  'acFrequency', 'acBalance', 'doublePulseFrequency', 'knob', 'trim', 'inductance', 'preFlow', 'postFlow', 'craterCurrent', 'craterTime', 'hotStart', 'upSlope', 'downSlope', 'burnBack', 'runIn', 'gasFlow',
] as const
export const panelQuantitySchema = z.enum(PANEL_QUANTITIES)
export type PanelQuantity = z.infer<typeof panelQuantitySchema>

const key = z.string().trim().regex(/^[a-z0-9-]{1,40}$/, 'Use small letters, digits and hyphens, e.g. "manual-pulse".')

/** One knob, button or menu line; figures in the unit printed on the panel. */
export const controlSchema = z
  .object({
    key,
    label: z.string().trim().min(1, 'Give the words on the panel, e.g. "Wire feed".').max(60),
    /** Where it is, e.g. "left knob" or "menu, line 2". */
    where: textOrNull(80),
    sets: panelQuantitySchema,
    /** As printed: in/min, m/min, V, A, Hz, ms, s, %, or empty for a bare scale. */
    unit: z.string().trim().max(16).default(''),
    min: z.number().finite(),
    max: z.number().finite(),
    /** Smallest change that the control can make; null = stepless. */
    step: z.number().positive().nullable().default(null),
    /** Whether the panel shows the value that is set. */
    shown: z.boolean().default(true),
  })
  .refine((control) => control.min < control.max, { path: ['max'], message: 'The top of the scale must be above its bottom.' })
  .meta({ id: 'PanelControl' })
export type PanelControl = z.infer<typeof controlSchema>

/** A figure that the machine displays though no control sets it, or shows only while welding or afterwards. */
export const panelDisplaySchema = z.object({ quantity: panelQuantitySchema, unit: z.string().trim().max(16), when: z.enum(['always', 'while-welding', 'after-welding']), resolution: z.number().positive().nullable().default(null) }).meta({ id: 'PanelDisplay' })

/** A point that the shop measured: where the knob stood, and what came out. */
export const programPointSchema = z.object({ knob: z.number().finite(), wireFeed: z.number().positive().nullable().default(null), voltage: z.number().positive().nullable().default(null), current: z.number().positive().nullable().default(null), measuredOn: z.iso.date().nullable().default(null), note: textOrNull(200) }).meta({ id: 'ProgramPoint' })
export type ProgramPoint = z.infer<typeof programPointSchema>

/** The shop's own measurements of one program with one wire and gas; wire feed m/min, volts, amps. */
export const measuredProgramSchema = z.object({ wire: z.string().trim().min(1, 'Name the wire, e.g. ER5356.').max(60), /** mm */ diameter: z.number().positive(), gas: z.string().trim().min(1, 'Name the gas, e.g. Ar 100.').max(60), trim: z.number().nullable().default(null), points: z.array(programPointSchema).max(60).default([]) }).meta({ id: 'MeasuredProgram' })

/** A program of a one-knob mode: the wires that its maker made it for, as the panel names them. */
export const programSchema = z
  .object({
    key,
    label: z.string().trim().min(1, 'Give the program the name on the panel.').max(80),
    /** Classifications that the button stands for; several when the machine lumps them together. Empty = the maker doesn't say. */
    wires: z.array(z.string().trim().min(1).max(60)).max(20).default([]),
    /** mm; empty = the maker doesn't say. */
    diameters: z.array(z.number().positive()).max(12).default([]),
    gases: z.array(z.string().trim().min(1).max(60)).max(12).default([]),
    measured: z.array(measuredProgramSchema).max(40).default([]),
  })
  .meta({ id: 'MachineProgram' })
export type MachineProgram = z.infer<typeof programSchema>

const span = z.object({ min: z.number(), max: z.number() }).nullable().default(null)

export const machineModeSchema = z
  .object({
    key,
    name: z.string().trim().min(1, 'Give the mode the name on the panel.').max(60),
    kind: modeKindSchema,
    processes: z.array(processSchema).min(1, 'Say which process the mode is for.').max(8),
    transferModes: z.array(z.enum(TRANSFER_MODES)).max(4).default([]),
    polarities: z.array(z.enum(['DCEP', 'DCEN', 'AC'])).max(3).default([]),
    controls: z.array(controlSchema).max(40).default([]),
    displays: z.array(panelDisplaySchema).max(20).default([]),
    programs: z.array(programSchema).max(40).default([]),
    /** What the machine can put out in this mode: A, V, m/min. */
    reach: z.object({ current: span, voltage: span, wireFeed: span }).prefault({}),
    has: z.object({ craterFill: z.boolean().default(false), hotStart: z.boolean().default(false), ramp: z.boolean().default(false), preFlow: z.boolean().default(false), postFlow: z.boolean().default(false) }).prefault({}),
  })
  .meta({ id: 'MachineMode' })
export type MachineMode = z.infer<typeof machineModeSchema>

const different = (message: string) => (rows: readonly { key: string }[], context: z.RefinementCtx) => {
  rows.forEach((row, index) => { if (rows.findIndex((other) => other.key === row.key) !== index) context.addIssue({ code: 'custom', path: [index, 'key'], message }) })
}

const accuracyPercent = z.number().positive().max(50, 'An accuracy worse than ± 50 % says nothing.').nullable().default(null)
export const CALIBRATION_STATES = ['current', 'due-soon', 'lapsed', 'unknown'] as const
export const calibrationStateSchema = z.enum(CALIBRATION_STATES)
export type CalibrationState = z.infer<typeof calibrationStateSchema>

export const writeMachineSchema = z
  .object({
    name: z.string().trim().min(1, 'Name the machine as the shop does, e.g. "Bay 2 pulse".').max(120),
    kind: z.enum(['wire', 'wire-and-stick', 'stick', 'tig', 'plasma', 'submerged-arc', 'several']).default('wire'),
    serial: z.string().trim().max(80).default(''),
    location: z.string().trim().max(120).default(''),
    feeder: z.string().trim().max(120).default(''),
    gunTypes: z.array(z.enum(['standard', 'spool-gun', 'push-pull', 'machine-mounted', 'tig-torch', 'electrode-holder'])).max(6).default([]),
    /** Share of ten minutes at which the rated current can be held. */
    dutyCycle: z.object({ percent: z.number().min(1).max(100), current: z.number().positive() }).nullable().default(null),
    dataOutput: z.boolean().default(false),
    calibration: z
      .object({
        certificate: textOrNull(120),
        doneOn: z.iso.date().nullable().default(null),
        dueOn: z.iso.date().nullable().default(null),
        accuracyNote: textOrNull(200),
        /** What the certificate vouches for, as ± per cent of the reading; a card's range is narrowed by it. */
        accuracy: z.object({ current: accuracyPercent, voltage: accuracyPercent, wireFeed: accuracyPercent }).prefault({}),
      })
      .prefault({}),
    retired: z.boolean().default(false),
    notes: textOrNull(4000),
    modes: z.array(machineModeSchema).max(20).default([]).superRefine(different('Two modes carry this key.')),
  })
  .meta({ id: 'WriteMachine' })
export type WriteMachine = z.infer<typeof writeMachineSchema>

export const machineSchema = z.object({ id: idSchema, number: z.string(), version: z.number().int(), updatedAt: z.iso.datetime(), content: writeMachineSchema, may: z.array(z.string()) }).meta({ id: 'Machine' })
export type Machine = z.infer<typeof machineSchema>
export const machineRowSchema = z.object({ id: idSchema, number: z.string(), name: z.string(), location: z.string(), modes: z.array(z.object({ key: z.string(), name: z.string(), kind: modeKindSchema })), calibrationDueOn: z.iso.date().nullable(), calibration: calibrationStateSchema, processes: z.array(processSchema), retired: z.boolean(), updatedAt: z.iso.datetime() }).meta({ id: 'MachineRow' })
export type MachineRow = z.infer<typeof machineRowSchema>

/** One line of a panel card, in the panel's own unit and steps; `min`/`max` are the approved range rounded inward. */
export const panelLineSchema = z
  .object({
    control: z.string(), label: z.string(), where: z.string().nullable(), quantity: panelQuantitySchema, unit: z.string(),
    /** What to dial; null when the procedure doesn't say or the machine can't. */
    value: z.number().nullable(), text: z.string(), min: z.number().nullable(), max: z.number().nullable(), scaleMin: z.number(), scaleMax: z.number(), step: z.number().nullable(),
    /** How the figure came about: the procedure's range, a conversion, interpolation between measured points. */
    because: z.string(), shown: z.boolean(),
  })
  .meta({ id: 'PanelLine' })
export type PanelLine = z.infer<typeof panelLineSchema>
/** `refuse`: nothing may be dialled. `warn`: take care. `note`: good to know. */
export const panelNoticeSchema = z.object({ level: z.enum(['refuse', 'warn', 'note']), code: z.string(), message: z.string(), basis: z.string().nullable().default(null) }).meta({ id: 'PanelNotice' })
export type PanelNotice = z.infer<typeof panelNoticeSchema>

/** An approved range turned into the settings of one machine; with any `refuse` notice no value may be dialled from it. */
export const panelCardSchema = z
  .object({ machine: z.string(), machineName: z.string(), mode: z.string(), modeName: z.string(), processId: z.string(), program: z.string().nullable().default(null), programLabel: z.string().nullable().default(null), pass: z.string().nullable().default(null), ready: z.boolean(), lines: z.array(panelLineSchema), mustMeasure: z.array(z.object({ quantity: panelQuantitySchema, text: z.string() })), notices: z.array(panelNoticeSchema) })
  .meta({ id: 'PanelCard' })
export type PanelCard = z.infer<typeof panelCardSchema>

/** Which machine, mode, process block and program a card is asked for. */
export const panelQuerySchema = z.object({ machine: idSchema, mode: z.string().trim().min(1).max(40), process: z.string().trim().max(40).optional(), program: z.string().trim().max(40).optional(), /** Number of a pass that has ranges of its own. */ pass: z.string().trim().max(12).optional() })
