import type { StandardDetail, StandardRule } from '@shared/schemas/standards.ts'
import { ruleAnchor } from '@shared/standards/catalogue.ts'
import { BASIS_SENTENCE, BASIS_WORD, RULE_CLASS_WORD } from '@/components/standards/words.ts'

type RuleClass = StandardRule['classes'][number]['class']
const LETTER: Record<RuleClass, string> = { essential: 'E', supplementary: 'S', nonessential: 'N', dual: 'S/N', 'not-a-variable': '–' }
const COMBINE: Record<StandardRule['combine'], string> = {
  each: 'One coupon has to cover it by itself.',
  union: 'Ranges of coupons that agree in the other variables join.',
  jointly: 'One coupon covers it, or several that agree do so together.',
}

/** What the letters of the class columns say. */
export const CLASS_LEGEND: readonly (readonly [letter: string, word: string])[] = (['essential', 'supplementary', 'dual', 'nonessential'] as const).map((kind) => [LETTER[kind], RULE_CLASS_WORD[kind]])

/** Rules of one section, a column a process; on a phone the classes stand in words under each rule. */
export function RulesTable({ section, rules, standard, target }: { section: string; rules: readonly StandardRule[]; standard: StandardDetail; /** Anchor of the rule that the reader came for. */ target: string }) {
  return (
    <table role="table" className="block w-full border-collapse text-left sm:table">
      <caption className="sr-only">Rules on {section}</caption>
      <thead role="rowgroup" className="sr-only sm:not-sr-only sm:table-header-group">
        <tr role="row" className="border-b border-rule bg-paper">
          <th role="columnheader" scope="col" className="px-4 py-1.5 font-medium">
            Rule
          </th>
          {standard.processes.map((process) => (
            <th key={process} role="columnheader" scope="col" className="px-1 py-1.5 text-center font-narrow font-medium">
              {process}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup" className="block sm:table-row-group">
        {rules.map((rule) => (
          <RuleRow key={rule.id} rule={rule} standard={standard} targeted={ruleAnchor(rule.id) === target} />
        ))}
      </tbody>
    </table>
  )
}

function RuleRow({ rule, standard, targeted }: { rule: StandardRule; standard: StandardDetail; targeted: boolean }) {
  const { title, clause, statement, classes, basis, source, editions, route, combine, withoutCoupon, fieldLabel } = rule
  const grouped = [...new Set(classes.map((one) => one.class))].map((kind) => [kind, classes.filter((one) => one.class === kind).map(({ process }) => process)] as const)
  const someEditions = editions.length < standard.editions.length
  return (
    <tr role="row" id={ruleAnchor(rule.id)} className={`sheet-row block scroll-mt-16 border-b border-hair align-top last:border-b-0 sm:table-row ${targeted ? 'bg-straw-bg' : ''}`}>
      <th role="rowheader" scope="row" className="block px-4 py-2.5 font-normal sm:table-cell sm:w-full">
        <p className="flex flex-wrap items-baseline gap-x-2.5">
          <a href={`#${ruleAnchor(rule.id)}`} className="text-link font-narrow text-base font-semibold whitespace-nowrap">
            {clause}
          </a>
          <span className="font-semibold">{title}</span>
        </p>
        <p className="mt-0.5 max-w-prose text-pretty">{statement}</p>
        <p className="mt-0.5 text-sm text-soft">
          {basis === 'memory' ? <strong className="font-semibold text-straw-deep">{BASIS_SENTENCE[basis]}</strong> : BASIS_SENTENCE[basis]} {someEditions && `Editions ${editions.join(', ')} only. `}
          {route === 'prequalified' && 'Prequalified procedures only. '}
        </p>
        <details className="print-open text-sm text-soft">
          <summary className="w-fit cursor-pointer py-0.5 underline decoration-dotted underline-offset-2">Source and how it is judged</summary>
          <p>Stands beside: {fieldLabel}.</p>
          <p>Source: {source}.</p>
          <p>{withoutCoupon ? 'Judged on the procedure by itself.' : COMBINE[combine]}</p>
          {classes.some((one) => one.basis !== basis) && <p>Class letters: {[...new Set(classes.map((one) => one.basis))].map((known) => `${classes.filter((one) => one.basis === known).map(({ process }) => process).join(', ')} ${BASIS_WORD[known]}`).join('; ')}.</p>}
        </details>
        <p className="mt-0.5 text-sm sm:hidden">
          {grouped.map(([kind, processes]) => (
            <span key={kind} className="block">
              <span className="inline-block font-medium first-letter:uppercase">{RULE_CLASS_WORD[kind]}</span>: {processes.join(', ')}
            </span>
          ))}
        </p>
      </th>
      {standard.processes.map((process) => {
        const own = classes.find((one) => one.process === process)
        return (
          <td key={process} role="cell" className={`hidden min-w-12 px-1 py-2.5 text-center sm:table-cell ${own?.class === 'essential' ? 'font-semibold' : own ? '' : 'text-soft'}`}>
            {own ? (
              <>
                <span aria-hidden="true">{LETTER[own.class]}</span>
                <span className="sr-only">{RULE_CLASS_WORD[own.class]}</span>
              </>
            ) : (
              <>
                <span aria-hidden="true">–</span>
                <span className="sr-only">no such variable</span>
              </>
            )}
          </td>
        )
      })}
    </tr>
  )
}
