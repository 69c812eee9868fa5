/** One text for one content, so that equal records have equal hashes on any machine. */

/**
 * JSON with object keys in code-unit order, no spaces, and absent values (`undefined`) left out; arrays keep their order.
 * @throws TypeError for what JSON can't hold: NaN, infinities, functions, symbols, bigints
 */
export function canonicalJson(value: unknown): string {
  if (value === null) return 'null'
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError(`${value} can't be written as JSON`)
    return JSON.stringify(value)
  }
  if (typeof value === 'string' || typeof value === 'boolean') return JSON.stringify(value)
  if (Array.isArray(value)) return `[${value.map((item: unknown) => canonicalJson(item ?? null)).join(',')}]`
  if (typeof value !== 'object') throw new TypeError(`A ${typeof value} can't be written as JSON`)
  if (value instanceof Date) return JSON.stringify(value.toISOString())
  const entries = Object.entries(value).filter(([, item]) => item !== undefined)
  entries.sort(([one], [other]) => (one < other ? -1 : one > other ? 1 : 0))
  return `{${entries.map(([key, item]) => `${JSON.stringify(key)}:${canonicalJson(item)}`).join(',')}}`
}
