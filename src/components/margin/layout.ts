import { createContext } from 'react'

/** Where notes report themselves; null outside a MarginLayout. */
export const MarginContext = createContext<{ add: (element: HTMLElement) => () => void; ask: () => void } | null>(null)

export interface Anchored {
  /** Where the note would like to start, from the top of the layout, px. */
  anchor: number
  height: number
}

/**
 * Places notes down a margin: each at its anchor, or below the one before it where they would overlap.
 * @param notes in any order
 * @param from first free px
 * @param gap px between notes
 * @returns a top for each note, in the order given, and the bottom of the last
 */
export function stackNotes(notes: readonly Anchored[], from: number, gap: number): { tops: number[]; bottom: number } {
  const tops = new Array<number>(notes.length).fill(0)
  let free = from
  for (const index of notes.map((_, i) => i).sort((a, b) => (notes[a]?.anchor ?? 0) - (notes[b]?.anchor ?? 0))) {
    const note = notes[index]
    if (!note) continue
    const top = Math.max(note.anchor, free)
    tops[index] = top
    free = top + note.height + gap
  }
  return { tops, bottom: notes.length === 0 ? from : free - gap }
}
