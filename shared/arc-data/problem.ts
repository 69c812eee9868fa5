/** What keeps a recording from being read, in a sentence, and at which row of the file. */
export class ArcDataError extends Error {
  /** Counted from 1, header rows and blank lines included; null where the whole file is meant. */
  readonly row: number | null
  /** What a person can give so that it can be read: another choice of columns, or the sample rate. */
  readonly asks: 'columns' | 'samplesPerSecond' | null
  constructor(sentence: string, { row = null, asks = null }: { row?: number | null; asks?: 'columns' | 'samplesPerSecond' | null } = {}) {
    super(sentence)
    this.name = 'ArcDataError'
    this.row = row
    this.asks = asks
  }
}

/** A row's text as it may be shown: short, without control characters. */
export const shownText = (text: string): string => {
  const plain = text.replace(/\p{Cc}/gu, '·')
  return plain.length > 80 ? `${plain.slice(0, 79)}…` : plain
}
