/** Every field of a weld's variables, a procedure and a coupon: its name in the trade's words, its dimension and the section it stands in, in the document's order. */
import type { Dimension } from '../units/types.ts'

/** How a value is read: a measured one by its dimension, a choice by its words. */
export type FieldKind = 'text' | 'choice' | 'boolean' | 'number' | 'date' | 'quantity' | 'interval' | 'quantities' | 'positions' | 'gas' | 'standards' | 'panel' | 'ids' | 'openings' | 'numbers'

export interface Field {
  /** Dotted path with `*` for a place in a list; paths of a weld's variables stand without the prefix `variables`. */
  path: string
  label: string
  section: string
  kind: FieldKind
  /** Of quantities and intervals. */
  dimension: Dimension | null
}

type Entry = readonly [path: string, label: string, kind?: FieldKind, dimension?: Dimension]
const section = (name: string, prefix: string, entries: readonly Entry[]): Field[] => entries.map(([path, label, kind = 'text', dimension]) => ({ path: prefix + path, label, section: name, kind, dimension: dimension ?? null }))

const baseMetal = (side: 'a' | 'b'): Field[] =>
  section('Base metals', `baseMetals.${side}.`, (
    [
      ['libraryId', 'library row'],
      ['specification', 'specification'],
      ['grade', 'grade'],
      ['uns', 'UNS or EN number'],
      ['productForm', 'product form'],
      ['pNumber', 'P-Number'],
      ['groupNumber', 'Group Number', 'number'],
      ['iso15608', 'ISO 15608 group'],
      ['d11Group', 'AWS D1.1 group'],
      ['d12MNumber', 'AWS D1.2 M-Number'],
      ['minTensile', 'minimum tensile strength', 'quantity', 'stress'],
      ['minYield', 'minimum yield strength', 'quantity', 'stress'],
      ['minElongation', 'minimum elongation', 'quantity', 'percent'],
      ['condition', 'heat-treatment condition or temper'],
      ['impactSpecified', 'impact values specified', 'boolean'],
      ['heatNumber', 'heat number'],
      ['certificate', 'certificate'],
    ] as const satisfies readonly Entry[]
  ).map(([path, label, ...rest]): Entry => [path, `Base metal ${side.toUpperCase()} ${label}`, ...rest]))

const gas = (path: string, name: string): readonly Entry[] => [
  [`${path}.libraryId`, `${name} library row`],
  [`${path}.components`, name, 'gas'],
  [`${path}.isoSymbol`, `${name} ISO 14175 symbol`],
  [`${path}.name`, `${name} name`],
  [`${path}.flow`, `${name} flow`, 'interval', 'gasFlow'],
]

