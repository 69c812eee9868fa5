import type { Interval, Quantity } from '@shared/schemas/common.ts'
import type { Position, ProcessBlock } from '@shared/schemas/welding.ts'
import { formatQuantity } from '@shared/units/format.ts'
import { parseQuantity } from '@shared/units/parse.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { useState } from 'react'
import { ObservedField } from '@/components/fields/observed.tsx'
import { useJointField } from '@/components/joint/live.tsx'
import { IntervalField, QuantityField } from '@/components/fields/quantity.tsx'
import { Select, TagPicker, TextArea, TextField } from '@/components/fields/text.tsx'
import type { PairOf, RowSpec } from './row-spec.ts'
import { inputId, useSheet, useSheetField } from './context.ts'
import { FillerEditor } from './FillerEditor.tsx'
import { GasEditor } from './GasEditor.tsx'
import { HeatNumberEditor } from './HeatNumber.tsx'
import { MetalEditor } from './MetalEditor.tsx'
import { positionsFor } from './options.ts'
import { PanelEditor } from './PanelEditor.tsx'
import { PassGrid } from './PassGrid.tsx'

type Of<K extends RowSpec['kind']> = Extract<RowSpec, { kind: K }>
const orNull = (text: string) => (text === '' ? null : text)

/** The input of a row, by its kind. */
export function Editor({ spec, path, prefix, block }: { spec: RowSpec; path: string; prefix: string; block: ProcessBlock | null }) {
  const lead = block?.process ? `${block.process}: ` : ''
  const label = `${lead}${spec.label}`
  switch (spec.kind) {
    case 'interval':
      return <IntervalEditor spec={spec} path={path} label={label} />
    case 'quantity':
      return <QuantityEditor dimension={spec.dimension} path={path} label={label} />
    case 'choice':
      return <ChoiceEditor spec={spec} path={path} label={label} />
    case 'flag':
      return <FlagEditor path={path} label={label} />
    case 'text':
    case 'paragraph':
      if (path.endsWith('filler.lot')) return <HeatNumberEditor path={path} label={label} max={spec.max} />
      return <TextEditor spec={spec} path={path} label={label} />
    case 'whole':
      return <WholeEditor min={spec.min} max={spec.max} path={path} label={label} />
    case 'pair':
      return (
        <div className={`grid grid-cols-2 gap-2 ${spec.of.kind === 'flag' ? 'sm:max-w-72' : ''}`}>
          {spec.paths.map((one, index) => (
            <HalfEditor key={one} of={spec.of} path={`${prefix}${one}`} label={`${label}, ${index === 0 ? 'A' : 'B'}`} />
          ))}
        </div>
      )
    case 'sizes':
      return <SizesEditor path={path} label={label} />
    case 'positions':
      return <PositionsEditor path={path} label={label} />
    case 'metal':
      return <MetalEditor path={path} label={spec.label} />
    case 'filler':
      return <FillerEditor path={path} label={label} process={block?.process ?? null} />
    case 'gas':
      return <GasEditor path={path} label={label} />
    case 'panel':
      return <PanelEditor path={path} label={label} />
    case 'passes':
      return <PassGrid path={path} label={label} />
  }
}

/** One of the two values of a pair. */
function HalfEditor({ of, path, label }: { of: PairOf; path: string; label: string }) {
  switch (of.kind) {
    case 'whole':
      return <WholeEditor min={of.min} max={of.max} path={path} label={label} />
    case 'quantity':
      return <QuantityEditor dimension={of.dimension} path={path} label={label} />
    case 'flag':
      return <FlagEditor path={path} label={label} />
    case 'text':
      return path.endsWith('.heatNumber') ? <HeatNumberEditor path={path} label={label} max={of.max} /> : <TextEditor spec={{ kind: 'text', max: of.max }} path={path} label={label} />
  }
}

/** What a procedure asks goes from one figure to another; what was measured on a coupon is one figure. */
function IntervalEditor({ spec, path, label }: { spec: Of<'interval'>; path: string; label: string }) {
  const { system, record } = useSheet()
  const { value, set, error } = useSheetField<Interval | null>(`variables.${path}`)
  const joint = useJointField(path)
  const shown = joint.dragged ? joint.dragged.value : value
  const shared = { id: inputId(path), label, labelHidden: true, dimension: spec.dimension, system, value: shown, onChange: set, error: error ?? joint.problem, onTyping: joint.typing }
  return (
    <div className={`rounded ${joint.hot ? 'outline-offset-2 outline-steel not-focus-within:outline-2' : ''}`} onFocus={joint.enter} onBlur={joint.leave}>
      {record === 'coupon' ? <ObservedField {...shared} className="sm:max-w-52" /> : <IntervalField {...shared} allowAll={spec.allMeans !== undefined} allMeans={spec.allMeans} />}
    </div>
  )
}

