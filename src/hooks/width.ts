import { useLayoutEffect, useRef, useState, type RefObject } from 'react'

/** The width of an element in px, followed as it changes; `initial` until it has been measured. */
export function useWidth(initial: number): [RefObject<HTMLDivElement | null>, number] {
  const frame = useRef<HTMLDivElement>(null)
  const [width, setWidth] = useState(initial)
  useLayoutEffect(() => {
    const element = frame.current
    if (!element || typeof ResizeObserver === 'undefined') return
    const watch = new ResizeObserver(([entry]) => {
      const next = Math.floor(entry?.contentRect.width ?? 0)
      if (next > 0) setWidth(next)
    })
    watch.observe(element)
    return () => watch.disconnect()
  }, [])
  return [frame, width]
}
