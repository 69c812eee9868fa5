import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { layOutPasses, passEstimate } from '../../../../shared/calculations/bead-layout.ts'
import { drawnValue } from '../../../../shared/calculations/joint-figures.ts'
import { jointGeometry, settingOf, type JointSetting } from '../../../../shared/calculations/joint-geometry.ts'
import { handlesOf, movedInterval, settled, stepOf, typedQuantity } from '../../../../shared/calculations/joint-handles.ts'
import { jointPicture } from '../../../../shared/calculations/joint-picture.ts'
import { boxOf } from '../../../../shared/calculations/joint-placing.ts'
import { sequenceOf } from '../../../../shared/calculations/pass-layout.ts'
import { beadFromSettings, changedPass, movedPass, passToProcess, withoutPass, withPass, withPlan } from '../../../../shared/calculations/pass-sequence.ts'
import { polygonArea } from '../../../../shared/calculations/polygon.ts'
import { GROOVE_TYPES, jointSchema, passSchema, processBlockSchema, weldingVariablesSchema, type Joint, type Pass, type ProcessBlock } from '../../../../shared/schemas/welding.ts'
import { detailSheet, detailsFor, detailsNamed, jointOfDetail } from '../../../../shared/standards/aws-d1-1/prequalified/detail-values.ts'
import { details } from '../../../../shared/standards/aws-d1-1/prequalified/joint-details.ts'
import { interval } from '../../../../shared/units/convert.ts'
import { parseQuantity } from '../../../../shared/units/parse.ts'

const mm = (min: number, max?: number) => interval(min, max, 'length')
const degrees = (min: number, max?: number) => interval(min, max, 'angle')

interface Shape { groove: Joint['groove']; t: number; opening: number; face: number; bevel: number; radius: number; more?: Record<string, unknown> }
const settingFor = ({ groove, t, opening, face, bevel, radius, more = {} }: Shape, blocks: ProcessBlock[] = []): JointSetting => {
  const both = ['single-v', 'double-v', 'single-u', 'double-u', 'compound-v'].includes(groove ?? '')
  return { joint: jointSchema.parse({ groove, includedAngle: both ? degrees(2 * bevel) : null, bevelAngle: groove === 'compound-v' ? degrees(bevel / 3) : both ? null : degrees(bevel), rootOpening: mm(opening), rootFace: mm(face), rootRadius: mm(radius), ...more }), thickness: mm(t), thicknessB: null, blocks, density: 7850, system: 'SI' }
}
const PREPARED = GROOVE_TYPES.filter((groove) => groove !== 'square' && !groove.startsWith('flare'))
const shapes = fc.record({ groove: fc.constantFrom(...PREPARED), t: fc.integer({ min: 24, max: 80 }), opening: fc.integer({ min: 0, max: 8 }), face: fc.integer({ min: 0, max: 4 }), bevel: fc.integer({ min: 5, max: 50 }), radius: fc.integer({ min: 2, max: 8 }) })
const areaOf = (shape: Shape) => jointGeometry(settingFor(shape)).areaMm2 ?? NaN

describe('the section grows', () => {
  it.each(['t', 'opening', 'bevel'] as const)('with %s', (key) => {
    fc.assert(fc.property(shapes, fc.integer({ min: 1, max: 10 }), (shape, by) => {
      expect(areaOf({ ...shape, [key]: shape[key] + by })).toBeGreaterThan(areaOf(shape))
    }))
  })
  it('with a fillet’s leg, and stays below the square’s half', () => {
    fc.assert(fc.property(fc.integer({ min: 3, max: 30 }), fc.integer({ min: 1, max: 10 }), fc.integer({ min: 40, max: 140 }), (leg, by, angle) => {
      const area = (z: number) => jointGeometry({ joint: jointSchema.parse({ weld: 'fillet', type: 'tee', filletLeg: mm(z), memberAngle: degrees(angle) }), thickness: mm(20), system: 'SI' }).areaMm2 ?? NaN
      expect(area(leg + by)).toBeGreaterThan(area(leg))
      expect(area(leg)).toBeLessThanOrEqual((leg * leg) / 2 + 1e-9)
    }))
  })
})

