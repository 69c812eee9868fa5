/** Joint detail, vertical progression, layer width, and what the written procedure must state (Table 5.2). */
import type { Interval } from '../../../schemas/common.ts'
import type { Process, ProcessBlock } from '../../../schemas/welding.ts'
import type { Dimension } from '../../../units/types.ts'
import { figures, isNoGas, isStated, unitOf } from '../../common/reading.ts'
import { cannotTell, list, notStated, show } from '../../common/wording.ts'
import type { Rule, RuleContext, RuleVerdict } from '../../rule.ts'
import { askedPlaces } from '../positions.ts'
import { details, readDesignation } from './joint-details.ts'
import { matchDetail } from './match-detail.ts'
import { condition } from './meta.ts'

const says = (verdict: RuleVerdict['verdict'], sentence: string, more: Partial<RuleVerdict> = {}): RuleVerdict => ({ verdict, sentence, asked: null, range: null, ...more })
const FOUR = { classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential' } } as const

export const pqJoint = condition({
  file: 'joint-detail', title: 'Prequalified joint detail', clause: 'Fig. 5.1', basis: 'memory', field: 'joint.groove', at: 'weld', more: FOUR,
  source: 'Figures 5.1 and 5.2 as far as they were read or quoted; the list kept here is not complete, and where SMAW details serve GMAW and FCAW is not kept',
  statement: 'A groove meets a prequalified detail in thickness, root opening, root face, angle, backing or backgouging, position and gas. A single value is held to the tolerance for drawings, a range also to that of fit-up. A groove that fits no detail kept here is "cannot tell" unless its own designation is kept and it misses it.',
  applies: (context) => context.procedure.joint.weld === 'groove',
  check(context, block) {
    const { joint } = context.procedure
    const clause = joint.penetration === 'partial' ? 'Fig. 5.2' : 'Fig. 5.1'
    const designation = joint.designation?.trim() ?? ''
    if (designation !== '') {
      const read = readDesignation(designation)
      const field = 'joint.designation'
      if (!read) return cannotTell(`${designation} can't be read as a designation of a joint detail.`, ['procedure: joint.designation'], { field, clause })
      if (read.penetration !== joint.penetration || (joint.groove !== null && read.groove !== joint.groove) || !read.joints.includes(joint.type)) return says('outside', `${designation} is a ${list(read.joints, 'or')} joint with a ${read.groove.replace('-', ' ')} groove and ${read.penetration} penetration, which the joint stated is not.`, { field, clause, asked: [designation] })
      if (block.process && !read.processes.includes(block.process)) {
        if (read.processes.includes('SMAW') && (block.process === 'GMAW' || block.process === 'FCAW')) return cannotTell(`${designation} is a detail for SMAW; it serves ${block.process} only where the figure says so, which must be looked up.`, ['note of the figure for this detail'], { field, clause, asked: [designation] })
        return says('outside', `${designation} is a detail for ${list(read.processes, 'and')}, not for ${block.process}.`, { field, clause, asked: [designation] })
      }
      if (!details.some(({ code }) => code === designation)) return cannotTell(`The dimensions of ${designation} are not kept here; look them up in the figure.`, [`dimensions of ${designation}`], { field, clause, asked: [designation] })
    }
    const match = matchDetail(context.procedure, block, context.system)
    const code = match.detail?.code ?? ''
    if (match.fits === 'yes') return says('within', `The groove meets ${code}.`, { clause, asked: [code], basis: match.detail?.basis ?? 'memory' })
    const field = match.misses[0]?.field ?? match.lacking[0] ?? 'joint.groove'
    const full = field.startsWith('positions') || field.startsWith('shieldingGas') ? `${context.path}.${field}` : field
    const misses = list(match.misses.map(({ sentence }) => sentence))
    if (match.fits === 'no' && designation !== '') return says('outside', `The groove does not meet ${designation}: ${misses}.`, { clause, field: full, asked: [designation], basis: match.detail?.basis ?? 'memory' })
    if (match.lacking.length > 0 && match.misses.length === 0) return cannotTell(`Whether the groove meets ${code || 'a prequalified detail'} can't be told; not stated: ${list(match.lacking)}.`, match.lacking.map((path) => `procedure: ${path}`), { clause, field: full, fixes: match.lacking.map((path) => ({ kind: 'state' as const, label: 'State it', field: path === 'positions' || path === 'shieldingGas' ? `${context.path}.${path}` : path })) })
    return cannotTell(match.detail ? `The groove fits no detail kept here; nearest is ${code}, but ${misses}. The list is not complete, so look the figure up or give the designation of the detail.` : 'No detail for such a groove and process is kept here; look the figure up or give the designation of the detail.', ['a prequalified detail that the groove meets'], { clause, field: full, fixes: [{ kind: 'state', label: 'Give the designation of the detail', field: 'joint.designation' }] })
  },
})

export const pqProgression = condition({
  file: 'vertical-progression', title: 'Vertical welding upward', clause: 'Clause 5', basis: 'memory', field: 'progression', at: 'block', more: FOUR,
  source: 'Clause 5 as recalled',
  statement: 'Vertical welds run upward in every pass; downward only to mend undercut, or on tubes where the standard allows it.',
  applies: (_context, block) => askedPlaces(block.positions).includes('vertical'),
  check(context, block) {
    const field = `${context.path}.progression`
    if (block.progression === null) return notStated('vertical progression', field)
    if (block.progression === 'up') return says('within', 'Vertical welds run upward.', { asked: ['uphill'] })
    if (context.procedure.product !== 'plate') return cannotTell('Downward welding is allowed on some tubes; where, must be looked up.', ['where downward welding of tubes is allowed'], { asked: ['downhill'] })
    return says('outside', 'Downward vertical welding is not prequalified (but to mend undercut).', { asked: ['downhill'], fixes: [{ kind: 'set', label: 'Set the progression to uphill', field, value: 'up' }] })
  },
})

export const pqLayerWidth = condition({
  file: 'layer-width', title: 'Split layers', clause: 'Table 5.1', basis: 'read', field: 'technique.bead', at: 'block',
  source: 'Table 5.1 read in 2020; note g for vertical and tubular work from memory',
  statement: 'Wide layers are split: GMAW and FCAW over 16 mm (5/8 in.) in flat, horizontal and overhead, over 25 mm (1 in.) in vertical position or with a root opening over 12 mm (1/2 in.); SAW likewise by its feed. In each pass neither depth nor greatest width exceeds the width at the surface. Records hold no layer width, so this is shown and does not decide.',
  more: { classes: { SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential' } },
  applies: (context) => context.procedure.joint.weld === 'groove',
  check: (_context, block) => cannotTell(`Layers wider than ${block.process === 'SAW' ? 'the table allows for the feed of the arc' : '16 mm (5/8 in.), in vertical position 25 mm (1 in.),'} are split; the width of layers is not part of the record.`, ['width of the layers']),
})

interface Stated { file: string; title: string; field: string; at: 'weld' | 'block'; processes: readonly Process[]; stated: (context: RuleContext, block: ProcessBlock) => boolean }
const ALL_FOUR: readonly Process[] = ['SMAW', 'SAW', 'GMAW', 'FCAW']
const WIRES: readonly Process[] = ['SAW', 'GMAW', 'FCAW']

const STATED: readonly Stated[] = [
  { file: 'states-positions', title: 'Position', field: 'positions', at: 'block', processes: ALL_FOUR, stated: (_, block) => block.positions.length > 0 },
  { file: 'states-electrodes', title: 'Number of electrodes', field: 'technique.electrodes', at: 'block', processes: WIRES, stated: (_, { technique }) => technique.electrodes !== null || (technique.electrodeCount ?? null) !== null },
  { file: 'states-current-type', title: 'Current type and polarity', field: 'electrical.currentType', at: 'block', processes: ALL_FOUR, stated: (_, { electrical }) => electrical.currentType !== null },
  { file: 'states-amperage', title: 'Amperage or wire feed speed', field: 'electrical.current', at: 'block', processes: ALL_FOUR, stated: (_, { electrical, passes }) => isStated(electrical.current) || isStated(electrical.wireFeed) || (passes.length > 0 && passes.every((pass) => isStated(pass.current) || isStated(pass.wireFeed))) },
  { file: 'states-gas-flow', title: 'Gas flow', field: 'shieldingGas.flow', at: 'block', processes: ['GMAW', 'FCAW'], stated: (_, { shieldingGas }) => shieldingGas !== null && (isNoGas(shieldingGas) || isStated(shieldingGas.flow)) },
]

const states = ({ file, title, field, at, processes, stated }: Stated): Rule =>
  condition({
    file, title, clause: 'Table 5.2', basis: 'memory', field, at,
    source: 'That every parameter is stated: read (5.2); the list of parameters as recalled',
    statement: `The written procedure states the ${title.toLowerCase()}.`,
    more: { classes: Object.fromEntries(processes.map((process) => [process, 'essential'])) },
    check: (context, block) => (stated(context, block) ? says('within', `The procedure states the ${title.toLowerCase()}.`) : notStated(title.toLowerCase(), at === 'block' ? `${context.path}.${field}` : field)),
  })

export const pqStates: readonly Rule[] = STATED.map(states)

type Setting = 'current' | 'voltage' | 'wireFeed' | 'travelSpeed'
interface Width { setting: Setting; file: string; title: string; dimension: Dimension; processes: readonly Process[]; sure: (process: Process, edition: string) => number; maybe: (process: Process, edition: string) => number }

const ten = (): number => 10
const speed = (process: Process): number => (process === 'SAW' ? 15 : 25)

/** Voltage of 2015 and 2020 is recalled as 7 or 15 per cent: what both allow is within, what neither allows is outside. */
const WIDTHS: readonly Width[] = [
  { setting: 'current', file: 'range-amperage', title: 'Range of amperage', dimension: 'current', processes: WIRES, sure: ten, maybe: ten },
  { setting: 'voltage', file: 'range-voltage', title: 'Range of voltage', dimension: 'voltage', processes: WIRES, sure: () => 7, maybe: (_process, edition) => (edition === '2010' ? 7 : 15) },
  { setting: 'wireFeed', file: 'range-wire-feed', title: 'Range of wire feed speed', dimension: 'wireFeed', processes: WIRES, sure: ten, maybe: ten },
  { setting: 'travelSpeed', file: 'range-travel-speed', title: 'Range of travel speed', dimension: 'travelSpeed', processes: WIRES, sure: speed, maybe: speed },
]

/** Each line of the procedure by itself: the block's range and that of every pass. */
function lines(block: ProcessBlock, setting: Setting, path: string): { interval: Interval; field: string }[] {
  const own = block.electrical[setting]
  return [...(own && isStated(own) ? [{ interval: own, field: `${path}.electrical.${setting}` }] : []), ...block.passes.flatMap((pass, i) => { const interval = pass[setting]; return interval && isStated(interval) ? [{ interval, field: `${path}.passes.${i}.${setting}` }] : [] })]
}

const width = ({ setting, file, title, dimension, processes, sure, maybe }: Width): Rule =>
  condition({
    file, title, clause: 'Table 5.2', basis: 'memory', field: `electrical.${setting}`, at: 'block',
    source: 'To 2010 the percentages of Table 4.5 (published interpretation); for 2015 and 2020 as recalled',
    statement: `${title}: a line of the procedure reaches no further than the table allows to either side of its middle (amperage and wire feed speed 10 %, travel speed 25 %, submerged arc 15 %; voltage 7 % to 2010, later recalled as 7 or 15 %).`,
    more: { classes: Object.fromEntries(processes.map((process) => [process, 'essential'])) },
    check(context, block) {
      const { process } = block
      if (!process) return null
      const all = lines(block, setting, context.path)
      const label = title.replace('Range of ', '')
      const unit = unitOf(dimension, context.system)
      if (all.length === 0) return setting === 'wireFeed' || setting === 'current' ? null : notStated(label, `${context.path}.electrical.${setting}`)
      const basis = context.edition === '2010' ? 'secondary' : 'memory'
      let unsure: RuleVerdict | null = null
      for (const { interval, field } of all) {
        const { min, max, all: every, fault } = figures(interval, dimension, context.system)
        if (fault) return notStated(label, field, { sentence: `The ${label} contradicts itself.` })
        const low = min ?? max
        const high = max ?? min
        if (every || low === null || high === null) return says('outside', `The ${label} has no limits.`, { field, basis })
        const middle = (low + high) / 2
        const spread = middle === 0 ? 0 : ((high - low) / 2 / middle) * 100
        const most = { sure: sure(process, context.edition), maybe: maybe(process, context.edition) }
        const asked = { min: low, max: high }
        if (spread <= most.sure + 1e-6) continue
        const text = `${show(low, unit)} to ${show(high, unit)} reaches ${Math.round(spread * 10) / 10} % to either side of its middle`
        if (spread > most.maybe + 1e-6) return says('outside', `${text}, over the ${most.maybe} % allowed; use several lines of settings that belong together.`, { asked, field, basis })
        unsure = cannotTell(`${text}; the limit is recalled as ${most.sure} or ${most.maybe} %, so look it up in your edition.`, ['the figure of Table 5.2 for voltage'], { asked, field, basis })
      }
      return unsure ?? says('within', `Every line of ${label} stays within ${sure(process, context.edition)} % of its middle.`, { basis })
    },
  })

export const pqRanges: readonly Rule[] = WIDTHS.map(width)

export const pqGasFlowRange = condition({
  file: 'range-gas-flow', title: 'Range of gas flow', clause: 'Table 5.2', basis: 'memory', field: 'shieldingGas.flow', at: 'block',
  source: 'To 2010 the percentages of Table 4.5; for 2015 and 2020 no figure is confirmed',
  statement: 'A range of gas flow has a limit that is not confirmed for 2015 and 2020; one figure is within, a range is "cannot tell".',
  more: { classes: { GMAW: 'essential', FCAW: 'essential' } },
  applies: (_context, { shieldingGas }) => shieldingGas !== null && !isNoGas(shieldingGas) && isStated(shieldingGas.flow),
  check(context, { shieldingGas }) {
    const { min, max, all } = figures(shieldingGas?.flow, 'gasFlow', context.system)
    if (!all && (min === null || max === null || min === max)) return says('within', 'The gas flow is one figure.')
    return cannotTell('How wide a range of gas flow may be is not confirmed here; look it up in your edition.', ['the figure of Table 5.2 for gas flow'], { asked: all ? { min: null, max: null } : { min, max } })
  },
})
