/** ISO 15610: a procedure may rest on tested consumables, without a test piece, inside the scope of that standard (published scope; read). */
import type { WeldingVariables } from '../../schemas/welding.ts'
import { materialGroup, secondMember, siFigures } from '../common/iso-names.ts'
import { throatOf } from './sides.ts'

export interface RouteReading { available: 'yes' | 'no' | 'cannot-tell'; reasons: string[]; clause: 'ISO 15610, scope'; basis: 'read' }

/** Sub-groups in scope and the greatest thickness of each, mm. */
const SCOPE: Readonly<Record<string, number>> = { '1.1': 40, '8.1': 40, '21': 20, '22.1': 20, '22.2': 20 }
const LEAST_THROAT = 1

/**
 * Whether the route by tested consumables stands open for a weld: it is closed as soon as hardness, impact, preheat, controlled heat input, interpass
 * temperature or heat treatment after welding is specified. A preheat at or below room temperature (20 °C) is none.
 */
export function testedConsumablesRoute(variables: WeldingVariables): RouteReading {
  const closed: string[] = []
  const open: string[] = []
  const ask = (value: boolean | null | undefined, what: string): void => {
    if (value === true) closed.push(`${what} is specified`)
    else if (value !== false) open.push(`whether ${what} is specified isn't stated`)
  }
  for (const metal of [variables.baseMetals.a, secondMember(variables)]) {
    const group = materialGroup(metal)
    const limit = group && (SCOPE[group.text] ?? null)
    if (!group) open.push('the ISO/TR 15608 group isn\'t recorded')
    else if (limit === null) closed.push(`group ${group.text} is not among ${Object.keys(SCOPE).join(', ')}`)
    else {
      const { min, max, all } = siFigures(variables.thickness, 'length')
      const top = all ? Infinity : (max ?? min)
      if (top === null) open.push('the thickness isn\'t stated')
      else if (top > limit) closed.push(`${top} mm is above ${limit} mm`)
    }
  }
  if (variables.joint.weld === 'fillet') {
    const throat = throatOf(variables)
    if (!throat || throat === 'fault') open.push('the throat isn\'t stated')
    else if (throat.min === null || throat.min < LEAST_THROAT) closed.push(`a throat below ${LEAST_THROAT} mm is asked`)
  }
  ask(variables.toughnessRequired, 'impact')
  ask(variables.hardnessRequired, 'hardness')
  if ((variables.preheat.minimum?.si ?? 0) > 20) closed.push('preheat is specified')
  if (variables.preheat.interpassMaximum) closed.push('an interpass temperature is specified')
  if (variables.processes.some(({ electrical }) => electrical.heatInput !== null)) closed.push('heat input is controlled')
  if (variables.pwht.condition === null) open.push('whether heat treatment after welding is specified isn\'t stated')
  else if (variables.pwht.condition !== 'none') closed.push('heat treatment after welding is specified')
  const reasons = [...new Set(closed.length > 0 ? closed : open)]
  return { available: closed.length > 0 ? 'no' : open.length > 0 ? 'cannot-tell' : 'yes', reasons, clause: 'ISO 15610, scope', basis: 'read' }
}
