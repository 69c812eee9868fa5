import type { Pass } from '@shared/schemas/welding.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { useSheet } from './context.ts'
import { cellText, PASS_COLUMNS } from './pass-grid.ts'

/** The passes as a ruled table of figures; columns that no pass fills are left away. */
export function PassTable({ passes }: { passes: readonly Pass[] }) {
  const { system } = useSheet()
  const columns = PASS_COLUMNS.filter(({ id }) => id === 'number' || passes.some((pass) => (pass[id] ?? null) !== null))
  return (
    // A table wider than a phone scrolls sideways, so it must be reachable by keyboard.
    <div className="overflow-x-auto" role="group" aria-label="Passes" tabIndex={0}>
      <table className="w-full text-left">
        <thead>
          <tr className="border-b border-ink text-soft">
            {columns.map(({ id, label, dimension }) => (
              <th key={id} scope="col" className="py-1 pr-4 text-sm font-medium whitespace-nowrap">
                {label} {dimension && <span className="font-normal">{SHOWN_UNIT[system][dimension]}</span>}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {passes.map((pass, index) => (
            <tr key={index} className="border-b border-hair last:border-b-0">
              {columns.map((column) => (
                <td key={column.id} className="py-1 pr-4 whitespace-nowrap">
                  {cellText(pass, column, system)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
