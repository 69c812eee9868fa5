/** A statement as the database layer sent it. */
export interface Statement { text: string; values: unknown[] }

function readList(text: string): unknown[] | null {
  try {
    return JSON.parse(`[${text}]`) as unknown[]
  } catch {
    return null
  }
}

/**
 * Takes a line of the database layer's log apart: `Executing (…): select …; "a", 2`.
 * @returns null for a line that is no statement
 */
export function readStatement(line: string): Statement | null {
  const text = /^Execut(?:ing|ed) \([^)]*\): ([^]*)$/.exec(line)?.[1]
  if (text === undefined) return null
  // A text may have a semicolon of its own: the values are the first tail that reads as a list, if there is a place for each.
  for (let at = text.indexOf('; '); at >= 0; at = text.indexOf('; ', at + 1)) {
    const before = text.slice(0, at)
    const values = readList(text.slice(at + 2))
    if (values && values.length > 0 && values.every((_value, index) => before.includes(`$${index + 1}`))) return { text: before, values }
  }
  return { text, values: [] }
}
