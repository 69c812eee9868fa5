import { Plus, X } from 'lucide-react'
import { classifyGas, toGasMixture } from '@shared/library/gases.ts'
import type { Interval } from '@shared/schemas/common.ts'
import { GASES, gasMixtureSchema, type GasMixture } from '@shared/schemas/welding.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { Button } from '@/components/Button.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { ObservedField } from '@/components/fields/observed.tsx'
import { IntervalField } from '@/components/fields/quantity.tsx'
import { Select } from '@/components/fields/text.tsx'
import { searchLibrary } from '@/lib/library-search.ts'
import { inputId, useSheet, useSheetField } from './context.ts'
import { gasInWords } from './labels.ts'

const search = searchLibrary('gases')
const GAS_OPTIONS = GASES.map((value) => ({ value, label: value }))
type Component = GasMixture['components'][number]

/** A gas: a usual mixture from the library, or its parts by volume, with its flow. The ISO 14175 symbol follows from the parts. */
export function GasEditor({ path, label }: { path: string; label: string }) {
  const { system, record } = useSheet()
  const Flow = record === 'coupon' ? ObservedField : IntervalField
  const { value, set, error } = useSheetField<GasMixture | null>(`variables.${path}`)
  const gas = value ?? gasMixtureSchema.parse({})
  const classed = classifyGas(gas.components)
  const sum = gas.components.reduce((total, { percent }) => total + percent, 0)
  const parts = (components: Component[]) => {
    const symbol = classifyGas(components).symbol
    set({ ...gas, libraryId: null, components, isoSymbol: symbol, name: null })
  }
  const change = (index: number, part: Partial<Component>) => parts(gas.components.map((one, at) => (at === index ? { ...one, ...part } : one)))
  return (
    <div className="space-y-2">
      <div className="flex flex-wrap items-start gap-x-3 gap-y-2">
        <ComboBox
          id={inputId(path)}
          className="min-w-52 grow basis-52"
          label={label}
          labelHidden
          text={gasInWords(gas)}
          queryKey="gases"
          load={search}
          allowOwn
          placeholder="Mixture, e.g. argon 18 CO2, or none"
          error={error}
          onPick={(item, text) => set(item ? { ...toGasMixture(item.data), flow: gas.flow } : text === '' ? null : gasMixtureSchema.parse({ name: text.slice(0, 80), flow: gas.flow }))}
        />
        <div className="flex min-w-52 grow basis-52 items-center gap-2">
          <Flow className="grow" label={`${label}, flow`} labelHidden dimension="gasFlow" system={system} value={gas.flow} onChange={(flow: Interval | null) => set({ ...gas, flow })} />
          <span className="text-sm text-soft">{SHOWN_UNIT[system].gasFlow}</span>
        </div>
      </div>
      <div className="flex flex-wrap items-center gap-x-3 gap-y-2">
        {gas.components.map((part, index) => (
          <div key={index} className="flex items-center gap-1.5">
            <Select className="w-24" label={`${label}, part ${index + 1}`} labelHidden options={GAS_OPTIONS} value={part.gas} onChange={(event) => change(index, { gas: event.target.value as Component['gas'] })} />
            <input
              type="number"
              min={0}
              max={100}
              step="any"
              className="box w-20!"
              aria-label={`${label}, share of ${part.gas} in per cent`}
              value={part.percent}
              onChange={(event) => {
                const percent = event.target.valueAsNumber
                if (percent >= 0 && percent <= 100) change(index, { percent })
              }}
            />
            <span className="text-soft">%</span>
            <button type="button" aria-label={`Remove ${part.gas} from ${label}`} className="flex size-7 items-center justify-center rounded text-soft hover:text-ink" onClick={() => parts(gas.components.filter((_, at) => at !== index))}>
              <X size={14} aria-hidden="true" />
            </button>
          </div>
        ))}
        {gas.components.length < 6 && (
          <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => parts([...gas.components, { gas: GASES.find((one) => !gas.components.some((part) => part.gas === one)) ?? 'Ar', percent: Math.max(0, Number((100 - sum).toFixed(2))) }])}>
            Part
          </Button>
        )}
        {gas.components.length > 0 && <p className={`text-sm ${classed.symbol ? 'text-soft' : 'font-medium text-straw-deep'}`}>{classed.symbol ? `ISO 14175 ${classed.symbol}` : `The parts sum to ${Number(sum.toFixed(2))} %; a mixture sums to 100 %.`}</p>}
      </div>
    </div>
  )
}
