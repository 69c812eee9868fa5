/** The standards as the program keeps them, a coupon under each of them, and what a revision changes under one of them. */
import { z } from 'zod'
import { basisSchema, qualifiedRangeSchema, variableClassSchema, verdictSchema } from './assessment.ts'
import { idSchema, routeSchema, standardIdSchema } from './common.ts'

export const IMPACT_CLASSES = ['editorial', 'nonessential', 'supplementary', 'essential'] as const
export const impactClassSchema = z.enum(IMPACT_CLASSES)
/** `editorial`: no rule of the standard judges the field. */
export type ImpactClass = z.infer<typeof impactClassSchema>

export const STANDINGS = ['revise only', 'still covered', 'cannot tell', 'requalify'] as const
export const standingSchema = z.enum(STANDINGS)
export type Standing = z.infer<typeof standingSchema>

/** One changed field, its class, and whether the linked coupons still carry it. */
export const impactChangeSchema = z
  .object({
    field: z.string(),
    label: z.string(),
    before: z.string().nullable(),
    after: z.string().nullable(),
    class: impactClassSchema,
    ruleIds: z.array(z.string()),
    clause: z.string().nullable(),
    /** The weakest basis of the rules that class and judge it; null where none does. */
    basis: basisSchema.nullable(),
    standing: standingSchema,
    /** What follows, in plain words with the figures. */
    sentence: z.string(),
    /** Values of the coupon that would have to be welded; null where none is needed or it can't be told. */
    wanted: z.string().nullable(),
  })
  .meta({ id: 'ImpactChange' })
export type ImpactChange = z.infer<typeof impactChangeSchema>

export const revisionImpactSchema = z
  .object({
    standard: standardIdSchema,
    edition: z.string(),
    changes: z.array(impactChangeSchema),
    overall: z.object({
      /** Null where nothing changed. */
      class: impactClassSchema.nullable(),
      standing: standingSchema.nullable(),
      /** The newer content by the linked coupons, changed or not. */
      verdict: verdictSchema,
      sentence: z.string(),
      counts: z.object({ editorial: z.number().int(), nonessential: z.number().int(), supplementary: z.number().int(), essential: z.number().int() }),
    }),
  })
  .meta({ id: 'RevisionImpact' })
export type RevisionImpact = z.infer<typeof revisionImpactSchema>

export const revisionImpactsSchema = z
  .object({
    revisionId: idSchema,
    /** The revision compared with; null for a first one, which changes nothing. */
    from: z.object({ id: idSchema, revision: z.string() }).nullable(),
    /** One under each standard that the revision names. */
    impacts: z.array(revisionImpactSchema),
  })
  .meta({ id: 'RevisionImpacts' })
export type RevisionImpacts = z.infer<typeof revisionImpactsSchema>

/** How one standard stands to one variable of a coupon; every cell says one of these, so that no blank reads like coverage. */
export const sideCellSchema = z
  .object({
    standard: standardIdSchema,
    state: z.enum(['range', 'cannot-tell', 'no-range', 'not-a-variable']),
    /** The range in words, or why there is none. */
    words: z.string(),
    clause: z.string().nullable(),
    basis: basisSchema.nullable(),
    ranges: z.array(qualifiedRangeSchema),
    /** What the record lacks, where that is why. */
    missing: z.array(z.string()),
  })
  .meta({ id: 'SideCell' })
export type SideCell = z.infer<typeof sideCellSchema>

export const sideRowSchema = z.object({ variable: z.string(), label: z.string(), processId: z.string().nullable(), process: z.string().nullable(), cells: z.array(sideCellSchema) }).meta({ id: 'SideRow' })
export type SideRow = z.infer<typeof sideRowSchema>

export const sideBySideSchema = z
  .object({
    couponId: z.string(),
    number: z.string(),
    certified: z.boolean(),
    standards: z.array(
      z.object({
        standard: standardIdSchema,
        shortName: z.string(),
        edition: z.string().nullable(),
        /** Whether the coupon's own record names the standard; the others are judged all the same. */
        named: z.boolean(),
        readyToCertify: z.boolean(),
        /** Why nothing can be told under it; null where it was judged. */
        reason: z.string().nullable(),
        /** Read before relying on it: notes on the edition, what is still missing from the record. */
        notes: z.array(z.string()),
      }),
    ),
    rows: z.array(sideRowSchema),
  })
  .meta({ id: 'SideBySide' })
export type SideBySide = z.infer<typeof sideBySideSchema>

const editionSchema = z.object({ id: z.string(), label: z.string(), note: z.string().nullable() })
const ruleClassSchema = z.union([variableClassSchema, z.literal('dual')])

export const standardRowSchema = z
  .object({ id: standardIdSchema, name: z.string(), shortName: z.string(), editions: z.array(editionSchema), processes: z.array(z.string()), routes: z.array(routeSchema), rules: z.number().int(), bases: z.record(basisSchema, z.number().int()) })
  .meta({ id: 'StandardRow' })
export type StandardRow = z.infer<typeof standardRowSchema>

/** A rule as its page shows it; nothing here is written twice, all of it comes from the rule. */
export const standardRuleSchema = z
  .object({
    id: z.string(),
    title: z.string(),
    clause: z.string(),
    editions: z.array(z.string()),
    classes: z.array(z.object({ process: z.string(), class: ruleClassSchema, basis: basisSchema })),
    basis: basisSchema,
    source: z.string(),
    statement: z.string(),
    field: z.string(),
    fieldLabel: z.string(),
    section: z.string(),
    route: routeSchema.nullable(),
    combine: z.enum(['union', 'each', 'jointly']),
    withoutCoupon: z.boolean(),
  })
  .meta({ id: 'StandardRule' })
export type StandardRule = z.infer<typeof standardRuleSchema>

export const standardDetailSchema = standardRowSchema
  .extend({ outOfScope: z.array(z.string()), certification: z.object({ clause: z.string(), basis: basisSchema, source: z.string() }), ruleList: z.array(standardRuleSchema) })
  .meta({ id: 'StandardDetail' })
export type StandardDetail = z.infer<typeof standardDetailSchema>
