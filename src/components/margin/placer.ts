import { stackNotes } from './layout.ts'

const WIDE = '(min-width: 1280px)'
const GAP = 8
const matches = (media: string) => typeof window.matchMedia === 'function' && window.matchMedia(media).matches

/** Measures the notes of a margin and sets their tops; works on the page, outside React's rendering. */
export class MarginPlacer {
  private frame: HTMLElement | null = null
  private head: HTMLElement | null = null
  private readonly notes = new Set<HTMLElement>()
  private asked = 0
  private readonly watch = typeof ResizeObserver === 'undefined' ? null : new ResizeObserver(() => this.ask())

  /** Starts on a frame and the head of its margin. Returns the way to stop. */
  mount(frame: HTMLElement | null, head: HTMLElement | null): () => void {
    this.frame = frame
    this.head = head
    const ask = () => this.ask()
    for (const element of [frame, head]) if (element) this.watch?.observe(element)
    window.addEventListener('resize', ask)
    ask()
    return () => {
      for (const element of [frame, head]) if (element) this.watch?.unobserve(element)
      window.removeEventListener('resize', ask)
      cancelAnimationFrame(this.asked)
      this.asked = 0
      this.frame = null
    }
  }

  /** Takes a row's notes in. Returns the way to let them go. */
  add(note: HTMLElement): () => void {
    this.notes.add(note)
    this.watch?.observe(note)
    this.ask()
    return () => {
      this.notes.delete(note)
      this.watch?.unobserve(note)
      this.ask()
    }
  }

  /** Places the notes before the next frame is drawn. */
  ask(): void {
    if (this.asked === 0) this.asked = requestAnimationFrame(() => this.place())
  }

  private place(): void {
    this.asked = 0
    const { frame, head } = this
    if (!frame) return
    const notes = [...this.notes]
    if (!matches(WIDE) || matches('print')) {
      for (const note of notes) note.style.top = ''
      frame.style.minHeight = ''
      return
    }
    const origin = frame.getBoundingClientRect().top
    const placed = notes.map((note) => ({ note, anchor: (note.parentElement ?? note).getBoundingClientRect().top - origin, height: note.offsetHeight }))
    const { tops, bottom } = stackNotes(placed, head?.childElementCount ? head.offsetHeight + 16 : 0, GAP)
    placed.forEach(({ note, anchor }, index) => {
      note.style.top = `${(tops[index] ?? 0) - anchor}px`
    })
    frame.style.minHeight = `${bottom}px`
  }
}
