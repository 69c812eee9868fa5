/** Type-ahead over names full of dashes: `A516-70`, `a 516 70` and `SA516 Gr.70` are one thing. */

/** Lower case, accents and signs away; the letters and figures that remain, run together. */
export const squeeze = (text: string): string => text.toLowerCase().normalize('NFKD').replace(/[^a-z0-9%]/g, '')

/** Words of a query: runs of letters, figures, points and slashes. */
export const words = (query: string): string[] => query.toLowerCase().split(/[\s,;–—]+/).map(squeeze).filter((word) => word !== '')

/** What a row can be found by: a title that counts most, and further text. */
export interface Findable { title: string; search: string }

/**
 * How well a row answers a query: 0 when a word is nowhere in it; more for a title that is, starts with or holds the query.
 */
export function matchScore(query: string, { title, search }: Findable): number {
  const wanted = words(query)
  if (wanted.length === 0) return 1
  const [squeezedTitle, parts] = [squeeze(title), search.toLowerCase().split('|').map((part) => part.trim())]
  const squeezedParts = parts.map(squeeze)
  const all = squeezedTitle + '|' + squeezedParts.join('|')
  const whole = squeeze(query)
  const hasAll = wanted.every((word) => all.includes(word))
  if (!hasAll && !all.includes(whole)) return 0
  if (squeezedParts.includes(whole) || squeezedTitle === whole) return 100
  if (squeezedTitle.startsWith(whole) || squeezedParts.some((part) => part.startsWith(whole))) return 60
  if (all.includes(whole)) return 40
  const ownWords = new Set([title, ...parts].flatMap(words))
  return 10 + wanted.filter((word) => ownWords.has(word)).length
}

/** The best `limit` rows for a query, best first; ties keep the library's own order. */
export function findRows<T>(rows: readonly T[], query: string, findable: (row: T) => Findable, limit: number): T[] {
  return rows
    .map((row, order) => ({ row, order, score: matchScore(query, findable(row)) }))
    .filter(({ score }) => score > 0)
    .sort((one, other) => other.score - one.score || one.order - other.order)
    .slice(0, limit)
    .map(({ row }) => row)
}