describe('whatever is typed', () => {
  const any = fc.record({
    weld: fc.constantFrom('groove' as const, 'fillet' as const), type: fc.constantFrom('butt', 'tee', 'corner', 'lap', 'edge'), groove: fc.option(fc.constantFrom(...GROOVE_TYPES)), backing: fc.constantFrom('none', 'metal', 'ceramic', 'consumable-insert', 'weld-metal', null), backGouging: fc.constantFrom('grinding', null), penetration: fc.constantFrom('full', 'partial'), weldedFromBothSides: fc.boolean(),
    figures: fc.dictionary(fc.constantFrom('includedAngle', 'bevelAngle', 'rootOpening', 'rootFace', 'rootRadius', 'grooveDepth', 'secondDepth', 'secondAngle', 'angleChange', 'reinforcingFillet', 'filletLeg', 'filletLegB', 'memberAngle', 'taperAngle', 'backingThickness', 'backingWidth', 'insertWidth', 'insertHeight', 'backGougeDepth'), fc.oneof(fc.constantFrom(0, 0.5, 2, 6, 10, 20, 45, 60, 90, 180), fc.double({ min: -20, max: 300, noNaN: true }))),
    t: fc.option(fc.constantFrom(0, 3, 10, 25, 60)), tB: fc.option(fc.constantFrom(0, 6, 12, 40)),
  })
  it('it is drawn with finite strokes, or told why not; never both, never neither', () => {
    fc.assert(fc.property(any, ({ figures, t, tB, ...joint }) => {
      const parsed = jointSchema.parse({ ...joint, ...Object.fromEntries(Object.entries(figures).map(([key, value]) => [key, interval(value, undefined, /angle/i.test(key) && key !== 'angleChange' ? 'angle' : 'length')])) })
      const setting: JointSetting = { joint: parsed, thickness: t === null ? null : mm(t), thicknessB: tB === null ? null : mm(tB), blocks: [{ id: 'p', passes: [passSchema.parse({ number: '1', layer: 'root' }), passSchema.parse({ number: '2', layer: 'cap' }), passSchema.parse({ number: '3', layer: 'fillet' })] }], density: 7850, system: 'SI' }
      const drawn = jointGeometry(setting)
      expect(drawn.plates.length > 0).toBe(drawn.problems.length === 0)
      const numbers = [...[...drawn.plates, ...drawn.weld, ...drawn.passes.map(({ polygon }) => polygon)].flat().flatMap(({ x, y }) => [x, y]), drawn.areaMm2 ?? 0, drawn.weldMetalKgPerM ?? 0]
      expect(numbers.every(Number.isFinite)).toBe(true)
      if (drawn.problems.length > 0) return
      const picture = jointPicture(drawn, { width: 500, maxHeight: 200 })
      expect(JSON.stringify(picture)).not.toMatch(/NaN|Infinity|null null/)
      for (const handle of handlesOf(setting, drawn)) expect(Number.isFinite(handle.value) && Number.isFinite(picture.at(handle.at).x)).toBe(true)
    }), { numRuns: 400 })
  })
})

