import { useQuery } from '@tanstack/react-query'
import { useEffect } from 'react'
import { useLocation, useParams } from 'react-router-dom'
import { standardIdSchema, type StandardId } from '@shared/schemas/common.ts'
import type { StandardDetail } from '@shared/schemas/standards.ts'
import { Button } from '@/components/Button.tsx'
import { Select } from '@/components/fields/text.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { BASIS_SENTENCE, BASIS_WORD, RULE_CLASS_WORD } from '@/components/standards/words.ts'
import { Breadcrumb, ErrorState, NothingFound, Skeleton } from '@/components/states.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { useFilters } from '@/hooks/filters.ts'
import { query } from '@/lib/query.ts'
import { NotFoundStandard } from '../components/NotFoundStandard.tsx'
import { Bases } from '../components/Bases.tsx'
import { bySection, chosenRules } from '../components/rule-search.ts'
import { CLASS_LEGEND, RulesTable } from '../components/RulesTable.tsx'

/** One standard as it is kept here: what is checked, clause by clause, and what is not. Made from the rules themselves. */
export function StandardPage() {
  const { data: id } = standardIdSchema.safeParse(useParams().id)
  return id ? <Page id={id} /> : <NotFoundStandard />
}

function Page({ id }: { id: StandardId }) {
  const standard = useQuery({ ...query('readStandard', { params: { id } }), staleTime: Infinity })
  return (
    <>
      <Breadcrumb trail={[{ label: 'Standards', to: '/standards' }, { label: standard.data?.shortName ?? id }]} />
      {standard.isPending && <Skeleton label="Reading the rules" rows={12} />}
      {standard.isError && <ErrorState error={standard.error} onRetry={() => void standard.refetch()} />}
      {standard.data && <Rules standard={standard.data} />}
    </>
  )
}

function Rules({ standard }: { standard: StandardDetail }) {
  const filters = useFilters(['q', 'process', 'class', 'basis', 'edition'])
  const { q, process, class: kind, basis, edition } = filters.values
  const target = useLocation().hash.slice(1)
  const rules = chosenRules(standard.ruleList, { q, process, kind, basis, edition })
  // The rules come after the address was opened, so the browser's own jump finds nothing.
  useEffect(() => {
    if (target) document.getElementById(target)?.scrollIntoView()
  }, [target])
  const clear = filters.any ? filters.clear : undefined
  return (
    <>
      <TitleBlock
        kind="Standard, as it is kept here"
        number={standard.shortName}
        title={standard.name}
        cells={[
          { label: 'Editions', children: standard.editions.map(({ label }) => label).join(', ') },
          { label: 'Processes', children: standard.processes.join(', ') },
          { label: 'Supported by', children: standard.routes.includes('prequalified') ? 'test, or prequalified' : 'test' },
          { label: `${standard.rules} rules`, children: <Bases bases={standard.bases} />, wide: true },
        ]}
      />
      <div className="mt-4 grid gap-4 lg:grid-cols-2">
        <Sheet title="Editions">
          <ul className="space-y-1.5 px-4 py-3">
            {standard.editions.map(({ id, label, note }) => (
              <li key={id}>
                <span className="font-semibold">{label}</span>
                {note && <span className="text-soft">: {note}</span>}
              </li>
            ))}
          </ul>
          <p className="border-t border-hair px-4 py-2.5 text-sm text-soft">
            A coupon supports a procedure once it is certified ({standard.certification.clause}; {BASIS_WORD[standard.certification.basis]}).
          </p>
        </Sheet>
        <Sheet title="Not checked here">
          <ul className="list-disc space-y-0.5 py-3 pr-4 pl-8">
            {standard.outOfScope.map((item) => (
              <li key={item} className="first-letter:uppercase">
                {item}
              </li>
            ))}
          </ul>
          <p className="border-t border-hair px-4 py-2.5 text-sm text-soft">What is not checked is never said to be within: the verdict is &ldquo;cannot tell&rdquo;.</p>
        </Sheet>
      </div>
      <div className="no-print mt-6 flex flex-wrap items-end justify-between gap-x-4">
        <FilterBar label="Find a rule" search={q} onSearch={(text) => filters.set({ q: text })} onClear={clear} count={`${rules.length} of ${standard.ruleList.length} rules`}>
          <Select label="Process" labelHidden empty="Every process" value={process} onChange={(event) => filters.set({ process: event.target.value })} options={standard.processes.map((one) => ({ value: one, label: one }))} />
          <Select label="Class" labelHidden empty="Every class" value={kind} onChange={(event) => filters.set({ class: event.target.value })} options={(['essential', 'supplementary', 'dual', 'nonessential'] as const).map((one) => ({ value: one, label: RULE_CLASS_WORD[one] }))} className="max-w-52" />
          <Select label="Basis" labelHidden empty="Every basis" value={basis} onChange={(event) => filters.set({ basis: event.target.value })} options={(['read', 'secondary', 'common-practice', 'memory'] as const).map((one) => ({ value: one, label: BASIS_WORD[one] }))} />
          {standard.editions.length > 1 && <Select label="Edition" labelHidden empty="Every edition" value={edition} onChange={(event) => filters.set({ edition: event.target.value })} options={standard.editions.map((one) => ({ value: one.id, label: one.label }))} />}
        </FilterBar>
        <Button className="mb-3" onClick={() => window.print()}>
          Print
        </Button>
      </div>
      {filters.any && <p className="mb-2 hidden print:block">{rules.length} of {standard.ruleList.length} rules, as filtered.</p>}
      <p className="mb-3 text-sm text-soft">
        {CLASS_LEGEND.map(([letter, word]) => `${letter} ${word}`).join('; ')}; – no such variable for the process. {BASIS_SENTENCE.memory.replace('From memory', 'Where a rule stands on memory, it says so')}
      </p>
      {rules.length === 0 ? (
        <NothingFound what="rules" onClear={filters.clear} />
      ) : (
        <div className="space-y-4">
          {bySection(rules).map(([section, own]) => (
            <Sheet key={section} title={section} aside={own.length === 1 ? 'one rule' : `${own.length} rules`}>
              <RulesTable section={section} rules={own} standard={standard} target={target} />
            </Sheet>
          ))}
        </div>
      )}
    </>
  )
}
