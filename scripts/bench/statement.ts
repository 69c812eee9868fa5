/** A statement as the database layer sent it. */
export interface Statement { text: string; values: unknown[] }

/**
 * Takes a line of the database layer's log apart: `Executing (…): select …; ["a"]`.
 * @returns null for a line that is no statement
 */
export function readStatement(line: string): Statement | null {
  const text = /^Execut(?:ing|ed) \([^)]*\): ([^]*)$/.exec(line)?.[1]
  if (text === undefined) return null
  const bound = /^([^]*); (\[[^]*\])$/.exec(text)
  if (!bound?.[1] || !bound[2] || !/\$\d/.test(bound[1])) return { text, values: [] }
  return { text: bound[1], values: JSON.parse(bound[2]) as unknown[] }
}
