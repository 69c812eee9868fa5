import type { Standard } from '../rule.ts'

/** One edition is kept. What its amendment changed has not been seen, so its figures are those of 2017 and, for level 2, of 2004 where they are recalled as unchanged. */
export const editions: Standard['editions'] = [
  { id: '2017+A1:2019', label: '2017 with Amd 1:2019', note: 'What the amendment of 2019 changed has not been seen; check its figures in your copy. Records to older editions keep the ranges they were issued with and are not judged here.' },
]

export const editionIds: readonly string[] = editions.map(({ id }) => id)
