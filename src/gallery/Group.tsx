import type { ReactNode } from 'react'

/** A named group of specimens. */
export function Group({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section aria-label={title}>
      <h2 className="mb-3 border-b border-ink pb-1 font-narrow text-xl font-semibold">{title}</h2>
      {children}
    </section>
  )
}
