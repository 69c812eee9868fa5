/** A coupon's content as this feature handles it: what is new in it, how a field of it is named, and how two versions are joined. */
import { z } from 'zod'
import { fieldAt, fieldLabel } from '@shared/comparison/fields.ts'
import { textOf } from '@shared/comparison/describe.ts'
import { isOpen } from '@shared/records/coupon-states.ts'
import { couponSchema, type Coupon } from '@shared/schemas/records.ts'
import { bendTestSchema, couponContentSchema, hardnessTestSchema, macroTestSchema, ndtTestSchema, tensionTestSchema, toughnessTestSchema, type CouponContent, type NdtTest } from '@shared/schemas/welding.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import type { ConflictKind } from '@/components/record/ConflictView.tsx'
import type { DraftKind } from '@/hooks/draft.ts'
import { call } from '@/lib/api.ts'

export type Macro = CouponContent['macros'][number]
export type Toughness = CouponContent['toughness'][number]
export type Hardness = CouponContent['hardness'][number]

/** Lists whose items keep their id while they are edited. */
export const LISTS = ['variables.processes', 'runSheet', 'tension', 'bends', 'macros', 'toughness', 'hardness', 'ndt'] as const
const OF_COUPON = Object.keys(couponContentSchema.shape)

/** The form's path of a field as the server or the engine names it: `content.bends.0` and `bends.0`, `thickness` and `variables.thickness`. */
export function formPath(field: string): string {
  const bare = field.replace(/^content\./, '')
  return OF_COUPON.includes(bare.split('.')[0] ?? '') ? bare : `variables.${bare}`
}

export const couponKind: DraftKind<CouponContent, Coupon> = {
  schema: couponContentSchema,
  // A title cleared a moment ago is kept too.
  unfinished: couponContentSchema.extend({ title: z.string() }),
  recordSchema: couponSchema,
  isOpen: ({ state }) => isOpen(state),
  read: (id) => call('readCoupon', { params: { id } }),
  save: (id, content, version) => call('saveCoupon', { params: { id }, body: { content }, ifMatch: version }),
  fieldPath: formPath,
}

const ITEM = /^(?:variables\.)?(\w+)#([^.]+)\.?(.*)$/

/** A difference's field in words: "Bend tests S2: Former diameter". */
function label(path: string, content: CouponContent): string {
  const [, list, id, rest] = ITEM.exec(path) ?? []
  if (!list || !id) return fieldLabel(path)
  const field = rest ? fieldLabel(`${list}.0.${rest}`) : null
  const items: { id: string }[] = list === 'processes' ? content.variables.processes : (content[list as 'runSheet' | 'ndt'] ?? [])
  const item = items.find((one) => one.id === id)
  const name = item && ('process' in item ? item.process : 'specimen' in item ? item.specimen : 'pass' in item ? item.pass : 'place' in item ? item.place : 'method' in item ? item.method : null)
  const lead = list === 'processes' ? (typeof name === 'string' ? name : 'Process') : `${fieldLabel(list)}${typeof name === 'string' ? ` ${name}` : ''}`
  return field ? `${lead}: ${field}` : lead
}

function words(path: string, value: unknown, _content: CouponContent, system: UnitSystem): string {
  const [, list, , rest] = ITEM.exec(path) ?? []
  if (list && !rest) return 'kept, with everything in it'
  const field = list ? `${list}.0.${rest ?? ''}` : path
  if (value !== null && typeof value === 'object' && !fieldAt(field)) return Object.entries(value).flatMap(([key, part]) => textOf(fieldAt(`${field}.${key}`), part, system) ?? []).join(', ') || 'not stated'
  return textOf(fieldAt(field), value, system) ?? 'not stated'
}

export const couponConflict: ConflictKind<CouponContent> = { schema: couponContentSchema, lists: LISTS, label, words }

const fresh = () => crypto.randomUUID().slice(0, 8)
/** The next mark of a series: T3 after T2, S1 where there is none. */
export function nextMark(letter: string, marks: readonly string[]): string {
  const taken = marks.flatMap((mark) => (mark.startsWith(letter) ? [Number(mark.slice(letter.length))] : [])).filter(Number.isInteger)
  return `${letter}${Math.max(0, ...taken) + 1}`
}

export const BEND_LETTER = { face: 'F', root: 'R', side: 'S', 'longitudinal-face': 'LF', 'longitudinal-root': 'LR' } as const
export type BendKind = keyof typeof BEND_LETTER

/** New tests take what is the same for the whole set from the one before. */
export const newTension = (tests: CouponContent['tension']) => {
  const last = tests.at(-1)
  return tensionTestSchema.parse({ id: fresh(), specimen: nextMark('T', tests.map(({ specimen }) => specimen)), kind: last?.kind, width: last?.width, thickness: last?.thickness, diameter: last?.diameter })
}
export const newBend = (tests: CouponContent['bends'], kind: BendKind) => {
  const last = tests.at(-1)
  return bendTestSchema.parse({ id: fresh(), specimen: nextMark(BEND_LETTER[kind], tests.map(({ specimen }) => specimen)), kind, thickness: last?.thickness, formerDiameter: last?.formerDiameter, angle: last?.angle })
}
export const newMacro = (tests: readonly Macro[]): Macro => macroTestSchema.parse({ id: fresh(), specimen: nextMark('M', tests.map(({ specimen }) => specimen)) })
export const newToughness = (tests: readonly Toughness[]): Toughness => toughnessTestSchema.parse({ id: fresh(), place: tests.length % 2 === 0 ? 'weld' : 'heat-affected-zone', temperature: tests.at(-1)?.temperature ?? null, size: tests.at(-1)?.size ?? null })
export const newHardness = (tests: readonly Hardness[]): Hardness => hardnessTestSchema.parse({ id: fresh(), scale: tests.at(-1)?.scale ?? 'HV10', place: (['weld', 'heat-affected-zone', 'base-metal'] as const)[tests.length % 3], values: [] })
export const newNdt = (method: NdtTest['method']): NdtTest => ndtTestSchema.parse({ id: fresh(), method })
