import { useLayoutEffect, useMemo, useRef, type ReactNode } from 'react'
import { MarginContext, stackNotes } from './layout.ts'

const WIDE = '(min-width: 1280px)'
const GAP = 8
const matches = (media: string) => typeof window.matchMedia === 'function' && window.matchMedia(media).matches

export interface MarginLayoutProps {
  /** Left index, usually a SectionNav. */
  nav?: ReactNode
  /** Head of the margin: the tally and what can be done next. */
  head?: ReactNode
  /** The sheets; rows inside carry their own Margin. */
  children: ReactNode
}

/** A record's three columns: index, sheets, margin. Below 1280 px the index lies on top and notes fold under their rows. */
export function MarginLayout({ nav, head, children }: MarginLayoutProps) {
  const frame = useRef<HTMLDivElement>(null)
  const top = useRef<HTMLDivElement>(null)
  const notes = useRef(new Set<HTMLElement>())

  const api = useMemo(() => {
    let asked = 0
    const place = () => {
      asked = 0
      const base = frame.current
      if (!base) return
      const list = [...notes.current]
      if (!matches(WIDE) || matches('print')) {
        for (const note of list) note.style.top = ''
        base.style.minHeight = ''
        return
      }
      const origin = base.getBoundingClientRect().top
      const anchors = list.map((note) => (note.parentElement ?? note).getBoundingClientRect().top - origin)
      const heights = list.map((note) => note.offsetHeight)
      const from = top.current?.childElementCount ? top.current.offsetHeight + 16 : 0
      const { tops, bottom } = stackNotes(list.map((_, i) => ({ anchor: anchors[i] ?? 0, height: heights[i] ?? 0 })), from, GAP)
      list.forEach((note, i) => {
        note.style.top = `${(tops[i] ?? 0) - (anchors[i] ?? 0)}px`
      })
      base.style.minHeight = `${bottom}px`
    }
    const ask = () => {
      if (asked === 0) asked = requestAnimationFrame(place)
    }
    const watch = typeof ResizeObserver === 'undefined' ? null : new ResizeObserver(ask)
    return {
      watch,
      ask,
      context: {
        add: (element: HTMLElement) => {
          notes.current.add(element)
          watch?.observe(element)
          ask()
          return () => {
            notes.current.delete(element)
            watch?.unobserve(element)
            ask()
          }
        },
      },
    }
  }, [])

  useLayoutEffect(() => {
    const { watch, ask } = api
    const seen = [frame.current, top.current].filter((element) => element !== null)
    for (const element of seen) watch?.observe(element)
    window.addEventListener('resize', ask)
    ask()
    return () => {
      for (const element of seen) watch?.unobserve(element)
      window.removeEventListener('resize', ask)
    }
  }, [api])

  return (
    <MarginContext value={api.context}>
      <div className="xl:grid xl:grid-cols-[9.5rem_minmax(0,1fr)_19.5rem] xl:gap-x-6">
        <div className="no-print mb-3 min-w-0 xl:mb-0">{nav}</div>
        <div ref={frame} className="margin-frame relative min-w-0 space-y-4">
          <div ref={top} className="space-y-3 xl:absolute xl:top-0 xl:left-[calc(100%+1.5rem)] xl:w-[19.5rem]">
            {head}
          </div>
          {children}
        </div>
      </div>
    </MarginContext>
  )
}
