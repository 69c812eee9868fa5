/** Records as the API presents them. */
import { z } from 'zod'
import { assessmentSchema, couponQualificationSchema, linkedCouponSchema } from './assessment.ts'
import { idSchema, textOrNull, unitSystemSchema, intervalOrNull } from './common.ts'
import { couponContentSchema, positionSchema, processSchema, procedureContentSchema, weldingVariablesSchema } from './welding.ts'

export const REVISION_STATES = ['draft', 'in-review', 'approved', 'superseded', 'withdrawn'] as const
export const revisionStateSchema = z.enum(REVISION_STATES)
export type RevisionState = z.infer<typeof revisionStateSchema>

export const COUPON_STATES = ['planned', 'welding', 'testing', 'certified', 'rejected'] as const
export const couponStateSchema = z.enum(COUPON_STATES)
export type CouponState = z.infer<typeof couponStateSchema>

export const personRefSchema = z.object({ id: idSchema, name: z.string() }).meta({ id: 'PersonRef' })

export const signatureSchema = z
  .object({ id: idSchema, person: personRefSchema, role: z.string(), meaning: z.enum(['authored', 'reviewed', 'approved', 'certified', 'withdrawn', 'rejected', 'returned']), statement: z.string(), reason: z.string().nullable(), contentSha256: z.string(), signedAt: z.iso.datetime() })
  .meta({ id: 'Signature' })
export type Signature = z.infer<typeof signatureSchema>

/** Row of the procedure list: the newest revision stands for the procedure. */
export const procedureRowSchema = z
  .object({
    id: idSchema,
    number: z.string(),
    title: z.string(),
    revisionId: idSchema,
    revision: z.string(),
    state: revisionStateSchema,
    processes: z.array(z.string()),
    standards: z.array(z.string()),
    metals: z.string(),
    /** mm; null = not given */
    thicknessMin: z.number().nullable(),
    thicknessMax: z.number().nullable(),
    positions: z.array(z.string()),
    author: personRefSchema,
    updatedAt: z.iso.datetime(),
    approvedRevisionId: idSchema.nullable(),
  })
  .meta({ id: 'ProcedureRow' })
export type ProcedureRow = z.infer<typeof procedureRowSchema>

export const revisionSummarySchema = z.object({ id: idSchema, revision: z.string(), state: revisionStateSchema, author: personRefSchema, createdAt: z.iso.datetime(), updatedAt: z.iso.datetime(), decidedAt: z.iso.datetime().nullable() }).meta({ id: 'RevisionSummary' })

export const procedureSchema = z.object({ id: idSchema, number: z.string(), revisions: z.array(revisionSummarySchema) }).meta({ id: 'Procedure' })
export type ProcedureRecord = z.infer<typeof procedureSchema>

export const revisionSchema = revisionSummarySchema
  .extend({
    procedureId: idSchema,
    number: z.string(),
    version: z.number().int(),
    content: procedureContentSchema,
    coupons: z.array(linkedCouponSchema),
    signatures: z.array(signatureSchema),
    /** Why "outside" or "cannot tell" findings were accepted; printed on the document. */
    deviationReason: z.string().nullable(),
    contentSha256: z.string(),
    /** Actions open to the person who asks, for this record in this state. */
    may: z.array(z.string()),
  })
  .meta({ id: 'Revision' })
export type Revision = z.infer<typeof revisionSchema>

export const fieldChangeSchema = z.object({ field: z.string(), label: z.string(), before: z.string().nullable(), after: z.string().nullable() }).meta({ id: 'FieldChange' })
export const comparisonSchema = z.object({ from: revisionSummarySchema.nullable(), to: revisionSummarySchema, changes: z.array(fieldChangeSchema) }).meta({ id: 'Comparison' })
export type Comparison = z.infer<typeof comparisonSchema>
export const revisionAssessmentSchema = z.object({ revisionId: idSchema, assessments: z.array(assessmentSchema) }).meta({ id: 'RevisionAssessment' })

export const couponRowSchema = z
  .object({ id: idSchema, number: z.string(), title: z.string(), state: couponStateSchema, procedureNumber: z.string().nullable(), revisionId: idSchema.nullable(), processes: z.array(z.string()), metals: z.string(), thickness: z.number().nullable(), positions: z.array(z.string()), weldedOn: z.iso.date().nullable(), inspector: personRefSchema, photoCount: z.number().int(), updatedAt: z.iso.datetime() })
  .meta({ id: 'CouponRow' })
export type CouponRow = z.infer<typeof couponRowSchema>

export const couponSchema = z
  .object({ id: idSchema, number: z.string(), state: couponStateSchema, revisionId: idSchema.nullable(), procedureId: idSchema.nullable(), procedureNumber: z.string().nullable(), inspector: personRefSchema, version: z.number().int(), createdAt: z.iso.datetime(), updatedAt: z.iso.datetime(), content: couponContentSchema, signatures: z.array(signatureSchema), contentSha256: z.string(), may: z.array(z.string()) })
  .meta({ id: 'Coupon' })
export type Coupon = z.infer<typeof couponSchema>

export const couponQualificationsSchema = z.object({ couponId: idSchema, qualifications: z.array(couponQualificationSchema) }).meta({ id: 'CouponQualifications' })

