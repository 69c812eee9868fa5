/** Nonessential variables: no coupon limits them, but the procedure must state its own value (QW-200.1). One rule a row. */
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import { isStated } from '../../common/reading.ts'
import { notStated } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { pathOf } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import type { Paragraph } from '../variables.ts'

interface Row {
  paragraph: Paragraph
  file: string
  field: string
  at: 'weld' | 'block'
  label: string
  /** Absent = always. */
  applies?: (variables: WeldingVariables, block: ProcessBlock) => boolean
  stated: (variables: WeldingVariables, block: ProcessBlock) => boolean
}

const groove = (variables: WeldingVariables): boolean => variables.joint.weld === 'groove'
const byHand = (_: WeldingVariables, block: ProcessBlock): boolean => block.mechanisation === null || block.mechanisation === 'manual' || block.mechanisation === 'semiautomatic'
const byMachine = (_: WeldingVariables, block: ProcessBlock): boolean => block.mechanisation === 'machine' || block.mechanisation === 'automatic'
const filled = (_: WeldingVariables, block: ProcessBlock): boolean => block.filler.added !== false
const VERTICAL: ReadonlySet<string> = new Set(['3G', '3F', '5G', '5F', '6G', '6GR'])

/** Amperage (or wire feed); voltage too, save for SMAW, GTAW and waveform control. */
function electricalStated(_: WeldingVariables, { process, electrical }: ProcessBlock): boolean {
  const amps = isStated(electrical.current) || isStated(electrical.wireFeed)
  return amps && (isStated(electrical.voltage) || process === 'SMAW' || process === 'GTAW' || electrical.waveformControlled === true)
}

