/** Sampled volts and amps of a weld, and what was computed from them. */
import { z } from 'zod'
import { idSchema } from './common.ts'
import { personRefSchema } from './records.ts'

/** What one pass over the samples yields. Powers W, energy J, times s, frequency Hz. */
export const arcFiguresSchema = z
  .object({
    rows: z.number().int(), badRows: z.number().int(), samplesPerSecond: z.number().nullable(), duration: z.number(),
    /** The first rows that could not be used: number of the row in the file, its text, and why. */
    bad: z.array(z.object({ row: z.number().int(), text: z.string(), why: z.string() })).max(20).default([]),
    /** Times in which nothing was recorded; nothing is counted across them. */
    gaps: z.object({ count: z.number().int(), duration: z.number() }).default({ count: 0, duration: 0 }), alternating: z.boolean().default(false),
    /** Time with the arc burning, and the stops between. */
    arcTime: z.number(), stops: z.array(z.object({ from: z.number(), to: z.number() })).max(500), stopCount: z.number().int(),
    current: z.object({ mean: z.number(), rms: z.number(), min: z.number(), max: z.number() }), voltage: z.object({ mean: z.number(), rms: z.number(), min: z.number(), max: z.number() }),
    /** Mean of v·i sample by sample while the arc burns, and its energy. */
    averageInstantaneousPower: z.number(), energy: z.number(),
    /** Current and voltage are those while the arc burns. What the meters' mean volts times mean amps would have said, and how far off that is, per cent. */
    meterPower: z.number(), meterError: z.number(),
    /** Null where the signal isn't pulsed, or not surely. */
    pulse: z.object({ frequency: z.number(), peakCurrent: z.number(), backgroundCurrent: z.number(), onTime: z.number(), count: z.number().int() }).nullable(),
    said: z.array(z.string()),
  })
  .meta({ id: 'ArcFigures' })
export type ArcFigures = z.infer<typeof arcFiguresSchema>

/** Lowest and highest of each stretch of samples, so that no peak is lost; `t` is the middle of the stretch, s. */
export const arcPlotSchema = z.object({ t: z.array(z.number()), currentMin: z.array(z.number()), currentMax: z.array(z.number()), voltageMin: z.array(z.number()), voltageMax: z.array(z.number()) }).meta({ id: 'ArcPlot' })
export type ArcPlot = z.infer<typeof arcPlotSchema>

const arcTimeUnitSchema = z.enum(['s', 'ms', 'µs', 'none'])
const arcCurrentUnitSchema = z.enum(['A', 'kA', 'mA'])
const arcVoltageUnitSchema = z.enum(['V', 'kV', 'mV'])
export const arcLayoutSchema = z
  .object({
    delimiter: z.enum([',', ';', '\t', ' ', '|']), decimal: z.enum(['.', ',']), headerRows: z.number().int(), columns: z.object({ time: z.number().int().nullable(), current: z.number().int(), voltage: z.number().int() }), timeUnit: arcTimeUnitSchema,
    currentUnit: arcCurrentUnitSchema.default('A'), voltageUnit: arcVoltageUnitSchema.default('V'),
    /** Given by the person where there is no time column. */
    samplesPerSecond: z.number().positive().nullable().default(null), encoding: z.enum(['utf-8', 'windows-1252', 'utf-16le', 'utf-16be']).default('utf-8'),
  })
  .meta({ id: 'ArcLayout' })
export type ArcLayout = z.infer<typeof arcLayoutSchema>

/** What a person says of a file's columns, counted from 0; whatever is left out is found in the file. `time: -1` says that there is no time column. */
export const arcChoiceSchema = z
  .object({ time: z.coerce.number().int().min(-1).max(200).optional(), current: z.coerce.number().int().min(0).max(200).optional(), voltage: z.coerce.number().int().min(0).max(200).optional(), timeUnit: z.enum(['s', 'ms', 'µs']).optional(), currentUnit: arcCurrentUnitSchema.optional(), voltageUnit: arcVoltageUnitSchema.optional(), samplesPerSecond: z.coerce.number().positive('Give the sample rate as samples per second, e.g. 10000.').max(10_000_000).optional() })
  .meta({ id: 'ArcChoice' })
export type ArcChoice = z.infer<typeof arcChoiceSchema>

export const attachArcSchema = z.object({ couponId: idSchema.nullable().default(null), /** Row of the coupon's run sheet. */ runRowId: z.string().max(40).nullable().default(null), beadId: idSchema.nullable().default(null), /** mm; of the weld that was recorded, for energy per length. */ weldLength: z.number().positive().nullable().default(null) }).meta({ id: 'AttachArc' })
export const arcRecordingRowSchema = z.object({ id: idSchema, fileName: z.string(), bytes: z.number().int(), rows: z.number().int(), uploadedAt: z.iso.datetime(), by: personRefSchema, attachment: attachArcSchema, attachedTo: z.string().nullable(), figures: arcFiguresSchema }).meta({ id: 'ArcRecordingRow' })
export type ArcRecordingRow = z.infer<typeof arcRecordingRowSchema>
export const arcRecordingSchema = arcRecordingRowSchema.extend({ sha256: z.string(), layout: arcLayoutSchema, plot: arcPlotSchema, /** kJ/mm by QW-409.1(c): energy over weld length, or power over travel speed; null without a length. */ heatInput: z.number().nullable(), /** From what, in words. */ heatInputHow: z.string().nullable().default(null), version: z.number().int(), may: z.array(z.string()) }).meta({ id: 'ArcRecording' })
export type ArcRecording = z.infer<typeof arcRecordingSchema>
