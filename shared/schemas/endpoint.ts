/** The shape in which an endpoint of the API is told. */
import { z } from 'zod'
import { idSchema } from './common.ts'

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

export interface Endpoint<P extends z.ZodType = z.ZodType, Q extends z.ZodType = z.ZodType, B extends z.ZodType = z.ZodType, R extends z.ZodType = z.ZodType> {
  method: Method
  /** Below `/api`, Express style. */
  path: string
  action: string
  public: boolean
  tag: string
  summary: string
  params: P
  query: Q
  body: B
  /** What a 2xx carries; z.void() for none. Files are `binary`. */
  response: R
  status: number
  binary?: string
  /** Multipart upload under the field `files`. */
  upload?: boolean
  /** Wants If-Match with the version last read. */
  ifMatch?: boolean
}

const none = z.object({}).strict()
const nothing = z.void()
type Given<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType> = Partial<Endpoint<P, Q, B, R>> & Pick<Endpoint, 'method' | 'path' | 'action' | 'tag' | 'summary'>
/** An endpoint with what is usual filled in: signed-in, no parameters, 200 with a response and 204 without. */
export const endpoint = <P extends z.ZodType = typeof none, Q extends z.ZodType = typeof none, B extends z.ZodType = typeof nothing, R extends z.ZodType = typeof nothing>(given: Given<P, Q, B, R>): Endpoint<P, Q, B, R> => ({
  public: false,
  status: given.response ? 200 : 204,
  params: none as unknown as P,
  query: none as unknown as Q,
  body: nothing as unknown as B,
  response: nothing as unknown as R,
  ...given,
})

/** The path parameter `:id`. */
export const byId = z.object({ id: idSchema })
/** A `sort` query out of these keys; a minus in front means downwards. */
export const sorts = <const T extends readonly [string, ...string[]]>(keys: T) => z.enum(keys).optional()