function QuantityEditor({ dimension, path, label }: { dimension: Dimension; path: string; label: string }) {
  const { system } = useSheet()
  const { value, set, error } = useSheetField<Quantity | null>(`variables.${path}`)
  return <QuantityField id={inputId(path)} label={label} labelHidden dimension={dimension} system={system} value={value} onChange={set} error={error} />
}

function ChoiceEditor({ spec, path, label }: { spec: Of<'choice'>; path: string; label: string }) {
  const { value, set, error, onBlur } = useSheetField<string | null>(`variables.${path}`)
  const { problem } = useJointField(path)
  return <Select id={inputId(path)} label={label} labelHidden options={spec.options} {...(spec.always ? {} : { empty: spec.none ?? 'Not stated' })} value={value ?? ''} onChange={(event) => set(orNull(event.target.value))} onBlur={onBlur} error={error ?? problem} />
}

const YES_NO = [
  { value: 'yes', label: 'Yes' },
  { value: 'no', label: 'No' },
]
function FlagEditor({ path, label }: { path: string; label: string }) {
  const { value, set, error, onBlur } = useSheetField<boolean | null>(`variables.${path}`)
  return <Select id={inputId(path)} label={label} labelHidden options={YES_NO} empty="Not stated" value={value === null ? '' : value ? 'yes' : 'no'} onChange={(event) => set(event.target.value === '' ? null : event.target.value === 'yes')} onBlur={onBlur} error={error} />
}

function TextEditor({ spec, path, label }: { spec: Pick<Of<'text'>, 'kind' | 'max' | 'example'> | Pick<Of<'paragraph'>, 'kind' | 'max' | 'example'>; path: string; label: string }) {
  const { value, set, error, onBlur } = useSheetField<string | null>(`variables.${path}`)
  const shared = { id: inputId(path), label, labelHidden: true, maxLength: spec.max, placeholder: spec.example && `e.g. ${spec.example}`, value: value ?? '', onBlur, error }
  return spec.kind === 'text' ? <TextField {...shared} onChange={(event) => set(orNull(event.target.value))} /> : <TextArea {...shared} rows={2} onChange={(event) => set(orNull(event.target.value))} />
}

function WholeEditor({ min, max, path, label }: { min: number; max: number; path: string; label: string }) {
  const { value, set, error, onBlur } = useSheetField<number | null>(`variables.${path}`)
  const [unread, setUnread] = useState<string | null>(null)
  const [seen, setSeen] = useState(value)
  if (seen !== value) {
    setSeen(value)
    setUnread(null)
  }
  const read = (text: string) => {
    if (text.trim() === '') {
      setUnread(null)
      return set(null)
    }
    const number = Number(text)
    if (Number.isInteger(number) && number >= min && number <= max) {
      setUnread(null)
      return set(number)
    }
    setUnread(text)
  }
  const wrong = unread === null ? error : `${label}: "${unread}" is not a whole number from ${min} to ${max}.`
  return <TextField id={inputId(path)} label={label} labelHidden inputMode="numeric" value={unread ?? value ?? ''} onChange={(event) => read(event.target.value)} onBlur={onBlur} error={wrong} />
}

const sizesText = (sizes: readonly Quantity[], system: UnitSystem) => sizes.map((size) => formatQuantity(size, 'length', system).text).join(', ')

/** Filler sizes, several in one box: `.035, 1.2 mm`. */
function SizesEditor({ path, label }: { path: string; label: string }) {
  const { system } = useSheet()
  const { value, set, error } = useSheetField<Quantity[]>(`variables.${path}`)
  const shown = sizesText(value, system)
  const [text, setText] = useState(shown)
  const [seen, setSeen] = useState(shown)
  const [unread, setUnread] = useState<string | null>(null)
  if (seen !== shown) {
    setSeen(shown)
    setText(shown)
    setUnread(null)
  }
  const read = () => {
    if (text === shown) return
    const parts = text.split(/[;,](?=\s|$)|;/).map((part) => part.trim()).filter(Boolean)
    const readings = parts.map((part) => parseQuantity(part, 'length', system))
    const bad = readings.find((reading) => !reading.ok)
    if (bad && !bad.ok) return setUnread(bad.message)
    if (parts.length > 8) return setUnread(`${label}: at most 8 sizes; ${parts.length} are written.`)
    setUnread(null)
    set(readings.flatMap((reading) => (reading.ok ? [reading.quantity] : [])))
  }
  return <TextField id={inputId(path)} label={label} labelHidden autoComplete="off" value={text} onChange={(event) => setText(event.target.value)} onBlur={read} onKeyDown={(event) => event.key === 'Enter' && read()} error={unread ?? error} />
}

function PositionsEditor({ path, label }: { path: string; label: string }) {
  const { content } = useSheet()
  const { value, set, error } = useSheetField<Position[]>(`variables.${path}`)
  const { joint, product } = content.variables
  return (
    <div id={inputId(path)} tabIndex={-1}>
      <TagPicker label={label} labelHidden options={positionsFor(joint.weld, product, value)} value={value} onChange={set} error={error} />
    </div>
  )
}
