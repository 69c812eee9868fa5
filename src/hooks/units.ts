import type { Interval, Quantity } from '@shared/schemas/common.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatInterval, formatNumber, formatQuantity, type Formatted } from '@shared/units/format.ts'
import type { Dimension, UnitSystem } from '@shared/units/types.ts'
import { useChangeAccount, useSession } from './session.ts'

export interface Units {
  system: UnitSystem
  setSystem: (system: UnitSystem) => void
  /** The unit in which a dimension is shown to this person. */
  unitOf: (dimension: Dimension) => string
  quantity: (value: Quantity | null, dimension: Dimension) => Formatted | null
  interval: (value: Interval | null, dimension: Dimension) => Formatted | null
  /** A bare storage figure, e.g. a list row's `thicknessMin` in mm. */
  stored: (si: number, dimension: Dimension) => string
}

/** In which system this person reads figures, and figures so read. Records keep their own system. */
export function useUnits(): Units {
  const session = useSession()
  const change = useChangeAccount()
  const system = session.person?.unitSystem ?? session.organization?.defaultUnitSystem ?? 'SI'
  return {
    system,
    setSystem: (next) => change.mutate({ unitSystem: next }),
    unitOf: (dimension) => SHOWN_UNIT[system][dimension],
    quantity: (value, dimension) => value && formatQuantity(value, dimension, system),
    interval: (value, dimension) => value && formatInterval(value, dimension, system),
    stored: (si, dimension) => `${formatNumber(si, dimension, SHOWN_UNIT[system][dimension])} ${SHOWN_UNIT[system][dimension]}`,
  }
}
