/** What changed between two contents, field by field, in the document's order. */
import { canonicalJson } from '../schemas/canonical.ts'
import type { CouponContent, ProcedureContent } from '../schemas/welding.ts'
import type { UnitSystem } from '../units/types.ts'
import { choiceWord, textOf } from './describe.ts'
import { FIELDS, fieldLabel, type Field } from './fields.ts'

export interface FieldChange {
  /** Dotted path in the newer content (in the older one for what was removed), without the prefix `variables`. */
  field: string
  label: string
  /** null = not stated. */
  before: string | null
  after: string | null
}

type Part = Readonly<Record<string, unknown>>
const isPart = (value: unknown): value is Part => typeof value === 'object' && value !== null && !Array.isArray(value)
const at = (value: unknown, keys: readonly string[]): unknown => keys.reduce<unknown>((part, key) => (isPart(part) ? part[key] : undefined), value)
const items = (value: unknown): Part[] => (Array.isArray(value) ? value.filter(isPart) : [])

/** Process blocks, run-sheet rows and tests keep their id; a pass is known by its number. */
function keysOf(list: readonly Part[]): string[] {
  const seen = new Map<string, number>()
  return list.map((item, index) => {
    const key = typeof item.id === 'string' ? item.id : typeof item.number === 'string' ? `#${item.number}` : `@${index}`
    const count = seen.get(key) ?? 0
    seen.set(key, count + 1)
    return count === 0 ? key : `${key}~${count}`
  })
}

/** What a list item is called in a label. */
function nameOf(listName: string, item: Part, index: number, list: readonly Part[]): string {
  const text = (value: unknown): string => (typeof value === 'string' ? value : '')
  if (listName === 'processes') {
    const process = text(item.process) || 'Process'
    const alike = list.filter((other) => other.process === item.process)
    return alike.length > 1 ? `${process} (${alike.indexOf(item) + 1})` : item.process === null ? `Process ${index + 1}` : process
  }
  if (listName === 'passes') return `pass ${text(item.number)}`
  if (listName === 'runSheet') return `Run sheet pass ${text(item.pass)}`
  if (listName === 'toughness' || listName === 'hardness') return `${listName === 'toughness' ? 'Toughness' : 'Hardness'}, ${choiceWord(text(item.place))}`
  if (listName === 'ndt') return `${fieldLabel('ndt')}, ${text(item.method)}`
  return `${{ tension: 'Tension', bends: 'Bend', macros: 'Macro' }[listName] ?? listName} ${text(item.specimen)}`
}

interface Leaf { keys: readonly string[]; field: Field }

/** Figures only: a quantity written in other units but of the same size has not changed. */
function meaning(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(meaning)
  if (!isPart(value)) return value ?? null
  if (typeof value.si === 'number' && 'typed' in value) return Number(value.si.toPrecision(10))
  return Object.fromEntries(Object.entries(value).map(([key, part]) => [key, meaning(part)]))
}
const nothingIn = (value: unknown): boolean => value === null || value === undefined || value === '' || (Array.isArray(value) && value.length === 0) || (isPart(value) && value.min === null && value.max === null && value.all === false)
const same = (one: unknown, other: unknown): boolean => (nothingIn(one) && nothingIn(other)) || canonicalJson(meaning(one)) === canonicalJson(meaning(other))

function changeOf(field: Field, path: string, name: string, before: unknown, after: unknown, system: UnitSystem): FieldChange[] {
  if (same(before, after)) return []
  const texts = (asTyped?: boolean) => [textOf(field, before, system, { asTyped }), textOf(field, after, system, { asTyped })] as const
  const [plain, typed] = [texts(), texts(true)]
  const [was, is] = plain[0] === plain[1] ? typed : plain
  return [{ field: path, label: name === '' ? field.label : `${name}: ${field.label}`, before: was, after: is }]
}

type Keyed = readonly [items: readonly Part[], keys: readonly string[]]

/** Items that both contents hold, in another order. */
function orderChange(path: string, name: string, [old, oldKeys]: Keyed, [now, nowKeys]: Keyed, named: (item: Part, place: number, all: readonly Part[]) => string): FieldChange[] {
  const [kept, keptNow] = [oldKeys.filter((key) => nowKeys.includes(key)), nowKeys.filter((key) => oldKeys.includes(key))]
  if (kept.every((key, index) => key === keptNow[index])) return []
  const names = (all: readonly Part[], keys: readonly string[], wanted: readonly string[]): string => wanted.flatMap((key) => { const item = all[keys.indexOf(key)]; return item ? [named(item, keys.indexOf(key), all)] : [] }).join(', ')
  return [{ field: path, label: `${name === '' ? '' : `${name}: `}${fieldLabel(path)}, order`, before: names(old, oldKeys, kept), after: names(now, nowKeys, keptNow) }]
}

/** Walks fields in order; neighbouring fields of one list are taken item by item, so that a process block stays together. */
function walk(leaves: readonly Leaf[], before: unknown, after: unknown, path: string, name: string, system: UnitSystem): FieldChange[] {
  const changes: FieldChange[] = []
  for (let index = 0; index < leaves.length; ) {
    const leaf = leaves[index]
    if (!leaf) break
    const star = leaf.keys.indexOf('*')
    if (star === -1) {
      changes.push(...changeOf(leaf.field, path + leaf.keys.join('.'), name, at(before, leaf.keys), at(after, leaf.keys), system))
      index += 1
      continue
    }
    const list = leaf.keys.slice(0, star)
    const prefix = list.join('.')
    let end = index
    while (leaves[end]?.keys.slice(0, star + 1).join('.') === `${prefix}.*`) end += 1
    const inner = leaves.slice(index, end).map(({ keys, field }) => ({ keys: keys.slice(star + 1), field }))
    const [old, now] = [items(at(before, list)), items(at(after, list))]
    const [oldKeys, nowKeys] = [keysOf(old), keysOf(now)]
    const named = (item: Part, place: number, all: readonly Part[]): string => [name, nameOf(list.at(-1) ?? '', item, place, all)].filter((part) => part !== '').join(' ')
    changes.push(...orderChange(path + prefix, name, [old, oldKeys], [now, nowKeys], named))
    now.forEach((item, place) => changes.push(...walk(inner, old[oldKeys.indexOf(nowKeys[place] ?? '')], item, `${path}${prefix}.${place}.`, named(item, place, now), system)))
    old.forEach((item, place) => {
      if (!nowKeys.includes(oldKeys[place] ?? '')) changes.push(...walk(inner, item, undefined, `${path}${prefix}.${place}.`, named(item, place, old), system))
    })
    index = end
  }
  return changes
}

/** A pointer to the library is not printed: what was copied from the row is compared instead. */
const leaves: readonly Leaf[] = FIELDS.filter(({ path }) => !path.endsWith('.libraryId')).map((field) => ({ keys: field.path.split('.'), field }))
/** Variables and the rest of a content on one level, as field paths are written. */
const flat = ({ variables, ...rest }: ProcedureContent | CouponContent): Part => ({ ...variables, ...rest })

/**
 * Every field that differs between two contents of a procedure or of a coupon. Process blocks, run-sheet rows and tests are
 * matched by id, passes by number; a figure written in other units but equal is no change.
 * @param system in which figures are read; the newer content's own unless given
 */
export const compareContent = <T extends ProcedureContent | CouponContent>(before: T, after: T, system: UnitSystem = after.variables.unitSystem): FieldChange[] => walk(leaves, flat(before), flat(after), '', '', system)
