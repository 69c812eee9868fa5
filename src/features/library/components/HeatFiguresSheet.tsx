import { useMemo, type ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { FAMILY_WORDS, heatFigures, sharesOf, type HeatFigure } from '@shared/library/heat-figures.ts'
import type { WriteHeat } from '@shared/schemas/heats.ts'
import { SourceLine } from '@/components/calculator/Working.tsx'
import { Sheet } from '@/components/Sheet.tsx'

/** The figures beside what they follow from; where there is no room beside it, directly under it and before the rest. */
export function BesideFigures({ main, figures, rest }: { main: ReactNode; figures: ReactNode; rest: ReactNode }) {
  return (
    <div className="mt-4 grid items-start gap-4 xl:grid-cols-[minmax(0,1fr)_24rem] xl:grid-rows-[auto_1fr]">
      <div className="min-w-0">{main}</div>
      <div className="min-w-0 xl:col-start-2 xl:row-span-2 xl:row-start-1">{figures}</div>
      <div className="min-w-0 space-y-4 xl:col-start-1">{rest}</div>
    </div>
  )
}

/** What follows from the chemistry, as it is typed: each figure with its formula, where it holds and what it rests on. */
export function HeatFiguresSheet({ content }: { content: Pick<WriteHeat, 'kind' | 'chemistryOf' | 'chemistry'> }) {
  const { kind, chemistryOf, chemistry } = content
  const { family, figures, notes } = useMemo(() => heatFigures({ kind, chemistryOf, chemistry }), [kind, chemistryOf, chemistry])
  const address = new URLSearchParams(Object.entries(sharesOf(chemistry)).map(([element, percent]): [string, string] => [element, String(percent)])).toString()
  return (
    <Sheet id="figures" title="What follows from it" aside={family && FAMILY_WORDS[family]}>
      <div aria-live="polite">
        {family === null && notes.length === 0 && <p className="px-4 py-3 text-soft">Carbon equivalents, A-Number, ferrite number and PREN stand here as soon as the chemistry is entered.</p>}
        {figures.map((figure) => (
          <Figure key={figure.id} figure={figure} address={address} />
        ))}
        {notes.map((note) => (
          <p key={note} className="border-b border-hair px-4 py-2.5 text-soft last:border-b-0">
            {note}
          </p>
        ))}
      </div>
    </Sheet>
  )
}

function Figure({ figure: { label, formula, calculation, reading, calculator }, address }: { figure: HeatFigure; address: string }) {
  const { unit, validity, problems, notes, steps, source } = calculation
  const last = steps.at(-1)
  return (
    <div className="border-b border-hair px-4 py-3 last:border-b-0">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h3 className="font-medium">{label}</h3>
        <p className="font-narrow text-2xl font-semibold tabular-nums">{reading === null ? <span className="text-base font-medium text-straw-deep">cannot tell</span> : <>{reading} <span className="text-base font-normal text-soft">{unit}</span></>}</p>
      </div>
      {problems.map(({ message }) => (
        <p key={message} className="font-medium text-straw-deep">
          {message}
        </p>
      ))}
      {validity.said.map((sentence) => (
        <p key={sentence} className="font-medium text-straw-deep">
          {sentence}
        </p>
      ))}
      <details className="print-open mt-0.5">
        <summary className="w-fit cursor-pointer py-0.5 text-sm text-soft underline decoration-dotted underline-offset-2">Formula, working and source</summary>
        <div className="space-y-1.5 py-1">
          <p className="break-words">{formula}</p>
          {last && <p className="text-soft break-words">{last.working}</p>}
          {notes.map((note) => (
            <p key={note} className="text-soft">
              {note}
            </p>
          ))}
          <SourceLine source={source} />
          <p>
            <Link to={`/calculators/${calculator}?${address}`} className="text-link">
              Open in the calculator
            </Link>
          </p>
        </div>
      </details>
    </div>
  )
}
