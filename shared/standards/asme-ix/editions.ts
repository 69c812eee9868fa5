/** Editions that can be judged, and which rules each of them has (section change lists; secondary). */
import type { Standard } from '../rule.ts'

export const editions: Standard['editions'] = [
  { id: '2017', label: '2017', note: 'Vertical uphill is a supplementary variable; short-circuiting transfer narrows the thickness ranges.' },
  { id: '2019', label: '2019', note: 'Short-circuiting transfer narrows the thickness ranges.' },
  { id: '2021', label: '2021', note: null },
  { id: '2023', label: '2023', note: 'Judged by the rules of the 2021 edition; changes made in 2023 are not confirmed here. Check your copy.' },
]

const ids = editions.map(({ id }) => id)

/** The editions up to and including `last`; all of them where `last` is absent. */
export const editionsUntil = (last: string | undefined): readonly string[] => (last === undefined ? ids : ids.filter((id) => id <= last))
