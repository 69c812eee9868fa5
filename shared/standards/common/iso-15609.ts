/** What a WPS must state by ISO 15609-1 (heads of the contents list of 2019 read to 4.4.10; what belongs under them and what follows recalled). No coupon limits these. */
import type { Basis } from '../../schemas/assessment.ts'
import type { StandardId } from '../../schemas/common.ts'
import type { Process, ProcessBlock, WeldingVariables } from '../../schemas/welding.ts'
import type { Rule, RuleMeta } from '../rule.ts'
import { isoProcessNumber, secondMember } from './iso-names.ts'
import { isStated } from './reading.ts'
import { pathOf } from './rule-kinds.ts'
import { capital, notStated } from './wording.ts'

interface Row {
  file: string
  clause: string
  field: string
  at: 'weld' | 'block'
  label: string
  basis?: Basis
  processes?: readonly Process[]
  applies?: (variables: WeldingVariables, block: ProcessBlock) => boolean
  stated: (variables: WeldingVariables, block: ProcessBlock) => boolean
}

const pipe = (variables: WeldingVariables): boolean => variables.product !== 'plate'
const groove = (variables: WeldingVariables): boolean => variables.joint.weld === 'groove'
const fillet = (variables: WeldingVariables): boolean => variables.joint.weld === 'fillet'
const filled = (_: WeldingVariables, block: ProcessBlock): boolean => block.filler.added !== false
const byMachine = (_: WeldingVariables, block: ProcessBlock): boolean => block.mechanisation === 'machine' || block.mechanisation === 'automatic'
const vertical = (_: WeldingVariables, block: ProcessBlock): boolean => block.positions.some((position) => /^[356]/.test(position))
const shielded = (_: WeldingVariables, block: ProcessBlock): boolean => block.shieldingGas === null || block.shieldingGas.components.length > 0
const treated = (variables: WeldingVariables): boolean => variables.pwht.condition !== null && variables.pwht.condition !== 'none'
const released = (variables: WeldingVariables): boolean => variables.postHeating?.used === true
const GAS: readonly Process[] = ['GMAW', 'FCAW', 'GTAW', 'PAW']
const WIRE: readonly Process[] = ['SAW', 'GMAW', 'FCAW']

/** What a WPS states beyond these rows: a record has no place for it, or its document holds it. */
export const NOT_HELD: readonly string[] = ['contents of a WPS that a record has no place for: jigging and tacking, torch angles, depth and shape of gouging, handling and drying of fillers, minimum interpass temperature, run-out length of electrodes, polarity of each wire, type of plasma torch']

