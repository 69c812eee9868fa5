/** The engine alone, without database or server: whole assessments a second on one core, and the same rules in a general rule library. */
import { assess } from '../../shared/assessment/assess.ts'
import { assessEach } from '../../shared/assessment/throughput.ts'
import { cases, type Case } from './cases.ts'
import { compare } from './library.ts'
import { cpuSlices, median, type Figure, type Slices } from './measure.ts'

/** Procedures in a pool; each slice of a measurement takes every one of them once. */
const POOL = 600

const rates = (slices: Slices): { median: number; best: number; wall: number } => ({ median: 1e6 / median(slices.cpu), best: 1e6 / Math.min(...slices.cpu), wall: 1e6 / median(slices.wall) })

/** Two figures of one measurement: the middle slice, and the one that other work on the machine disturbed least. */
function figuresOf(name: string, slices: Slices, what: string): Figure[] {
  const { median: middle, best, wall } = rates(slices)
  const note = `${what}; processor time of one core, ${slices.cpu.length} slices of ${POOL}`
  return [
    { name, value: middle, unit: '/s', note: `median slice; ${note}`, details: { best, wall, slices: slices.cpu.length, procedures: POOL } },
    { name: `${name}, best slice`, value: best, unit: '/s', note },
  ]
}

function describe({ input }: Case): { text: string; findings: number } {
  const { findings, ranges } = assess(input)
  const judged = findings.filter((one) => one.class !== 'not-a-variable').length
  return { text: `${judged} variables judged, ${ranges.length} ranges, ${input.coupons.length} coupons, toughness, ${POOL} procedures that differ; a rule is not asked again for values that it has met with these coupons`, findings: judged }
}

/** Each case by itself, then ASME IX in turns with the library. @param seconds for each case */
export async function measureAssessments(seconds: number): Promise<Figure[]> {
  const figures: Figure[] = []
  for (const one of cases(POOL)) {
    const { text, findings } = describe(one)
    const isMain = one.input.standard === 'asme-ix'
    if (findings < (isMain ? 40 : 20)) throw new Error(`${one.name} has ${findings} findings: too few to be a case worth measuring.`)
    const run = { ours: (): number => assessEach(one.pool) }
    figures.push(...figuresOf(`Assessments, ${one.name}`, (await cpuSlices(run, POOL, seconds)).ours, text))
    if (isMain) figures.push(...(await measureLibrary(one, findings, seconds)))
  }
  return figures
}

async function measureLibrary(one: Case, findings: number, seconds: number): Promise<Figure[]> {
  const { rules, facts, judge } = await compare(one.input, one.pool)
  const slices = await cpuSlices(
    {
      ours: () => assessEach(one.pool),
      library: async () => {
        let covered = 0
        for (const own of facts) covered += (await judge(own)).length
        return covered
      },
    },
    POOL,
    seconds * 2,
  )
  const ours = rates(slices.ours)
  const library = rates(slices.library)
  return [
    ...figuresOf('json-rules-engine 7.3.1, ASME IX', slices.library, `${rules.length} of those variables, verdicts alone, facts read beforehand; equal to ours over the pool`),
    { name: 'Assessments: ours / library', value: ours.median / library.median, unit: '×', note: `whole assessment of ${findings} variables against ${rules.length} in the library; median slices in turns`, details: { best: ours.best / library.best } },
    { name: 'A variable: ours / library', value: (ours.median * findings) / (library.median * rules.length), unit: '×', note: 'by variable judged, sentences, reasoning, cures and ranges included in ours' },
  ]
}
