/**
 * The rows of a procedure's sheet, in document order, as data: the drafting form, the read-only sheet, the placing of findings and the
 * names of fields in a conflict all read it. Paths are from the weld's variables; those of a process block start at the block.
 */
import type { ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import type { Dimension } from '@shared/units/types.ts'
import type { Option } from '@/components/fields/text.tsx'
import * as words from './options.ts'

interface Common {
  path: string
  label: string
  /** Under the label where no unit stands there. */
  hint?: string
  /** Further fields whose findings stand at this row. */
  also?: readonly string[]
  /** Offered only then, or once something is stated or found in it. */
  when?: (weld: WeldingVariables, block: ProcessBlock | null) => boolean
}
export type RowSpec = Common &
  (
    | { kind: 'interval'; dimension: Dimension; allMeans?: string }
    | { kind: 'quantity'; dimension: Dimension }
    | { kind: 'choice'; options: readonly Option[]; always?: boolean }
    | { kind: 'flag' }
    | { kind: 'text'; max: number; example?: string }
    | { kind: 'paragraph'; max: number; example?: string }
    | { kind: 'whole'; min: number; max: number }
    | { kind: 'pair'; paths: readonly [string, string]; max?: number; whole?: readonly [number, number] }
    | { kind: 'metal' | 'filler' | 'sizes' | 'positions' | 'gas' | 'panel' | 'passes' }
  )

export interface SectionSpec {
  id: string
  title: string
  /** Shorter, for the index. */
  short?: string
  rows: readonly RowSpec[]
}

const groove = (weld: WeldingVariables) => weld.joint.weld === 'groove'
const fillet = (weld: WeldingVariables) => weld.joint.weld === 'fillet'
const shaped = (...kinds: string[]) => (weld: WeldingVariables) => groove(weld) && kinds.some((kind) => weld.joint.groove?.endsWith(kind))
const pipe = (weld: WeldingVariables) => weld.product !== 'plate'
const by = (...processes: string[]) => (_weld: WeldingVariables, block: ProcessBlock | null) => block?.process != null && processes.includes(block.process)
const mechanised = (_weld: WeldingVariables, block: ProcessBlock | null) => block?.mechanisation === 'machine' || block?.mechanisation === 'automatic'
const several = (_weld: WeldingVariables, block: ProcessBlock | null) => block?.technique.electrodes === 'multiple'
const pulsing = (_weld: WeldingVariables, block: ProcessBlock | null) => block?.electrical.pulsed === true || block?.electrical.transferMode === 'pulsed-spray'
const judgedBy = (...standards: string[]) => (weld: WeldingVariables) => weld.standards.some(({ standard }) => standards.includes(standard))
const filled = (_weld: WeldingVariables, block: ProcessBlock | null) => block?.filler.added !== false
const treated = (weld: WeldingVariables) => weld.pwht.condition !== null && weld.pwht.condition !== 'none'

export const JOINT: SectionSpec = {
  id: 'joint',
  title: 'Joint',
  rows: [
    { kind: 'choice', path: 'joint.weld', label: 'Weld', options: words.WELDS, always: true },
    { kind: 'choice', path: 'joint.type', label: 'Joint', options: words.JOINT_TYPES, always: true },
    { kind: 'choice', path: 'joint.groove', label: 'Groove', options: words.GROOVES, when: groove },
    { kind: 'text', path: 'joint.designation', label: 'Joint detail', max: 40, hint: 'designation', example: 'TC-U4a-GF', when: (weld) => groove(weld) && judgedBy('aws-d1-1')(weld) },
    { kind: 'choice', path: 'joint.penetration', label: 'Penetration', options: words.PENETRATIONS, always: true, when: groove },
    { kind: 'interval', path: 'joint.includedAngle', label: 'Included angle', dimension: 'angle', when: shaped('-v', '-u') },
    { kind: 'interval', path: 'joint.bevelAngle', label: 'Bevel angle', dimension: 'angle', when: shaped('bevel', '-j') },
    { kind: 'interval', path: 'joint.rootOpening', label: 'Root opening', dimension: 'length', when: groove },
    { kind: 'interval', path: 'joint.rootFace', label: 'Root face', dimension: 'length', when: (weld) => groove(weld) && weld.joint.groove !== 'square' },
    { kind: 'interval', path: 'joint.rootRadius', label: 'Root radius', dimension: 'length', when: shaped('-u', '-j') },
    { kind: 'interval', path: 'joint.filletLeg', label: 'Fillet leg', dimension: 'length', when: fillet },
    { kind: 'choice', path: 'joint.backing', label: 'Backing', options: words.BACKINGS },
    { kind: 'text', path: 'joint.backingMaterial', label: 'Backing material', max: 120, example: '6061-T6, 1/4 in', when: ({ joint }) => joint.backing !== null && joint.backing !== 'none' },
    { kind: 'flag', path: 'joint.retainers', label: 'Retainers', when: groove },
    { kind: 'flag', path: 'joint.weldedFromBothSides', label: 'Welded from both sides' },
    { kind: 'choice', path: 'joint.backGouging', label: 'Back gouging', options: words.GOUGINGS, when: groove },
    { kind: 'paragraph', path: 'joint.notes', label: 'Joint notes', max: 1000 },
  ],
}

export const BASE_METALS: SectionSpec = {
  id: 'base-metals',
  title: 'Base metals',
  rows: [
    { kind: 'metal', path: 'baseMetals.a', label: 'Metal A' },
    { kind: 'metal', path: 'baseMetals.b', label: 'Metal B' },
    { kind: 'pair', path: 'baseMetals', paths: ['baseMetals.a.pNumber', 'baseMetals.b.pNumber'], label: 'P-Number', hint: 'A and B', max: 6, when: judgedBy('asme-ix') },
    { kind: 'pair', path: 'baseMetals.a.groupNumber', paths: ['baseMetals.a.groupNumber', 'baseMetals.b.groupNumber'], label: 'Group Number', hint: 'A and B', whole: [1, 9], when: judgedBy('asme-ix') },
    { kind: 'pair', path: 'baseMetals.a.iso15608', paths: ['baseMetals.a.iso15608', 'baseMetals.b.iso15608'], label: 'ISO 15608 group', hint: 'A and B', max: 8, when: judgedBy('iso-15614-1', 'iso-15614-2') },
    { kind: 'pair', path: 'baseMetals.a.d11Group', paths: ['baseMetals.a.d11Group', 'baseMetals.b.d11Group'], label: 'D1.1 group', hint: 'A and B', max: 6, when: judgedBy('aws-d1-1') },
    { kind: 'pair', path: 'baseMetals.a.d12MNumber', paths: ['baseMetals.a.d12MNumber', 'baseMetals.b.d12MNumber'], label: 'M-Number', hint: 'A and B', max: 6, when: judgedBy('aws-d1-2') },
    { kind: 'quantity', path: 'serviceTemperature', label: 'Service temperature', hint: 'where it is high', dimension: 'temperature', when: judgedBy('aws-d1-2') },
    { kind: 'choice', path: 'product', label: 'Product', options: words.PRODUCTS, always: true },
    { kind: 'interval', path: 'thickness', label: 'Thickness', dimension: 'length', allMeans: 'every thickness' },
    { kind: 'interval', path: 'thicknessB', label: 'Thickness of B', dimension: 'length', allMeans: 'every thickness', when: () => false },
    { kind: 'interval', path: 'diameter', label: 'Outside diameter', dimension: 'length', allMeans: 'plate and pipe', when: pipe },
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
  ],
}

export const PWHT: SectionSpec = {
  id: 'pwht',
  title: 'Postweld heat treatment',
  short: 'PWHT',
  rows: [
    { kind: 'choice', path: 'pwht.condition', label: 'Condition', options: words.PWHTS },
    { kind: 'interval', path: 'pwht.temperature', label: 'Temperature', dimension: 'temperature', when: treated },
    { kind: 'interval', path: 'pwht.time', label: 'Time at temperature', dimension: 'time', when: treated },
    { kind: 'text', path: 'pwht.heatingRate', label: 'Heating and cooling', max: 80, example: 'at most 110 °C/h above 425 °C', when: treated },
    { kind: 'paragraph', path: 'pwht.notes', label: 'PWHT notes', max: 400, when: treated },
  ],
}

/** The sheets of one process block. */
export const BLOCK_SECTIONS: readonly SectionSpec[] = [
  {
    id: 'process',
    title: 'Process',
    rows: [
      { kind: 'choice', path: 'process', label: 'Process', options: words.PROCESS_OPTIONS },
      { kind: 'choice', path: 'mechanisation', label: 'Mechanisation', options: words.MECHANISATIONS },
      { kind: 'interval', path: 'depositThickness', label: 'Deposit thickness', dimension: 'length', allMeans: 'every thickness' },
      { kind: 'quantity', path: 'maxPassThickness', label: 'Thickest pass', dimension: 'length' },
    ],
  },
  {
    id: 'filler',
    title: 'Filler metals',
    rows: [
      { kind: 'filler', path: 'filler', label: 'Filler metal' },
      { kind: 'text', path: 'filler.fNumber', label: 'F-Number', max: 6, when: (weld, block) => judgedBy('asme-ix', 'aws-d1-2')(weld) && filled(weld, block) },
      { kind: 'whole', path: 'filler.aNumber', label: 'A-Number', min: 1, max: 12, when: (weld, block) => judgedBy('asme-ix')(weld) && filled(weld, block) },
      { kind: 'text', path: 'filler.depositComposition', label: 'Deposit composition', max: 200, hint: 'where no A-Number fits', example: 'Al-5Mg', when: (weld, block) => filled(weld, block) && block?.filler.aNumber === null },
      { kind: 'choice', path: 'filler.productForm', label: 'Product form', options: words.PRODUCT_FORMS, when: filled },
      { kind: 'sizes', path: 'filler.diameters', label: 'Sizes', when: filled },
      { kind: 'text', path: 'filler.tradeName', label: 'Trade name', max: 80, when: filled },
      { kind: 'flag', path: 'filler.supplemental', label: 'Supplemental filler', when: (weld, block) => filled(weld, block) && by('SAW', 'GMAW', 'FCAW')(weld, block) },
      { kind: 'flag', path: 'filler.consumableInsert', label: 'Consumable insert', when: by('GTAW', 'PAW') },
      { kind: 'text', path: 'filler.fluxClassification', label: 'Flux', max: 80, example: 'F7A2-EM12K', when: by('SAW') },
      { kind: 'text', path: 'filler.fluxTradeName', label: 'Flux trade name', max: 80, when: by('SAW') },
      { kind: 'choice', path: 'filler.fluxType', label: 'Flux type', options: words.FLUX_TYPES, when: by('SAW') },
      { kind: 'flag', path: 'filler.fluxIsRecrushedSlag', label: 'Recrushed slag', when: by('SAW') },
      { kind: 'flag', path: 'filler.supplementalAlloyElement', label: 'Alloy from flux', hint: 'analysis depends on it', when: by('SAW') },
      { kind: 'flag', path: 'filler.penetrationFlux', label: 'Penetration flux', when: by('GTAW') },
    ],
  },
  {
    id: 'positions',
    title: 'Positions',
    rows: [
      { kind: 'positions', path: 'positions', label: 'Positions' },
      { kind: 'choice', path: 'progression', label: 'Vertical progression', options: words.PROGRESSIONS },
    ],
  },
  {
    id: 'gas',
    title: 'Gas',
    rows: [
      { kind: 'gas', path: 'shieldingGas', label: 'Shielding gas', when: by('GMAW', 'FCAW', 'GTAW', 'PAW', 'OTHER') },
      { kind: 'gas', path: 'backingGas', label: 'Backing gas', when: by('GMAW', 'FCAW', 'GTAW', 'PAW', 'OTHER') },
      { kind: 'gas', path: 'trailingGas', label: 'Trailing gas', when: by('GTAW', 'PAW', 'OTHER') },
      { kind: 'gas', path: 'plasmaGas', label: 'Orifice gas', when: by('PAW') },
    ],
  },
  {
    id: 'electrical',
    title: 'Electrical',
    rows: [
      { kind: 'choice', path: 'electrical.currentType', label: 'Current', options: words.CURRENT_TYPES },
      { kind: 'choice', path: 'electrical.powerSource', label: 'Power source', options: words.POWER_SOURCES },
      { kind: 'choice', path: 'electrical.transferMode', label: 'Transfer mode', options: words.TRANSFER_MODES, when: by('GMAW', 'FCAW') },
      { kind: 'flag', path: 'electrical.pulsed', label: 'Pulsed' },
      { kind: 'flag', path: 'electrical.waveformControlled', label: 'Waveform controlled', when: by('GMAW', 'FCAW', 'GTAW', 'SAW') },
      { kind: 'interval', path: 'electrical.current', label: 'Amps', dimension: 'current' },
      { kind: 'interval', path: 'electrical.makerCurrent', label: "Maker's amps", hint: 'as the maker recommends', dimension: 'current', when: judgedBy('aws-d1-1') },
      { kind: 'interval', path: 'electrical.voltage', label: 'Volts', dimension: 'voltage' },
      { kind: 'interval', path: 'electrical.wireFeed', label: 'Wire feed speed', dimension: 'wireFeed', when: by('GMAW', 'FCAW', 'SAW') },
      { kind: 'interval', path: 'electrical.travelSpeed', label: 'Travel speed', dimension: 'travelSpeed' },
      { kind: 'interval', path: 'electrical.heatInput', label: 'Heat input', dimension: 'heatInput' },
      { kind: 'choice', path: 'electrical.heatInputMethod', label: 'Heat input found by', options: words.HEAT_INPUT_METHODS },
      { kind: 'interval', path: 'electrical.peakCurrent', label: 'Peak current', dimension: 'current', when: pulsing },
      { kind: 'interval', path: 'electrical.backgroundCurrent', label: 'Background current', dimension: 'current', when: pulsing },
      { kind: 'interval', path: 'electrical.backgroundVoltage', label: 'Background voltage', dimension: 'voltage', when: pulsing },
      { kind: 'interval', path: 'electrical.pulseFrequency', label: 'Pulse frequency', dimension: 'frequency', when: pulsing },
      { kind: 'interval', path: 'electrical.pulseOnTime', label: 'Pulse on time', dimension: 'pulseTime', when: pulsing },
      { kind: 'interval', path: 'electrical.acFrequency', label: 'AC frequency', dimension: 'frequency', when: (_weld, block) => block?.electrical.currentType?.startsWith('AC') === true },
      { kind: 'text', path: 'electrical.tungstenClassification', label: 'Tungsten', max: 40, example: 'EWLa-1.5', when: by('GTAW', 'PAW') },
      { kind: 'quantity', path: 'electrical.tungstenDiameter', label: 'Tungsten diameter', dimension: 'length', when: by('GTAW', 'PAW') },
      { kind: 'panel', path: 'electrical.panel', label: 'Machine panel' },
    ],
  },
  {
    id: 'technique',
    title: 'Technique',
    rows: [
      { kind: 'choice', path: 'technique.bead', label: 'Bead', options: words.BEADS },
      { kind: 'text', path: 'technique.oscillation', label: 'Oscillation', max: 120, example: 'width 6 mm, dwell 0.3 s', when: mechanised },
      { kind: 'text', path: 'technique.initialCleaning', label: 'Initial cleaning', max: 200, example: 'acetone, then stainless brush' },
      { kind: 'text', path: 'technique.interpassCleaning', label: 'Interpass cleaning', max: 200, example: 'chip and wire brush' },
      { kind: 'choice', path: 'technique.passesPerSide', label: 'Passes per side', options: words.SINGLE_MULTIPLE },
      { kind: 'choice', path: 'technique.electrodes', label: 'Electrodes', options: words.SINGLE_MULTIPLE },
      { kind: 'quantity', path: 'technique.electrodeSpacing', label: 'Electrode spacing', dimension: 'length', when: several },
      { kind: 'whole', path: 'technique.electrodeCount', label: 'Number of electrodes', min: 1, max: 12, when: (weld, block) => judgedBy('aws-d1-1')(weld) && several(weld, block) },
      { kind: 'quantity', path: 'technique.lateralSpacing', label: 'Spacing across the joint', dimension: 'length', when: (weld, block) => judgedBy('aws-d1-1')(weld) && several(weld, block) },
      { kind: 'quantity', path: 'technique.parallelAngle', label: 'Angle of parallel electrode', dimension: 'angle', when: (weld, block) => judgedBy('aws-d1-1')(weld) && several(weld, block) },
      { kind: 'quantity', path: 'technique.travelAngle', label: 'Electrode angle, along travel', dimension: 'angle', when: (weld, block) => judgedBy('aws-d1-1')(weld) && by('SAW')(weld, block) },
      { kind: 'quantity', path: 'technique.normalAngle', label: 'Electrode angle, across travel', dimension: 'angle', when: (weld, block) => judgedBy('aws-d1-1')(weld) && by('SAW')(weld, block) },
      { kind: 'flag', path: 'technique.hotWire', label: 'Hot wire', when: (weld, block) => by('GTAW')(weld, block) && mechanised(weld, block) },
      { kind: 'interval', path: 'technique.contactTubeDistance', label: 'Contact tube to work', dimension: 'length', when: by('GMAW', 'FCAW', 'SAW') },
      { kind: 'text', path: 'technique.nozzleSize', label: 'Nozzle or cup', max: 40, example: '16 mm', when: by('GMAW', 'FCAW', 'GTAW', 'PAW') },
      { kind: 'choice', path: 'technique.peening', label: 'Peening', options: words.PEENINGS },
      { kind: 'choice', path: 'technique.keyhole', label: 'Keyhole', options: words.KEYHOLES, when: by('PAW') },
      { kind: 'flag', path: 'technique.closedChamber', label: 'Closed chamber', when: by('GTAW', 'PAW') },
      { kind: 'flag', path: 'technique.thermalPreparation', label: 'Thermal preparation', when: () => false },
      { kind: 'paragraph', path: 'technique.notes', label: 'Technique notes', max: 1000 },
    ],
  },
  { id: 'passes', title: 'Passes', rows: [{ kind: 'passes', path: 'passes', label: 'Passes' }] },
]

/** Rows told in words elsewhere on the page, for labels and the placing of findings. */
const GENERAL: readonly RowSpec[] = [
  { kind: 'flag', path: 'toughnessRequired', label: 'Toughness required' },
  { kind: 'choice', path: 'unitSystem', label: 'Written in', options: words.UNIT_SYSTEMS, always: true },
]
export const [TOUGHNESS, WRITTEN_IN] = GENERAL as [RowSpec, RowSpec]

/** Where a row stands: its path from the variables, with the block's prefix. */
export interface PlacedRow {
  spec: RowSpec
  path: string
  sectionId: string
}

const pathsOf = (spec: RowSpec): readonly string[] => [spec.path, ...(spec.kind === 'pair' ? spec.paths : []), ...(spec.also ?? [])]

/** Every row of a procedure with these blocks, in document order. */
export function placedRows(blocks: readonly unknown[]): PlacedRow[] {
  const at = (section: SectionSpec, prefix: string, id: string): PlacedRow[] => section.rows.map((spec) => ({ spec, path: `${prefix}${spec.path}`, sectionId: id }))
  return [
    ...GENERAL.map((spec) => ({ spec, path: spec.path, sectionId: 'scope' })),
    ...at(JOINT, '', 'joint'),
    ...at(BASE_METALS, '', 'base-metals'),
    ...blocks.flatMap((_, index) => BLOCK_SECTIONS.flatMap((section) => at(section, `processes.${index}.`, blockSectionId(index, section.id)))),
    ...at(PREHEAT, '', 'preheat'),
    ...at(PWHT, '', 'pwht'),
  ]
}

export const blockSectionId = (index: number, section: string): string => `process-${index + 1}-${section}`

/** All paths whose findings belong to a placed row. */
export function coveredPaths(row: PlacedRow): string[] {
  const prefix = row.path.slice(0, row.path.length - row.spec.path.length)
  return pathsOf(row.spec).map((path) => `${prefix}${path}`)
}
