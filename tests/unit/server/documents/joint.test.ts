import { describe, expect, it, vi } from 'vitest'
import { layOutPasses } from '@shared/calculations/bead-layout.ts'
import { geometryOf } from '@shared/calculations/joint-geometry.ts'
import { withPlan } from '@shared/calculations/pass-sequence.ts'
import { jointSchema, passSchema } from '@shared/schemas/welding.ts'
import { interval } from '@shared/units/convert.ts'
import { renderProcedure } from '../../../../server/documents/procedure.ts'
import { procedureDocument, steelProcedure } from '../../../fixtures/samples.ts'
import { boxesOf, pagesOf, wordsOf } from './read.ts'

vi.setConfig({ testTimeout: 120_000 })
const mm = (min: number, max?: number) => interval(min, max, 'length')
const degrees = (min: number, max?: number) => interval(min, max, 'angle')

interface Given { joint: Record<string, unknown>; t: number; tB?: number; d?: number; bead: number }
async function printed({ joint, t, tB, d, bead }: Given) {
  const content = steelProcedure()
  const bare = { ...content.variables, joint: jointSchema.parse(joint), thickness: mm(t), thicknessB: tB === undefined ? null : mm(tB), product: d === undefined ? ('plate' as const) : ('pipe' as const), diameter: d === undefined ? null : mm(d), processes: content.variables.processes.map((block) => ({ ...block, passes: [] })) }
  const plan = layOutPasses(geometryOf(bare), bare.processes.map(({ id }) => ({ processId: id, bead, height: null })))
  if (!plan.ok) throw new Error(plan.sentence)
  const pdf = await renderProcedure(procedureDocument({ content: { ...content, variables: { ...bare, processes: withPlan(bare.processes, plan.passes, false) } }, assessments: [] }))
  return { pdf, count: plan.passes.length }
}

describe('a joint on paper', () => {
  it.each<[string, Given, string[]]>([
    ['a V, back gouged', { joint: { groove: 'single-v', includedAngle: degrees(55, 65), rootOpening: mm(2, 4), rootFace: mm(1, 2), backGouging: 'arc-gouging', backGougeDepth: mm(5) }, t: 20, bead: 25 }, ['55–65°', 'gouge 5 mm', 'arc gouging, 5 mm', '2–4 mm']],
    ['unequal pipes on an insert', { joint: { groove: 'single-v', includedAngle: degrees(75), rootOpening: mm(3), rootFace: mm(1.5), backing: 'consumable-insert', insertWidth: mm(3), insertHeight: mm(3), taperAngle: degrees(14), alignment: 'root-side' }, t: 8, tB: 12, d: 168.3, bead: 14 }, ['taper 14°', 'insert 3 mm', 'axis of the pipe, Ø 168.3 mm', 'face 1.5 mm', '3 mm × 3 mm', 'flush on the root side']],
    ['a tee with fillets over it', { joint: { type: 'tee', groove: 'double-bevel', bevelAngle: degrees(45), rootOpening: mm(2), rootFace: mm(2), reinforcingFillet: mm(6) }, t: 25, tB: 15, bead: 30 }, ['fillet 6 mm', '45°', 'face 2 mm', '15 mm']],
    ['a skewed fillet', { joint: { weld: 'fillet', type: 'tee', filletLeg: mm(8), filletLegB: mm(12), memberAngle: degrees(75) }, t: 12, tB: 10, bead: 15 }, ['75°', '8 mm', '12 mm', 'Throat, flat face']],
    ['a compound V', { joint: { groove: 'compound-v', includedAngle: degrees(75), bevelAngle: degrees(10), rootOpening: mm(3), rootFace: mm(1.5), angleChange: mm(19) }, t: 40, bead: 60 }, ['75°', '10°', '19 mm', 'Angle changes at']],
  ])('%s: every figure and pass stands on the sheet, inside it', async (_name, given, texts) => {
    const { pdf, count } = await printed(given)
    const [first = ''] = pagesOf(pdf)
    const words = wordsOf(pdf)
    for (const text of texts) expect(words, text).toContain(text)
    for (let number = 1; number <= Math.min(count, 9); number += 1) expect(first, `pass ${number}`).toMatch(new RegExp(`(^|\\s)${number}(\\s|$)`, 'm'))
    const [page] = boxesOf(pdf)
    for (const { text, xMin, xMax, yMin, yMax } of page?.words ?? []) expect(xMin >= 0 && xMax <= (page?.width ?? 0) && yMin >= 0 && yMax <= (page?.height ?? 0), text).toBe(true)
  })

  it('lists the passes in the order in which they are welded, also where processes take turns', async () => {
    const content = steelProcedure()
    const [root, fill] = content.variables.processes
    if (!root || !fill) throw new Error('the sample has two processes')
    const pass = (number: string, order: number) => passSchema.parse({ number, layer: 'fill', order })
    const variables = { ...content.variables, processes: [{ ...root, passes: [pass('first', 1), pass('third', 3)] }, { ...fill, passes: [pass('second', 2)] }] }
    const text = wordsOf(await renderProcedure(procedureDocument({ content: { ...content, variables }, assessments: [] })))
    const table = text.slice(text.indexOf('PASS TABLE'))
    const places = ['first', 'second', 'third'].map((name) => table.indexOf(`${name} fill`))
    expect(places.every((place) => place > 0)).toBe(true)
    expect([...places].sort((a, b) => a - b)).toEqual(places)
  })

  it('is drawn as vectors: more beads are more strokes, and no picture', async () => {
    const joint = { groove: 'single-v', includedAngle: degrees(60), rootOpening: mm(2), rootFace: mm(1) }
    const [few, many] = [await printed({ joint, t: 20, bead: 80 }), await printed({ joint, t: 20, bead: 15 })]
    expect(many.count).toBeGreaterThan(few.count)
    const pictures = ({ pdf }: typeof few) => pdf.toString('latin1').match(/\/Subtype\s*\/Image/g)?.length ?? 0
    expect(pictures(many)).toBe(pictures(few))
    expect(pictures(many)).toBe(0)
  })
})