export const photoSchema = z
  .object({ id: idSchema, couponId: idSchema, fileName: z.string(), mediaType: z.string(), bytes: z.number().int(), sha256: z.string(), width: z.number().int().nullable(), height: z.number().int().nullable(), caption: z.string(), tag: z.string(), takenAt: z.iso.datetime().nullable(), uploadedAt: z.iso.datetime(), uploadedBy: personRefSchema, hasThumbnail: z.boolean() })
  .meta({ id: 'Photo' })
export type Photo = z.infer<typeof photoSchema>

export const jobJointSchema = z
  .object({ id: idSchema, number: z.string().trim().min(1).max(20), mark: textOrNull(80), metalA: textOrNull(80), metalB: textOrNull(80), process: processSchema.nullable().default(null), weld: z.enum(['groove', 'fillet']).default('groove'), product: z.enum(['plate', 'pipe']).default('plate'), thickness: intervalOrNull, diameter: intervalOrNull, position: positionSchema.nullable().default(null), length: textOrNull(40), count: z.number().int().min(1).max(100000).default(1), revisionId: idSchema.nullable().default(null), procedureNumber: z.string().nullable().default(null) })
  .meta({ id: 'JobJoint' })
export type JobJoint = z.infer<typeof jobJointSchema>
export const jobRowSchema = z.object({ id: idSchema, number: z.string(), title: z.string(), customer: z.string(), code: z.string(), joints: z.number().int(), assigned: z.number().int(), updatedAt: z.iso.datetime() }).meta({ id: 'JobRow' })
export type JobRow = z.infer<typeof jobRowSchema>
export const jobSchema = z.object({ id: idSchema, number: z.string(), title: z.string(), customer: z.string(), code: z.string(), toughnessRequired: z.boolean(), notes: z.string(), version: z.number().int(), updatedAt: z.iso.datetime(), joints: z.array(jobJointSchema) }).meta({ id: 'Job' })
export type Job = z.infer<typeof jobSchema>
export const writeJobJointSchema = jobJointSchema.omit({ procedureNumber: true, id: true }).extend({ id: idSchema.optional() })
export const writeJobSchema = z.object({ title: z.string().trim().min(1, 'Name the job, e.g. "Settling tank 3".').max(160), customer: z.string().trim().max(160).default(''), code: z.string().trim().max(160).default(''), toughnessRequired: z.boolean().default(false), notes: z.string().trim().max(4000).default(''), joints: z.array(writeJobJointSchema).max(500).default([]) }).meta({ id: 'WriteJob' })

/** A joint that somebody asks about: picked, typed as a line, or taken from a job. */
export const lookupQuerySchema = z.object({
  line: z.string().trim().max(200).optional(),
  jointId: idSchema.optional(),
  metalA: z.string().trim().max(80).optional(),
  metalB: z.string().trim().max(80).optional(),
  thickness: z.string().trim().max(40).optional(),
  process: processSchema.optional(),
  position: positionSchema.optional(),
  weld: z.enum(['groove', 'fillet']).optional(),
  unitSystem: unitSystemSchema.optional(),
})
export type LookupQuery = z.infer<typeof lookupQuerySchema>
export const lookupResultSchema = z
  .object({
    /** How the question was read, in words. */
    read: z.array(z.object({ label: z.string(), value: z.string() })),
    notRead: z.array(z.string()),
    fits: z.array(z.object({ revisionId: idSchema, procedureId: idSchema, number: z.string(), revision: z.string(), title: z.string(), processes: z.array(z.string()), reasons: z.array(z.string()), score: z.number() })),
    near: z.array(z.object({ revisionId: idSchema, procedureId: idSchema, number: z.string(), revision: z.string(), title: z.string(), processes: z.array(z.string()), wants: z.array(z.string()) })),
  })
  .meta({ id: 'LookupResult' })
export type LookupResult = z.infer<typeof lookupResultSchema>

export const outboxRowSchema = z.object({ id: idSchema, to: z.array(z.string()), subject: z.string(), state: z.enum(['queued', 'sent', 'caught', 'failed']), attempts: z.number().int(), error: z.string().nullable(), attachments: z.array(z.object({ name: z.string(), bytes: z.number().int() })), createdAt: z.iso.datetime(), sentAt: z.iso.datetime().nullable() }).meta({ id: 'OutboxRow' })
export type OutboxRow = z.infer<typeof outboxRowSchema>
export const outboxMailSchema = outboxRowSchema.extend({ text: z.string() }).meta({ id: 'OutboxMail' })

export const libraryItemSchema = z
  .object({ id: idSchema, kind: z.enum(['base-metals', 'filler-metals', 'gases', 'positions', 'processes']), key: z.string(), title: z.string(), subtitle: z.string(), origin: z.enum(['reference', 'own']), basis: z.string().nullable(), source: z.string().nullable(), content: z.record(z.string(), z.unknown()), version: z.number().int() })
  .meta({ id: 'LibraryItem' })
export type LibraryItem = z.infer<typeof libraryItemSchema>

export const todaySchema = z
  .object({ tasks: z.array(z.object({ kind: z.string(), title: z.string(), detail: z.string(), href: z.string(), at: z.iso.datetime() })), counts: z.record(z.string(), z.number().int()) })
  .meta({ id: 'Today' })

export { weldingVariablesSchema }
