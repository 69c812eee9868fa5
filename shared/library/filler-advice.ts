/**
 * Advice on fillers: whether a classification suits a pair of base metals, how its strength and hydrogen stand, and what to mind.
 * It says only what the library's rows and their sources say; where nothing is said the answer is "cannot tell".
 */
import type { BaseMetal, Filler, Process } from '../schemas/welding.ts'
import { aluminiumCare, aluminiumFit } from './filler-advice-aluminium.ts'
import { fillerFacts, metalFacts, remark, type AdviceLibrary, type Asked, type MetalFacts, type Remark, type Verdict } from './filler-advice-facts.ts'
import { alloyFit, excessAlloy, hydrogenLevel, lowCarbonCare, strengthMatch } from './filler-advice-steel.ts'
import { fillers, toFiller } from './filler-metals.ts'
import { readProcess } from './processes.ts'
import type { FillerRow } from './rows.ts'

export interface FillerAdvice {
  /** The worst that any remark says of whether it suits; "suits" only where one says so and none speaks against. */
  verdict: Verdict
  remarks: Remark[]
}
export interface AdviceAsked {
  a: BaseMetal
  b: BaseMetal
  filler: Filler
  process: Process | null
  /** Highest temperature in service, °C, where stated. */
  serviceTemperature?: number | null
  library?: AdviceLibrary
}

function verdictOf(remarks: readonly Remark[]): Verdict {
  const kinds = remarks.map(({ kind }) => kind)
  if (kinds.includes('unfit')) return 'unfit'
  const fit = remarks.filter(({ id }) => id !== 'strength' && id !== 'hydrogen')
  if (fit.some(({ kind }) => kind === 'cannot-tell')) return 'cannot-tell'
  return fit.some(({ kind }) => kind === 'suits') ? 'suits' : 'cannot-tell'
}

/** What is said of a filler by itself, whatever it welds. */
export function fillerCare(filler: Filler, process: Process | null, library?: AdviceLibrary): Remark[] {
  const facts = fillerFacts(filler, library)
  if (!facts) return []
  const hydrogen = hydrogenLevel({ filler: facts, process })
  const alone = /Single pass only/i.test(facts.row?.notes ?? '') ? [remark('single-pass', 'care', 'For single-pass welds only.', 'Row of the library', facts.basis)] : []
  return [...(hydrogen ? [hydrogen] : []), ...alone, ...(facts.family === 'aluminium' ? aluminiumCare(facts) : [])]
}

function stated(a: BaseMetal, b: BaseMetal, library: AdviceLibrary | undefined): MetalFacts[] {
  return [metalFacts(a, library), metalFacts(b, library)].filter((facts) => facts !== null)
}

/** Advice on the filler of a process for the metals of a joint; a second metal that isn't stated is as the first. */
export function fillerAdvice({ a, b, filler, process, serviceTemperature = null, library }: AdviceAsked): FillerAdvice {
  const metals = stated(a, b, library)
  if (filler.added === false) {
    const sixes = metals.filter(({ family, record }) => family === 'aluminium' && /(?:^|\D)6\d{3}/.test(`${record.grade ?? ''} ${record.uns ?? ''}`))
    return { verdict: 'cannot-tell', remarks: sixes.length > 0 ? [remark('autogenous', 'care', '6xxx aluminium without filler is prone to cracks: avoid it.', 'Recalled', 'memory')] : [] }
  }
  const facts = fillerFacts(filler, library)
  if (!facts) return { verdict: 'cannot-tell', remarks: [] }
  const care = fillerCare(filler, process, library)
  if (metals.length === 0) return { verdict: 'cannot-tell', remarks: [remark('metals', 'cannot-tell', 'Name the base metals, and whether the filler suits them is told here.', 'Library', 'memory'), ...care] }
  const asked: Asked = { metals, filler: facts, process, serviceTemperature }
  const aluminium = facts.family === 'aluminium' && metals.every(({ family }) => family === 'aluminium')
  const remarks = [...(aluminium ? aluminiumFit(asked) : alloyFit(asked)), strengthMatch(asked), ...lowCarbonCare(asked), ...care]
  return { verdict: verdictOf(remarks), remarks }
}

/**
 * Fillers of the reference that suit a pair of metals.
 * @param process only fillers of this process
 * @returns the rows with what is said of them, those of matching strength first, then the nearest in alloy; undermatching and single-pass ones are left out
 */
export function suitableFillers(a: BaseMetal, b: BaseMetal, process: Process | null): { row: FillerRow; advice: FillerAdvice }[] {
  const composition = metalFacts(a)?.composition ?? null
  const strong = ({ advice }: { advice: FillerAdvice }): number => (advice.remarks.some(({ id, kind }) => id === 'strength' && kind === 'suits') ? 0 : 1)
  return fillers
    .flatMap((row) => {
      const of = process ?? row.processes.map((name) => readProcess(name)?.process ?? null).find((one) => one !== null) ?? null
      if (process !== null && !row.processes.some((name) => readProcess(name)?.process === process)) return []
      const advice = fillerAdvice({ a, b, filler: toFiller(row), process: of })
      return advice.verdict === 'suits' && !advice.remarks.some(({ id }) => id === 'undermatching' || id === 'single-pass') ? [{ row, advice }] : []
    })
    .sort((one, other) => strong(one) - strong(other) || excessAlloy(composition, one.row.nominal_composition) - excessAlloy(composition, other.row.nominal_composition))
}
