/** The sequence of passes over all process blocks: moved, given to another process, laid out anew. Pure; the blocks stay as they were. */
import { passSchema, type Pass, type ProcessBlock } from '../schemas/welding.ts'
import type { PlannedPass } from './bead-layout.ts'
import { beadArea } from './weld-metal.ts'
import { sequenceOf } from './pass-layout.ts'

interface Step { pass: Pass; blockId: string }

const stepsOf = (blocks: readonly ProcessBlock[]): Step[] => sequenceOf(blocks).map(({ pass, processId }) => ({ pass, blockId: processId }))
const without = (pass: Pass): Pass => {
  const kept = { ...pass }
  delete kept.order
  return kept
}

/** Writes a sequence into the blocks; places are stated only where the blocks, one after the other, would weld in another order. */
function written(blocks: readonly ProcessBlock[], steps: readonly Step[]): ProcessBlock[] {
  const natural = blocks.flatMap(({ id }) => steps.filter(({ blockId }) => blockId === id))
  const plain = natural.every((step, index) => step === steps[index])
  const places = new Map(steps.map((step, index) => [step, index + 1]))
  return blocks.map((block) => ({ ...block, passes: steps.filter(({ blockId }) => blockId === block.id).map((step) => (plain ? without(step.pass) : { ...step.pass, order: places.get(step) })) }))
}

/** Whether passes are numbered 1, 2, 3 … in their order, so that they keep being so. */
const counted = (steps: readonly Step[]): boolean => steps.every(({ pass }, index) => pass.number === String(index + 1))
const renumbered = (steps: readonly Step[]): Step[] => steps.map((step, index) => ({ ...step, pass: { ...step.pass, number: String(index + 1) } }))

function changed(blocks: readonly ProcessBlock[], change: (steps: Step[]) => Step[]): ProcessBlock[] {
  const steps = stepsOf(blocks)
  const next = change([...steps])
  return written(blocks, counted(steps) ? renumbered(next) : next)
}

/** The sequence with one pass moved to another place; numbers that count on are counted anew. */
export const movedPass = (blocks: readonly ProcessBlock[], from: number, to: number): ProcessBlock[] =>
  changed(blocks, (steps) => {
    const [step] = steps.splice(from, 1)
    if (step) steps.splice(Math.max(0, Math.min(steps.length, to)), 0, step)
    return steps
  })

/** A pass changed in its place. */
export const changedPass = (blocks: readonly ProcessBlock[], at: number, change: Partial<Pass>): ProcessBlock[] => written(blocks, stepsOf(blocks).map((step, index) => (index === at ? { ...step, pass: { ...step.pass, ...change } } : step)))

/** A pass given to another process; it takes its settings along. */
export const passToProcess = (blocks: readonly ProcessBlock[], at: number, blockId: string): ProcessBlock[] => written(blocks, stepsOf(blocks).map((step, index) => (index === at ? { ...step, blockId } : step)))

export const withoutPass = (blocks: readonly ProcessBlock[], at: number): ProcessBlock[] => changed(blocks, (steps) => steps.filter((_, index) => index !== at))

/** A further pass at the end, with layer, process and size of the last. */
export const withPass = (blocks: readonly ProcessBlock[]): ProcessBlock[] => {
  const [first] = blocks
  return changed(blocks, (steps) => {
    const last = steps.at(-1)
    const blockId = last?.blockId ?? first?.id
    const number = String(Math.max(0, ...steps.map(({ pass }) => Number(/(\d+)\s*$/.exec(pass.number)?.[1] ?? 0))) + 1)
    return blockId === undefined ? steps : [...steps, { blockId, pass: passSchema.parse({ number, layer: last ? (last.pass.layer === 'root' ? 'fill' : last.pass.layer) : 'root', fillerDiameter: last?.pass.fillerDiameter ?? null, ...(last?.pass.beadArea ? { beadArea: last.pass.beadArea } : {}) }) }]
  })
}

/** The planned passes in place of those there were; a pass takes the settings of the first one of its process in the same layer. */
export function withPlan(blocks: readonly ProcessBlock[], plan: readonly PlannedPass[], twoSides: boolean): ProcessBlock[] {
  const had = stepsOf(blocks)
  const steps = plan.map(({ processId, layer, side, beadArea: area }, index): Step => {
    const like = had.find(({ blockId, pass }) => blockId === processId && pass.layer === layer) ?? had.find(({ blockId }) => blockId === processId)
    const size = Number(area.toFixed(1))
    return { blockId: processId, pass: { ...passSchema.parse({ fillerDiameter: like?.pass.fillerDiameter ?? null, current: like?.pass.current ?? null, voltage: like?.pass.voltage ?? null, wireFeed: like?.pass.wireFeed ?? null, travelSpeed: like?.pass.travelSpeed ?? null, number: String(index + 1), layer, beadArea: { si: size, unit: 'mm²', typed: `${size} mm²` } }), ...(twoSides ? { side } : {}) } }
  })
  return written(blocks, steps)
}

const middle = (interval: Pass['current']): number | null => (interval?.min && interval.max ? (interval.min.si + interval.max.si) / 2 : (interval?.min?.si ?? interval?.max?.si ?? null))

/** Section of a bead, mm², that a process' wire, feed and travel give before losses; null where one of them isn't stated. */
export function beadFromSettings(block: ProcessBlock): number | null {
  const wire = block.filler.diameters[0]?.si ?? block.passes[0]?.fillerDiameter?.si ?? null
  const feed = middle(block.electrical.wireFeed) ?? middle(block.passes[0]?.wireFeed ?? null)
  const travel = middle(block.electrical.travelSpeed) ?? middle(block.passes[0]?.travelSpeed ?? null)
  return wire === null || feed === null || travel === null || !(wire > 0 && feed > 0 && travel > 0) ? null : beadArea({ wireDiameter: wire, wireFeed: feed, efficiency: 1, travelSpeed: travel })
}