const variables: readonly Field[] = [
  ...section('Heading', '', [
    ['standards', 'Standards', 'standards'],
    ['unitSystem', 'Units', 'choice'],
    ['toughnessRequired', 'Toughness required', 'boolean'],
    ['impactTemperature', 'Impact test temperature', 'quantity', 'temperature'],
    ['impactEnergy', 'Impact energy required', 'quantity', 'energy'],
    ['hardnessRequired', 'Hardness required', 'boolean'],
    ['serviceTemperature', 'Service temperature', 'quantity', 'temperature'],
    ['product', 'Product', 'choice'],
  ]),
  ...section('Joint', 'joint.', [
    ['weld', 'Weld', 'choice'],
    ['work', 'Repair or build-up', 'choice'],
    ['type', 'Joint type', 'choice'],
    ['designation', 'Joint detail designation'],
    ['penetration', 'Penetration', 'choice'],
    ['groove', 'Groove', 'choice'],
    ['includedAngle', 'Included angle', 'interval', 'angle'],
    ['bevelAngle', 'Bevel angle', 'interval', 'angle'],
    ['rootOpening', 'Root opening', 'interval', 'length'],
    ['rootFace', 'Root face', 'interval', 'length'],
    ['rootRadius', 'Root radius', 'interval', 'length'],
    ['grooveDepth', 'Groove depth', 'interval', 'length'],
    ['secondDepth', 'Groove depth of the second side', 'interval', 'length'],
    ['secondAngle', 'Groove angle of the second side', 'interval', 'angle'],
    ['angleChange', 'Height at which the angle changes', 'interval', 'length'],
    ['reinforcingFillet', 'Reinforcing fillet', 'interval', 'length'],
    ['filletLeg', 'Fillet leg', 'interval', 'length'],
    ['filletLegB', 'Fillet leg on B', 'interval', 'length'],
    ['memberAngle', 'Angle between the members', 'interval', 'angle'],
    ['filletThroat', 'Fillet throat', 'interval', 'length'],
    ['branch', 'Branch connection', 'choice'],
    ['branchAngle', 'Branch angle', 'interval', 'angle'],
    ['alignment', 'Flush surfaces', 'choice'],
    ['taperAngle', 'Taper', 'interval', 'angle'],
    ['pressureRetaining', 'Pressure retaining', 'boolean'],
    ['backing', 'Backing', 'choice'],
    ['backingMaterial', 'Backing material'],
    ['backingThickness', 'Backing thickness', 'interval', 'length'],
    ['backingWidth', 'Backing width', 'interval', 'length'],
    ['insertWidth', 'Insert width', 'interval', 'length'],
    ['insertHeight', 'Insert height', 'interval', 'length'],
    ['retainers', 'Retainers', 'boolean'],
    ['backGouging', 'Back gouging', 'choice'],
    ['backGougeDepth', 'Back gouging depth', 'interval', 'length'],
    ['weldedFromBothSides', 'Welded from both sides', 'boolean'],
    ['notes', 'Joint notes'],
  ]),
  ...baseMetal('a'),
  ...baseMetal('b'),
  ...section('Base metals', '', [
    ['thickness', 'Base metal thickness', 'interval', 'length'],
    ['thicknessB', 'Base metal B thickness', 'interval', 'length'],
    ['diameter', 'Outside diameter', 'interval', 'length'],
    ['diameterB', 'Outside diameter of member B', 'interval', 'length'],
    ['pipeRotated', 'Pipe rotated', 'boolean'],
  ]),
  ...section('Preheat', 'preheat.', [
    ['minimum', 'Preheat minimum', 'quantity', 'temperature'],
    ['interpassMaximum', 'Interpass maximum', 'quantity', 'temperature'],
    ['maintenance', 'Preheat maintenance'],
    ['method', 'Preheat method'],
  ]),
  ...section('Preheat', 'postHeating.', [
    ['used', 'Post-heating', 'boolean'],
    ['temperature', 'Post-heating temperature', 'interval', 'temperature'],
    ['time', 'Post-heating time', 'interval', 'time'],
  ]),
  ...section('PWHT', 'pwht.', [
    ['condition', 'PWHT condition', 'choice'],
    ['ageing', 'Ageing', 'choice'],
    ['temperature', 'PWHT temperature', 'interval', 'temperature'],
    ['time', 'PWHT time', 'interval', 'time'],
    ['heatingRate', 'PWHT heating rate'],
    ['notes', 'PWHT notes'],
  ]),
  ...section('Process', 'processes.*.', [
    ['process', 'Process', 'choice'],
    ['mechanisation', 'Mechanisation', 'choice'],
    ['depositThickness', 'Deposited weld metal thickness', 'interval', 'length'],
    ['maxPassThickness', 'Pass thickness maximum', 'quantity', 'length'],
  ]),
  ...section('Filler metals', 'processes.*.filler.', [
    ['added', 'Filler metal added', 'boolean'],
    ['libraryId', 'Filler metal library row'],
    ['specification', 'Filler metal specification'],
    ['classification', 'Filler metal classification'],
    ['tradeName', 'Filler metal trade name'],
    ['lot', 'Filler metal lot'],
    ['fNumber', 'F-Number'],
    ['aNumber', 'A-Number', 'number'],
    ['depositComposition', 'Deposit composition'],
    ['productForm', 'Filler metal product form', 'choice'],
    ['diameters', 'Filler metal diameters', 'quantities', 'length'],
    ['supplemental', 'Supplemental filler metal', 'boolean'],
    ['supplementalVolume', 'Supplemental filler metal volume', 'quantity', 'percent'],
    ['supplementalAlloyElement', 'Supplemental alloy elements', 'boolean'],
    ['consumableInsert', 'Consumable insert', 'boolean'],
    ['fluxClassification', 'Flux and wire classification'],
    ['fluxTradeName', 'Flux trade name'],
    ['fluxType', 'Flux type', 'choice'],
    ['fluxIsRecrushedSlag', 'Recrushed slag', 'boolean'],
    ['penetrationFlux', 'Penetration enhancing flux', 'boolean'],
  ]),
  ...section('Positions', 'processes.*.', [
    ['positions', 'Positions', 'positions'],
    ['progression', 'Vertical progression', 'choice'],
  ]),
  ...section('Gas', 'processes.*.', [...gas('shieldingGas', 'Shielding gas'), ...gas('backingGas', 'Backing gas'), ...gas('trailingGas', 'Trailing gas'), ...gas('plasmaGas', 'Plasma gas')]),
  ...section('Electrical', 'processes.*.electrical.', [
    ['currentType', 'Current type and polarity', 'choice'],
    ['transferMode', 'Transfer mode', 'choice'],
    ['pulsed', 'Pulsed current', 'boolean'],
    ['waveformControlled', 'Waveform controlled', 'boolean'],
    ['powerSource', 'Power source', 'choice'],
    ['current', 'Current', 'interval', 'current'],
    ['voltage', 'Voltage', 'interval', 'voltage'],
    ['makerCurrent', 'Current recommended by the maker', 'interval', 'current'],
    ['wireFeed', 'Wire feed speed', 'interval', 'wireFeed'],
    ['travelSpeed', 'Travel speed', 'interval', 'travelSpeed'],
    ['heatInput', 'Heat input', 'interval', 'heatInput'],
    ['heatInputMethod', 'Heat input method', 'choice'],
    ['heatInputQuantity', 'Heat input or arc energy', 'choice'],
    ['tungstenClassification', 'Tungsten classification'],
    ['tungstenDiameter', 'Tungsten diameter', 'quantity', 'length'],
    ['pulseFrequency', 'Pulse frequency', 'interval', 'frequency'],
    ['pulseOnTime', 'Pulse on-time', 'interval', 'pulseTime'],
    ['backgroundCurrent', 'Background current', 'interval', 'current'],
    ['backgroundVoltage', 'Background voltage', 'interval', 'voltage'],
    ['peakCurrent', 'Peak current', 'interval', 'current'],
    ['acFrequency', 'AC frequency', 'interval', 'frequency'],
    ['panel.machine', 'Panel card machine'],
    ['panel.mode', 'Panel card mode'],
    ['panel.caution', 'Panel card caution'],
    ['panel.settings', 'Panel card settings', 'panel'],
  ]),
  ...section('Technique', 'processes.*.technique.', [
    ['bead', 'Stringer or weave', 'choice'],
    ['oscillation', 'Oscillation'],
    ['initialCleaning', 'Initial cleaning'],
    ['interpassCleaning', 'Interpass cleaning'],
    ['passesPerSide', 'Single or multiple passes per side', 'choice'],
    ['electrodes', 'Single or multiple electrodes', 'choice'],
    ['electrodeSpacing', 'Electrode spacing', 'quantity', 'length'],
    ['electrodeCount', 'Number of electrodes', 'number'],
    ['lateralSpacing', 'Electrode spacing across the joint', 'quantity', 'length'],
    ['parallelAngle', 'Angle of the parallel electrode', 'quantity', 'angle'],
    ['travelAngle', 'Electrode angle along travel', 'quantity', 'angle'],
    ['normalAngle', 'Electrode angle across travel', 'quantity', 'angle'],
    ['hotWire', 'Hot wire', 'boolean'],
    ['contactTubeDistance', 'Contact tube to work distance', 'interval', 'length'],
    ['nozzleSize', 'Nozzle or gas cup size'],
    ['peening', 'Peening', 'choice'],
    ['closedChamber', 'Closed chamber', 'boolean'],
    ['keyhole', 'Melt-in or keyhole', 'choice'],
    ['thermalPreparation', 'Thermal edge preparation', 'boolean'],
    ['notes', 'Technique notes'],
  ]),
  ...section('Passes', 'processes.*.passes.*.', [
    ['number', 'Pass number'],
    ['layer', 'Layer', 'choice'],
    ['fillerDiameter', 'Filler diameter', 'quantity', 'length'],
    ['current', 'Current', 'interval', 'current'],
    ['voltage', 'Voltage', 'interval', 'voltage'],
    ['wireFeed', 'Wire feed speed', 'interval', 'wireFeed'],
    ['travelSpeed', 'Travel speed', 'interval', 'travelSpeed'],
    ['beadArea', 'Bead section', 'quantity', 'area'],
    ['side', 'Side', 'choice'],
    ['order', 'Place in the sequence', 'number'],
  ]),
]

