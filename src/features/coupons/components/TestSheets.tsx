import { Plus, X } from 'lucide-react'
import { use } from 'react'
import { BESIDE_BEND, BESIDE_HARDNESS } from '@shared/calculations/beside.ts'
import type { BendTest, NdtTest } from '@shared/schemas/welding.ts'
import { formatQuantity } from '@shared/units/format.ts'
import { Button } from '@/components/Button.tsx'
import { QuantityField } from '@/components/fields/quantity.tsx'
import { Checkbox, Select } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { inputId, useSheet } from '@/components/variables/context.ts'
import { VerdictMark } from '@/components/Verdict.tsx'
import { WorkItOut } from '@/components/work-it-out/WorkItOut.tsx'
import { newBend, newHardness, newMacro, newNdt, newTension, newToughness, type BendKind } from '../content.ts'
import { useCouponContent, useList, type Listed as ListOf } from './coupon-sheet.ts'
import { BEND_KINDS, NDT_METHODS, TEST_FIELDS, type TestList } from './test-fields.ts'
import { JudgedContext, TestRow } from './TestRow.tsx'
import { VisualSheet } from './VisualSheet.tsx'

/** How many specimens the standard asks for, how many are recorded, and what may stand for them. */
export function SpecimensSheet() {
  const judged = use(JudgedContext)
  const rows = judged.flatMap(({ standard, specimens }) => specimens.map((row) => ({ ...row, standard })))
  return (
    <Sheet id="specimens" title="Specimens asked for" aside={rows.length === 0 ? undefined : `${rows.filter(({ recorded, required }) => recorded >= required).length} of ${rows.length} complete`}>
      {rows.length === 0 ? (
        <p className="px-4 py-3 text-soft">Which specimens are asked for follows from the joint and the thickness of the coupon. State both, and they are listed here.</p>
      ) : (
        <ul>
          {rows.map(({ standard, kind, label, required, recorded, alternative, clause, basis }) => (
            <li key={`${standard} ${kind}`} className="sheet-row grid grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-4 border-b border-hair px-4 py-2.5 last:border-b-0 sm:grid-cols-[12rem_6rem_minmax(0,1fr)_auto]">
              <p className="font-medium">
                <VerdictMark verdict={recorded >= required ? 'within' : 'cannot-tell'} className="mr-2 size-2.5" />
                {label}
              </p>
              <p className="whitespace-nowrap">
                <strong className="font-narrow text-xl font-semibold tabular-nums">{recorded}</strong> <span className="text-soft">of {required}</span>
              </p>
              <p className="text-sm text-soft max-sm:col-span-2">
                {alternative}
                {basis === 'memory' && ' From memory: confirm in your edition.'}
              </p>
              <p className="font-narrow font-medium text-soft max-sm:hidden">{clause}</p>
            </li>
          ))}
        </ul>
      )}
    </Sheet>
  )
}

const PLACE = { weld: 'Weld', 'heat-affected-zone': 'HAZ', 'base-metal': 'Base' } as const

/** What is examined before specimens are cut, then tension, bends and the tests that only some coupons have. */
export function TestSheets() {
  const { control } = useSheet()
  const content = useCouponContent()
  const shows = (list: TestList) => control !== null || (content[list] ?? []).length > 0
  return (
    <>
      <VisualSheet />
      {shows('ndt') && <NdtSheet />}
      {shows('tension') && <Listed list="tension" title="Tension" add="Tension specimen" fresh={newTension} mark={({ specimen }) => specimen} empty="Size, greatest load and where it broke; the stress is computed and judged at once." />}
      {shows('bends') && <BendSheet />}
      {shows('macros') && <Listed list="macros" title="Macro sections" add="Macro section" fresh={newMacro} mark={({ specimen }) => specimen} empty="Asked of fillet coupons: fusion, cracks and the two legs." />}
      {shows('toughness') && <Listed list="toughness" title="Toughness" add="Set of impact specimens" fresh={newToughness} mark={({ place }) => PLACE[place]} empty="Asked where the weld needs toughness: three values a set, in the weld and in the heat-affected zone." />}
      {shows('hardness') && <Listed list="hardness" title="Hardness" add="Row of indentations" fresh={newHardness} mark={({ place }) => PLACE[place]} empty="Asked by some standards and contracts: Vickers figures by place." />}
    </>
  )
}

type ItemOf<L extends TestList> = ListOf<L>[number]
interface ListedProps<L extends TestList> {
  list: L
  title: string
  add: string
  empty: string
  fresh: (items: ListOf<L>) => ItemOf<L>
  mark: (item: ItemOf<L>) => string
}

