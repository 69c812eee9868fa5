/** A statement as the database layer sent it. */
export interface Statement { text: string; values: unknown[] }

function readList(text: string): unknown[] | null {
  try {
    const list: unknown = JSON.parse(text)
    return Array.isArray(list) ? list : null
  } catch {
    return null
  }
}

/**
 * Takes a line of the database layer's log apart: `Executing (…): select …; ["a"]`.
 * @returns null for a line that is no statement
 */
export function readStatement(line: string): Statement | null {
  const text = /^Execut(?:ing|ed) \([^)]*\): ([^]*)$/.exec(line)?.[1]
  if (text === undefined) return null
  // A text may have "; [" of its own: the values are the first tail that reads as a list, if there are places for them.
  for (let at = text.indexOf('; ['); at >= 0; at = text.indexOf('; [', at + 1)) {
    const values = readList(text.slice(at + 2))
    if (values && /\$\d/.test(text.slice(0, at))) return { text: text.slice(0, at), values }
  }
  return { text, values: [] }
}