const coupon: readonly Field[] = [
  ...section('Coupon', '', [
    ['weldedOn', 'Welded on', 'date'],
    ['welder', 'Welder'],
    ['welderStamp', 'Welder stamp'],
    ['witness', 'Witness'],
    ['machine', 'Machine'],
  ]),
  ...section('Run sheet', 'runSheet.*.', [
    ['pass', 'Pass number'],
    ['processId', 'Process block'],
    ['layer', 'Layer', 'choice'],
    ['fillerDiameter', 'Filler diameter', 'quantity', 'length'],
    ['current', 'Current', 'interval', 'current'],
    ['voltage', 'Voltage', 'interval', 'voltage'],
    ['wireFeed', 'Wire feed speed', 'interval', 'wireFeed'],
    ['travelSpeed', 'Travel speed', 'interval', 'travelSpeed'],
    ['length', 'Bead length', 'quantity', 'length'],
    ['arcTime', 'Arc time', 'quantity', 'duration'],
    ['instantaneousEnergy', 'Instantaneous energy', 'quantity', 'energy'],
    ['interpass', 'Interpass temperature', 'quantity', 'temperature'],
    ['note', 'Note'],
  ]),
  ...section('Tension tests', 'tension.*.', [
    ['specimen', 'Specimen'],
    ['kind', 'Specimen kind', 'choice'],
    ['width', 'Width', 'quantity', 'length'],
    ['thickness', 'Thickness', 'quantity', 'length'],
    ['diameter', 'Diameter', 'quantity', 'length'],
    ['load', 'Ultimate load', 'quantity', 'force'],
    ['reportedStrength', 'Reported tensile strength', 'quantity', 'stress'],
    ['fracture', 'Place of fracture', 'choice'],
    ['fractureType', 'Type of fracture', 'choice'],
  ]),
  ...section('Bend tests', 'bends.*.', [
    ['specimen', 'Specimen'],
    ['kind', 'Bend', 'choice'],
    ['thickness', 'Specimen thickness', 'quantity', 'length'],
    ['formerDiameter', 'Former diameter', 'quantity', 'length'],
    ['angle', 'Bend angle', 'quantity', 'angle'],
    ['openings', 'Open discontinuities', 'openings', 'length'],
    ['inspected', 'Inspected', 'boolean'],
    ['broke', 'Broke', 'boolean'],
  ]),
  ...section('Macro sections', 'macros.*.', [
    ['specimen', 'Specimen'],
    ['fusionComplete', 'Fusion complete', 'boolean'],
    ['cracks', 'Cracks', 'boolean'],
    ['leg1', 'First leg', 'quantity', 'length'],
    ['leg2', 'Second leg', 'quantity', 'length'],
  ]),
  ...section('Toughness tests', 'toughness.*.', [
    ['place', 'Notch in', 'choice'],
    ['temperature', 'Test temperature', 'quantity', 'temperature'],
    ['size', 'Specimen size'],
    ['values', 'Absorbed energy', 'quantities', 'energy'],
    ['lateralExpansion', 'Lateral expansion', 'quantities', 'length'],
  ]),
  ...section('Hardness tests', 'hardness.*.', [
    ['scale', 'Scale', 'choice'],
    ['place', 'Place', 'choice'],
    ['values', 'Hardness', 'numbers'],
  ]),
  ...section('Visual examination', 'visual.', [
    ['cracks', 'Cracks', 'boolean'],
    ['cratersFull', 'Craters full', 'boolean'],
    ['rootSound', 'Root sound', 'boolean'],
    ['profileAccepted', 'Profile accepted', 'boolean'],
    ['reinforcement', 'Reinforcement', 'quantity', 'length'],
    ['undercut', 'Undercut', 'quantity', 'length'],
    ['rootConcavity', 'Root concavity', 'quantity', 'length'],
    ['meltThrough', 'Melt-through', 'quantity', 'length'],
    ['weldThickness', 'Weld thickness at the concave root', 'quantity', 'length'],
  ]),
  ...section('Nondestructive testing', 'ndt.*.', [
    ['method', 'Method', 'choice'],
    ['wholeLength', 'Whole length tested', 'boolean'],
    ['accepted', 'Accepted', 'boolean'],
    ['reportNumber', 'Report number'],
    ['note', 'Note'],
  ]),
  ...section('Laboratory', '', [
    ['laboratory', 'Laboratory'],
    ['reportNumber', 'Report number'],
    ['testedOn', 'Tested on', 'date'],
  ]),
]