const ROWS: readonly Row[] = [
  { file: 'contents-parent-metal', clause: '4.3.1', field: 'baseMetals.a.grade', at: 'weld', label: 'parent metal designation and standard, both members', stated: ({ baseMetals: { a, b } }) => [a, b].every((metal) => metal.specification !== null && (metal.grade !== null || metal.uns !== null)) },
  { file: 'contents-parent-group', clause: '4.3.1', field: 'baseMetals.a.iso15608', at: 'weld', label: 'ISO/TR 15608 group of both members', basis: 'memory', stated: ({ baseMetals: { a, b } }) => a.iso15608 !== null && b.iso15608 !== null },
  { file: 'contents-parent-condition', clause: '4.3.1', field: 'baseMetals.a.condition', at: 'weld', label: 'heat-treatment condition of both parent metals', basis: 'memory', stated: (variables) => [variables.baseMetals.a, secondMember(variables)].every((metal) => (metal.condition ?? null) !== null) },
  { file: 'contents-thickness', clause: '4.3.2', field: 'thickness', at: 'weld', label: 'thickness range', stated: ({ thickness }) => isStated(thickness) },
  { file: 'contents-diameter', clause: '4.3.2', field: 'diameter', at: 'weld', label: 'outside diameter range', applies: pipe, stated: ({ diameter }) => isStated(diameter) },
  { file: 'contents-throat', clause: '4.3.2', field: 'joint.filletThroat', at: 'weld', label: 'fillet throat range', basis: 'memory', applies: fillet, stated: ({ joint }) => isStated(joint.filletThroat) || isStated(joint.filletLeg) },
  { file: 'contents-branch-angle', clause: '4.3.2', field: 'joint.branchAngle', at: 'weld', label: 'branch angle', basis: 'memory', applies: ({ joint }) => (joint.branch ?? null) !== null || isStated(joint.branchAngle), stated: ({ joint }) => isStated(joint.branchAngle) },
  { file: 'contents-process', clause: '4.4.1', field: 'process', at: 'block', label: 'ISO 4063 process, from process, filler form and gas', stated: (_, block) => isoProcessNumber(block) !== null },
  { file: 'contents-mechanisation', clause: '4.4.1', field: 'mechanisation', at: 'block', label: 'degree of mechanisation', basis: 'memory', stated: (_, { mechanisation }) => mechanisation !== null },
  { file: 'contents-groove', clause: '4.4.2', field: 'joint.groove', at: 'weld', label: 'joint design', applies: groove, stated: ({ joint }) => joint.groove !== null },
  { file: 'contents-root-gap', clause: '4.4.2', field: 'joint.rootOpening', at: 'weld', label: 'root gap', basis: 'memory', applies: groove, stated: ({ joint }) => isStated(joint.rootOpening) },
  { file: 'contents-sides', clause: '4.4.2', field: 'joint.weldedFromBothSides', at: 'weld', label: 'one side or both sides', basis: 'memory', applies: groove, stated: ({ joint }) => joint.weldedFromBothSides !== null },
  { file: 'contents-passes', clause: '4.4.2', field: 'passes', at: 'block', label: 'run sequence', basis: 'memory', stated: (_, { passes }) => passes.length > 0 },
  { file: 'contents-position', clause: '4.4.3', field: 'positions', at: 'block', label: 'welding position', stated: (_, { positions }) => positions.length > 0 },
  { file: 'contents-progression', clause: '4.4.3', field: 'progression', at: 'block', label: 'direction of vertical welding', basis: 'memory', applies: vertical, stated: (_, { progression }) => progression !== null },
  { file: 'contents-preparation', clause: '4.4.4', field: 'technique.initialCleaning', at: 'block', label: 'preparation and cleaning', stated: (_, { technique }) => technique.initialCleaning !== null },
  { file: 'contents-bead', clause: '4.4.5', field: 'technique.bead', at: 'block', label: 'stringer or weave', basis: 'memory', stated: (_, { technique }) => technique.bead !== null },
  { file: 'contents-oscillation', clause: '4.4.5', field: 'technique.oscillation', at: 'block', label: 'oscillation width, frequency and dwell, or none', basis: 'memory', applies: byMachine, stated: (_, { technique }) => technique.oscillation !== null },
  { file: 'contents-gouging', clause: '4.4.6', field: 'joint.backGouging', at: 'weld', label: 'back gouging method, or none', applies: groove, stated: ({ joint }) => joint.backGouging !== null },
  { file: 'contents-backing', clause: '4.4.7', field: 'joint.backing', at: 'weld', label: 'backing and its material, or none', applies: groove, stated: ({ joint }) => joint.backing !== null && (joint.backing === 'none' || joint.backing === 'weld-metal' || joint.backingMaterial !== null) },
  { file: 'contents-backing-gas', clause: '4.4.7', field: 'backingGas', at: 'block', label: 'backing gas, or none', basis: 'memory', processes: ['GTAW', 'PAW', 'GMAW'], applies: groove, stated: (_, { backingGas }) => backingGas !== null },
  { file: 'contents-filler', clause: '4.4.8', field: 'filler.classification', at: 'block', label: 'filler designation', basis: 'memory', applies: filled, stated: (_, { filler }) => filler.classification !== null },
  { file: 'contents-filler-make', clause: '4.4.8', field: 'filler.tradeName', at: 'block', label: 'make of filler', basis: 'memory', applies: filled, stated: (_, { filler }) => filler.tradeName !== null },
  { file: 'contents-filler-size', clause: '4.4.8', field: 'filler.diameters', at: 'block', label: 'filler size', basis: 'memory', applies: filled, stated: (_, { filler }) => filler.diameters.length > 0 },
  { file: 'contents-flux', clause: '4.4.8', field: 'filler.fluxClassification', at: 'block', label: 'flux designation and make', basis: 'memory', processes: ['SAW'], stated: (_, { filler }) => filler.fluxClassification !== null && filler.fluxTradeName !== null },
  { file: 'contents-current-type', clause: '4.4.9', field: 'electrical.currentType', at: 'block', label: 'type of current and polarity', basis: 'memory', stated: (_, { electrical }) => electrical.currentType !== null },
  { file: 'contents-current', clause: '4.4.9', field: 'electrical.current', at: 'block', label: 'current range or wire feed speed', basis: 'memory', stated: (_, { electrical }) => isStated(electrical.current) || isStated(electrical.wireFeed) },
  { file: 'contents-voltage', clause: '4.4.9', field: 'electrical.voltage', at: 'block', label: 'voltage range', basis: 'memory', stated: (_, { electrical }) => isStated(electrical.voltage) },
  { file: 'contents-pulse', clause: '4.4.9', field: 'electrical.pulsed', at: 'block', label: 'pulsed current and its data, or none', basis: 'memory', processes: GAS, stated: (_, { electrical }) => electrical.pulsed === false || (electrical.pulsed === true && (isStated(electrical.pulseFrequency) || electrical.panel !== null)) },
  { file: 'contents-travel-speed', clause: '4.4.10', field: 'electrical.travelSpeed', at: 'block', label: 'travel speed range', basis: 'memory', applies: byMachine, stated: (_, { electrical }) => isStated(electrical.travelSpeed) },
  { file: 'contents-wire-feed', clause: '4.4.10', field: 'electrical.wireFeed', at: 'block', label: 'wire feed speed range', basis: 'memory', processes: WIRE, applies: byMachine, stated: (_, { electrical }) => isStated(electrical.wireFeed) },
  { file: 'contents-preheat', clause: '4.4.11', field: 'preheat.minimum', at: 'weld', label: 'minimum preheat', basis: 'memory', stated: ({ preheat }) => preheat.minimum !== null },
  { file: 'contents-interpass', clause: '4.4', field: 'preheat.interpassMaximum', at: 'weld', label: 'maximum interpass temperature', basis: 'memory', stated: ({ preheat }) => preheat.interpassMaximum !== null },
  { file: 'contents-preheat-maintenance', clause: '4.4', field: 'preheat.maintenance', at: 'weld', label: 'preheat maintenance, or none', basis: 'memory', stated: ({ preheat }) => preheat.maintenance !== null },
  { file: 'contents-post-heating', clause: '4.4', field: 'postHeating', at: 'weld', label: 'hydrogen release, or none', basis: 'memory', stated: ({ postHeating }) => postHeating?.used === false || (postHeating?.used === true && isStated(postHeating.temperature) && isStated(postHeating.time)) },
  { file: 'contents-pwht', clause: '4.4', field: 'pwht.condition', at: 'weld', label: 'heat treatment after welding, or none', basis: 'memory', stated: ({ pwht }) => pwht.condition !== null },
  { file: 'contents-pwht-cycle', clause: '4.4', field: 'pwht.temperature', at: 'weld', label: 'heat treatment temperature, time and rates', basis: 'memory', applies: treated, stated: ({ pwht }) => isStated(pwht.temperature) && isStated(pwht.time) && pwht.heatingRate !== null },
  { file: 'contents-gas', clause: '4.4', field: 'shieldingGas', at: 'block', label: 'shielding gas, or none', basis: 'memory', processes: GAS, stated: (_, { shieldingGas }) => shieldingGas !== null },
  { file: 'contents-gas-flow', clause: '4.5', field: 'shieldingGas.flow', at: 'block', label: 'shielding gas flow', basis: 'memory', processes: GAS, applies: shielded, stated: (_, { shieldingGas }) => isStated(shieldingGas?.flow) },
  { file: 'contents-heat-input', clause: '4.4', field: 'electrical.heatInput', at: 'block', label: 'heat input or arc energy, and which of the two', basis: 'memory', applies: (variables) => variables.toughnessRequired === true || variables.hardnessRequired === true, stated: (_, { electrical }) => isStated(electrical.heatInput) && (electrical.heatInputQuantity ?? null) !== null },
  { file: 'contents-wires', clause: '4.5', field: 'technique.electrodes', at: 'block', label: 'one wire or several', basis: 'memory', processes: WIRE, stated: (_, { technique }) => technique.electrodes !== null },
  { file: 'contents-contact-tube', clause: '4.5', field: 'technique.contactTubeDistance', at: 'block', label: 'contact tube distance', basis: 'memory', processes: ['SAW', 'GMAW', 'FCAW'], stated: (_, { technique }) => isStated(technique.contactTubeDistance) },
  { file: 'contents-nozzle', clause: '4.5', field: 'technique.nozzleSize', at: 'block', label: 'nozzle size', basis: 'memory', processes: GAS, stated: (_, { technique }) => technique.nozzleSize !== null },
  { file: 'contents-transfer-mode', clause: '4.5', field: 'electrical.transferMode', at: 'block', label: 'transfer mode', basis: 'memory', processes: ['GMAW', 'FCAW'], stated: (_, { electrical }) => electrical.transferMode !== null },
  { file: 'contents-tungsten', clause: '4.5', field: 'electrical.tungstenClassification', at: 'block', label: 'tungsten electrode type and diameter', basis: 'memory', processes: ['GTAW', 'PAW'], stated: (_, { electrical }) => electrical.tungstenClassification !== null && electrical.tungstenDiameter !== null },
  { file: 'contents-hot-wire', clause: '4.5', field: 'technique.hotWire', at: 'block', label: 'hot or cold wire', basis: 'memory', processes: ['GTAW'], applies: (variables, block) => byMachine(variables, block) && filled(variables, block), stated: (_, { technique }) => (technique.hotWire ?? null) !== null },
  { file: 'contents-plasma-gas', clause: '4.5', field: 'plasmaGas', at: 'block', label: 'plasma gas and its flow', basis: 'memory', processes: ['PAW'], stated: (_, { plasmaGas }) => plasmaGas !== null && isStated(plasmaGas.flow) },
  { file: 'contents-release-cycle', clause: '4.4', field: 'postHeating.temperature', at: 'weld', label: 'hydrogen release temperature and time', basis: 'memory', applies: released, stated: ({ postHeating }) => isStated(postHeating?.temperature) && isStated(postHeating?.time) },
]

