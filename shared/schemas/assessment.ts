/** What the engine says: verdicts, ranges, findings. The same shapes are drawn in the margin, printed and sent by the API. */
import { z } from 'zod'
import { idSchema, routeSchema, standardIdSchema } from './common.ts'
import { couponContentSchema, procedureContentSchema } from './welding.ts'

export const verdictSchema = z.enum(['within', 'outside', 'cannot-tell'])
export type Verdict = z.infer<typeof verdictSchema>

export const variableClassSchema = z.enum(['essential', 'supplementary', 'nonessential', 'not-a-variable'])
export type VariableClass = z.infer<typeof variableClassSchema>

/** How the figure is known: read in the standard's text, from a secondary source, or from memory ("confirm in your edition"). */
export const basisSchema = z.enum(['read', 'secondary', 'memory', 'common-practice'])
export type Basis = z.infer<typeof basisSchema>

export const boundSchema = z
  .discriminatedUnion('kind', [
    z.object({ kind: z.literal('closed'), value: z.number() }),
    z.object({ kind: z.literal('open'), value: z.number() }),
    z.object({ kind: z.literal('unlimited') }),
    z.object({ kind: z.literal('unknown') }),
  ])
  .meta({ id: 'Bound' })
export type Bound = z.infer<typeof boundSchema>

export const segmentSchema = z.object({ lower: boundSchema, upper: boundSchema }).meta({ id: 'Segment' })
export type Segment = z.infer<typeof segmentSchema>

/** Disjoint ascending segments, in `unit`; a union of coupons may leave a gap, and a gap is not covered. */
export const numericRangeSchema = z
  .object({ type: z.literal('numeric'), dimension: z.string(), unit: z.string(), segments: z.array(segmentSchema) })
  .meta({ id: 'NumericRange' })
export type NumericRange = z.infer<typeof numericRangeSchema>

/** Named values or combinations; `any` covers everything, `unknown` says that it can't be told. */
export const setRangeSchema = z
  .object({ type: z.literal('set'), values: z.array(z.string()), any: z.boolean().default(false), unknown: z.boolean().default(false) })
  .meta({ id: 'SetRange' })
export type SetRange = z.infer<typeof setRangeSchema>

export const rangeSchema = z.discriminatedUnion('type', [numericRangeSchema, setRangeSchema])
export type QualifiedSpan = z.infer<typeof rangeSchema>

/** One variable's range of qualification and what made it. */
export const qualifiedRangeSchema = z
  .object({
    ruleId: z.string(),
    variable: z.string(),
    label: z.string(),
    /** Dotted path in the weld's variables beside which the gauge stands. */
    field: z.string(),
    processId: z.string().nullable(),
    process: z.string().nullable(),
    class: variableClassSchema,
    range: rangeSchema,
    /** What was welded, in the range's unit (numeric) or as a name. */
    tested: z.union([z.number(), z.string(), z.null()]),
    couponId: z.string(),
    clause: z.string(),
    basis: basisSchema,
    /** How the range comes from the coupon's value, in plain words with the figures. */
    reason: z.string(),
  })
  .meta({ id: 'QualifiedRange' })
export type QualifiedRange = z.infer<typeof qualifiedRangeSchema>

export const fixSchema = z
  .discriminatedUnion('kind', [
    z.object({ kind: z.literal('set'), label: z.string(), field: z.string(), value: z.unknown() }),
    z.object({ kind: z.literal('link-coupon'), label: z.string(), couponId: z.string() }),
    z.object({ kind: z.literal('plan-coupon'), label: z.string(), requirement: z.string() }),
    z.object({ kind: z.literal('state'), label: z.string(), field: z.string() }),
  ])
  .meta({ id: 'Fix' })
export type Fix = z.infer<typeof fixSchema>

