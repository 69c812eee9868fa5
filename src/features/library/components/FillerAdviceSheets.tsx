import { useMemo, useState } from 'react'
import { Link } from 'react-router-dom'
import { toBaseMetal } from '@shared/library/base-metals.ts'
import { fillerAdvice, fillerCare, suitableFillers } from '@shared/library/filler-advice.ts'
import { toFiller } from '@shared/library/filler-metals.ts'
import { readProcess } from '@shared/library/processes.ts'
import { baseMetalRowSchema, fillerRowSchema, type FillerRow } from '@shared/library/rows.ts'
import { processSchema, type Process } from '@shared/schemas/welding.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import { Remarks, RemarkWord } from '@/components/advice/Advice.tsx'
import { ComboBox, type ComboItem } from '@/components/fields/ComboBox.tsx'
import { Select } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { PROCESS_OPTIONS } from '@/components/variables/options.ts'
import { useUnits } from '@/hooks/units.ts'
import { searchLibrary } from '@/lib/library-search.ts'
import { BASIS_WORD } from '../columns.tsx'

type Picked = ComboItem<Record<string, unknown>>
const search = searchLibrary('base-metals')

/** A base metal chosen to ask about. */
function MetalPick({ label, description, picked, onPick }: { label: string; description?: string; picked: Picked | null; onPick: (item: Picked | null) => void }) {
  return <ComboBox className="max-w-md" label={label} description={description} text={picked?.title ?? ''} queryKey="base-metals" load={search} placeholder="Grade, specification, UNS or P-Number" onPick={(item) => onPick(item)} />
}

/** What to mind of a filler by itself, and how it stands to a pair of metals. */
export function FillerSheets({ item }: { item: LibraryItem }) {
  const [a, setA] = useState<Picked | null>(null)
  const [b, setB] = useState<Picked | null>(null)
  const row = useMemo(() => fillerRowSchema.parse(item.content), [item.content])
  const filler = toFiller(row)
  const process = row.processes.map((name) => readProcess(name)?.process ?? null).find((one) => one !== null) ?? null
  const library = { filler: (id: string) => (id === row.id ? row : null), metal: (id: string) => [a, b].flatMap((one) => (one ? [baseMetalRowSchema.parse(one.data)] : [])).find((one) => one.id === id) ?? null }
  const care = fillerCare(filler, process, library)
  const advice = a && fillerAdvice({ a: toBaseMetal(a.data), b: toBaseMetal((b ?? a).data), filler, process, library })
  const fit = advice?.remarks.filter(({ id }) => !care.some((remark) => remark.id === id))
  return (
    <>
      {care.length > 0 && (
        <Sheet id="care" title="To mind">
          <div className="px-4 py-1">
            <Remarks remarks={care} />
          </div>
        </Sheet>
      )}
      <Sheet id="advice" title="Does it suit?" aside={advice && <RemarkWord kind={advice.verdict} />}>
        <div className="grid gap-4 px-4 py-4 md:grid-cols-2">
          <MetalPick label="Base metal" picked={a} onPick={setA} />
          {a && <MetalPick label="To another base metal" picked={b} onPick={setB} />}
        </div>
        <div className="border-t border-hair px-4 py-1" aria-live="polite">
          {fit ? <Remarks remarks={fit} /> : <p className="py-2 text-soft">Pick a base metal, or two that are joined, and alloy and strength are compared. What no source says is told as “cannot tell”.</p>}
        </div>
      </Sheet>
    </>
  )
}

interface Named { text: string; source: string; rows: FillerRow[] }

/** Rows by the reason for which they suit, in the order in which the reasons come. */
function byReason(found: ReturnType<typeof suitableFillers>): Named[] {
  const groups = new Map<string, Named>()
  for (const { row, advice } of found) {
    const why = advice.remarks.find(({ kind, id }) => kind === 'suits' && id !== 'strength')
    if (!why) continue
    // The filler's own name begins some sentences; what follows is the reason.
    const text = why.text.startsWith(row.classification) ? why.text.slice(row.classification.length).trim() : why.text
    const key = `${why.id} ${why.id === 'alloy' ? '' : text}`
    const group = groups.get(key) ?? { text: why.id === 'alloy' ? 'Hold no less Cr, Ni and Mo than the metals; the nearest first.' : text, source: `${why.source} · ${BASIS_WORD[why.basis] ?? why.basis}`, rows: [] }
    group.rows.push(row)
    groups.set(key, group)
  }
  return [...groups.values()]
}

/** The reference’s fillers that suit a base metal, by itself or joined to another. */
export function SuitableSheet({ item }: { item: LibraryItem }) {
  const { stored } = useUnits()
  const [process, setProcess] = useState<Process | null>(null)
  const [b, setB] = useState<Picked | null>(null)
  const found = useMemo(() => {
    const metal = toBaseMetal(item.content)
    return suitableFillers(metal, b ? toBaseMetal(b.data) : metal, process)
  }, [item.content, b, process])
  return (
    <Sheet id="fillers" title="Fillers that suit" aside={found.length > 0 ? found.length : undefined}>
      <div className="grid gap-4 px-4 py-4 sm:grid-cols-2">
        <MetalPick label="Joined to another metal" description="Left empty: to itself." picked={b} onPick={setB} />
        <Select label="Process" empty="Every process" options={PROCESS_OPTIONS.filter(({ value }) => value !== 'OTHER')} value={process ?? ''} onChange={(event) => setProcess(processSchema.safeParse(event.target.value).data ?? null)} />
      </div>
      <div className="border-t border-hair px-4 py-1" aria-live="polite">
        {found.length === 0 && <p className="py-2 text-soft">Cannot tell: no source kept here names a filler for {b ? `${item.title} to ${b.title}` : 'this metal'}{process ? ` by ${process}` : ''}.</p>}
        {byReason(found).map(({ text, source, rows }) => (
          <section key={text} className="border-b border-hair py-2.5 last:border-b-0">
            <p>{text}</p>
            <p className="text-xs text-soft">{source}</p>
            <ul className="mt-1.5 grid grid-cols-[repeat(auto-fill,minmax(10.5rem,1fr))] gap-x-4">
              {rows.map((row) => (
                <li key={row.id} className="flex items-baseline justify-between gap-2 py-0.5">
                  <Link to={`/library/filler-metals?q=${encodeURIComponent(row.classification)}`} className="text-link font-semibold">
                    {row.classification}
                  </Link>
                  <span className="text-sm whitespace-nowrap text-soft">{row.min_tensile_mpa === null ? 'not set' : stored(row.min_tensile_mpa, 'stress')}</span>
                </li>
              ))}
            </ul>
          </section>
        ))}
        {found.length > 0 && <p className="py-2 text-sm text-soft">With the minimum strength of the weld metal; undermatching fillers are left out. Fillers of which nothing is said here may suit as well.</p>}
      </div>
    </Sheet>
  )
}
