type ColumnsFound = Readonly<Partial<Record<'time' | 'current' | 'voltage', number>>>

/** What keeps a recording from being read, in a sentence, and at which row of the file. */
export class ArcDataError extends Error {
  /** Counted from 1, header rows and blank lines included; null where the whole file is meant. */
  readonly row: number | null
  /** What a person can give so that it can be read: another choice of columns, or the sample rate. */
  readonly asks: 'columns' | 'samplesPerSecond' | null
  /** The columns that could be told all the same, counted from 0. */
  readonly found: ColumnsFound
  constructor(sentence: string, { row = null, asks = null, found = {} }: { row?: number | null; asks?: 'columns' | 'samplesPerSecond' | null; found?: ColumnsFound } = {}) {
    super(sentence)
    this.name = 'ArcDataError'
    this.row = row
    this.asks = asks
    this.found = found
  }
}

/** A row's text as it may be shown: short, without control characters. */
export const shownText = (text: string): string => {
  const plain = text.replace(/\p{Cc}/gu, '·')
  return plain.length > 80 ? `${plain.slice(0, 79)}…` : plain
}
