/** Editions that can be judged, and how their clauses are numbered (numbers from memory save where the reference was read). */
import type { Standard } from '../rule.ts'

export const editions: Standard['editions'] = [
  { id: '2010', label: '2010', note: 'Findings number their clauses as 2010 does, the list of rules as 2020 does. Figures are those known for 2015 and 2020, save where a rule says otherwise; variables of a prequalified procedure follow the limits of the qualification table.' },
  { id: '2015', label: '2015', note: 'Prequalification stands in Clause 3, qualification in Clause 4: findings number their clauses so, the list of rules as 2020 does.' },
  { id: '2020', label: '2020', note: null },
]

export const editionIds: readonly string[] = editions.map(({ id }) => id)

/** Clause of 2020 → clause of 2010 and 2015; longer names first so that `Table 6.5` is not taken for `Table 6.5x`. */
const NUMBERS: readonly (readonly [string, { '2010': string; '2015': string }])[] = [
  ['Table 10.8', { '2010': 'Table 4.1', '2015': 'Table 9.9' }],
  ['Table 10.9', { '2010': 'Table 4.2', '2015': 'Table 9.10' }],
  ['Table 5.1', { '2010': 'Table 3.7', '2015': 'Table 3.6' }],
  ['Table 5.2', { '2010': '3.6 and Table 4.5', '2015': 'Table 3.7' }],
  ['Table 5.3', { '2010': 'Table 3.1', '2015': 'Table 3.1' }],
  ['Table 5.4', { '2010': 'Table 3.1', '2015': 'Table 3.2' }],
  ['Table 5.5', { '2010': 'Table 3.4', '2015': 'Table 3.5' }],
  ['Table 5.7', { '2010': 'Clause 3', '2015': 'Clause 3' }],
  ['Table 5.8', { '2010': 'Table 3.2', '2015': 'Table 3.3' }],
  ['Fig. 5.1', { '2010': 'Fig. 3.4', '2015': 'Fig. 3.3' }],
  ['Fig. 5.2', { '2010': 'Fig. 3.3', '2015': 'Fig. 3.2' }],
  ['Table 6.1', { '2010': 'Table 4.1', '2015': 'Table 4.1' }],
  ['Table 6.2', { '2010': 'Table 4.2', '2015': 'Table 4.2' }],
  ['Table 6.3', { '2010': 'Table 4.3', '2015': 'Table 4.3' }],
  ['Table 6.4', { '2010': 'Table 4.4', '2015': 'Table 4.4' }],
  ['Table 6.5', { '2010': 'Table 4.5', '2015': 'Table 4.5' }],
  ['Table 6.7', { '2010': 'Table 4.6', '2015': 'Table 4.6' }],
  ['Table 6.8', { '2010': 'Table 4.8', '2015': 'Table 4.8' }],
  ['Table 6.9', { '2010': 'Table 4.9', '2015': 'Table 4.9' }],
  ['Table 7.7', { '2010': 'Table 5.8', '2015': 'Table 5.7' }],
  ['6.10', { '2010': '4.9', '2015': '4.9' }],
  ['Clause 5', { '2010': 'Clause 3', '2015': 'Clause 3' }],
  ['Clause 6', { '2010': 'Clause 4', '2015': 'Clause 4' }],
  ['Clause 7', { '2010': 'Clause 5', '2015': 'Clause 5' }],
]

const known = new Map<string, string>()

/** A clause as the edition numbers it, from its number in 2020; the words around the number stay. Rows are known for 2015 and 2020 alone. */
export function clauseIn(edition: string, clause: string): string {
  if (edition !== '2010' && edition !== '2015') return clause
  const key = `${edition} ${clause}`
  let told = known.get(key)
  if (told === undefined) {
    const row = NUMBERS.find(([number]) => clause.startsWith(number))
    told = row ? row[1][edition] + clause.slice(row[0].length) : clause
    if (edition === '2010') told = told.replace(/ row \d+$/, '')
    // Clauses come from the rules, of which there is a fixed number.
    known.set(key, told)
  }
  return told
}