describe('passes from bead sizes', () => {
  const plan = (shape: Shape, bead: number, rootBead = bead) => layOutPasses(jointGeometry(settingFor(shape)), [{ processId: 'root', bead: rootBead, height: null }, { processId: 'fill', bead, height: null }])
  it('fill the groove: their sections add up to it, and none is larger than asked', () => {
    fc.assert(fc.property(shapes, fc.integer({ min: 8, max: 60 }), (shape, bead) => {
      fc.pre(areaOf(shape) / bead < 180)
      const laid = plan(shape, bead)
      expect(laid.ok).toBe(true)
      if (!laid.ok) return
      const parts = jointGeometry(settingFor(shape)).weld.reduce((sum, polygon) => sum + polygonArea(polygon), 0)
      expect(laid.passes.reduce((sum, { beadArea }) => sum + beadArea, 0)).toBeCloseTo(parts, 4)
      expect(Math.max(...laid.passes.map(({ beadArea }) => beadArea))).toBeLessThanOrEqual(bead + 1e-6)
      expect(laid.passes[0]).toMatchObject({ processId: 'root', layer: 'root' })
      expect(laid.passes.at(-1)?.layer).toBe(laid.passes.length > 1 ? 'cap' : 'root')
    }))
  })
  it('are drawn in the proportion of their sections', () => {
    fc.assert(fc.property(shapes, fc.integer({ min: 15, max: 60 }), (shape, bead) => {
      fc.pre(areaOf(shape) / bead < 80 && areaOf(shape) > bead * 2)
      const laid = plan(shape, bead, bead / 2)
      if (!laid.ok) throw new Error(laid.sentence)
      const blocks = withPlan([processBlockSchema.parse({ id: 'root' }), processBlockSchema.parse({ id: 'fill' })], laid.passes, true)
      const drawn = jointGeometry(settingFor(shape, blocks))
      const whole = drawn.weld.reduce((sum, polygon) => sum + polygonArea(polygon), 0)
      const inner = drawn.passes.filter(({ layer }) => layer !== 'cap')
      expect(drawn.passes).toHaveLength(laid.passes.length)
      expect(drawn.passes.reduce((sum, { polygon }) => sum + polygonArea(polygon), 0)).toBeGreaterThan(whole * 0.99)
      const [root] = inner
      if (root?.beadArea) expect(polygonArea(root.polygon) / root.beadArea).toBeGreaterThan(0.9)
      if (root?.beadArea) expect(polygonArea(root.polygon) / root.beadArea).toBeLessThan(1.1)
    }), { numRuns: 60 })
  })
  it('count as the reference does: ceil(area / bead), 161.16 mm² in beads of 16.116 mm² are 10', () => {
    const drawn = jointGeometry({ joint: jointSchema.parse({ groove: 'square', rootOpening: mm(10) }), thickness: mm(16.116), system: 'SI' })
    expect(passEstimate(drawn, 16.116)).toBe(10)
    const laid = layOutPasses(drawn, [{ processId: 'p', bead: 16.116, height: null }])
    expect(laid.ok && laid.passes.length).toBe(10)
  })
  it('give a process what its deposit is thick', () => {
    const drawn = jointGeometry({ joint: jointSchema.parse({ groove: 'square', rootOpening: mm(5) }), thickness: mm(20), system: 'SI' })
    const laid = layOutPasses(drawn, [{ processId: 'root', bead: 12.5, height: 5 }, { processId: 'fill', bead: 25, height: null }])
    expect(laid.ok && laid.passes.map(({ processId }) => processId)).toEqual(['root', 'root', 'fill', 'fill', 'fill'])
  })
  it('fill a fillet on each side, and a reinforcing one after the groove', () => {
    const fillet = layOutPasses(jointGeometry({ joint: jointSchema.parse({ weld: 'fillet', type: 'tee', filletLeg: mm(8), weldedFromBothSides: true }), thickness: mm(12), system: 'SI' }), [{ processId: 'p', bead: 16, height: null }])
    expect(fillet.ok && fillet.passes.map(({ layer, side }) => `${layer} ${side}`)).toEqual(['fillet first', 'fillet first', 'fillet second', 'fillet second'])
    const tee = layOutPasses(jointGeometry(settingFor({ groove: 'single-bevel', t: 24, opening: 2, face: 2, bevel: 45, radius: 5, more: { type: 'tee', reinforcingFillet: mm(8) } })), [{ processId: 'p', bead: 40, height: null }])
    expect(tee.ok && tee.passes.at(-1)?.layer).toBe('fillet')
  })
  it.each([[[], /bead section above 0/], [[{ processId: 'p', bead: 0, height: null }], /bead section above 0/], [[{ processId: 'p', bead: 0.1, height: null }], /more than 200 passes/]] as const)('says what is missing', (sizes, sentence) => {
    const laid = layOutPasses(jointGeometry(settingFor({ groove: 'single-v', t: 30, opening: 2, face: 2, bevel: 30, radius: 5 })), sizes)
    expect(laid.ok ? '' : laid.sentence).toMatch(sentence)
    const undrawn = layOutPasses(jointGeometry(settingFor({ groove: null, t: 30, opening: 2, face: 2, bevel: 30, radius: 5 })), [{ processId: 'p', bead: 10, height: null }])
    expect(undrawn.ok ? '' : undrawn.sentence).toMatch(/can’t be laid out yet.*groove type/)
  })
})

