import { Link } from 'react-router-dom'
import { CALCULATOR_GROUPS, type Calculator } from '@shared/calculations/catalogue.ts'
import { findCalculators } from '@shared/calculations/calculator-search.ts'
import { FilterBar } from '@/components/FilterBar.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { NothingFound, PageHead } from '@/components/states.tsx'
import { useFilters } from '@/hooks/filters.ts'

/** Every calculator by its group; a question leaves those that answer it, the nearest first. */
export function CalculatorsPage() {
  const { values, set, clear, any } = useFilters(['q'])
  const found = findCalculators(values.q)
  return (
    <>
      <PageHead title="Calculators">Each with its formula, its source, the limits within which it holds and a worked example. An address carries the figures, so a result can be sent or kept.</PageHead>
      <FilterBar label="Find a calculator: preheat, t8/5, wire feed" search={values.q} onSearch={(text) => set({ q: text })} onClear={any ? clear : undefined} count={any ? `${found.length} ${found.length === 1 ? 'calculator' : 'calculators'}` : undefined} />
      {found.length === 0 && <NothingFound what="calculators" onClear={clear} />}
      {any && found.length > 0 && (
        <Sheet title="Found">
          <List calculators={found} />
        </Sheet>
      )}
      {!any && (
        <div className="gap-4 md:columns-2 xl:columns-3">
          {CALCULATOR_GROUPS.map(({ id, title }) => (
            <Sheet key={id} id={id} title={title} className="mb-4 break-inside-avoid">
              <List calculators={found.filter(({ group }) => group === id)} />
            </Sheet>
          ))}
        </div>
      )}
    </>
  )
}

function List({ calculators }: { calculators: readonly Calculator[] }) {
  return (
    <ul>
      {calculators.map(({ id, title, purpose }) => (
        <li key={id} className="border-b border-hair last:border-b-0">
          <Link to={`/calculators/${id}`} className="group block px-4 py-2.5 hover:bg-paper">
            <span className="block font-medium group-hover:underline">{title}</span>
            <span className="block text-sm text-pretty text-soft">{purpose}</span>
          </Link>
        </li>
      ))}
    </ul>
  )
}
