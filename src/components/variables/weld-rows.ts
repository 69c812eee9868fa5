/** Rows of the weld as a whole, in document order. */
import { all, fillet, groove, judgedBy, onCoupon, ownMetal, pipe, shaped, some, treated, type PairOf, type RowSpec, type SectionSpec } from './row-spec.ts'
import * as words from './options.ts'

const ISO = judgedBy('iso-15614-1', 'iso-15614-2')
/** Asked for by the application, or by the standard where the parent metal itself promises impact values. */
const impacts = some((weld) => weld.toughnessRequired === true, all(judgedBy('iso-15614-1'), ({ baseMetals: { a, b } }) => a.impactSpecified === true || b.impactSpecified === true))
const postHeated = (weld: { postHeating?: { used: boolean | null } | null | undefined }) => weld.postHeating?.used === true
const branched = (weld: { joint: { branch?: string | null | undefined } }) => (weld.joint.branch ?? null) !== null
const doubled = (weld: { joint: { groove: string | null } }) => weld.joint.groove?.startsWith('double-') === true
const edged = (weld: { joint: { type: string } }) => weld.joint.type === 'edge'
const unequal = (weld: { joint: { type: string; weld: string }; thicknessB: unknown }) => weld.joint.type === 'butt' && weld.joint.weld === 'groove' && weld.thicknessB !== null
const stripped = (weld: { joint: { backing: string | null } }) => weld.joint.backing === 'metal' || weld.joint.backing === 'ceramic' || weld.joint.backing === 'flux'
const inserted = (weld: { joint: { backing: string | null } }) => weld.joint.backing === 'consumable-insert'
/** One value of each metal, side by side. */
const ofMetals = (field: string, label: string, of: PairOf, when: RowSpec['when'], more: Pick<RowSpec, 'hint' | 'told'> = {}): RowSpec => ({ kind: 'pair', path: `baseMetals.a.${field}`, paths: [`baseMetals.a.${field}`, `baseMetals.b.${field}`], label, hint: 'A and B', of, ...(when && { when }), ...more })

