import { columnVisibilityFeature, createColumnHelper, tableFeatures, useTable } from '@tanstack/react-table'
import { ArrowDown, ArrowUp, Columns3 } from 'lucide-react'
import { useMemo, useRef, type KeyboardEvent, type MouseEvent, type ReactNode } from 'react'
import { Button as AriaButton, Dialog, DialogTrigger, Popover } from 'react-aria-components'
import { Link, useNavigate } from 'react-router-dom'
import { useRemembered } from '@/hooks/remembered.ts'
import { Button, buttonClass } from './Button.tsx'
import { Checkbox } from './fields/text.tsx'

export interface Column<Row> {
  id: string
  header: string
  cell: (row: Row) => ReactNode
  /** Name under which the list can be sorted by this column. */
  sort?: string
  /** Figures stand right. */
  align?: 'left' | 'right'
  /** Hidden until chosen. */
  hidden?: boolean
  /** Always shown; the first column always is. */
  fixed?: boolean
  /** Left out between a phone and a desk, where every column would be squeezed. */
  wideOnly?: boolean
  /** Classes of the cell, e.g. a width. */
  className?: string
}

export interface DataTableProps<Row> {
  /** What the table lists, for readers: "Procedures". */
  caption: string
  columns: readonly Column<Row>[]
  rows: readonly Row[]
  rowKey: (row: Row) => string
  /** Where a row leads; its first cell becomes the link. */
  rowHref?: (row: Row) => string
  /** As the API takes it: `number`, `-updatedAt`. */
  sort?: string
  onSort?: (sort: string) => void
  /** Remembers the chosen columns on this device. */
  storageKey?: string
  /** Total behind the pages, and the way to the next. */
  total?: number
  onMore?: (() => void) | undefined
  loadingMore?: boolean
}

const features = tableFeatures({ columnVisibilityFeature })
const isVisibility = (value: unknown): value is Record<string, boolean> => typeof value === 'object' && value !== null && Object.values(value).every((shown) => typeof shown === 'boolean')

/**
 * A list as ruled rows: sorting, column choice, arrow keys between rows, Enter opens. On a phone each row stacks,
 * first cell as its head, the others labelled.
 */