describe('handles', () => {
  const joints: [string, JointSetting][] = [
    ...GROOVE_TYPES.map((groove): [string, JointSetting] => [groove, settingFor({ groove, t: 30, opening: 3, face: 2, bevel: 25, radius: 6 })]),
    ['fillet', { joint: jointSchema.parse({ weld: 'fillet', type: 'tee', filletLeg: mm(8), filletLegB: mm(10), memberAngle: degrees(75) }), thickness: mm(12), thicknessB: mm(10), system: 'SI' }],
    ['bevel by depth, in a tee', settingFor({ groove: 'single-bevel', t: 30, opening: 0, face: 0, bevel: 45, radius: 5, more: { type: 'tee', rootFace: null, grooveDepth: mm(18), reinforcingFillet: mm(6) } })],
    ['unequal plates', { ...settingFor({ groove: 'single-v', t: 30, opening: 3, face: 2, bevel: 25, radius: 5, more: { taperAngle: degrees(20) } }), thicknessB: mm(40) }],
    ['edge', settingFor({ groove: 'single-v', t: 12, opening: 0, face: 0, bevel: 30, radius: 5, more: { type: 'edge', grooveDepth: mm(6) } })],
  ]
  it.each(joints)('of %s: where a handle stands is its value, and moved there the figure follows', (_name, setting) => {
    const drawn = jointGeometry(setting)
    const handles = handlesOf(setting, drawn)
    expect(handles.length).toBeGreaterThan(0)
    for (const handle of handles) {
      expect(handle.read(handle.at), handle.label).toBeCloseTo(handle.value, 4)
      const by = (mm: number) => handle.read({ x: handle.at.x + (handle.axis === 'x' ? mm : 0), y: handle.at.y + (handle.axis === 'y' ? mm : 0) })
      const asked = Math.max(by(1), by(-1))
      expect(asked - handle.value, `${handle.label} moves`).toBeGreaterThan(0.1)
      const key = handle.path.startsWith('joint.') ? handle.path.slice(6) : null
      const value = interval(asked, undefined, handle.dimension)
      const next = key ? { ...setting, joint: { ...setting.joint, [key]: value } } : { ...setting, [handle.path]: value }
      const again = handlesOf(next, jointGeometry(next)).find(({ path, label }) => path === handle.path && label === handle.label)
      expect(again?.value ?? NaN, handle.label).toBeCloseTo(asked, 3)
    }
  })
  it('keep a range as wide as it was, an open end open, and never go below 0', () => {
    fc.assert(fc.property(fc.integer({ min: 0, max: 50 }), fc.integer({ min: 1, max: 20 }), fc.integer({ min: 0, max: 60 }), (low, wide, to) => {
      const moved = movedInterval(mm(low, low + wide), to, 'length', 'SI')
      expect(drawnValue(moved)).toBeCloseTo(to, 9)
      expect(moved.min?.si).toBeGreaterThanOrEqual(0)
      if (to >= wide / 2) expect((moved.max?.si ?? 0) - (moved.min?.si ?? 0)).toBeCloseTo(wide, 9)
    }))
    expect(movedInterval(interval(3, null, 'length'), 5, 'length', 'SI')).toMatchObject({ min: { si: 5 }, max: null })
    expect(movedInterval(interval(null, 3, 'length'), 5, 'length', 'SI')).toMatchObject({ min: null, max: { si: 5 } })
    expect(movedInterval(null, 5, 'length', 'SI')).toMatchObject({ min: { si: 5 }, max: { si: 5 } })
  })
  it('write inches as the trade does, and what they write reads back as the same', () => {
    expect([25.4 / 8, 25.4, 38.1, 25.4 * (1 + 3 / 32), 1].map((value) => typedQuantity(value, 'length', 'US').typed)).toEqual(['1/8 in', '1 in', '1 1/2 in', '1 3/32 in', '0.0394 in'])
    fc.assert(fc.property(fc.integer({ min: 0, max: 400 }), (parts) => {
      const { si, typed } = typedQuantity(parts * stepOf('length', 'US'), 'length', 'US')
      const read = parseQuantity(typed, 'length', 'SI')
      expect(read.ok && read.quantity.si).toBeCloseTo(si, 6)
    }))
  })
  it('settle on steps within their ends', () => {
    fc.assert(fc.property(fc.double({ min: -10, max: 100, noNaN: true }), (value) => {
      const at = settled({ dimension: 'length', min: 0.5, max: 12.3 }, value, 'SI')
      expect(at).toBeGreaterThanOrEqual(0.5)
      expect(at).toBeLessThanOrEqual(12.3)
      expect(Math.abs(at * 2 - Math.round(at * 2))).toBeLessThan(1e-9)
    }))
  })
})

