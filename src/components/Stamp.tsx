/** The states a record can be stamped with, and how each looks: outlined while open, solid once decided. */
const STAMPS = {
  draft: ['Draft', 'border-straw text-straw-deep -rotate-2'],
  'in-review': ['In review', 'border-plum text-plum -rotate-2'],
  approved: ['Approved', 'border-jade bg-jade text-stamped'],
  superseded: ['Superseded', 'border-soft border-dashed text-soft'],
  withdrawn: ['Withdrawn', 'border-oxide bg-oxide text-stamped'],
  planned: ['Planned', 'border-soft border-dashed text-soft'],
  welding: ['Welding', 'border-straw text-straw-deep'],
  testing: ['Testing', 'border-plum text-plum'],
  certified: ['Certified', 'border-jade bg-jade text-stamped'],
  rejected: ['Rejected', 'border-oxide bg-oxide text-stamped'],
  queued: ['Queued', 'border-soft border-dashed text-soft'],
  sent: ['Sent', 'border-jade text-jade'],
  caught: ['Caught here', 'border-straw text-straw-deep'],
  failed: ['Failed', 'border-oxide text-oxide'],
  invited: ['Invited', 'border-straw text-straw-deep'],
  active: ['Active', 'border-jade text-jade'],
  inactive: ['Inactive', 'border-soft border-dashed text-soft'],
} as const

export type StampState = keyof typeof STAMPS
export const STAMP_STATES = Object.keys(STAMPS) as StampState[]

/** What the stamp says, e.g. for a filter's options. */
export const stampWord = (state: StampState): string => STAMPS[state][0]

/** A record's state as a rubber stamp. `small` for lists, where nothing is tilted. */
export function Stamp({ state, small = false }: { state: StampState; small?: boolean }) {
  const [word, look] = STAMPS[state]
  const size = small ? 'border px-1.5 text-[0.8125rem] leading-5 rotate-0' : 'border-2 px-2.5 py-0.5 text-[1.25rem] leading-7'
  return <span className={`inline-block rounded-sm font-narrow font-semibold tracking-[0.07em] whitespace-nowrap uppercase ${look} ${size}`}>{word}</span>
}