const ROWS: readonly Row[] = [
  { paragraph: 'QW-402.1', file: 'groove-type', field: 'joint.groove', at: 'weld', label: 'groove type', applies: groove, stated: ({ joint }) => joint.groove !== null },
  { paragraph: 'QW-402.4', file: 'backing', field: 'joint.backing', at: 'weld', label: 'backing, or none', applies: groove, stated: ({ joint }) => joint.backing !== null },
  { paragraph: 'QW-402.5', file: 'backing-composition', field: 'joint.backing', at: 'weld', label: 'backing and its composition, or none', applies: groove, stated: ({ joint }) => joint.backing !== null && (joint.backing === 'none' || joint.backing === 'weld-metal' || joint.backingMaterial !== null) },
  { paragraph: 'QW-402.10', file: 'root-spacing', field: 'joint.rootOpening', at: 'weld', label: 'root spacing', applies: groove, stated: ({ joint }) => isStated(joint.rootOpening) },
  { paragraph: 'QW-402.11', file: 'retainers', field: 'joint.retainers', at: 'weld', label: 'retainers, or none', stated: ({ joint }) => joint.retainers !== null },
  { paragraph: 'QW-404.3', file: 'filler-size', field: 'filler.diameters', at: 'block', label: 'filler metal size', applies: filled, stated: (_, { filler }) => filler.diameters.length > 0 },
  { paragraph: 'QW-404.6', file: 'electrode-size', field: 'filler.diameters', at: 'block', label: 'electrode or wire diameter', stated: (_, { filler }) => filler.diameters.length > 0 },
  { paragraph: 'QW-404.22', file: 'consumable-insert', field: 'filler.consumableInsert', at: 'block', label: 'consumable insert, or none', stated: (_, { filler }) => filler.consumableInsert !== null },
  { paragraph: 'QW-404.29', file: 'flux-name', field: 'filler.fluxTradeName', at: 'block', label: 'flux trade name and designation', stated: (_, { filler }) => filler.fluxTradeName !== null },
  { paragraph: 'QW-404.33', file: 'classification', field: 'filler.classification', at: 'block', label: 'filler classification or trade name', applies: filled, stated: (_, { filler }) => filler.classification !== null || filler.tradeName !== null },
  { paragraph: 'QW-404.50', file: 'penetration-flux', field: 'filler.penetrationFlux', at: 'block', label: 'penetration flux, or none', stated: (_, { filler }) => filler.penetrationFlux !== null },
  { paragraph: 'QW-405.1', file: 'position', field: 'positions', at: 'block', label: 'positions', stated: (_, { positions }) => positions.length > 0 },
  { paragraph: 'QW-405.3', file: 'progression', field: 'progression', at: 'block', label: 'direction of vertical welding', applies: (_, { positions }) => positions.length === 0 || positions.some((position) => VERTICAL.has(position)), stated: (_, { progression }) => progression !== null },
  { paragraph: 'QW-406.2', file: 'preheat-maintenance', field: 'preheat.maintenance', at: 'weld', label: 'preheat maintenance', stated: ({ preheat }) => preheat.maintenance !== null },
  { paragraph: 'QW-408.1', file: 'trailing-gas', field: 'trailingGas', at: 'block', label: 'trailing gas, or none', stated: (_, { trailingGas }) => trailingGas !== null },
  { paragraph: 'QW-408.3', file: 'gas-flow', field: 'shieldingGas.flow', at: 'block', label: 'shielding gas flow', applies: (_, { shieldingGas }) => shieldingGas === null || shieldingGas.components.length > 0, stated: (_, { shieldingGas }) => isStated(shieldingGas?.flow) },
  { paragraph: 'QW-408.5', file: 'backing-gas', field: 'backingGas', at: 'block', label: 'backing gas, or none', stated: (_, { backingGas }) => backingGas !== null && (backingGas.components.length === 0 || isStated(backingGas.flow)) },
  { paragraph: 'QW-408.21', file: 'plasma-gas-flow', field: 'plasmaGas.flow', at: 'block', label: 'orifice and shielding gas flow', stated: (_, { plasmaGas, shieldingGas }) => isStated(plasmaGas?.flow) && isStated(shieldingGas?.flow) },
  { paragraph: 'QW-409.3', file: 'pulsing', field: 'electrical.pulsed', at: 'block', label: 'pulsed current, or none', stated: (_, { electrical }) => electrical.pulsed !== null },
  { paragraph: 'QW-409.8', file: 'current-and-voltage', field: 'electrical.current', at: 'block', label: 'current and voltage ranges', stated: electricalStated },
  { paragraph: 'QW-409.12', file: 'tungsten', field: 'electrical.tungstenClassification', at: 'block', label: 'tungsten electrode type and size', stated: (_, { electrical }) => electrical.tungstenClassification !== null && electrical.tungstenDiameter !== null },
  { paragraph: 'QW-410.1', file: 'bead', field: 'technique.bead', at: 'block', label: 'stringer or weave bead', applies: byHand, stated: (_, { technique }) => technique.bead !== null },
  { paragraph: 'QW-410.3', file: 'nozzle-size', field: 'technique.nozzleSize', at: 'block', label: 'orifice, cup or nozzle size', stated: (_, { technique }) => technique.nozzleSize !== null },
  { paragraph: 'QW-410.5', file: 'cleaning', field: 'technique.initialCleaning', at: 'block', label: 'initial and interpass cleaning', stated: (_, { technique }) => technique.initialCleaning !== null && technique.interpassCleaning !== null },
  { paragraph: 'QW-410.6', file: 'back-gouging', field: 'joint.backGouging', at: 'weld', label: 'back gouging method, or none', applies: groove, stated: ({ joint }) => joint.backGouging !== null },
  { paragraph: 'QW-410.7', file: 'oscillation', field: 'technique.oscillation', at: 'block', label: 'oscillation width, frequency and dwell', applies: byMachine, stated: (_, { technique }) => technique.oscillation !== null },
  { paragraph: 'QW-410.8', file: 'contact-tube-distance', field: 'technique.contactTubeDistance', at: 'block', label: 'contact tube to work distance', stated: (_, { technique }) => isStated(technique.contactTubeDistance) },
  { paragraph: 'QW-410.15', file: 'electrode-spacing', field: 'technique.electrodeSpacing', at: 'block', label: 'electrode spacing', applies: (variables, block) => byMachine(variables, block) && block.technique.electrodes === 'multiple', stated: (_, { technique }) => technique.electrodeSpacing !== null },
  { paragraph: 'QW-410.25', file: 'mechanisation', field: 'mechanisation', at: 'block', label: 'mechanisation', stated: (_, { mechanisation }) => mechanisation !== null },
  { paragraph: 'QW-410.26', file: 'peening', field: 'technique.peening', at: 'block', label: 'peening, or none', stated: (_, { technique }) => technique.peening !== null },
]

/** The thing itself, for a sentence: "none" is one way of stating it. */
const plain = (label: string): string => label.replace(/, or none$/, '')

const build = (row: Row, stated: RuleVerdict = { verdict: 'within', sentence: `The procedure states the ${plain(row.label)}; no coupon limits it.`, asked: null, range: null, tested: [] }): Rule => ({
  meta: meta(row.paragraph, row.file, { withoutCoupon: true }),
  field: row.field,
  at: row.at,
  label: row.label.charAt(0).toUpperCase() + row.label.slice(1),
  applies: row.applies && ((context) => context.block !== null && row.applies?.(context.procedure, context.block) !== false),
  range: () => null,
  check(context) {
    const { procedure, block } = context
    if (!block || (row.applies && !row.applies(procedure, block))) return null
    if (!row.stated(procedure, block)) return notStated(plain(row.label), pathOf(context, row), { fixes: [{ kind: 'state', label: `State the ${row.label}`, field: pathOf(context, row) }] })
    return stated
  },
})

export const mustBeStated: readonly Rule[] = ROWS.map((row) => build(row))
