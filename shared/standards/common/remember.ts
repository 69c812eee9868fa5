/** Few texts come again and again (grades, classes, P-Numbers): what a pure function makes of them is kept. */

const LIMIT = 500

/**
 * Keeps the answers of a pure function of one text.
 * @param work must depend on the text alone, and its answer must never be changed by a caller
 * @returns the same function; it forgets everything after 500 texts, so that typing can't fill the memory
 */
export function remember<T>(work: (text: string) => T): (text: string) => T {
  const known = new Map<string, { answer: T }>()
  return (text) => {
    let found = known.get(text)
    if (found === undefined) {
      if (known.size >= LIMIT) known.clear()
      found = { answer: work(text) }
      known.set(text, found)
    }
    return found.answer
  }
}

/** As `remember`, for two texts. */
export function rememberPair<T>(work: (first: string, second: string) => T): (first: string, second: string) => T {
  const byFirst = remember((first) => remember((second) => work(first, second)))
  return (first, second) => byFirst(first)(second)
}
