import type { PanelCard, PanelLine, PanelNotice } from '@shared/schemas/machines.ts'
import { barOf, barWords, roomAt, roomOf } from './layout.ts'

/** A panel card, read at arm's length: what stands against it first, then what to dial with the room left, then what to measure. */
export function PanelCardView({ card }: { card: PanelCard }) {
  const of = (level: PanelNotice['level']) => card.notices.filter((notice) => notice.level === level)
  // What to measure and what is good to know belongs to a weld that may be made.
  const [refusals, warnings, notes] = [of('refuse'), of('warn').filter(({ code }) => card.ready || code !== 'not-shown'), card.ready ? of('note') : []]
  const dialled = card.lines.filter(({ value }) => value !== null)
  const open = card.lines.filter(({ value }) => value === null)
  return (
    <div>
      {refusals.length > 0 && (
        <div role="alert" className="border-b-4 border-oxide bg-oxide-bg px-5 py-4 print:py-2">
          <h2 className="font-narrow text-3xl leading-9 font-semibold text-oxide uppercase">Do not dial from this</h2>
          <Notices notices={refusals} className="mt-1" />
        </div>
      )}
      {warnings.length > 0 && (
        <section aria-label="Take care" className="border-b border-rule bg-straw-bg px-5 py-4 print:py-2">
          <h2 className="font-narrow text-xl font-semibold tracking-[0.03em] text-straw-deep uppercase">Take care</h2>
          <Notices notices={warnings} className="mt-1" />
        </section>
      )}
      {card.ready && (
        <section aria-label="Dial this" className="border-b border-rule px-5 pt-4">
          <h2 className="font-narrow text-lg font-medium tracking-[0.055em] text-soft uppercase">
            Dial this on {card.machine} · {card.modeName}
            {card.programLabel && ` · ${card.programLabel}`}
          </h2>
          {dialled.length === 0 && <p className="py-3">No control of this mode is fixed by the procedure. Set it by what you measure.</p>}
          <ul className="print:grid print:grid-cols-2 print:gap-x-6">
            {dialled.map((line) => (
              <LineRow key={line.control} line={line} />
            ))}
          </ul>
          {open.length > 0 && <Open lines={open} />}
        </section>
      )}
      {card.ready && card.mustMeasure.length > 0 && (
        <section aria-label="Measure this" className="border-b border-rule px-5 py-4 print:py-2">
          <h2 className="font-narrow text-lg font-medium tracking-[0.055em] text-soft uppercase">Measure this; the panel doesn’t show it</h2>
          <ul className="mt-1 list-disc space-y-1.5 pl-5">
            {card.mustMeasure.map(({ quantity, text }) => (
              <li key={quantity} className="text-pretty">
                {text}
              </li>
            ))}
          </ul>
        </section>
      )}
      {notes.length > 0 && (
        <section aria-label="Good to know" className="break-inside-avoid border-b border-rule px-5 py-4 print:py-2">
          <h2 className="font-narrow text-lg font-medium tracking-[0.055em] text-soft uppercase">Good to know</h2>
          <Notices notices={notes} className="mt-1" />
        </section>
      )}
      {card.ready && dialled.length > 0 && (
        <details className="no-print border-b border-rule px-5 py-2">
          <summary className="flex min-h-12 cursor-pointer items-center text-soft">Where the figures come from</summary>
          <dl className="space-y-2 pb-3">
            {dialled.map(({ control, label, because }) => (
              <div key={control}>
                <dt className="font-medium">{label}</dt>
                <dd className="text-pretty text-soft">{because}</dd>
              </div>
            ))}
          </dl>
        </details>
      )}
    </div>
  )
}

function Notices({ notices, className = '' }: { notices: readonly PanelNotice[]; className?: string }) {
  return (
    <ul className={`space-y-2.5 print:space-y-1 print:text-sm ${className}`}>
      {notices.map(({ code, message, basis }) => (
        <li key={`${code} ${message}`} className="text-pretty">
          {message}
          {basis && <span className="block text-sm text-soft">Basis: {basis}</span>}
        </li>
      ))}
    </ul>
  )
}

function LineRow({ line }: { line: PanelLine }) {
  const bar = barOf(line)
  const figure = line.unit === '' ? line.text : line.text.slice(0, -line.unit.length).trim()
  return (
    <li className="break-inside-avoid border-b border-rule py-3.5 last:border-b-0 print:py-1.5">
      <div className="flex items-end justify-between gap-4">
        <p className="min-w-0 pb-1 text-lg leading-6 break-words">
          {line.label}
          {line.where && <span className="block text-base text-soft">{line.where}</span>}
          {!line.shown && <span className="block text-base text-straw-deep">not shown on the panel</span>}
        </p>
        <p className="shrink-0 text-right">
          <span className={`font-narrow leading-none font-semibold text-figure tabular-nums ${figure.length > 6 ? 'text-3xl' : 'text-4xl'}`}>{figure}</span> <span className="text-soft">{line.unit}</span>
        </p>
      </div>
      {bar && (
        <div role="img" aria-label={barWords(line)}>
          <div className="relative mt-2 h-4 border border-rule bg-hair">
            <span className="absolute inset-y-0 bg-figure/55" style={{ left: `${bar.from * 100}%`, width: `max(4px, ${(bar.to - bar.from) * 100}%)` }} />
            <span className="absolute -inset-y-1 w-1 -translate-x-1/2 bg-figure" style={{ left: `${bar.at * 100}%` }} />
          </div>
          <p aria-hidden="true" className="relative mt-1.5 flex items-baseline justify-between text-base text-soft tabular-nums">
            <span>{line.scaleMin}</span>
            <span className="absolute -translate-x-1/2 whitespace-nowrap text-ink" style={{ left: `${roomAt(bar)}%` }}>
              {roomOf(line)}
            </span>
            <span>{line.scaleMax}</span>
          </p>
        </div>
      )}
    </li>
  )
}

/** Controls that the procedure says nothing of, in one line, so that nobody looks for their figure. */
function Open({ lines }: { lines: readonly PanelLine[] }) {
  return (
    <p className="border-t border-rule py-3 text-pretty text-soft">
      No figure given for {lines.map(({ label }) => label).join(', ')}: {lines.every(({ because }) => because.startsWith('The procedure doesn’t limit')) ? 'the procedure doesn’t limit it.' : [...new Set(lines.map(({ because }) => because))].join(' ')}
    </p>
  )
}
