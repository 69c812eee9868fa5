import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { geometryOf, jointGeometry, type JointSetting } from '../../../../shared/calculations/joint-geometry.ts'
import { spread } from '../../../../shared/calculations/pass-layout.ts'
import { boundsOf, centroid, polygonArea, type Polygon } from '../../../../shared/calculations/polygon.ts'
import { GROOVE_TYPES, jointSchema, passSchema, weldingVariablesSchema, type Pass } from '../../../../shared/schemas/welding.ts'
import { interval } from '../../../../shared/units/convert.ts'
import { parseInterval } from '../../../../shared/units/parse.ts'

const mm = (value: number) => interval(value, undefined, 'length')
const degrees = (value: number) => interval(value, undefined, 'angle')
interface Given { type?: string; groove?: string | null; t?: number | null; tB?: number; included?: number; bevel?: number; opening?: number | null; face?: number | null; radius?: number; leg?: number; weld?: 'groove' | 'fillet'; passes?: Pass[]; density?: number | null; extra?: Record<string, unknown> }
const setting = ({ type = 'butt', groove = 'single-v', t = 12, tB, included, bevel, opening = 2, face = 2, radius, leg, weld = 'groove', passes = [], density = null, extra = {} }: Given): JointSetting => ({
  joint: jointSchema.parse({ weld, type, groove, includedAngle: included === undefined ? null : degrees(included), bevelAngle: bevel === undefined ? null : degrees(bevel), rootOpening: opening === null ? null : mm(opening), rootFace: face === null ? null : mm(face), rootRadius: radius === undefined ? null : mm(radius), filletLeg: leg === undefined ? null : mm(leg), ...extra }),
  thickness: t === null ? null : mm(t),
  thicknessB: tB === undefined ? null : mm(tB),
  blocks: [{ id: 'p1', passes }],
  density,
  system: 'SI',
})
const pass = (number: number | string, layer: Pass['layer'] = 'fill'): Pass => passSchema.parse({ number: String(number), layer })
const typical = (groove: string): Given => ({ groove, t: 20, included: groove === 'compound-v' ? 75 : undefined, bevel: groove === 'compound-v' ? 10 : /-[uj]$/.test(groove) ? 15 : 30, radius: groove.startsWith('flare') ? 12 : 5, face: 2, opening: 3 })

describe('areas', () => {
  const tan = (angle: number) => Math.tan((angle * Math.PI) / 180)
  test.each<[string, Given, number]>([
    ['square', { groove: 'square', t: 5, opening: 2 }, 10],
    ['single V', { groove: 'single-v', t: 10, included: 60, opening: 2, face: 0 }, 20 + 100 * tan(30)],
    ['single V by its bevel angle', { groove: 'single-v', t: 10, bevel: 30, opening: 2, face: 0 }, 20 + 100 * tan(30)],
    ['double V', { groove: 'double-v', t: 22, included: 60, opening: 3, face: 2 }, 66 + 2 * 100 * tan(30)],
    ['single bevel', { groove: 'single-bevel', t: 15, bevel: 45, opening: 3, face: 2 }, 45 + 0.5 * 169],
    ['double bevel', { groove: 'double-bevel', t: 22, bevel: 45, opening: 0, face: 2 }, 2 * 0.5 * 100],
    ['flare bevel', { groove: 'flare-bevel', t: 6, opening: 0, radius: 12 }, 144 * (1 - Math.PI / 4)],
    ['flare V', { groove: 'flare-v', t: 6, opening: 1, radius: 12 }, 12 + 2 * 144 * (1 - Math.PI / 4)],
    ['compound V', { groove: 'compound-v', t: 22, included: 60, bevel: 10, opening: 2, face: 2 }, 44 + 2 * (0.5 * 10 * 10 * tan(30) + 10 * 10 * tan(30) + 0.5 * 10 * 10 * tan(10))],
  ])('%s', (_name, given, area) => {
    expect(jointGeometry(setting(given)).areaMm2 ?? 0).toBeCloseTo(area, given.groove?.startsWith('flare') ? 0 : 6)
  })
  it('a double U is twice a single one of half the depth', () => {
    const double = jointGeometry(setting({ groove: 'double-u', t: 40, bevel: 10, radius: 6, opening: 2, face: 2 })).areaMm2 ?? 0
    const single = jointGeometry(setting({ groove: 'single-u', t: 21, bevel: 10, radius: 6, opening: 2, face: 2 })).areaMm2 ?? 0
    expect(double).toBeCloseTo(2 * single - 2 * 2, 6)
  })
  it('counts the root face of a partial penetration weld out', () => {
    const full = jointGeometry(setting({ included: 60 })).areaMm2 ?? 0
    expect(jointGeometry(setting({ included: 60, extra: { penetration: 'partial' } })).areaMm2).toBeCloseTo(full - 2 * 2, 6)
  })
  it('gives mass only with a density, and no area where a figure is open', () => {
    expect(jointGeometry(setting({ included: 60 })).weldMetalKgPerM).toBeNull()
    expect(jointGeometry(setting({ included: 60, density: 7850 })).weldMetalKgPerM).toBeGreaterThan(0)
    const open = jointGeometry(setting({ included: 60, opening: null, density: 7850 }))
    expect([open.areaMm2, open.weldMetalKgPerM]).toEqual([null, null])
    expect(open.assumed.join(' ')).toMatch(/root opening is not given/)
  })
  it('counts both fillets of a tee welded from both sides', () => {
    expect(jointGeometry(setting({ weld: 'fillet', type: 'tee', leg: 8 })).areaMm2).toBe(32)
    expect(jointGeometry(setting({ weld: 'fillet', type: 'tee', leg: 8, extra: { weldedFromBothSides: true } })).areaMm2).toBe(64)
  })
})