export const JOINT: SectionSpec = {
  id: 'joint',
  title: 'Joint',
  rows: [
    { kind: 'choice', path: 'joint.weld', label: 'Weld', options: words.WELDS, always: true },
    { kind: 'choice', path: 'joint.work', label: 'Repair or build-up', options: words.WORKS, none: 'Neither: it joins', when: judgedBy('asme-ix') },
    { kind: 'choice', path: 'joint.type', label: 'Joint', options: words.JOINT_TYPES, always: true },
    { kind: 'choice', path: 'joint.groove', label: 'Groove', options: words.GROOVES, when: groove },
    { kind: 'text', path: 'joint.designation', label: 'Joint detail', max: 40, hint: 'designation', example: 'TC-U4a-GF', when: all(groove, judgedBy('aws-d1-1')) },
    { kind: 'choice', path: 'joint.penetration', label: 'Penetration', options: words.PENETRATIONS, always: true, when: groove },
    { kind: 'interval', path: 'joint.includedAngle', label: 'Included angle', dimension: 'angle', when: shaped('single-v', 'double-v', 'compound-v', '-u') },
    { kind: 'interval', path: 'joint.bevelAngle', label: 'Bevel angle', dimension: 'angle', when: shaped('single-bevel', 'double-bevel', '-j', 'compound-v') },
    { kind: 'interval', path: 'joint.rootOpening', label: 'Root opening', dimension: 'length', when: groove },
    { kind: 'interval', path: 'joint.rootFace', label: 'Root face', dimension: 'length', when: all(groove, (weld) => weld.joint.groove !== 'square') },
    { kind: 'interval', path: 'joint.rootRadius', label: 'Root radius', dimension: 'length', when: shaped('-u', '-j', 'flare-v', 'flare-bevel') },
    { kind: 'interval', path: 'joint.grooveDepth', label: 'Groove depth', hint: 'of the first side', dimension: 'length', when: all(groove, some(doubled, edged, ({ joint }) => joint.penetration === 'partial')) },
    { kind: 'interval', path: 'joint.secondDepth', label: 'Depth, second side', hint: 'where it differs', dimension: 'length', when: all(groove, doubled) },
    { kind: 'interval', path: 'joint.secondAngle', label: 'Angle, second side', hint: 'where it differs', dimension: 'angle', when: all(groove, doubled) },
    { kind: 'interval', path: 'joint.angleChange', label: 'Angle changes at', hint: 'height above the root', dimension: 'length', when: shaped('compound-v') },
    { kind: 'interval', path: 'joint.reinforcingFillet', label: 'Reinforcing fillet', dimension: 'length', when: all(groove, ({ joint }) => joint.type === 'tee') },
    { kind: 'interval', path: 'joint.filletLeg', label: 'Fillet leg', dimension: 'length', when: fillet },
    { kind: 'interval', path: 'joint.filletLegB', label: 'Leg on B', hint: 'where it differs', dimension: 'length', when: fillet },
    { kind: 'interval', path: 'joint.memberAngle', label: 'Angle between members', hint: 'where not square', dimension: 'angle', when: all(fillet, ({ joint }) => joint.type === 'tee' || joint.type === 'corner') },
    { kind: 'interval', path: 'joint.filletThroat', label: 'Fillet throat', dimension: 'length', when: all(fillet, ISO) },
    { kind: 'flag', path: 'joint.pressureRetaining', label: 'Holds pressure', hint: 'the fillet itself', when: all(fillet, judgedBy('asme-ix')) },
    { kind: 'choice', path: 'joint.branch', label: 'Branch connection', hint: 'A the branch, B the run', options: words.BRANCHES, none: 'None', when: all(pipe, ISO) },
    { kind: 'interval', path: 'joint.branchAngle', label: 'Branch angle', dimension: 'angle', when: branched },
    { kind: 'choice', path: 'joint.alignment', label: 'Flush surfaces', hint: 'of unequal thicknesses', options: words.ALIGNMENTS, when: unequal },
    { kind: 'interval', path: 'joint.taperAngle', label: 'Taper', hint: '1 : 4 is 14°', dimension: 'angle', when: unequal },
    { kind: 'choice', path: 'joint.backing', label: 'Backing', options: words.BACKINGS },
    { kind: 'text', path: 'joint.backingMaterial', label: 'Backing material', max: 120, example: '6061-T6, 1/4 in', when: ({ joint }) => joint.backing !== null && joint.backing !== 'none' },
    { kind: 'interval', path: 'joint.backingThickness', label: 'Backing thickness', dimension: 'length', when: all(groove, stripped) },
    { kind: 'interval', path: 'joint.backingWidth', label: 'Backing width', dimension: 'length', when: all(groove, stripped) },
    { kind: 'interval', path: 'joint.insertWidth', label: 'Insert width', hint: 'across the joint', dimension: 'length', when: inserted },
    { kind: 'interval', path: 'joint.insertHeight', label: 'Insert height', dimension: 'length', when: inserted },
    { kind: 'flag', path: 'joint.retainers', label: 'Retainers', when: groove },
    { kind: 'flag', path: 'joint.weldedFromBothSides', label: 'Welded from both sides' },
    { kind: 'choice', path: 'joint.backGouging', label: 'Back gouging', options: words.GOUGINGS, when: groove },
    { kind: 'interval', path: 'joint.backGougeDepth', label: 'Gouging depth', dimension: 'length', when: all(groove, ({ joint }) => joint.backGouging !== null && joint.backGouging !== 'none') },
    { kind: 'paragraph', path: 'joint.notes', label: 'Joint notes', max: 1000 },
  ],
}

