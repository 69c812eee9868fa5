/**
 * Joins two edits of one draft. What only one of them changed is taken from that one; what both changed differently is a clash
 * for the person to settle. A metal, filler, gas or pass list is one value: half of mine with half of theirs would describe
 * something that neither meant.
 */
import type { ProcedureContent, ProcessBlock } from '@shared/schemas/welding.ts'
import { same } from './paths.ts'

export type Side = 'mine' | 'theirs'

export interface Difference {
  /** Dotted path; a process block is named by its id: `variables.processes#fill.electrical.current`. */
  path: string
  base: unknown
  mine: unknown
  theirs: unknown
  /** Who changed it: `both` is a clash. */
  by: Side | 'both'
}

export interface Merge {
  content: ProcedureContent
  /** Everything in which the two differ, in document order. */
  differences: Difference[]
}

type Tree = Record<string, unknown>
const WHOLE = ['si', 'all', 'components', 'settings', 'libraryId']
const branches = (value: unknown): value is Tree => typeof value === 'object' && value !== null && !Array.isArray(value) && !WHOLE.some((key) => key in value)
const BLOCKS = 'variables.processes'

/**
 * Three-way merge.
 * @param base what both started from
 * @param choose settles a difference by its path; where it says nothing, the one who changed the field has it, and a clash stays mine
 */
export function mergeContents(base: ProcedureContent, mine: ProcedureContent, theirs: ProcedureContent, choose: (path: string) => Side | undefined = () => undefined): Merge {
  const differences: Difference[] = []

  const settle = (path: string, from: unknown, my: unknown, their: unknown): unknown => {
    if (same(my, their)) return my
    if (path === BLOCKS) return mergeBlocks((from ?? []) as ProcessBlock[], my as ProcessBlock[], their as ProcessBlock[])
    if (branches(my) && branches(their)) {
      const before = branches(from) ? from : {}
      return Object.fromEntries([...new Set([...Object.keys(my), ...Object.keys(their)])].map((key) => [key, settle(path ? `${path}.${key}` : key, before[key], my[key], their[key])]))
    }
    const by = same(from, their) ? 'mine' : same(from, my) ? 'theirs' : 'both'
    differences.push({ path, base: from, mine: my, theirs: their, by })
    return (choose(path) ?? by) === 'theirs' ? their : my
  }

  const mergeBlocks = (from: ProcessBlock[], my: ProcessBlock[], their: ProcessBlock[]): ProcessBlock[] => {
    const ids = (blocks: ProcessBlock[]) => blocks.map((block) => block.id)
    const byId = (blocks: ProcessBlock[]) => new Map(blocks.map((block) => [block.id, block]))
    const [inBase, inMine, inTheirs] = [byId(from), byId(my), byId(their)]
    const iMoved = !same(ids(my).filter((id) => inBase.has(id)), ids(from).filter((id) => inMine.has(id)))
    const order = [...new Set(iMoved ? [...ids(my), ...ids(their)] : [...ids(their), ...ids(my)])]
    const merged = order.map((id) => {
      const [before, one, other] = [inBase.get(id), inMine.get(id), inTheirs.get(id)]
      const path = `${BLOCKS}#${id}`
      return settle(path, before, one, other) as ProcessBlock | undefined
    })
    const left = merged.filter((block) => block !== undefined)
    return left.length > 0 ? left : my
  }

  const content = settle('', base, mine, theirs) as ProcedureContent
  return { content, differences }
}
