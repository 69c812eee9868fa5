/** Highest preheat and interpass temperature of alloys that heat harms. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, unitOf } from '../../common/reading.ts'
import { cannotTell, list, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { isHeatLimited, metals, readAlloy } from '../alloys.ts'
import { meta } from '../meta.ts'

const HOTTEST = { SI: 120, US: 250 } as const

/** Which metal leaves the limit open, and why. */
function unknownLimit(procedure: WeldingVariables): string {
  const alloy = metals(procedure).filter((metal) => isHeatLimited(metal) === null).flatMap((metal) => readAlloy(metal)?.alloy ?? [])[0]
  return alloy === undefined ? "The alloy isn't named, so whether its temperature is limited can't be told." : `Whether the temperature of ${alloy} is limited isn't known here: it depends on its magnesium.`
}

export const highestTemperature: Rule = {
  meta: meta('highest-temperature', 'Highest preheat and interpass temperature', 'Clause 4', 'secondary', 'Interpass figure from a secondary source; preheat figure and the 15 minutes from memory', 'Heat-treatable alloys and 5xxx of more than 3 % magnesium: preheat and interpass temperature at most 120 °C (250 °F). That this heat is held for 15 minutes at most is not part of the record and not judged; of a 5xxx alloy whose magnesium is not kept here nothing can be told.', { withoutCoupon: true }),
  field: 'preheat.interpassMaximum',
  at: 'weld',
  label: 'Highest preheat and interpass temperature',
  range: () => null,
  check(context) {
    const { procedure, system } = context
    const limited = metals(procedure).map(isHeatLimited)
    const unit = unitOf('temperature', system)
    const most = HOTTEST[system]
    const range = between('temperature', unit, UNLIMITED, closed(most))
    const field = 'preheat.interpassMaximum'
    if (!limited.includes(true)) {
      if (limited.includes(null)) return cannotTell(unknownLimit(procedure), ['procedure: baseMetals.a.grade'], { field: 'baseMetals.a.grade', fixes: [{ kind: 'state', label: 'State the alloy', field: 'baseMetals.a.grade' }] })
      return { verdict: 'within', sentence: `${list([...new Set(metals(procedure).map((metal) => readAlloy(metal)?.alloy ?? ''))])} has no such limit.`, asked: null, range: null }
    }
    const interpass = figureOrNull(procedure.preheat.interpassMaximum, 'temperature', system)
    const minimum = figureOrNull(procedure.preheat.minimum, 'temperature', system)
    const set = { kind: 'set' as const, label: `Set the highest interpass temperature to ${show(most, unit)}`, field, value: quantity(most, 'temperature', unit) }
    if (minimum !== null && minimum > most) return { verdict: 'outside', sentence: `Preheat of ${show(minimum, unit)} is over the ${show(most, unit)} that these alloys take.`, asked: { min: minimum, max: minimum }, range, field: 'preheat.minimum', basis: 'memory', fixes: [{ ...set, label: `Set the preheat to ${show(most, unit)}`, field: 'preheat.minimum' }, ...(interpass !== null && interpass > most ? [set] : [])] }
    if (interpass === null) return cannotTell(`The highest interpass temperature isn't stated; these alloys take ${show(most, unit)} at most.`, [`procedure: ${field}`], { field, range, fixes: [set] })
    const asked = { min: interpass, max: interpass }
    return interpass > most ? { verdict: 'outside', sentence: `Interpass temperature of ${show(interpass, unit)} is over the ${show(most, unit)} that these alloys take.`, asked, range, fixes: [set] } : { verdict: 'within', sentence: `Interpass temperature of ${show(interpass, unit)} is not over the ${show(most, unit)} that these alloys take.`, asked, range }
  },
}
