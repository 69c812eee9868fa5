/** A look-up query as the API takes it (one line, or parts, or both) made into one question. */
import type { Interval } from '../schemas/common.ts'
import type { JobJoint, LookupQuery } from '../schemas/records.ts'
import { parseInterval } from '../units/parse.ts'
import type { UnitSystem } from '../units/types.ts'
import { askedMetal, emptyQuestion, type JointQuestion } from './joint-question.ts'
import { readJointLine, type JointReading } from './read-joint.ts'

/**
 * Reads the line first; parts that are given besides override what it says.
 * @returns the question with what was read and what was not (a part that can't be read is listed with the reason)
 */
export function readJointQuery(query: LookupQuery, system: UnitSystem = query.unitSystem ?? 'SI'): JointReading {
  const reading = readJointLine(query.line ?? '', system)
  const told = (label: string, value: string): void => {
    reading.read = [...reading.read.filter((part) => part.label !== label), { label, value }]
  }
  for (const side of ['metalA', 'metalB'] as const) {
    const text = query[side]
    if (!text) continue
    const metal = askedMetal(text, reading.product)
    if (!metal) reading.notRead.push(`${text} (not a metal of the library)`)
    // A metal outside the library can still be asked for by its name.
    reading[side] = metal ?? { text, libraryIds: [], pNumber: null, groupNumber: null, iso15608: null }
    told(side === 'metalA' ? 'Base metal A' : 'Base metal B', text)
  }
  if (query.thickness) {
    const parsed = parseInterval(query.thickness, 'length', system)
    if (parsed.ok) {
      reading.thickness = parsed.interval
      told('Thickness', query.thickness)
    } else reading.notRead.push(parsed.message)
  }
  if (query.process) {
    reading.process = query.process
    reading.processes = [query.process]
    told('Process', query.process)
  }
  if (query.position) {
    reading.position = query.position
    told('Position', query.position)
  }
  if (query.weld) {
    reading.weld = query.weld
    told('Weld', query.weld)
  }
  return reading
}

/** The question that a joint of a job asks; `toughness` is the job's own requirement. */
export function jobJointQuestion(joint: Pick<JobJoint, 'metalA' | 'metalB' | 'process' | 'weld' | 'product' | 'thickness' | 'diameter' | 'position'>, toughness: boolean | null = null): JointQuestion {
  const metal = (text: string | null) => (text ? (askedMetal(text, joint.product) ?? { text, libraryIds: [], pNumber: null, groupNumber: null, iso15608: null }) : null)
  const stated = (interval: Interval | null) => (interval && (interval.min || interval.max || interval.all) ? interval : null)
  return { ...emptyQuestion, metalA: metal(joint.metalA), metalB: metal(joint.metalB ?? joint.metalA), thickness: stated(joint.thickness), diameter: stated(joint.diameter), process: joint.process, processes: joint.process ? [joint.process] : [], position: joint.position, weld: joint.weld, product: joint.product, toughness }
}
