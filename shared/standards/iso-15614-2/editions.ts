import type { Standard } from '../rule.ts'

/** The first edition, in its European adoption; the second edition (2025) has not been seen. */
export const editions: Standard['editions'] = [
  { id: '2005', label: '2005', note: 'Nearly every figure is recalled, or taken from the standard before it (EN 288-4), so confirm each in your copy. The edition of 2025, which adds process 142, is not held here.' },
]

export const editionIds: readonly string[] = editions.map(({ id }) => id)
