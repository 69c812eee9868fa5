/** Table 5.2: what the written procedure must state. */
import type { Process, ProcessBlock } from '../../../schemas/welding.ts'
import { isNoGas, isStated } from '../../common/reading.ts'
import { notStated } from '../../common/wording.ts'
import type { Rule, RuleContext } from '../../rule.ts'
import { condition } from './meta.ts'
import { says } from './verdict.ts'

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
