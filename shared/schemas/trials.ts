/** The dial-in log: trial beads on the way to a setting. */
import { z } from 'zod'
import { idSchema, intervalOrNull, quantityOrNull, quantitySchema, textOrNull } from './common.ts'
import { panelQuantitySchema } from './machines.ts'
import { personRefSchema } from './records.ts'
import { gasMixtureSchema, positionSchema, processSchema } from './welding.ts'

/** Faults by which a trial bead is scored. */
export const BEAD_FAULTS = ['spatter', 'undercut', 'cold-lap', 'porosity', 'crater-crack', 'arc-too-long', 'arc-too-short', 'bead-too-high', 'bead-too-wide', 'burn-through', 'soot'] as const
const beadFaultSchema = z.enum(BEAD_FAULTS)

/** A panel setting as dialled: the words and the unit on the panel. */
const beadSettingSchema = z.object({ control: z.string().trim().min(1).max(60), label: z.string().trim().min(1).max(60), sets: panelQuantitySchema, value: z.number().finite(), unit: z.string().trim().max(16).default('') }).meta({ id: 'BeadSetting' })
export type BeadSetting = z.infer<typeof beadSettingSchema>

export const beadContentSchema = z
  .object({
    machineId: idSchema.nullable().default(null),
    modeKey: textOrNull(40),
    programKey: textOrNull(40),
    process: processSchema.default('GMAW'),
    metalId: textOrNull(80),
    metal: textOrNull(120),
    thickness: quantityOrNull,
    joint: textOrNull(120),
    position: positionSchema.nullable().default(null),
    wireId: textOrNull(80),
    wire: textOrNull(60),
    wireDiameter: quantityOrNull,
    gas: gasMixtureSchema.nullable().default(null),
    stickOut: quantityOrNull,
    settings: z.array(beadSettingSchema).max(40).default([]),
    measured: z.object({ current: intervalOrNull, voltage: intervalOrNull, wireFeed: intervalOrNull, travelSpeed: intervalOrNull, peakCurrent: quantityOrNull, backgroundCurrent: quantityOrNull, length: quantityOrNull, arcTime: quantityOrNull }).prefault({}),
    faults: z.array(z.object({ fault: beadFaultSchema, severity: z.number().int().min(1).max(3) })).max(11).default([]),
    /** 1 = scrap, 5 = would put it in the procedure; null = not scored. */
    score: z.number().int().min(1).max(5).nullable().default(null),
    note: textOrNull(2000),
  })
  .meta({ id: 'BeadContent' })
export type BeadContent = z.infer<typeof beadContentSchema>

export const beadPhotoSchema = z.object({ id: idSchema, fileName: z.string(), mediaType: z.string(), width: z.number().int().nullable(), height: z.number().int().nullable() }).meta({ id: 'BeadPhoto' })
export const beadSchema = z.object({ id: idSchema, trialId: idSchema, number: z.number().int(), version: z.number().int(), weldedAt: z.iso.datetime(), by: personRefSchema, content: beadContentSchema, photos: z.array(beadPhotoSchema) }).meta({ id: 'Bead' })
export type Bead = z.infer<typeof beadSchema>

export const writeTrialSchema = z.object({ title: z.string().trim().min(1, 'Say what setting you are after, e.g. "ER5356 on 6 mm 6061, flat".').max(160), goal: textOrNull(1000) }).meta({ id: 'WriteTrial' })
export const trialRowSchema = z.object({ id: idSchema, number: z.string(), title: z.string(), beads: z.number().int(), bestScore: z.number().int().nullable(), machine: z.string().nullable(), wire: z.string().nullable(), metal: z.string().nullable(), procedureId: idSchema.nullable(), procedureNumber: z.string().nullable(), by: personRefSchema, updatedAt: z.iso.datetime() }).meta({ id: 'TrialRow' })
export type TrialRow = z.infer<typeof trialRowSchema>
export const trialSchema = trialRowSchema.omit({ beads: true }).extend({ goal: z.string().nullable(), version: z.number().int(), beads: z.array(beadSchema), may: z.array(z.string()) }).meta({ id: 'Trial' })
export type Trial = z.infer<typeof trialSchema>

/** What differs from the bead that is copied; what isn't named stays. Measured values, faults, score and note are never copied. */
const beadChangesSchema = z
  .object({
    settings: z.array(z.object({ control: z.string().trim().min(1).max(60), value: z.number().finite() })).max(40).default([]),
    stickOut: quantitySchema.nullable().optional(),
    measured: beadContentSchema.shape.measured.optional(),
    faults: beadContentSchema.shape.faults.optional(),
    score: z.number().int().min(1).max(5).nullable().optional(),
    note: z.string().trim().max(2000).nullable().optional(),
  })
  .meta({ id: 'BeadChanges' })
export type BeadChanges = z.infer<typeof beadChangesSchema>
export const addBeadSchema = z
  .object({
    /** Made by the caller, so that a bead sent again after a lost connection is not added twice. */
    id: idSchema.optional(),
    content: beadContentSchema.nullable().default(null),
    copyOf: idSchema.nullable().default(null),
    changes: beadChangesSchema.nullable().default(null),
  })
  .refine(({ content, copyOf }) => (content === null) !== (copyOf === null), { path: ['content'], message: 'Send a bead’s content, or the bead that it copies: one of the two.' })
  .meta({ id: 'AddBead' })
