import type { StandardRow } from '@shared/schemas/standards.ts'
import { BASIS_WORD } from '@/components/standards/words.ts'

const ORDER = ['read', 'secondary', 'common-practice', 'memory'] as const

/** How many rules stand on what: the first thing that an auditor asks. */
export function Bases({ bases }: { bases: StandardRow['bases'] }) {
  return <p className="text-soft">{ORDER.flatMap((basis) => ((bases[basis] ?? 0) > 0 ? [`${bases[basis]} ${BASIS_WORD[basis]}`] : [])).join(', ')}</p>
}
