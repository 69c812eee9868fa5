/** The letter of the n-th revision: 1 is A, 26 is Z, 27 is AA. @throws RangeError below 1 */
export function revisionLetter(ordinal: number): string {
  if (!Number.isInteger(ordinal) || ordinal < 1) throw new RangeError(`no revision has the ordinal ${ordinal}`)
  let rest = ordinal
  let letters = ''
  while (rest > 0) {
    rest -= 1
    letters = String.fromCharCode(65 + (rest % 26)) + letters
    rest = Math.floor(rest / 26)
  }
  return letters
}