/** All fields in the document's order; a procedure has no coupon fields and the reverse. */
export const FIELDS: readonly Field[] = [
  ...section('Heading', '', [
    ['title', 'Title'],
    ['scope', 'Scope'],
  ]),
  ...variables,
  ...coupon,
  ...section('Heading', '', [
    ['supportingCoupons', 'Supporting coupons', 'ids'],
    ['notes', 'Notes'],
  ]),
]

/** Names of parts that are not single values, where a finding stands beside the whole part. */
const PARTS: Readonly<Record<string, readonly [label: string, section: string]>> = {
  joint: ['Joint', 'Joint'],
  baseMetals: ['Base metals', 'Base metals'],
  'baseMetals.a': ['Base metal A', 'Base metals'],
  'baseMetals.b': ['Base metal B', 'Base metals'],
  preheat: ['Preheat', 'Preheat'],
  postHeating: ['Post-heating', 'Preheat'],
  pwht: ['PWHT', 'PWHT'],
  processes: ['Processes', 'Process'],
  'processes.*': ['Process', 'Process'],
  'processes.*.filler': ['Filler metal', 'Filler metals'],
  'processes.*.shieldingGas': ['Shielding gas', 'Gas'],
  'processes.*.backingGas': ['Backing gas', 'Gas'],
  'processes.*.trailingGas': ['Trailing gas', 'Gas'],
  'processes.*.plasmaGas': ['Plasma gas', 'Gas'],
  'processes.*.electrical': ['Electrical', 'Electrical'],
  'processes.*.electrical.panel': ['Panel card', 'Electrical'],
  'processes.*.technique': ['Technique', 'Technique'],
  'processes.*.passes': ['Passes', 'Passes'],
  'processes.*.passes.*': ['Pass', 'Passes'],
  runSheet: ['Run sheet', 'Run sheet'],
  tension: ['Tension tests', 'Tension tests'],
  bends: ['Bend tests', 'Bend tests'],
  macros: ['Macro sections', 'Macro sections'],
  toughness: ['Toughness tests', 'Toughness tests'],
  hardness: ['Hardness tests', 'Hardness tests'],
  visual: ['Visual examination', 'Visual examination'],
  ndt: ['Nondestructive testing', 'Nondestructive testing'],
}