describe('what can be drawn', () => {
  it.each(GROOVE_TYPES)('%s has plates, a weld and dimensions inside its bounds', (groove) => {
    const drawn = jointGeometry(setting({ ...typical(groove), passes: [pass(1, 'root'), pass(2), pass(3), pass(4, 'cap'), pass(5, 'cap')] }))
    expect(drawn.impossible).toEqual([])
    expect(drawn.plates).toHaveLength(2)
    expect(drawn.passes.map(({ number }) => number)).toEqual(['1', '2', '3', '4', '5'])
    for (const polygon of [...drawn.plates, ...drawn.weld, ...drawn.passes.map((laid) => laid.polygon)]) {
      expect(polygon.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y))).toBe(true)
      expect(polygonArea(polygon)).toBeGreaterThan(0)
    }
    const { minX, maxX } = boundsOf(drawn.plates)
    for (const { labelAt } of drawn.passes) {
      expect(labelAt.x).toBeGreaterThan(minX)
      expect(labelAt.x).toBeLessThan(maxX)
    }
    expect(drawn.dimensions.map(({ kind }) => kind)).toEqual(expect.arrayContaining(['thickness', 'root-opening']))
    expect(drawn.dimensions.every(({ text }) => text !== '')).toBe(true)
  })
  it.each(['tee', 'lap', 'corner'])('a fillet in a %s joint', (type) => {
    const drawn = jointGeometry(setting({ weld: 'fillet', type, t: 10, tB: 12, leg: 8, opening: 0, passes: [pass(1, 'fillet'), pass(2, 'fillet'), pass(3, 'fillet')] }))
    expect(drawn.impossible).toEqual([])
    expect(drawn.plates).toHaveLength(2)
    expect(drawn.passes.reduce((sum, { polygon }) => sum + polygonArea(polygon), 0)).toBeCloseTo(32, 9)
    expect(drawn.dimensions.map(({ kind }) => kind)).toEqual(['leg', 'thickness', 'thickness-b'])
  })
  it('draws the backing that is a body of its own, and lays a backing bead under the root', () => {
    expect(jointGeometry(setting({ included: 60, extra: { backing: 'metal' } })).backing).not.toBeNull()
    expect(jointGeometry(setting({ included: 60, extra: { backing: 'weld-metal' } })).backing).toBeNull()
    const [, bead] = jointGeometry(setting({ included: 60, passes: [pass(1, 'root'), pass(2, 'backing')] })).passes
    expect(bead?.labelAt.y).toBeLessThan(0)
  })
  it('stands the unprepared member of a tee upright', () => {
    const [standing, lying] = jointGeometry(setting({ type: 'tee', groove: 'single-bevel', t: 12, tB: 20, bevel: 45 })).plates
    const size = (polygon: Polygon) => { const { minX, maxX, minY, maxY } = boundsOf([polygon]); return { width: maxX - minX, height: maxY - minY } }
    expect(size(standing ?? []).width).toBe(20)
    expect(size(lying ?? []).height).toBe(12)
  })
  it('labels an interval as it was written, and draws its middle', () => {
    const reading = parseInterval('3/16 - 3/4 in', 'length', 'US')
    const drawn = jointGeometry({ ...setting({ included: 60 }), thickness: reading.ok ? reading.interval : null, system: 'US' })
    expect(drawn.dimensions.find(({ kind }) => kind === 'thickness')?.text).toBe('3/16 to 3/4 in')
    expect(Math.max(...drawn.weld.flat().map(({ y }) => y))).toBeCloseTo((4.7625 + 19.05) / 2, 9)
  })
})

