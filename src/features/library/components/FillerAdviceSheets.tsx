import { useMemo, useState } from 'react'
import { Link } from 'react-router-dom'
import { baseMetalTitle, toBaseMetal } from '@shared/library/base-metals.ts'
import { fillerAdvice, fillerCare, suitableFillers } from '@shared/library/filler-advice.ts'
import { toFiller } from '@shared/library/filler-metals.ts'
import { readProcess } from '@shared/library/processes.ts'
import { baseMetalRowSchema, fillerRowSchema } from '@shared/library/rows.ts'
import { processSchema, type Process } from '@shared/schemas/welding.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import { Remarks, RemarkWord } from '@/components/advice/Advice.tsx'
import { ComboBox, type ComboItem } from '@/components/fields/ComboBox.tsx'
import { Select } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { PROCESS_OPTIONS } from '@/components/variables/options.ts'
import { useUnits } from '@/hooks/units.ts'
import { searchLibrary } from '@/lib/library-search.ts'

type Picked = ComboItem<Record<string, unknown>>
const search = searchLibrary('base-metals')
const MOST = 12

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

/** The reference’s fillers that suit a base metal, by itself or joined to another. */
export function SuitableSheet({ item }: { item: LibraryItem }) {
  const { stored } = useUnits()
  const [process, setProcess] = useState<Process | null>(null)
  const [b, setB] = useState<Picked | null>(null)
  const [all, setAll] = useState(false)
  const found = useMemo(() => {
    const metal = toBaseMetal(item.content)
    return suitableFillers(metal, b ? toBaseMetal(b.data) : metal, process)
  }, [item.content, b, process])
  const shown = all ? found : found.slice(0, MOST)
  return (
    <Sheet id="fillers" title="Fillers that suit" aside={found.length > 0 ? found.length : undefined}>
      <div className="grid gap-4 px-4 py-4 sm:grid-cols-2">
        <MetalPick label="Joined to another metal" description="Left empty: to itself." picked={b} onPick={setB} />
        <Select label="Process" empty="Every process" options={PROCESS_OPTIONS.filter(({ value }) => value !== 'OTHER')} value={process ?? ''} onChange={(event) => setProcess(processSchema.safeParse(event.target.value).data ?? null)} />
      </div>
      <div className="border-t border-hair px-4 py-1" aria-live="polite">
        {found.length === 0 && <p className="py-2 text-soft">Cannot tell: no source kept here names a filler for {b ? `${baseMetalTitle(baseMetalRowSchema.parse(item.content))} to ${b.title}` : 'this metal'}{process ? ` by ${process}` : ''}.</p>}
        <ul>
          {shown.map(({ row, advice }) => {
            const [why] = advice.remarks.filter(({ kind }) => kind === 'suits')
            return (
              <li key={row.id} className="grid gap-x-4 border-b border-hair py-2 last:border-b-0 sm:grid-cols-[11rem_minmax(0,1fr)_auto]">
                <Link to={`/library/filler-metals?q=${encodeURIComponent(row.classification)}`} className="text-link font-semibold">
                  {row.classification}
                </Link>
                <span className="min-w-0">
                  {why?.text} <span className="text-xs text-soft">{why && `${why.source} · ${why.basis === 'memory' ? 'from memory' : why.basis.replace('-', ' ')}`}</span>
                </span>
                <span className="whitespace-nowrap text-soft">{row.min_tensile_mpa === null ? 'strength not set' : stored(row.min_tensile_mpa, 'stress')}</span>
              </li>
            )
          })}
        </ul>
        {found.length > shown.length && (
          <button type="button" className="text-link my-2" onClick={() => setAll(true)}>
            Show all {found.length}
          </button>
        )}
      </div>
    </Sheet>
  )
}