const byPath = new Map(FIELDS.map((field) => [field.path, field]))

/** `variables.processes.0.filler.fNumber` → `processes.*.filler.fNumber` */
export const fieldPattern = (path: string): string => path.replace(/^variables\./, '').split('.').map((part) => (/^\d+$/.test(part) ? '*' : part)).join('.')

/**
 * The field at a dotted path, or the nearest one above it: `preheat.minimum.si` is `preheat.minimum`.
 * @returns null for a part or an unknown path
 */
export function fieldAt(path: string): Field | null {
  const parts = fieldPattern(path).split('.')
  for (let length = parts.length; length > 0; length -= 1) {
    const field = byPath.get(parts.slice(0, length).join('.'))
    if (field) return field
  }
  return null
}

/** The name of a field or part in the trade's words; the last word of the path, spaced, for one that is not known. */
export function fieldLabel(path: string): string {
  const known = fieldAt(path)?.label ?? PARTS[fieldPattern(path)]?.[0]
  if (known) return known
  const last = path.split('.').filter((part) => !/^\d+$/.test(part)).at(-1) ?? path
  const spaced = last.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase()
  return spaced.charAt(0).toUpperCase() + spaced.slice(1)
}

/** The section of the document in which a field or part stands; null when it is not known. */
export const fieldSection = (path: string): string | null => fieldAt(path)?.section ?? PARTS[fieldPattern(path)]?.[1] ?? null