describe('what is impossible is named', () => {
  test.each<[string, Given, RegExp]>([
    ['no groove type', { groove: null }, /groove type is not given/],
    ['no thickness', { t: null, included: 60 }, /thickness is not given/],
    ['no angle', {}, /included angle is not given/],
    ['no bevel angle', { groove: 'single-bevel' }, /bevel angle is not given/],
    ['root face as thick as the plate', { included: 60, face: 12 }, /root face of 12 mm leaves nothing to prepare in 12 mm/],
    ['root face above the plate', { included: 60, face: 15 }, /root face of 15 mm/],
    ['included angle of 180°', { included: 180 }, /180° leaves no plate/],
    ['bevel of 95°', { groove: 'single-bevel', bevel: 95 }, /95° leaves no plate/],
    ['angle of nothing', { included: 0 }, /0° is no bevel/],
    ['angles that disagree', { included: 60, bevel: 45 }, /60° is not twice the bevel angle of 45°/],
    ['no radius', { groove: 'single-u', bevel: 10 }, /root radius is not given/],
    ['a radius that does not fit', { groove: 'single-u', bevel: 10, radius: 15 }, /radius of 15 mm needs 12\.4 mm of depth; the groove has 10 mm/],
    ['a V in a tee', { type: 'tee', included: 60 }, /A single V groove needs two prepared edges/],
    ['a fillet in a butt joint', { weld: 'fillet', leg: 6 }, /instead of a butt joint/],
    ['a fillet without leg', { weld: 'fillet', type: 'tee' }, /leg is not given/],
    ['a leg above the lapped edge', { weld: 'fillet', type: 'lap', t: 10, tB: 6, leg: 8, opening: 0 }, /8 mm does not fit on the edge of a 6 mm plate/],
    ['a gap as large as the leg', { weld: 'fillet', type: 'tee', leg: 3, opening: 3 }, /would not reach both members/],
  ])('%s', (_name, given, message) => {
    const drawn = jointGeometry(setting(given))
    expect(drawn.impossible.join(' ')).toMatch(message)
    expect(drawn.plates).toEqual([])
    expect(drawn.areaMm2).toBeNull()
  })
})

