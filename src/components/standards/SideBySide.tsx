import { Fragment } from 'react'
import { Link } from 'react-router-dom'
import type { SideBySide as Table, SideCell } from '@shared/schemas/standards.ts'
import { Sheet } from '../Sheet.tsx'
import { VerdictMark } from '../Verdict.tsx'
import { BASIS_WORD, rulePath } from './words.ts'

const STATE_WORD: Record<SideCell['state'], string> = { range: '', 'cannot-tell': 'Cannot tell', 'no-range': 'No range', 'not-a-variable': 'No rule' }

type Head = Table['standards'][number]

/** One coupon under every standard: rows of variables, a column a standard; on a phone the standards stand under each variable. */
export function SideBySide({ table }: { table: Table }) {
  const { standards, rows } = table
  const blocks = [...new Set(rows.map(({ processId }) => processId))].map((processId) => ({ processId, rows: rows.filter((row) => row.processId === processId) }))
  return (
    <div className="space-y-4">
      <Sheet title="Under each standard" className="overflow-hidden" aside={table.certified ? 'certified' : 'as it would be, once certified'}>
        <ul className="grid sm:grid-cols-2 xl:grid-cols-5">
          {standards.map((head) => (
            <li key={head.standard} className="-mr-px -mb-px border-r border-b border-hair px-4 py-3">
              <StandardHead head={head} />
            </li>
          ))}
        </ul>
      </Sheet>
      {rows.length === 0 && <p className="border border-rule bg-sheet px-4 py-3">Nothing can be told yet: state the process, the metals and the thickness of the coupon.</p>}
      {blocks.map(({ processId, rows: own }) => (
        <Sheet key={processId} title={own[0]?.process ?? 'Process not stated'}>
          <table role="table" className="block w-full border-collapse text-left min-[900px]:table min-[900px]:table-fixed">
            <caption className="sr-only">What the coupon qualifies with {own[0]?.process ?? 'this process'}, under each standard</caption>
            <thead role="rowgroup" className="sr-only min-[900px]:not-sr-only min-[900px]:table-header-group">
              <tr role="row" className="border-b border-rule bg-paper">
                <th role="columnheader" scope="col" className="w-36 px-4 py-1.5 font-medium">
                  Variable
                </th>
                {standards.map(({ standard, shortName, edition }) => (
                  <th key={standard} role="columnheader" scope="col" className="px-3 py-1.5 font-medium">
                    {shortName} <span className="font-normal text-soft">{edition}</span>
                  </th>
                ))}
              </tr>
            </thead>
            <tbody role="rowgroup" className="block min-[900px]:table-row-group">
              {own.map(({ variable, label, cells }) => (
                <tr key={variable} role="row" className="sheet-row grid border-b border-hair py-1 align-top last:border-b-0 sm:grid-cols-2 min-[900px]:table-row">
                  <th role="rowheader" scope="row" className="block px-4 pt-2 font-semibold sm:col-span-2 min-[900px]:table-cell min-[900px]:py-2.5 min-[900px]:font-medium">
                    {label}
                  </th>
                  {cells.map((cell) => (
                    <td key={cell.standard} role="cell" className="block min-w-0 px-4 py-1.5 wrap-anywhere min-[900px]:table-cell min-[900px]:px-3 min-[900px]:py-2.5">
                      <span className="text-soft min-[900px]:hidden">{standards.find(({ standard }) => standard === cell.standard)?.shortName}: </span>
                      <Cell cell={cell} />
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </Sheet>
      ))}
    </div>
  )
}

function StandardHead({ head: { standard, shortName, edition, named, readyToCertify, reason, notes } }: { head: Head }) {
  return (
    <>
      <p className="font-narrow text-lg font-semibold">
        <Link to={`/standards/${standard}`} className="text-link">
          {shortName}
        </Link>{' '}
        {edition && <span className="font-medium text-soft">{edition}</span>}
      </p>
      <p className="text-sm text-soft">{named ? 'The coupon is welded to it.' : 'Not named by the coupon; shown to compare.'}</p>
      {reason ? (
        <p className="mt-1">
          <VerdictMark verdict="cannot-tell" className="mr-1.5 size-2.5" />
          {reason}
        </p>
      ) : (
        <p className="mt-1">
          <VerdictMark verdict={readyToCertify ? 'within' : 'cannot-tell'} className="mr-1.5 size-2.5" />
          {readyToCertify ? 'The record holds all that it asks for.' : 'The record lacks something that it asks for, so none of its column stands yet.'}
        </p>
      )}
      {notes.length > 0 && (
        <details className="print-open mt-1 text-sm">
          <summary className="w-fit cursor-pointer py-0.5 text-soft underline decoration-dotted underline-offset-2">
            {notes.length} {notes.length === 1 ? 'note' : 'notes'}
          </summary>
          <ul className="list-disc space-y-0.5 pl-4">
            {[...new Set(notes)].map((note) => (
              <li key={note}>{note}</li>
            ))}
          </ul>
        </details>
      )}
    </>
  )
}

function Cell({ cell: { state, words, clause, basis, ranges, standard } }: { cell: SideCell }) {
  // Why there is no figure is said small; the figures are what the eye looks for.
  const quiet = state !== 'range' && !(state === 'cannot-tell' && clause)
  const rules = [...new Map(ranges.map((range) => [`${range.ruleId} ${range.clause}`, range])).values()]
  return (
    <>
      {state === 'cannot-tell' && <VerdictMark verdict="cannot-tell" className="mr-1.5 size-2.5" />}
      {STATE_WORD[state] && <span className={`mr-1 font-medium ${state === 'cannot-tell' ? 'text-straw-deep' : 'text-soft'}`}>{STATE_WORD[state]}.</span>}
      <span className={quiet ? 'text-sm text-soft' : 'font-medium'}>
        {(state === 'range' ? words.split('; ') : [words]).map((part, index) => (
          <Fragment key={part}>
            {index > 0 && <br />}
            {part}
          </Fragment>
        ))}
      </span>
      {clause && (
        <span className="mt-0.5 block text-xs text-soft">
          {rules.length > 0 ? (
            rules.map((range, index) => {
              const to = rulePath(standard, range.ruleId)
              return (
                <Fragment key={`${range.ruleId} ${range.clause}`}>
                  {index > 0 && ', '}
                  {to ? (
                    <Link to={to} className="text-link">
                      {range.clause}
                    </Link>
                  ) : (
                    range.clause
                  )}
                </Fragment>
              )
            })
          ) : (
            clause
          )}
          {basis && basis !== 'read' && `; ${BASIS_WORD[basis]}`}
        </span>
      )}
    </>
  )
}
