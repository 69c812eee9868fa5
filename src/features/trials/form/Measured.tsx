import type { BeadContent } from '@shared/schemas/trials.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { MEASURE, type Measure } from '@shared/trials/bead-values.ts'
import { ObservedField } from '@/components/fields/observed.tsx'
import { QuantityField } from '@/components/fields/quantity.tsx'

export interface MeasuredProps {
  value: BeadContent['measured']
  onChange: (measured: BeadContent['measured']) => void
  system: UnitSystem
  errors: Readonly<Record<string, string>>
  onUnread: (field: string, message: string | null) => void
  /** Peak and background are asked where the bead pulses and the panel doesn't set them. */
  pulsed: boolean
}

const SPREADS = ['current', 'voltage', 'wireFeed', 'travelSpeed'] as const
const ONES: readonly ('peakCurrent' | 'backgroundCurrent' | 'length' | 'arcTime')[] = ['length', 'arcTime', 'peakCurrent', 'backgroundCurrent']
const ABOUT: Partial<Record<Measure, string>> = { current: '18-22 where it wandered', wireFeed: 'by cut length', travelSpeed: 'or length and time' }

/** What meters, tape and watch said. */
export function Measured({ value, onChange, system, errors, onUnread, pulsed }: MeasuredProps) {
  const label = (measure: Measure) => `${MEASURE[measure].label}, ${SHOWN_UNIT[system][MEASURE[measure].dimension]}`
  const shared = (measure: Measure) => ({ label: label(measure), dimension: MEASURE[measure].dimension, system, description: ABOUT[measure], error: errors[`measured.${measure}`] ?? null, onUnread: (message: string | null) => onUnread(`measured.${measure}`, message) })
  return (
    <div className="grid grid-cols-2 gap-x-3 gap-y-4">
      {SPREADS.map((measure) => (
        <ObservedField key={measure} {...shared(measure)} value={value[measure]} onChange={(next) => onChange({ ...value, [measure]: next })} />
      ))}
      {ONES.filter((measure) => pulsed || measure === 'length' || measure === 'arcTime').map((measure) => (
        <QuantityField key={measure} {...shared(measure)} value={value[measure]} onChange={(next) => onChange({ ...value, [measure]: next })} />
      ))}
    </div>
  )
}