describe('passes', () => {
  const layered = fc.record({ groove: fc.constantFrom(...GROOVE_TYPES), t: fc.integer({ min: 20, max: 60 }), opening: fc.integer({ min: 0, max: 6 }), fills: fc.integer({ min: 0, max: 20 }), caps: fc.integer({ min: 0, max: 6 }), root: fc.boolean() })

  it('fill the groove exactly: together they are the weld and its crown', () => {
    fc.assert(
      fc.property(layered, ({ groove, t, opening, fills, caps, root }) => {
        const passes = [...(root ? [pass('r', 'root')] : []), ...Array.from({ length: fills }, (_, index) => pass(`f${index}`)), ...Array.from({ length: caps }, (_, index) => pass(`c${index}`, 'cap'))]
        const drawn = jointGeometry(setting({ ...typical(groove), t, opening, passes }))
        expect(drawn.passes).toHaveLength(passes.length)
        fc.pre(passes.length > 1 && (groove !== 'square' || opening > 0))
        const top = Math.max(...drawn.weld.flat().map(({ y }) => y))
        const crown = Math.min(1.5, top * 0.12)
        const widthAtTop = boundsOf([drawn.weld[0] ?? []]).maxX - boundsOf([drawn.weld[0] ?? []]).minX
        const widthBelow = drawn.weld[1] ? boundsOf([drawn.weld[1]]).maxX - boundsOf([drawn.weld[1]]).minX : 0
        const crowns = (2 / 3) * crown * (widthAtTop + widthBelow)
        const laid = drawn.passes.reduce((sum, { polygon }) => sum + polygonArea(polygon), 0)
        const weld = drawn.areaMm2 ?? 0
        expect(laid).toBeGreaterThan(weld * 0.999)
        expect(laid).toBeLessThan((weld + crowns) * 1.001)
      }),
      { numRuns: 150 },
    )
  })
  it('rise from the root: no fill bead lies below the root pass, no cap below a fill bead', () => {
    const drawn = jointGeometry(setting({ t: 25, included: 60, passes: [pass(1, 'root'), pass(2), pass(3), pass(4), pass(5), pass(6, 'cap'), pass(7, 'cap'), pass(8, 'cap')] }))
    const heights = drawn.passes.map(({ labelAt }) => labelAt.y)
    expect(Math.min(...heights.slice(1))).toBeGreaterThan(heights[0] ?? 0)
    expect(Math.min(...heights.slice(5))).toBeGreaterThan(Math.max(...heights.slice(1, 5)))
  })
  it('change sides in a double groove after the first cap', () => {
    const drawn = jointGeometry(setting({ groove: 'double-v', t: 30, included: 60, passes: [pass(1, 'root'), pass(2), pass(3, 'cap'), pass(4), pass(5, 'cap')] }))
    expect(drawn.passes.map(({ labelAt }) => labelAt.y > 15)).toEqual([true, true, true, false, false])
  })
  it('keep the process block that lays them', () => {
    const variables = weldingVariablesSchema.parse({ standards: [{ standard: 'asme-ix', edition: '2023' }], thickness: mm(12), joint: { groove: 'single-v', includedAngle: degrees(60), rootOpening: mm(3), rootFace: mm(1) }, baseMetals: { a: { libraryId: 'us-a516-70' } }, processes: [{ id: 'root', process: 'GTAW', passes: [pass(1, 'root')] }, { id: 'fill', process: 'SMAW', passes: [pass(2), pass(3, 'cap')] }] })
    const drawn = geometryOf(variables)
    expect(drawn.passes.map(({ processId, order }) => [processId, order])).toEqual([['root', 0], ['fill', 1], ['fill', 2]])
    expect(drawn.weldMetalKgPerM).toBeCloseTo(((drawn.areaMm2 ?? 0) * 7850) / 1e6, 9)
  })
  it('are spread so that every layer has one and none is lost', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 40 }), fc.array(fc.integer({ min: 0, max: 9 }), { minLength: 1, maxLength: 8 }), (extra, weights) => {
        const beads = spread(weights.length + extra, weights)
        expect(beads.reduce((sum, count) => sum + count, 0)).toBe(weights.length + extra)
        expect(Math.min(...beads)).toBeGreaterThanOrEqual(1)
      }),
    )
  })
})

it('areas and centres are those of plane geometry', () => {
  const square: Polygon = [{ x: 0, y: 0 }, { x: 2, y: 0 }, { x: 2, y: 2 }, { x: 0, y: 2 }]
  expect(polygonArea(square)).toBe(4)
  expect(centroid(square)).toEqual({ x: 1, y: 1 })
})

it('a thicker plate never needs less weld metal', () => {
  fc.assert(
    fc.property(fc.constantFrom(...GROOVE_TYPES.filter((groove) => !groove.startsWith('flare'))), fc.integer({ min: 20, max: 60 }), fc.integer({ min: 1, max: 20 }), (groove, t, more) => {
      expect(jointGeometry(setting({ ...typical(groove), t: t + more })).areaMm2).toBeGreaterThan(jointGeometry(setting({ ...typical(groove), t })).areaMm2 ?? Infinity)
    }),
  )
})