export const findingSchema = z
  .object({
    ruleId: z.string(),
    standard: standardIdSchema,
    edition: z.string(),
    clause: z.string(),
    title: z.string(),
    verdict: verdictSchema,
    class: variableClassSchema,
    field: z.string(),
    processId: z.string().nullable(),
    /** One plain sentence with the figures. */
    sentence: z.string(),
    /** The interval the procedure asks for, in the range's unit, for the gauge; or names. */
    asked: z.union([z.object({ min: z.number().nullable(), max: z.number().nullable() }), z.array(z.string()), z.null()]),
    range: rangeSchema.nullable(),
    tested: z.array(z.union([z.number(), z.string()])),
    /** The coupons that decide. */
    couponIds: z.array(z.string()),
    /** Exactly what is missing, when the verdict is "cannot tell". */
    missing: z.array(z.string()),
    fixes: z.array(fixSchema),
    basis: basisSchema,
    source: z.string(),
    /** Steps from inputs to verdict, for the opened reasoning. */
    reasoning: z.array(z.string()),
  })
  .meta({ id: 'Finding' })
export type Finding = z.infer<typeof findingSchema>

export const assessmentSchema = z
  .object({
    standard: standardIdSchema,
    edition: z.string(),
    unitSystem: z.enum(['SI', 'US']),
    /** Never better than the worst essential (or, with toughness, supplementary) finding. */
    verdict: verdictSchema,
    counts: z.object({ within: z.number().int(), outside: z.number().int(), cannotTell: z.number().int() }),
    findings: z.array(findingSchema),
    ranges: z.array(qualifiedRangeSchema),
  })
  .meta({ id: 'Assessment' })
export type Assessment = z.infer<typeof assessmentSchema>

/** A coupon as the engine takes it: its identity, whether it is certified, and its content. */
export const assessedCouponSchema = z
  .object({ id: z.string().min(1).max(80), number: z.string().max(40), certified: z.boolean().default(true), content: couponContentSchema })
  .meta({ id: 'AssessedCoupon' })
export type AssessedCoupon = z.infer<typeof assessedCouponSchema>

export const assessmentRequestSchema = z
  .object({ procedure: procedureContentSchema, coupons: z.array(assessedCouponSchema).max(20), standard: standardIdSchema, edition: z.string().min(1).max(20), level: z.enum(['1', '2']).nullable().default(null), route: routeSchema.optional() })
  .meta({ id: 'AssessmentRequest' })
export type AssessmentRequest = z.infer<typeof assessmentRequestSchema>

/** A specimen set that the standard asks for and what has been recorded of it. */
export const specimenRequirementSchema = z
  .object({ kind: z.string(), label: z.string(), required: z.number().int(), recorded: z.number().int(), alternative: z.string().nullable(), clause: z.string(), basis: basisSchema })
  .meta({ id: 'SpecimenRequirement' })
export type SpecimenRequirement = z.infer<typeof specimenRequirementSchema>

export const testVerdictSchema = z
  .object({ testId: z.string(), specimen: z.string(), verdict: z.enum(['pass', 'fail', 'cannot-tell']), sentence: z.string(), clause: z.string(), basis: basisSchema, computed: z.object({ label: z.string(), value: z.number(), unit: z.string() }).nullable() })
  .meta({ id: 'TestVerdict' })
export type TestVerdict = z.infer<typeof testVerdictSchema>

/** What a coupon still needs, how its results were judged and what it qualifies, under one standard. */
export const couponQualificationSchema = z
  .object({
    standard: standardIdSchema,
    edition: z.string(),
    specimens: z.array(specimenRequirementSchema),
    results: z.array(testVerdictSchema),
    missing: z.array(z.object({ field: z.string(), message: z.string(), clause: z.string() })),
    readyToCertify: z.boolean(),
    ranges: z.array(qualifiedRangeSchema),
  })
  .meta({ id: 'CouponQualification' })
export type CouponQualification = z.infer<typeof couponQualificationSchema>

export const linkedCouponSchema = z.object({ id: idSchema, number: z.string(), title: z.string(), status: z.string() })
