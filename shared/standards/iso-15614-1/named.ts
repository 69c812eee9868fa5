/** A name as a list of one. */
export const named = (value: string | null): readonly string[] | null => (value === null ? null : [value])
