import { useEffect, useState } from 'react'
import type { Verdict } from '@shared/schemas/assessment.ts'
import { VERDICT_WORD, VerdictMark } from './Verdict.tsx'

export interface SectionLink {
  /** Id of the sheet. */
  id: string
  label: string
  verdict?: Verdict | null
}

/** The left index of a record: one line a sheet, its worst verdict as a mark; follows the scroll. Below 1280 px a strip on top. */
export function SectionNav({ sections, label = 'Sections' }: { sections: readonly SectionLink[]; label?: string }) {
  const [current, setCurrent] = useState(sections[0]?.id)
  const ids = sections.map((section) => section.id).join(' ')
  useEffect(() => {
    if (typeof IntersectionObserver === 'undefined') return
    const seen = new Map<string, boolean>()
    const watch = new IntersectionObserver(
      (entries) => {
        for (const entry of entries) seen.set(entry.target.id, entry.isIntersecting)
        const first = ids.split(' ').find((id) => seen.get(id))
        if (first) setCurrent(first)
      },
      { rootMargin: '-64px 0px -55% 0px' },
    )
    for (const id of ids.split(' ')) {
      const element = document.getElementById(id)
      if (element) watch.observe(element)
    }
    return () => watch.disconnect()
  }, [ids])
  return (
    <nav aria-label={label} className="border-rule bg-paper max-xl:overflow-x-auto max-xl:border-b xl:sticky xl:top-4 xl:border-l-2">
      <ul className="flex xl:block">
        {sections.map(({ id, label: text, verdict }) => (
          <li key={id} className="shrink-0">
            <a
              href={`#${id}`}
              aria-current={current === id ? 'location' : undefined}
              className={`flex items-center justify-between gap-2.5 border-transparent px-3 py-[0.4375rem] hover:text-ink max-xl:border-b-2 xl:-ml-0.5 xl:border-l-2 ${current === id ? 'border-ink! font-semibold text-ink' : 'text-soft'}`}
            >
              {text}
              {verdict && <VerdictMark verdict={verdict} className="size-2" label={VERDICT_WORD[verdict]} />}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  )
}
