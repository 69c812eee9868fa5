/** Where a changed field stands in the older and in the newer record, and records with one field exchanged. */
import type { FieldChange } from '../comparison/compare.ts'
import type { ProcessBlock, WeldingVariables } from '../schemas/welding.ts'

/** A changed field in both records; null where a record has no such process block. */
export interface Place { old: string | null; now: string | null; block: { old: ProcessBlock | null; now: ProcessBlock | null } }

/** Fields of the document around the weld: no rule of any standard can judge them. */
const DOCUMENT = new Set(['title', 'scope', 'notes', 'supportingCoupons', 'standards', 'unitSystem'])
export const isOfDocument = (field: string): boolean => DOCUMENT.has(field)

/** What names or traces a piece rather than describing the weld. */
const TRACE = /(^|\.)(heatNumber|certificate|lot|notes|libraryId)$|\.panel(\.|$)/
export const isOfTrace = (field: string): boolean => TRACE.test(field)

const stated = (value: unknown): boolean => value !== null && value !== undefined && value !== '' && !(Array.isArray(value) && value.length === 0)

/** The value at a dotted path of a weld's variables; undefined where the way ends early. */
export function valueAt(variables: WeldingVariables, path: string): unknown {
  let at: unknown = variables
  for (const key of path.split('.')) {
    if (typeof at !== 'object' || at === null) return undefined
    at = (at as Record<string, unknown>)[key]
  }
  return at
}

/** A copy with one value exchanged; parts that are null on the way (a gas not stated) are made. */
export function withValue(variables: WeldingVariables, path: string, value: unknown): WeldingVariables {
  const keys = path.split('.')
  const write = (at: unknown, index: number): unknown => {
    const key = keys[index]
    if (key === undefined) return value
    if (Array.isArray(at)) return at.map((item: unknown, place) => (place === Number(key) ? write(item, index + 1) : item))
    const part = typeof at === 'object' && at !== null ? (at as Record<string, unknown>) : {}
    return { ...part, [key]: write(part[key], index + 1) }
  }
  return write(variables, 0) as WeldingVariables
}

/** A pass is compared within its list, and a part that a record lacks altogether (a gas) is exchanged whole. */
function unit(path: string, ...records: readonly WeldingVariables[]): string {
  const parts = path.split('.')
  const passes = parts.indexOf('passes')
  if (passes > 0) return parts.slice(0, passes + 1).join('.')
  const from = parts[0] === 'processes' ? 3 : 1
  for (let length = from; length < parts.length; length += 1) {
    const above = parts.slice(0, length).join('.')
    if (records.some((record) => !stated(valueAt(record, above)))) return above
  }
  return path
}

/** Where a change stands; process blocks are matched by their id, as the comparison does. */
export function placeOf(change: FieldChange, old: WeldingVariables, now: WeldingVariables): Place {
  const parts = change.field.split('.')
  if (parts[0] !== 'processes' || parts[1] === undefined) {
    const path = unit(change.field, old, now)
    return { old: path, now: path, block: { old: null, now: null } }
  }
  const index = Number(parts[1])
  const rest = parts.slice(2).join('.')
  const blockNow = now.processes[index] ?? null
  const oldIndex = blockNow === null ? -1 : old.processes.findIndex(({ id }) => id === blockNow.id)
  const gone = old.processes[index]
  const removed = gone !== undefined && change.after === null && !now.processes.some(({ id }) => id === gone.id)
  const paths = { now: `processes.${index}.${rest}`, old: `processes.${oldIndex}.${rest}` }
  const kept = blockNow !== null && oldIndex >= 0 && (change.after !== null || !stated(valueAt(now, paths.now)))
  if (removed && !(kept && stated(valueAt(old, paths.old)))) return { old: paths.now, now: null, block: { old: gone, now: null } }
  if (oldIndex < 0) return { old: null, now: paths.now, block: { old: null, now: blockNow } }
  const below = unit(rest === '' ? paths.now : `processes.0.${rest}`, ...[old.processes[oldIndex], blockNow].flatMap((block) => (block ? [{ ...now, processes: [block] }] : []))).split('.').slice(2).join('.')
  return { old: `processes.${oldIndex}.${below}`, now: `processes.${index}.${below}`, block: { old: old.processes[oldIndex] ?? null, now: blockNow } }
}

/**
 * The records with this one change made and with it taken back, everything else as it stands: `[older, older with the change],
 * [newer without it, newer]`. A block that is new or gone is exchanged whole.
 */
export function variants({ old, now, block }: Place, before: WeldingVariables, after: WeldingVariables): (readonly [WeldingVariables, WeldingVariables])[] {
  if (old !== null && now !== null) {
    return [
      [before, withValue(before, old, valueAt(after, now))],
      [withValue(after, now, valueAt(before, old)), after],
    ]
  }
  if (block.now) {
    const added = block.now
    return [[before, { ...before, processes: [...before.processes, added] }], [{ ...after, processes: after.processes.filter(({ id }) => id !== added.id) }, after]]
  }
  if (block.old) {
    const gone = block.old
    return [[before, { ...before, processes: before.processes.filter(({ id }) => id !== gone.id) }], [{ ...after, processes: [...after.processes, gone] }, after]]
  }
  return []
}
