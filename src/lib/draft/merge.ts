/**
 * Joins two edits of one record. What only one of them changed is taken from that one; what both changed differently is a clash
 * for the person to settle. A metal, filler, gas or pass list is one value, as
 * is anything that is not a plain part; half of mine with half of theirs would describe
 * something that neither meant.
 */
import { same } from './paths.ts'

export type Side = 'mine' | 'theirs'

export interface Difference {
  /** Dotted path; an item of a list is named by its id: `variables.processes#fill.electrical.current`. */
  path: string
  base: unknown
  mine: unknown
  theirs: unknown
  /** Who changed it: `both` is a clash. */
  by: Side | 'both'
}

export interface Merge<C> {
  content: C
  /** Everything in which the two differ, in document order. */
  differences: Difference[]
}

type Tree = Record<string, unknown>
const WHOLE = ['si', 'all', 'components', 'settings', 'libraryId']
const branches = (value: unknown): value is Tree => typeof value === 'object' && value !== null && !Array.isArray(value) && !WHOLE.some((key) => key in value)
interface Item {
  id: string
}

/**
 * Three-way merge.
 * @param base what both started from
 * @param lists paths of the lists whose items keep an id, and are joined item by item
 * @param choose settles a difference by its path; where it says nothing, the one who changed the field has it, and a clash stays mine
 */
export function mergeContents<C>(base: C, mine: C, theirs: C, lists: readonly string[], choose: (path: string) => Side | undefined = () => undefined): Merge<C> {
  const differences: Difference[] = []

  const settle = (path: string, from: unknown, my: unknown, their: unknown): unknown => {
    if (same(my, their)) return my
    if (lists.includes(path)) return mergeItems(path, (from ?? []) as Item[], (my ?? []) as Item[], (their ?? []) as Item[])
    if (branches(my) && branches(their)) {
      const before = branches(from) ? from : {}
      return Object.fromEntries([...new Set([...Object.keys(my), ...Object.keys(their)])].map((key) => [key, settle(path ? `${path}.${key}` : key, before[key], my[key], their[key])]))
    }
    const by = same(from, their) ? 'mine' : same(from, my) ? 'theirs' : 'both'
    differences.push({ path, base: from, mine: my, theirs: their, by })
    return (choose(path) ?? by) === 'theirs' ? their : my
  }

  const mergeItems = (list: string, from: Item[], my: Item[], their: Item[]): Item[] => {
    const ids = (items: Item[]) => items.map(({ id }) => id)
    const byId = (items: Item[]) => new Map(items.map((item) => [item.id, item]))
    const [inBase, inMine, inTheirs] = [byId(from), byId(my), byId(their)]
    const iMoved = !same(ids(my).filter((id) => inBase.has(id)), ids(from).filter((id) => inMine.has(id)))
    const order = [...new Set(iMoved ? [...ids(my), ...ids(their)] : [...ids(their), ...ids(my)])]
    const merged = order.map((id) => {
      const [before, one, other] = [inBase.get(id), inMine.get(id), inTheirs.get(id)]
      return settle(`${list}#${id}`, before, one, other) as Item | undefined
    })
    return merged.filter((item) => item !== undefined)
  }

  const content = settle('', base, mine, theirs) as C
  return { content, differences }
}