export const BASE_METALS: SectionSpec = {
  id: 'base-metals',
  title: 'Base metals',
  rows: [
    { kind: 'metal', path: 'baseMetals.a', label: 'Metal A' },
    { kind: 'metal', path: 'baseMetals.b', label: 'Metal B' },
    { kind: 'pair', path: 'baseMetals', paths: ['baseMetals.a.pNumber', 'baseMetals.b.pNumber'], label: 'P-Number', hint: 'A and B', of: { kind: 'text', max: 6 }, when: judgedBy('asme-ix') },
    ofMetals('groupNumber', 'Group Number', { kind: 'whole', min: 1, max: 9 }, judgedBy('asme-ix')),
    ofMetals('iso15608', 'ISO 15608 group', { kind: 'text', max: 8 }, ISO),
    ofMetals('d11Group', 'D1.1 group', { kind: 'text', max: 6 }, judgedBy('aws-d1-1')),
    ofMetals('d12MNumber', 'M-Number', { kind: 'text', max: 6 }, judgedBy('aws-d1-2')),
    ofMetals('grade', 'Grade', { kind: 'text', max: 80 }, ownMetal, { told: true }),
    ofMetals('uns', 'UNS or EN number', { kind: 'text', max: 20 }, ownMetal, { told: true }),
    ofMetals('productForm', 'Product form', { kind: 'text', max: 80 }, ownMetal, { told: true }),
    ofMetals('condition', 'Condition or temper', { kind: 'text', max: 40 }, judgedBy('aws-d1-2', 'iso-15614-1', 'iso-15614-2'), { hint: 'A and B, e.g. N, Q&T, T6' }),
    ofMetals('impactSpecified', 'Impact values specified', { kind: 'flag' }, judgedBy('iso-15614-1'), { hint: 'A and B, in their own standards' }),
    ofMetals('minTensile', 'Tensile, minimum', { kind: 'quantity', dimension: 'stress' }, some(onCoupon, ownMetal), { told: true }),
    ofMetals('minYield', 'Yield, minimum', { kind: 'quantity', dimension: 'stress' }, some(all(onCoupon, judgedBy('aws-d1-1', 'iso-15614-1')), ownMetal), { told: true }),
    ofMetals('minElongation', 'Elongation, minimum', { kind: 'quantity', dimension: 'percent' }, some(onCoupon, ownMetal), { told: true }),
    ofMetals('heatNumber', 'Heat number', { kind: 'text', max: 60 }, onCoupon),
    ofMetals('certificate', 'Certificate', { kind: 'text', max: 120 }, onCoupon),
    { kind: 'choice', path: 'product', label: 'Product', options: words.PRODUCTS, always: true },
    { kind: 'interval', path: 'thickness', label: 'Thickness', dimension: 'length', allMeans: 'every thickness' },
    { kind: 'interval', path: 'thicknessB', label: 'Thickness of B', hint: 'where it differs', dimension: 'length', allMeans: 'every thickness', when: some((weld) => weld.joint.type !== 'butt' || weld.joint.weld === 'groove', fillet, branched, onCoupon) },
    { kind: 'interval', path: 'diameter', label: 'Outside diameter', dimension: 'length', allMeans: 'plate and pipe', when: pipe },
    { kind: 'interval', path: 'diameterB', label: 'Diameter of B', hint: 'the run pipe', dimension: 'length', when: all(pipe, branched) },
    { kind: 'flag', path: 'pipeRotated', label: 'Pipe turns', hint: 'under the arc', when: all(pipe, judgedBy('aws-d1-1', 'iso-15614-1')) },
  ],
}

/** What the work asks of the weld beyond the standard itself: it decides which tests and which variables count. */
export const APPLICATION: SectionSpec = {
  id: 'application',
  title: 'What the application asks',
  short: 'Application',
  rows: [
    { kind: 'flag', path: 'toughnessRequired', label: 'Toughness required' },
    { kind: 'quantity', path: 'impactTemperature', label: 'Impact test temperature', dimension: 'temperature', when: impacts },
    { kind: 'quantity', path: 'impactEnergy', label: 'Impact energy', hint: 'mean of a set', dimension: 'energy', when: impacts },
    { kind: 'flag', path: 'hardnessRequired', label: 'Hardness required', when: judgedBy('iso-15614-1') },
    { kind: 'quantity', path: 'serviceTemperature', label: 'Service temperature', hint: 'where it is high', dimension: 'temperature', when: judgedBy('aws-d1-2') },
  ],
}

export const PREHEAT: SectionSpec = {
  id: 'preheat',
  title: 'Preheat',
  rows: [
    { kind: 'quantity', path: 'preheat.minimum', label: 'Preheat, minimum', dimension: 'temperature' },
    { kind: 'quantity', path: 'preheat.interpassMaximum', label: 'Interpass, maximum', dimension: 'temperature' },
    { kind: 'text', path: 'preheat.maintenance', label: 'Maintenance', max: 200, example: 'held until the cap is in' },
    { kind: 'text', path: 'preheat.method', label: 'Method', max: 120, example: 'propane torch, contact thermometer' },
    { kind: 'flag', path: 'postHeating.used', label: 'Post-heating', hint: 'lets hydrogen out', when: ISO },
    { kind: 'interval', path: 'postHeating.temperature', label: 'Post-heating temperature', dimension: 'temperature', when: postHeated },
    { kind: 'interval', path: 'postHeating.time', label: 'Post-heating time', dimension: 'time', when: postHeated },
  ],
}

export const PWHT: SectionSpec = {
  id: 'pwht',
  title: 'Postweld heat treatment',
  short: 'PWHT',
  rows: [
    { kind: 'choice', path: 'pwht.condition', label: 'Condition', options: words.PWHTS },
    { kind: 'choice', path: 'pwht.ageing', label: 'Ageing', options: words.AGEINGS, when: judgedBy('aws-d1-2', 'iso-15614-2') },
    { kind: 'interval', path: 'pwht.temperature', label: 'Temperature', dimension: 'temperature', when: treated },
    { kind: 'interval', path: 'pwht.time', label: 'Time at temperature', dimension: 'time', when: treated },
    { kind: 'text', path: 'pwht.heatingRate', label: 'Heating and cooling', max: 80, example: 'at most 110 °C/h above 425 °C', when: treated },
    { kind: 'paragraph', path: 'pwht.notes', label: 'PWHT notes', max: 400, when: treated },
  ],
}