function Listed<L extends Exclude<TestList, 'bends' | 'ndt'>>(props: ListedProps<L>) {
  const { control } = useSheet()
  const content = useCouponContent()
  const items: readonly ItemOf<L>[] = content[props.list]
  return (
    <Sheet id={props.list} title={props.title} aside={count(items.length)}>
      {control ? (
        <ListedTyped {...props} />
      ) : (
        items.map((item, index) => <TestRow key={item.id} fields={TEST_FIELDS[props.list]} path={`${props.list}.${index}`} test={item} mark={props.mark(item)} />)
      )}
    </Sheet>
  )
}

const count = (length: number) => (length === 0 ? 'none recorded' : `${length} recorded`)

function ListedTyped<L extends Exclude<TestList, 'bends' | 'ndt'>>({ list, add, empty, fresh, mark }: ListedProps<L>) {
  const { items, put, change, remove, error } = useList(list)
  const rows: readonly ItemOf<L>[] = items
  return (
    <div id={inputId(list)} tabIndex={-1}>
      {rows.map((item, index) => (
        <TestRow key={item.id} fields={TEST_FIELDS[list]} path={`${list}.${index}`} test={item} mark={mark(item)} onChange={(part) => change(index, part as Partial<ItemOf<L>>)} onRemove={() => remove(index)}>
          {list === 'hardness' && 'scale' in item && <HardnessWork values={item.values} mark={mark(item)} />}
        </TestRow>
      ))}
      <Foot error={error} empty={rows.length === 0 ? empty : null}>
        <Button icon={<Plus size={15} aria-hidden="true" />} onClick={() => put([...rows, fresh(items)] as typeof items)}>
          {add}
        </Button>
      </Foot>
    </div>
  )
}

function Foot({ error, empty, children }: { error: string | null; empty: string | null; children: React.ReactNode }) {
  return (
    <>
      {error && (
        <p role="alert" className="px-4 pt-2 text-sm font-medium text-oxide">
          {error}
        </p>
      )}
      <div className="no-print flex flex-wrap items-center gap-2 px-4 py-3 max-sm:[&_button]:min-h-12">
        {children}
        {empty && <p className="max-w-prose text-sm text-soft">{empty}</p>}
      </div>
    </>
  )
}

/** Non-destructive examinations, a button for each method. */
function NdtSheet() {
  const { control } = useSheet()
  const { ndt = [] } = useCouponContent()
  return (
    <Sheet id="ndt" title="Non-destructive testing" aside={count(ndt.length)}>
      {control ? <NdtTyped /> : ndt.map((test, index) => <TestRow key={test.id} fields={TEST_FIELDS.ndt} path={`ndt.${index}`} test={test} mark={test.method} />)}
    </Sheet>
  )
}

function NdtTyped() {
  const { items, put, change, remove, error } = useList('ndt')
  return (
    <div id={inputId('ndt')} tabIndex={-1}>
      {items.map((test, index) => (
        <TestRow key={test.id} fields={TEST_FIELDS.ndt} path={`ndt.${index}`} test={test} mark={test.method} onChange={(part) => change(index, part)} onRemove={() => remove(index)} />
      ))}
      <Foot error={error} empty={items.length === 0 ? 'ISO 15614 asks for visual, surface and volumetric testing; AWS D1.1 for radiography or ultrasonics of a complete-penetration groove.' : null}>
        {NDT_METHODS.map(({ value, label }) => (
          <Button key={value} icon={<Plus size={15} aria-hidden="true" />} onClick={() => put([...items, newNdt(value as NdtTest['method'])])}>
            {label}
          </Button>
        ))}
      </Foot>
    </div>
  )
}

/** The largest former that the metals allow, and the strain over the one that was used. */
function BendWork({ bend }: { bend: BendTest }) {
  const { content, system } = useSheet()
  return <WorkItOut what={`former of ${bend.specimen}`} calculators={BESIDE_BEND} record={{ variables: content.variables, bend }} blockIndex={null} system={system} of="coupon" />
}

/** Vickers figures in other scales, for whoever asks in them. */
function HardnessWork({ values, mark }: { values: readonly number[]; mark: string }) {
  const { content, system } = useSheet()
  return <WorkItOut what={`hardness of the ${mark.toLowerCase()}`} calculators={BESIDE_HARDNESS} record={{ variables: content.variables, hardness: { values } }} blockIndex={null} system={system} of="coupon" />
}

