/** Where a record contradicts itself: the field can't be judged until it is mended, whatever the standard says. */
import type { Interval } from '../schemas/common.ts'
import type { WeldingVariables } from '../schemas/welding.ts'

export interface Contradiction { field: string; sentence: string; processId: string | null }

/** "5 mm to 20 mm"; one end where only one is given, or both are the same. */
const shown = ({ min, max }: Interval): string => [...new Set([min, max].flatMap((end) => end?.typed ?? []))].join(' to ')

/** @param at path of the block with its dot, '' for the weld; put before the field only where there is something to say */
function order(found: Contradiction[], at: string, name: string, label: string, interval: Interval | null, processId: string | null, positive: boolean): void {
  if (!interval) return
  const { min, max } = interval
  if (min && max && min.si > max.si) found.push({ field: at + name, processId, sentence: `${label} ${shown(interval)} has its minimum above its maximum.` })
  if (positive && ((min && min.si < 0) || (max && max.si < 0))) found.push({ field: at + name, processId, sentence: `${label} ${shown(interval)} is negative.` })
}

/** Of both members, mm; null where it isn't given. */
function thickestMember({ thickness, thicknessB }: WeldingVariables): number | null {
  const ends = [thickness, thicknessB].flatMap((interval) => interval?.max?.si ?? interval?.min?.si ?? [])
  return ends.length === 0 || thickness?.all === true ? null : Math.max(...ends)
}

/**
 * Contradictions inside one record.
 * @param variables the weld's variables; nothing is changed
 * @param welded the record tells what was welded (a coupon), so a deposit can't be thicker than the metal it joins
 * @returns one entry a field, in plain words, without the record's name
 */
export function contradictions(variables: WeldingVariables, welded = false): Contradiction[] {
  const found: Contradiction[] = []
  order(found, '', 'thickness', 'Thickness', variables.thickness, null, true)
  order(found, '', 'thicknessB', 'Thickness of the second member', variables.thicknessB, null, true)
  order(found, '', 'diameter', 'Diameter', variables.diameter, null, true)
  order(found, '', 'joint.filletLeg', 'Fillet leg', variables.joint.filletLeg, null, true)
  order(found, '', 'joint.rootOpening', 'Root opening', variables.joint.rootOpening, null, true)
  order(found, '', 'pwht.temperature', 'Heat treatment temperature', variables.pwht.temperature, null, false)
  order(found, '', 'pwht.time', 'Heat treatment time', variables.pwht.time, null, true)
  const { diameter } = variables
  if (variables.product === 'plate' && diameter && !diameter.all && (diameter.min || diameter.max)) {
    found.push({ field: 'diameter', processId: null, sentence: `Diameter ${shown(diameter)} is given, but the product is plate.` })
  }
  const { minimum, interpassMaximum } = variables.preheat
  if (minimum && interpassMaximum && minimum.si > interpassMaximum.si) {
    found.push({ field: 'preheat.interpassMaximum', processId: null, sentence: `The lowest preheat, ${minimum.typed}, is above the highest interpass temperature, ${interpassMaximum.typed}.` })
  }
  for (let i = 0; i < variables.processes.length; i += 1) {
    const block = variables.processes[i]
    if (!block) continue
    const at = `processes.${i}.`
    order(found, at, 'depositThickness', 'Deposit thickness', block.depositThickness, block.id, true)
    const e = block.electrical
    order(found, at, 'electrical.current', 'Current', e.current, block.id, true)
    order(found, at, 'electrical.voltage', 'Voltage', e.voltage, block.id, true)
    order(found, at, 'electrical.travelSpeed', 'Travel speed', e.travelSpeed, block.id, true)
    order(found, at, 'electrical.wireFeed', 'Wire feed speed', e.wireFeed, block.id, true)
    order(found, at, 'electrical.heatInput', 'Heat input', e.heatInput, block.id, true)
    const deposit = block.depositThickness?.max ?? block.depositThickness?.min
    const thickest = welded && deposit ? thickestMember(variables) : null
    if (deposit && thickest !== null && variables.joint.weld === 'groove' && variables.joint.work == null && deposit.si > thickest) found.push({ field: `${at}depositThickness`, processId: block.id, sentence: `Deposit thickness ${deposit.typed} is more than the thickness of the metal that it joins.` })
    if (block.maxPassThickness && block.maxPassThickness.si < 0) found.push({ field: `${at}maxPassThickness`, processId: block.id, sentence: `Pass thickness ${block.maxPassThickness.typed} is negative.` })
  }
  return found
}