export function DataTable<Row extends object>({ caption, columns, rows, rowKey, rowHref, sort, onSort, storageKey, total, onMore, loadingMore }: DataTableProps<Row>) {
  const navigate = useNavigate()
  const body = useRef<HTMLTableSectionElement>(null)
  const initial = Object.fromEntries(columns.filter((column) => column.hidden).map((column) => [column.id, false]))
  const [visibility, setVisibility] = useRemembered(storageKey && `columns.${storageKey}`, initial, isVisibility)
  const helper = useMemo(() => createColumnHelper<typeof features, Row>(), [])
  const definitions = useMemo(
    () => helper.columns(columns.map((column) => helper.display({ id: column.id, header: column.header, cell: ({ row }) => column.cell(row.original), enableHiding: !column.fixed }))),
    [helper, columns],
  )
  const table = useTable({
    features,
    columns: definitions,
    data: rows,
    getRowId: rowKey,
    state: { columnVisibility: visibility },
    onColumnVisibilityChange: (next) => setVisibility(typeof next === 'function' ? next(visibility) : next),
  })
  const byId = new Map(columns.map((column) => [column.id, column]))
  const shown = table
    .getVisibleLeafColumns()
    .map((column) => byId.get(column.id))
    .filter((column) => column !== undefined)
  const first = shown[0]?.id
  const hideable = columns.filter((column, index) => index > 0 && !column.fixed)

  const move = (event: KeyboardEvent) => {
    const links = [...(body.current?.querySelectorAll<HTMLElement>('[data-row-link]') ?? [])]
    const at = links.findIndex((link) => link === document.activeElement)
    const target = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: links.length - 1 }[event.key]
    if (at < 0 || target === undefined) return
    event.preventDefault()
    links[Math.max(0, Math.min(target, links.length - 1))]?.focus()
  }
  const open = (event: MouseEvent, row: Row) => {
    if (!rowHref || (event.target as HTMLElement).closest('a, button, input, select, label, summary')) return
    if (window.getSelection()?.toString()) return
    void navigate(rowHref(row))
  }

  return (
    <div>
      <div className="relative border border-rule bg-sheet max-md:border-x-0">
        {hideable.length > 0 && <ColumnChoice columns={hideable} visibility={visibility} onChange={setVisibility} />}
        <div className="md:overflow-x-auto">
          <table role="table" aria-label={caption} className="w-full border-collapse text-left max-md:block">
            <thead role="rowgroup" className="max-md:sr-only">
              <tr role="row" className="border-b border-ink">
                {shown.map((column) => (
                  <Heading key={column.id} column={column} sort={sort} onSort={onSort} last={column === shown.at(-1) && hideable.length > 0} />
                ))}
              </tr>
            </thead>
            <tbody ref={body} role="rowgroup" className="max-md:block" onKeyDown={move}>
              {table.getRowModel().rows.map((row) => (
                <tr
                  key={row.id}
                  role="row"
                  onClick={(event) => open(event, row.original)}
                  className={`border-b border-hair last:border-b-0 max-md:block max-md:px-4 max-md:py-3 ${rowHref ? 'cursor-pointer hover:bg-paper' : ''}`}
                >
                  {row.getVisibleCells().map((cell) => {
                    const column = byId.get(cell.column.id)
                    const head = cell.column.id === first
                    return (
                      <td
                        key={cell.id}
                        role="cell"
                        className={`px-4 py-2.5 align-top max-md:px-0 ${head ? 'max-md:block max-md:pt-0 max-md:pb-1 max-md:text-lg' : 'max-md:flex max-md:items-baseline max-md:gap-3 max-md:py-0.5'} ${column?.align === 'right' ? 'md:text-right' : ''} ${column?.wideOnly ? 'md:max-xl:hidden' : ''} ${column?.className ?? ''}`}
                      >
                        {!head && (
                          <span className="w-28 shrink-0 text-sm text-soft md:hidden" aria-hidden="true">
                            {column?.header}
                          </span>
                        )}
                        <div className="min-w-0 grow">
                          {head && rowHref ? (
                            <Link to={rowHref(row.original)} data-row-link className="font-semibold hover:underline">
                              <table.FlexRender cell={cell} />
                            </Link>
                          ) : (
                            <table.FlexRender cell={cell} />
                          )}
                        </div>
                      </td>
                    )
                  })}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      </div>
      {(onMore || total !== undefined) && (
        <div className="no-print mt-3 flex items-center gap-4 text-soft">
          {onMore && (
            <Button onClick={onMore} pending={loadingMore}>
              Show more
            </Button>
          )}
          {total !== undefined && (
            <p>
              {rows.length} of {total}
            </p>
          )}
        </div>
      )}
    </div>
  )
}

function Heading<Row>({ column, sort, onSort, last }: { column: Column<Row>; sort: string | undefined; onSort: ((sort: string) => void) | undefined; last: boolean }) {
  const by = column.sort
  const up = by !== undefined && sort === by
  const down = by !== undefined && sort === `-${by}`
  const label = <span className="cell-label text-inherit!">{column.header}</span>
  return (
    <th
      role="columnheader"
      scope="col"
      aria-sort={up ? 'ascending' : down ? 'descending' : undefined}
      className={`px-4 py-2 align-bottom font-normal whitespace-nowrap ${up || down ? 'text-ink' : 'text-soft'} ${column.align === 'right' ? 'text-right' : ''} ${last ? 'pr-14' : ''} ${column.wideOnly ? 'md:max-xl:hidden' : ''}`}
    >
      {by && onSort ? (
        <button type="button" className="inline-flex items-center gap-1 hover:text-ink" onClick={() => onSort(up ? `-${by}` : by)}>
          {label}
          {up && <ArrowUp size={13} aria-hidden="true" />}
          {down && <ArrowDown size={13} aria-hidden="true" />}
        </button>
      ) : (
        label
      )}
    </th>
  )
}

function ColumnChoice<Row>({ columns, visibility, onChange }: { columns: readonly Column<Row>[]; visibility: Record<string, boolean>; onChange: (next: Record<string, boolean>) => void }) {
  return (
    <DialogTrigger>
      <AriaButton aria-label="Choose columns" className={buttonClass('secondary', 'no-print absolute top-0.5 right-1.5 z-10 min-h-8! border-transparent! px-2! max-md:hidden')}>
        <Columns3 size={16} aria-hidden="true" />
      </AriaButton>
      <Popover placement="bottom end" className="border border-ink bg-sheet px-4 py-3 text-ink">
        <Dialog aria-label="Columns" className="space-y-1.5 outline-none">
          <p className="cell-label">Columns</p>
          {columns.map((column) => (
            <Checkbox key={column.id} label={column.header} checked={visibility[column.id] !== false} onChange={(event) => onChange({ ...visibility, [column.id]: event.target.checked })} />
          ))}
        </Dialog>
      </Popover>
    </DialogTrigger>
  )
}
