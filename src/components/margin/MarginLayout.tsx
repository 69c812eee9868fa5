import { useLayoutEffect, useRef, useState, type ReactNode } from 'react'
import { MarginContext } from './layout.ts'
import { MarginPlacer } from './placer.ts'

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
  const [placer] = useState(() => new MarginPlacer())
  const frame = useRef<HTMLDivElement>(null)
  const top = useRef<HTMLDivElement>(null)
  useLayoutEffect(() => placer.mount(frame.current, top.current), [placer])
  return (
    <MarginContext value={placer}>
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