describe('the sequence', () => {
  const pass = (number: string, layer: Pass['layer'], more: Partial<Pass> = {}): Pass => ({ ...passSchema.parse({ number, layer }), ...more })
  const blocks = [processBlockSchema.parse({ id: 'a', process: 'GTAW', passes: [pass('1', 'root'), pass('2', 'hot')] }), processBlockSchema.parse({ id: 'b', process: 'GMAW', passes: [pass('3', 'fill', { current: interval(180, 200, 'current') }), pass('4', 'cap')] })]
  const told = (list: readonly ProcessBlock[]) => sequenceOf(list).map(({ processId, pass: { number, layer } }) => `${number} ${processId} ${layer}`)
  it('runs block after block until somebody moves a pass; then it says so, and counts anew', () => {
    expect(told(blocks)).toEqual(['1 a root', '2 a hot', '3 b fill', '4 b cap'])
    const moved = movedPass(blocks, 2, 0)
    expect(told(moved)).toEqual(['1 b fill', '2 a root', '3 a hot', '4 b cap'])
    expect(moved.flatMap(({ passes }) => passes.map(({ order }) => order))).toEqual([2, 3, 1, 4])
    const back = movedPass(moved, 0, 2)
    expect(back).toEqual(blocks)
  })
  it('never loses a pass, whatever is moved', () => {
    fc.assert(fc.property(fc.array(fc.tuple(fc.nat(3), fc.nat(3)), { maxLength: 12 }), (moves) => {
      const after = moves.reduce((list, [from, to]) => movedPass(list, from, to), [...blocks])
      expect(sequenceOf(after).map(({ pass: { layer } }) => layer).sort()).toEqual(['cap', 'fill', 'hot', 'root'])
      expect(sequenceOf(after).map(({ pass: { number } }) => number)).toEqual(['1', '2', '3', '4'])
    }))
  })
  it('gives a pass to another process, changes, adds and takes out', () => {
    expect(told(passToProcess(blocks, 1, 'b'))).toEqual(['1 a root', '2 b hot', '3 b fill', '4 b cap'])
    expect(told(changedPass(blocks, 1, { layer: 'fill' }))[1]).toBe('2 a fill')
    expect(told(withoutPass(blocks, 0))).toEqual(['1 a hot', '2 b fill', '3 b cap'])
    expect(told(withPass(blocks)).at(-1)).toBe('5 b cap')
    expect(told(withPass([processBlockSchema.parse({ id: 'a' })]))).toEqual(['1 a root'])
  })
  it('keeps numbers that somebody gave', () => {
    const own = changedPass(blocks, 0, { number: 'R1' })
    expect(sequenceOf(movedPass(own, 0, 1)).map(({ pass: { number } }) => number)).toEqual(['2', 'R1', '3', '4'])
  })
  it('takes the settings of the same process and layer when laid out anew', () => {
    const next = withPlan(blocks, [{ processId: 'a', layer: 'root', side: 'first', beadArea: 12 }, { processId: 'b', layer: 'fill', side: 'first', beadArea: 20 }], false)
    expect(next[1]?.passes).toMatchObject([{ number: '2', current: { min: { si: 180 } }, beadArea: { si: 20 } }])
    expect(next[1]?.passes[0]?.side).toBeUndefined()
  })
  it('a bead’s section follows from wire, feed and travel: 1.2 mm at 6 m/min and 400 mm/min give 16.96 mm² before losses', () => {
    const block = processBlockSchema.parse({ id: 'a', filler: { diameters: [{ si: 1.2, unit: 'mm', typed: '1.2' }] }, electrical: { wireFeed: interval(6, undefined, 'wireFeed'), travelSpeed: interval(300, 500, 'travelSpeed') } })
    expect(beadFromSettings(block)).toBeCloseTo(16.96, 2)
    expect(beadFromSettings(processBlockSchema.parse({ id: 'a' }))).toBeNull()
  })
})

