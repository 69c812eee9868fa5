import type { ProcessBlock } from '@shared/schemas/welding.ts'
import { formatInterval, formatQuantity } from '@shared/units/format.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { heatOf } from '@shared/calculations/joint-picture.ts'

const HEATS = ['bg-heat-1', 'bg-heat-2', 'bg-heat-3', 'bg-heat-4'] as const

/** The build-up, pass after pass, with the settings of each; then how the beads are laid and cleaned. */
export function ShopPasses({ block, system }: { block: ProcessBlock; system: UnitSystem }) {
  const { passes, technique } = block
  const words: readonly (readonly [string, string | null])[] = [
    ['Bead', technique.bead === 'both' ? 'stringer or weave' : technique.bead],
    ['Clean first', technique.initialCleaning],
    ['Between passes', technique.interpassCleaning],
    ['Contact tube', technique.contactTubeDistance && formatInterval(technique.contactTubeDistance, 'length', system).text],
    ['Nozzle', technique.nozzleSize],
    ['Note', technique.notes],
  ]
  const told = words.filter(([, value]) => value)
  return (
    <section aria-label="Passes" className="border border-rule">
      {passes.length === 0 && <p className="px-4 py-3 text-soft">The procedure lists no passes for this process.</p>}
      <ol>
        {passes.map((pass, index) => {
          const figures = [
            pass.fillerDiameter && formatQuantity(pass.fillerDiameter, 'length', system).text,
            pass.current && formatInterval(pass.current, 'current', system).text,
            pass.voltage && formatInterval(pass.voltage, 'voltage', system).text,
            pass.wireFeed && formatInterval(pass.wireFeed, 'wireFeed', system).text,
            pass.travelSpeed && formatInterval(pass.travelSpeed, 'travelSpeed', system).text,
          ].filter(Boolean)
          return (
            <li key={`${pass.number} ${index}`} className="flex items-stretch gap-3 border-b border-hair last:border-b-0">
              <span aria-hidden="true" className={`w-2 shrink-0 ${HEATS[heatOf(index, passes.length)]}`} />
              <div className="min-w-0 py-2.5 pr-4">
                <p className="font-narrow text-xl font-semibold">
                  {pass.number} {pass.layer && <span className="font-medium text-soft">{pass.layer}</span>}
                </p>
                {figures.length > 0 && <p>{figures.join(' · ')}</p>}
              </div>
            </li>
          )
        })}
      </ol>
      {told.length > 0 && (
        <dl className="space-y-2 border-t border-rule px-4 py-3">
          {told.map(([label, value]) => (
            <div key={label}>
              <dt className="font-narrow text-base tracking-[0.055em] text-soft uppercase">{label}</dt>
              <dd>{value}</dd>
            </div>
          ))}
        </dl>
      )}
    </section>
  )
}
