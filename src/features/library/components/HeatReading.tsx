import { Link } from 'react-router-dom'
import { printChemistry } from '@shared/library/paste-chemistry.ts'
import type { Quantity } from '@shared/schemas/common.ts'
import type { Heat, WriteHeat } from '@shared/schemas/heats.ts'
import type { Dimension } from '@shared/units/types.ts'
import { Sheet } from '@/components/Sheet.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { useUnits } from '@/hooks/units.ts'
import { day } from '@/lib/figures.ts'
import { CHEMISTRY_WORDS, HEAT_KINDS } from '../heat-form.ts'

const orNot = (text: React.ReactNode) => text || <span className="text-soft">not stated</span>

/** The title block of a heat or lot, as it is typed. */
export function HeatTitle({ heat, content }: { heat: Heat; content: WriteHeat }) {
  return (
    <TitleBlock
      kind={HEAT_KINDS[content.kind].title}
      number={content.number || heat.content.number}
      title={content.grade}
      cells={[
        { label: 'Certificate', children: orNot([content.certificate, content.certificateType && `type ${content.certificateType}`].filter(Boolean).join(', ')) },
        { label: 'Received', children: orNot(content.receivedOn && day(content.receivedOn)) },
        { label: 'Library', children: content.libraryId === null ? <span className="text-soft">not of a row there</span> : <Link to={`/library/${HEAT_KINDS[content.kind].library}?q=${encodeURIComponent(content.grade)}`} className="text-link">its row</Link> },
        { label: 'Changed', children: day(heat.updatedAt) },
      ]}
    />
  )
}

/** A heat or lot for whoever only reads. */
export function HeatReading({ content }: { content: WriteHeat }) {
  const units = useUnits()
  const figure = (value: Quantity | null, dimension: Dimension) => units.quantity(value, dimension)?.text
  const facts: [string, React.ReactNode][] = [
    [content.kind === 'lot' ? 'Size' : 'Thickness', figure(content.kind === 'lot' ? content.diameter : content.thickness, 'length')],
    ...(content.kind === 'heat' ? ([['Diameter', figure(content.diameter, 'length')]] as [string, React.ReactNode][]) : []),
    ['Tensile strength', figure(content.tensile, 'stress')],
    ['Yield strength', figure(content.yield, 'stress')],
    ['Elongation', figure(content.elongation, 'percent')],
    ['Notes', content.notes],
  ]
  return (
    <>
      <Sheet title="What the certificate says">
        <dl className="grid gap-x-6 gap-y-3 px-4 py-4 sm:grid-cols-2 lg:grid-cols-3">
          {facts.map(([label, value]) => (
            <div key={label} className="min-w-0">
              <dt className="cell-label">{label}</dt>
              <dd className="break-words whitespace-pre-line">{orNot(value)}</dd>
            </div>
          ))}
        </dl>
      </Sheet>
      <Sheet title="Chemistry" aside={content.chemistryOf ? `of ${CHEMISTRY_WORDS[content.chemistryOf]}, mass per cent` : 'mass per cent'}>
        {content.chemistry.length === 0 ? (
          <p className="px-4 py-3 text-soft">No chemistry is recorded.</p>
        ) : (
          <dl className="grid grid-cols-3 gap-x-4 gap-y-2 px-4 py-4 sm:grid-cols-6 lg:grid-cols-8">
            {content.chemistry.map((row) => (
              <div key={row.element}>
                <dt className="cell-label normal-case">{row.element}</dt>
                <dd className="font-medium">{printChemistry([row]).slice(row.element.length + 1)}</dd>
              </div>
            ))}
          </dl>
        )}
      </Sheet>
    </>
  )
}