describe('the picture', () => {
  it('stands within its frame, figures apart from one another', () => {
    fc.assert(fc.property(shapes, fc.integer({ min: 300, max: 900 }), (shape, width) => {
      const measure = (text: string) => text.length * 8
      const picture = jointPicture(jointGeometry(settingFor(shape)), { width, maxHeight: 280, measure })
      const boxes = picture.marks.map((mark) => boxOf(mark, measure))
      for (const box of boxes) {
        expect(box.left).toBeGreaterThanOrEqual(0)
        expect(box.right).toBeLessThanOrEqual(width)
        expect(box.top).toBeGreaterThanOrEqual(0)
        expect(box.bottom).toBeLessThanOrEqual(picture.height)
      }
      boxes.forEach((one, index) => boxes.slice(index + 1).forEach((other) => expect(one.left < other.right && one.right > other.left && one.top < other.bottom && one.bottom > other.top).toBe(false)))
    }))
  })
  it('is to one scale, and a place leads back to its millimetres', () => {
    const picture = jointPicture(jointGeometry(settingFor({ groove: 'single-v', t: 20, opening: 3, face: 2, bevel: 30, radius: 5 })), { width: 600, maxHeight: 300 })
    const [a, b] = [picture.at({ x: 0, y: 0 }), picture.at({ x: 5, y: 5 })]
    expect(b.x - a.x).toBeCloseTo(a.y - b.y, 9)
    expect(picture.from(b)).toEqual({ x: expect.closeTo(5, 9) as number, y: expect.closeTo(5, 9) as number })
  })
})

describe('standard details', () => {
  it.each(details.map((detail, index) => [`${detail.code} ${index}`, detail] as const))('%s fills a joint that can be drawn, in both systems', (_name, detail) => {
    for (const system of ['SI', 'US'] as const) {
      const thickness = detail.most ? detail.most[system] : system === 'SI' ? 25 : 1
      const joint = { ...jointSchema.parse({ rootOpening: mm(2) }), ...jointOfDetail(detail, { type: detail.joints[0] ?? 'butt', backing: null, backGouging: null, weldedFromBothSides: null }, thickness, system) }
      const drawn = jointGeometry({ joint, thickness: interval(thickness, undefined, 'length', system === 'SI' ? 'mm' : 'in'), system })
      expect(drawn.problems).toEqual([])
      expect(joint.designation).toBe(detail.code)
      expect(jointSchema.parse(joint)).toMatchObject({ groove: detail.groove, penetration: detail.penetration })
      const sheet = detailSheet(detail, thickness, system)
      expect(sheet.lines.map(({ fitUp }) => fitUp).join()).not.toMatch(/NaN|Infinity/)
      expect(sheet.source).toMatch(/Fig\. 5\.[12]/)
    }
  })
  it('B-U4b: what a drawing may state, and what fit-up may leave', () => {
    const [detail] = detailsNamed(' B-U4b ')
    const sheet = detail && detailSheet(detail, 1, 'US')
    expect(sheet?.lines).toEqual([
      { label: 'Root opening', detailed: '0 to 3/16 in', fitUp: '0 to 3/16 in' },
      { label: 'Root face', detailed: '0 to 3/16 in', fitUp: 'not limited' },
      { label: 'Groove angle', detailed: '45–55°', fitUp: '40–55°' },
    ])
    expect(sheet?.basis).toBe('read')
  })
  it('are found by groove, joint and process', () => {
    expect(detailsFor({ groove: 'single-v', type: 'butt', processes: ['SAW'] }).map(({ code }) => code)).toEqual(['B-L2a-S', 'B-U2-S', 'BC-P2-S'])
    expect(detailsFor({ groove: null, type: null, processes: [] })).toHaveLength(details.length)
  })
})

it('a weld’s variables give its setting: a plate has no axis, a pipe has', () => {
  const variables = weldingVariablesSchema.parse({ standards: [{ standard: 'asme-ix', edition: '2023' }], product: 'pipe', diameter: mm(168.3), thickness: mm(8), processes: [{ id: 'p' }] })
  expect(settingOf(variables).diameter).toEqual(mm(168.3))
  expect(settingOf({ ...variables, product: 'plate' }).diameter).toBeNull()
})
