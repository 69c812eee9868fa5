/** Calculators of joint and weld metal. */
import { filletFromLegs, filletSource, legFromThroat } from '../fillet-size.ts'
import { grooveArea, grooveSource, GROOVE_AREA_TYPES } from '../groove-area.ts'
import { consumptionSource, passCount } from '../weld-cost.ts'
import { calculator, type Calculator } from './define.ts'
import { choice, number, quantity, quantityIfAny } from './inputs.ts'

const LABELS = { square: 'Square', 'single-v': 'Single V', 'double-v': 'Double V', 'single-bevel': 'Single bevel', 'double-bevel': 'Double bevel', 'single-u': 'Single U', 'double-u': 'Double U', 'single-j': 'Single J', 'double-j': 'Double J' } as const
const density = number('rho', 'Density', 'g/cm³', 7.85, { above: 0, most: 25 })
const angle = quantity('a', 'Angle between the members', 'angle', 90, { above: 0, below: 180 })

export const jointCalculators: readonly Calculator[] = [
  calculator({
    id: 'groove-weld', title: 'Groove section and weld metal', group: 'joint', purpose: 'Section of a groove weld with its cap, and the mass of a metre.',
    inputs: {
      type: choice('g', 'Groove', GROOVE_AREA_TYPES.map((value) => ({ value, label: LABELS[value] })), 'single-v'), thickness: quantity('t', 'Plate thickness', 'length', 10), rootOpening: quantity('o', 'Root opening', 'length', 2, { least: 0 }), rootFace: quantity('f', 'Root face', 'length', 0, { least: 0 }), bevelAngle: quantityIfAny('b', 'Bevel angle of one edge', 'angle', 30, { least: 0, below: 90 }), rootRadius: quantityIfAny('r', 'Root radius', 'length', null),
      capWidth: quantity('cw', 'Cap width', 'length', 0, { least: 0 }), capHeight: quantity('ch', 'Cap height', 'length', 0, { least: 0 }), density,
    },
    outputs: [{ key: 'mass', label: 'Weld metal', unit: 'kg/m' }, { key: 'area', label: 'Section with cap', dimension: 'area' }, { key: 'groove', label: 'Groove section', dimension: 'area' }, { key: 'cap', label: 'Cap', dimension: 'area' }], calculate: grooveArea,
    formula: ['V: opening × t + (t − face)² × tan(bevel)', 'bevel: opening × t + ½ (t − face)² × tan(bevel)', 'U and J: an arc of the root radius tangent to the straight wall', 'cap: 2/3 × width × height', 'mass = section × density'], source: grooveSource, validity: 'Sharp plane geometry without shrinkage; both sides of a double groove alike.',
    example: { from: 'calc-g-jt-01; mass by hand: 77.735 × 7.85 / 1000 = 0.6102', expect: { groove: { value: 77.74, within: 0.5 }, area: { value: 77.735, within: 0.001 }, mass: { value: 0.6102, within: 0.0001 } } },
  }),
  calculator({
    id: 'fillet-throat', title: 'Throat of a fillet', group: 'joint', purpose: 'Throat, section and weld metal of a fillet from its leg or legs.',
    inputs: { leg: quantity('z', 'Leg', 'length', 8), legB: quantityIfAny('z2', 'Second leg, if unequal', 'length', null), angle, density },
    outputs: [{ key: 'throat', label: 'Throat', unit: 'mm', decimals: 3 }, { key: 'throatClaimed', label: 'Throat in whole millimetres', unit: 'mm', decimals: 0 }, { key: 'area', label: 'Section', dimension: 'area' }, { key: 'mass', label: 'Weld metal', unit: 'kg/m', decimals: 4 }], calculate: filletFromLegs,
    formula: ['equal legs: a = z / √2', 'unequal legs: a = z1 × z2 / √(z1² + z2²)', 'skewed: a = z × cos(angle / 2)'], source: filletSource, validity: 'Flat fillets; a claimed throat is rounded down.',
    example: { from: 'calc-g-jt-04', expect: { throat: { value: 5.657, within: 0.005 }, area: { value: 32, within: 0.001 }, mass: { value: 0.2512, within: 0.001 } } },
  }),
  calculator({
    id: 'fillet-leg', title: 'Leg of a fillet', group: 'joint', purpose: 'The leg to weld for a throat that a drawing asks.',
    inputs: { throat: quantity('th', 'Throat', 'length', 5), angle }, outputs: [{ key: 'leg', label: 'Leg', unit: 'mm', decimals: 3 }, { key: 'legToWeld', label: 'Leg in whole millimetres', unit: 'mm', decimals: 0 }], calculate: legFromThroat,
    formula: ['z = a / cos(angle / 2); at 90° z = a × √2'], source: filletSource, validity: 'Flat fillets with equal legs; a leg is rounded up.',
    example: { from: 'by hand: 5 × 1.41421 = 7.0711, up to 8', expect: { leg: { value: 7.0711, within: 0.0001 }, legToWeld: { value: 8, within: 0 } } },
  }),
  calculator({
    id: 'passes', title: 'Number of passes', group: 'joint', purpose: 'How many beads of given settings fill a groove.',
    inputs: { grooveArea: quantity('a', 'Groove section', 'area', 161.16), wireDiameter: quantity('d', 'Wire diameter', 'length', 1.2), wireFeed: quantity('w', 'Wire feed', 'wireFeed', 6), efficiency: quantity('eff', 'Deposition efficiency', 'percent', 95, { above: 0, most: 100 }), travelSpeed: quantity('s', 'Travel speed', 'travelSpeed', 400) },
    outputs: [{ key: 'passes', label: 'Passes', decimals: 0 }, { key: 'bead', label: 'Bead section', dimension: 'area' }], calculate: ({ efficiency, ...rest }) => passCount({ ...rest, efficiency: efficiency / 100 }),
    formula: ['bead section = wire section × wire feed × efficiency / travel speed', 'passes = groove section / bead section, rounded up'], source: consumptionSource, validity: 'An estimate: the root pass is usually smaller.',
    example: { from: 'calc-g-jt-08', expect: { passes: { value: 10, within: 0 }, bead: { value: 16.116, within: 0.02 } } },
  }),
]