function BendSheet() {
  const { control } = useSheet()
  const { bends } = useCouponContent()
  return (
    <Sheet id="bends" title="Bends" aside={count(bends.length)}>
      {control ? <BendsTyped /> : bends.map((bend, index) => <TestRow key={bend.id} fields={TEST_FIELDS.bends} path={`bends.${index}`} test={bend} mark={bend.specimen}><OpeningsRead openings={bend.openings} /></TestRow>)}
    </Sheet>
  )
}

function BendsTyped() {
  const { items, put, change, remove, error } = useList('bends')
  const judged = use(JudgedContext)
  // Offered first: what is asked for and not yet recorded.
  const wanted = new Set(judged.flatMap(({ specimens }) => specimens).filter(({ kind }) => kind.endsWith('-bend')).map(({ kind }) => kind.replace('-bend', '')))
  const kinds = BEND_KINDS.filter(({ value }) => (wanted.size > 0 ? wanted.has(value) || value === 'side' : !value.startsWith('long')))
  return (
    <div id={inputId('bends')} tabIndex={-1}>
      {items.map((bend, index) => (
        <TestRow key={bend.id} fields={TEST_FIELDS.bends} path={`bends.${index}`} test={bend} mark={bend.specimen} onChange={(part) => change(index, part)} onRemove={() => remove(index)}>
          <Openings bend={bend} onChange={(openings) => change(index, { openings })} />
          <BendWork bend={bend} />
        </TestRow>
      ))}
      <Foot error={error} empty={items.length === 0 ? 'Each opening on the convex face is measured; one at a corner is told apart, as it may not count.' : null}>
        {kinds.map(({ value, label }) => (
          <Button key={value} icon={<Plus size={15} aria-hidden="true" />} onClick={() => put([...items, newBend(items, value as BendKind)])}>
            {label} bend
          </Button>
        ))}
      </Foot>
    </div>
  )
}

type Opening = BendTest['openings'][number]
const FLAW = [
  { value: 'yes', label: 'From an internal flaw' },
  { value: 'no', label: 'Not from an internal flaw' },
]

function Openings({ bend, onChange }: { bend: BendTest; onChange: (openings: Opening[]) => void }) {
  const { system } = useSheet()
  const change = (index: number, part: Partial<Opening>) => onChange(bend.openings.map((one, at) => (at === index ? { ...one, ...part } : one)))
  return (
    <fieldset className="space-y-1.5 border-l-2 border-rule pl-3">
      <legend className="sr-only">Openings of {bend.specimen}</legend>
      {bend.openings.map((opening, index) => (
        <div key={index} className="flex flex-wrap items-center gap-x-3 gap-y-1.5">
          <QuantityField className="w-28" label={`Opening ${index + 1} of ${bend.specimen}`} labelHidden dimension="length" system={system} value={opening.size} onChange={(size) => (size ? change(index, { size }) : onChange(bend.openings.filter((_one, at) => at !== index)))} />
          <Checkbox label="at a corner" checked={opening.corner} onChange={(event) => change(index, { corner: event.target.checked })} />
          {opening.corner && <Select className="w-56" label={`Where opening ${index + 1} comes from`} labelHidden options={FLAW} empty="Cause not stated" value={opening.fromInternalFlaw === null ? '' : opening.fromInternalFlaw ? 'yes' : 'no'} onChange={(event) => change(index, { fromInternalFlaw: event.target.value === '' ? null : event.target.value === 'yes' })} />}
          <button type="button" aria-label={`Remove opening ${index + 1} of ${bend.specimen}`} className="flex size-8 items-center justify-center rounded text-soft hover:text-ink" onClick={() => onChange(bend.openings.filter((_one, at) => at !== index))}>
            <X size={14} aria-hidden="true" />
          </button>
        </div>
      ))}
      {bend.openings.length < 40 && (
        <div className="flex flex-wrap items-center gap-x-3">
          <QuantityField key={bend.openings.length} className="w-28" label={`Another opening of ${bend.specimen}`} labelHidden placeholder={system === 'SI' ? 'e.g. 1.5' : 'e.g. 1/16'} dimension="length" system={system} value={null} onChange={(size) => size && onChange([...bend.openings, { size, corner: false, fromInternalFlaw: null }])} />
          <p className="text-sm text-soft">{bend.openings.length === 0 ? 'Size of an opening, if there is one' : 'another opening'}</p>
        </div>
      )}
    </fieldset>
  )
}

function OpeningsRead({ openings }: { openings: readonly Opening[] }) {
  const { system } = useSheet()
  return <p className="text-soft">{openings.length === 0 ? 'No opening.' : openings.map(({ size, corner, fromInternalFlaw }) => `${formatQuantity(size, 'length', system).text}${corner ? ' at a corner' : ''}${fromInternalFlaw ? ', from an internal flaw' : ''}`).join('; ')}</p>
}
