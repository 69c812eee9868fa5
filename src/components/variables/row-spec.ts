/** What a row of the sheet is, and when it arises. */
import type { ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import type { Dimension } from '@shared/units/types.ts'
import type { Option } from '@/components/fields/text.tsx'

/** What is being written: what a procedure asks for, or what a coupon was. */
export type RecordKind = 'procedure' | 'coupon'

interface Common {
  path: string
  label: string
  /** Under the label where no unit stands there. */
  hint?: string
  /** Further fields whose findings stand at this row. */
  also?: readonly string[]
  /** Stated in words elsewhere on the page, so what is stated is no reason to show the row. */
  told?: true
  /** Offered only then, or once something is stated or found in it. */
  when?: (weld: WeldingVariables, block: ProcessBlock | null, record: RecordKind) => boolean
}

/** What each of two values is that stand side by side in one row. */
export type PairOf = { kind: 'text'; max: number } | { kind: 'whole'; min: number; max: number } | { kind: 'quantity'; dimension: Dimension } | { kind: 'flag' }

export type RowSpec = Common &
  (
    | { kind: 'interval'; dimension: Dimension; allMeans?: string }
    | { kind: 'quantity'; dimension: Dimension }
    | { kind: 'choice'; options: readonly Option[]; always?: boolean; /** What nothing chosen means, where it is an answer. */ none?: string }
    | { kind: 'flag' }
    | { kind: 'text'; max: number; example?: string }
    | { kind: 'paragraph'; max: number; example?: string }
    | { kind: 'whole'; min: number; max: number }
    | { kind: 'pair'; paths: readonly [string, string]; of: PairOf }
    | { kind: 'metal' | 'filler' | 'sizes' | 'positions' | 'gas' | 'panel' | 'passes' }
  )

export interface SectionSpec {
  id: string
  title: string
  /** Shorter, for the index. */
  short?: string
  rows: readonly RowSpec[]
}

type When = NonNullable<Common['when']>

export const groove: When = (weld) => weld.joint.weld === 'groove'
export const fillet: When = (weld) => weld.joint.weld === 'fillet'
export const shaped = (...kinds: string[]): When => (weld) => weld.joint.weld === 'groove' && kinds.some((kind) => weld.joint.groove?.endsWith(kind))
export const pipe: When = (weld) => weld.product !== 'plate'
export const by = (...processes: string[]): When => (_weld, block) => block?.process != null && processes.includes(block.process)
export const mechanised: When = (_weld, block) => block?.mechanisation === 'machine' || block?.mechanisation === 'automatic'
export const several: When = (_weld, block) => block?.technique.electrodes === 'multiple'
export const pulsing: When = (_weld, block) => block?.electrical.pulsed === true || block?.electrical.transferMode === 'pulsed-spray'
export const judgedBy = (...standards: string[]): When => (weld) => weld.standards.some(({ standard }) => standards.includes(standard))
export const filled: When = (_weld, block) => block?.filler.added !== false
export const treated: When = (weld) => weld.pwht.condition !== null && weld.pwht.condition !== 'none'
export const onCoupon: When = (_weld, _block, record) => record === 'coupon'
/** A metal that somebody wrote as it is called: what the library would say of it is written too. */
export const ownMetal: When = ({ baseMetals: { a, b } }) => [a, b].some(({ libraryId, specification }) => libraryId === null && specification !== null)
export const ownFiller: When = (_weld, block) => block?.filler.added !== false && block?.filler.libraryId === null && block.filler.classification !== null

export const all = (...conditions: When[]): When => (weld, block, record) => conditions.every((holds) => holds(weld, block, record))
export const some = (...conditions: When[]): When => (weld, block, record) => conditions.some((holds) => holds(weld, block, record))
