/** The matching filler of AWS D1.1 as advice, for metals that carry its groups. */
import { isLowHydrogen, strengthClass } from '../standards/aws-d1-1/fillers.ts'
import { classesOf, wanted, type Listed } from '../standards/aws-d1-1/prequalified/filler.ts'
import { namesOf, remark, type Asked, type Remark } from './filler-advice-facts.ts'

const ORDER: readonly Listed[] = ['I', 'II', 'III', 'IV']
const SOURCE = 'AWS D1.1, matching filler metal (Table 5.4 of 2020)'

/** Whether the filler is of a class that matches the groups; null where the metals carry none or the class can't be read. */
export function matchingSentence({ metals, filler, process }: Asked): Remark | null {
  const groups = metals.map(({ record }) => ORDER.find((group) => group === record.d11Group))
  const sorted = groups.flatMap((group) => (group ? [group] : [])).sort((one, other) => ORDER.indexOf(one) - ORDER.indexOf(other))
  const [low, high] = [sorted[0], sorted.at(-1)]
  const ksi = strengthClass(process, filler.record)
  if (!low || !high || sorted.length < metals.length || ksi === null || process === null || !['SMAW', 'GMAW', 'FCAW', 'SAW'].includes(process)) return null
  if (/Single pass only/i.test(filler.row?.notes ?? '')) return remark('d1-1', 'unfit', 'By AWS D1.1 a single-pass-only class matches no group.', SOURCE, 'memory')
  const strengths = new Set([...classesOf(low, process), ...classesOf(high, process)])
  const named = low === high ? `Group ${low}` : `Group ${low} to Group ${high}`
  if (!strengths.has(ksi)) return remark('d1-1', 'unfit', `By AWS D1.1 it does not match ${namesOf(metals)} (${named}): ${low === high ? wanted(low, process) : `${wanted(low, process)} or ${wanted(high, process)}`} would.`, SOURCE, 'memory')
  if (process === 'SMAW' && high !== 'I' && isLowHydrogen(filler.record) === false) return remark('d1-1', 'unfit', `By AWS D1.1 ${named} wants a low-hydrogen electrode (${wanted(high, process)}).`, SOURCE, 'memory')
  return remark('d1-1', 'suits', `By AWS D1.1 its strength class matches ${namesOf(metals)} (${named}).`, SOURCE, 'memory')
}
