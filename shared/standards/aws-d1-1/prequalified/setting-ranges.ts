/** Table 5.2: how far a line of settings may reach to either side of its middle. */
import type { Fix } from '../../../schemas/assessment.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { Process, ProcessBlock } from '../../../schemas/welding.ts'
import { quantity } from '../../../units/convert.ts'
import type { Dimension } from '../../../units/types.ts'
import { figures, isStated, tidy, unitOf } from '../../common/reading.ts'
import { cannotTell, notStated, show } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { clauseIn } from '../editions.ts'
import { condition } from './meta.ts'
import { says } from './verdict.ts'

const WIRES: readonly Process[] = ['SAW', 'GMAW', 'FCAW']

type Setting = 'current' | 'voltage' | 'wireFeed' | 'travelSpeed'
interface Width { figure: string; setting: Setting; file: string; title: string; dimension: Dimension; processes: readonly Process[]; sure: (process: Process, edition: string) => number; maybe: (process: Process, edition: string) => number }

const ten = (): number => 10
const speed = (process: Process): number => (process === 'SAW' ? 15 : 25)

/** Voltage of 2015 and 2020 is recalled as 7 or 15 per cent: what both allow is within, what neither allows is outside. */
const WIDTHS: readonly Width[] = [
  { figure: '10 %', setting: 'current', file: 'range-amperage', title: 'Range of amperage', dimension: 'current', processes: WIRES, sure: ten, maybe: ten },
  { figure: '7 % in 2010; recalled as 7 or 15 % for 2015 and 2020, so what lies between can\'t be told', setting: 'voltage', file: 'range-voltage', title: 'Range of voltage', dimension: 'voltage', processes: WIRES, sure: () => 7, maybe: (_process, edition) => (edition === '2010' ? 7 : 15) },
  { figure: '10 %', setting: 'wireFeed', file: 'range-wire-feed', title: 'Range of wire feed speed', dimension: 'wireFeed', processes: WIRES, sure: ten, maybe: ten },
  { figure: '25 %, submerged arc 15 %', setting: 'travelSpeed', file: 'range-travel-speed', title: 'Range of travel speed', dimension: 'travelSpeed', processes: WIRES, sure: speed, maybe: speed },
]

/** Each line of the procedure by itself: the block's range and that of every pass. */
function lines(block: ProcessBlock, setting: Setting, path: string): { interval: Interval; field: string }[] {
  const own = block.electrical[setting]
  return [...(own && isStated(own) ? [{ interval: own, field: `${path}.electrical.${setting}` }] : []), ...block.passes.flatMap((pass, i) => { const interval = pass[setting]; return interval && isStated(interval) ? [{ interval, field: `${path}.passes.${i}.${setting}` }] : [] })]
}

/** How far a range reaches to either side of its middle, per cent. */
const reach = (low: number, high: number): number => (low + high === 0 ? 0 : ((high - low) / (low + high)) * 100)

/** The same middle with as much room as every reading of the table allows. */
function narrowed({ label, field, middle, percent, dimension, unit }: { label: string; field: string; middle: number; percent: number; dimension: Dimension; unit: string }): Fix {
  // Rounded inward, to figures that people set.
  const min = quantity(Math.ceil(tidy(middle * (1 - percent / 100) * 1000)) / 1000, dimension, unit)
  const max = quantity(Math.floor(tidy(middle * (1 + percent / 100) * 1000)) / 1000, dimension, unit)
  return { kind: 'set', label: `Narrow the ${label} to ${percent} % about its middle`, field, value: { min, max, all: false } }
}

const width = ({ figure, setting, file, title, dimension, processes, sure, maybe }: Width): Rule =>
  condition({
    file, title, clause: 'Table 5.2', basis: 'memory', field: `electrical.${setting}`, at: 'block',
    source: 'To 2010 the percentages of Table 4.5 (published interpretation); for 2015 and 2020 as recalled',
    statement: `Each line of the procedure reaches no further to either side of its middle than the table allows for ${title.replace('Range of ', '')}: ${figure}.`,
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
      const over = (percent: number) => (one: number): boolean => one > percent + 1e-6
      const fixes = all.flatMap(({ interval, field }) => {
        const { min, max, all: every, fault } = figures(interval, dimension, context.system)
        const [low, high] = [min ?? max, max ?? min]
        if (every || fault || low === null || high === null || !over(sure(process, context.edition))(reach(low, high))) return []
        return [narrowed({ label, field, middle: (low + high) / 2, percent: sure(process, context.edition), dimension, unit })]
      })
      for (const { interval, field } of all) {
        const { min, max, all: every, fault } = figures(interval, dimension, context.system)
        if (fault) return notStated(label, field, { sentence: `The ${label} contradicts itself.` })
        const low = min ?? max
        const high = max ?? min
        if (every || low === null || high === null) return says('outside', `The ${label} has no limits.`, { field, basis })
        const spread = reach(low, high)
        const most = { sure: sure(process, context.edition), maybe: maybe(process, context.edition) }
        const asked = { min: low, max: high }
        if (!over(most.sure)(spread)) continue
        const text = `${show(low, unit)} to ${show(high, unit)} reaches ${Math.round(spread * 100) / 100} % to either side of its middle`
        if (over(most.maybe)(spread)) return says('outside', `${text}, over the ${most.maybe} % allowed; use several lines of settings that belong together.`, { asked, field, basis, fixes })
        unsure = cannotTell(`${text}; the limit is recalled as ${most.sure} or ${most.maybe} %, so look it up in your edition.`, [`the figure of ${clauseIn(context.edition, 'Table 5.2')} for voltage`], { asked, field, basis })
      }
      return unsure ?? says('within', `Every line of ${label} stays within ${sure(process, context.edition)} % of its middle.`, { basis })
    },
  })

export const pqRanges: readonly Rule[] = WIDTHS.map(width)
