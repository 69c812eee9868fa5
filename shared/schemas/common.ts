import { z } from 'zod'

/** A number as somebody typed it: `si` is in the dimension's storage unit (see units/types), `typed` is kept as typed. */
export const quantitySchema = z
  .object({ si: z.number().finite(), unit: z.string().min(1).max(16), typed: z.string().max(60) })
  .meta({ id: 'Quantity' })
export type Quantity = z.infer<typeof quantitySchema>

/** From min to max, each as typed; null is "not given", `all` is "every size". Order is checked by the form and the engine. */
export const intervalSchema = z
  .object({
    min: quantitySchema.nullable().default(null),
    max: quantitySchema.nullable().default(null),
    all: z.boolean().default(false),
  })
  .meta({ id: 'Interval' })
export type Interval = z.infer<typeof intervalSchema>

export const idSchema = z.uuid('This is not the id of a record; the address may be cut short or mistyped.')
export const textOrNull = (max = 400) => z.string().trim().max(max).nullable().default(null)
export const quantityOrNull = quantitySchema.nullable().default(null)
export const intervalOrNull = intervalSchema.nullable().default(null)
export const unitSystemSchema = z.enum(['SI', 'US'])

export const STANDARD_IDS = ['asme-ix', 'aws-d1-1', 'aws-d1-2', 'iso-15614-1', 'iso-15614-2'] as const
export const standardIdSchema = z.enum(STANDARD_IDS)
export type StandardId = z.infer<typeof standardIdSchema>

/** How a procedure is supported: by a qualification test, or by meeting every condition of a prequalified procedure. */
export const ROUTES = ['test', 'prequalified'] as const
export const routeSchema = z.enum(ROUTES)
export type Route = z.infer<typeof routeSchema>

/** A standard and the edition that the record is judged by; without `route` it is judged by test. */
export const standardChoiceSchema = z
  .object({ standard: standardIdSchema, edition: z.string().min(1).max(20), level: z.enum(['1', '2']).nullable().default(null), route: routeSchema.optional() })
  .meta({ id: 'StandardChoice' })
export type StandardChoice = z.infer<typeof standardChoiceSchema>

/** RFC 9457 problem details, with the fields at fault and the request id. */
export const problemSchema = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.number().int(),
    detail: z.string(),
    instance: z.string().optional(),
    requestId: z.string().optional(),
    errors: z.array(z.object({ field: z.string(), message: z.string(), value: z.unknown().optional() })).optional(),
    current: z.unknown().optional(),
  })
  .meta({ id: 'Problem' })
export type Problem = z.infer<typeof problemSchema>

/** A page of a list: `next` is the cursor to pass for the following page, null at the end. */
export const pageOf = <T extends z.ZodType>(item: T) => z.object({ items: z.array(item), next: z.string().nullable(), total: z.number().int() })
export interface Page<T> { items: T[]; next: string | null; total: number }

export const listQuery = {
  q: z.string().trim().max(200).optional(),
  cursor: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
}
