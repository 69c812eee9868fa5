/** The mark: a bend specimen seen from the side, its weld in the middle of the bend. */
export function Mark({ className = 'size-7' }: { className?: string }) {
  return (
    <svg viewBox="0 0 28 28" className={className} aria-hidden="true" fill="none" strokeWidth="5">
      <path d="M4.5 2v10.5a9.5 9.5 0 0 0 4.2 7.88" stroke="currentColor" />
      <path d="M23.5 2v10.5a9.5 9.5 0 0 1-4.2 7.88" stroke="currentColor" />
      <path d="M8.7 20.38a9.5 9.5 0 0 0 10.6 0" className="stroke-heat-4" />
    </svg>
  )
}

/** Mark and name, as on the bar. */
export function Wordmark() {
  return (
    <span className="inline-flex items-center gap-2.5">
      <Mark />
      <span className="font-narrow text-[1.5rem] leading-7 font-medium tracking-[0.06em]">SIDEBEND</span>
    </span>
  )
}