/** One rule a row, for the standard that asks for the contents of ISO 15609-1. */
export const wpsContents = (standard: StandardId, editions: RuleMeta['editions'], processes: readonly Process[]): readonly Rule[] =>
  ROWS.filter((row) => !row.processes || row.processes.some((process) => processes.includes(process))).map((row) => ({
    meta: {
      id: `${standard}/${row.file}`,
      title: capital(row.label),
      standard,
      clause: `ISO 15609-1 ${row.clause}`,
      editions,
      classes: Object.fromEntries((row.processes ?? processes).filter((process) => processes.includes(process)).map((process) => [process, 'nonessential'])),
      basis: row.basis ?? 'read',
      source: row.basis === 'memory' ? 'ISO 15609-1:2019, recalled' : 'ISO 15609-1:2019, head in the list of contents (read)',
      statement: `The WPS states the ${row.label}; no coupon limits it by this clause.`,
      scope: 'process',
      combine: 'each',
      withoutCoupon: true,
    },
    field: row.field,
    at: row.at,
    label: capital(row.label),
    applies: row.applies && ((context) => context.block !== null && row.applies?.(context.procedure, context.block) !== false),
    range: () => null,
    check(context) {
      const { procedure, block } = context
      if (!block || (row.applies && !row.applies(procedure, block))) return null
      if (!row.stated(procedure, block)) return notStated(row.label, pathOf(context, row))
      return { verdict: 'within', sentence: `The procedure states the ${row.label.replace(/, or none$/, '')}.`, asked: null, range: null, tested: [] }
    },
  }))
