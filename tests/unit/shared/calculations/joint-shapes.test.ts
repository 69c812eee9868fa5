import { describe, expect, it, test } from 'vitest'
import { throatOfLegs } from '../../../../shared/calculations/fillet-geometry.ts'
import { jointGeometry, type JointSetting } from '../../../../shared/calculations/joint-geometry.ts'
import { boundsOf, polygonArea } from '../../../../shared/calculations/polygon.ts'
import { jointSchema } from '../../../../shared/schemas/welding.ts'
import { interval } from '../../../../shared/units/convert.ts'

const mm = (min: number, max?: number) => interval(min, max, 'length')
const degrees = (value: number) => interval(value, undefined, 'angle')
interface More { t?: number | null; tB?: number | null; d?: [number, number | null] | null; density?: number | null }
const setting = (joint: Record<string, unknown>, { t = 20, tB = null, d = null, density = null }: More = {}): JointSetting => ({ joint: jointSchema.parse(joint), thickness: t === null ? null : mm(t), thicknessB: tB === null ? null : mm(tB), diameter: d && interval(d[0], d[1], 'length'), density, system: 'SI' })
const tan = (angle: number) => Math.tan((angle * Math.PI) / 180)
const sin = (angle: number) => Math.sin((angle * Math.PI) / 180)
/** One half of a U, by the reference's formula: depth D, radius r, bevel b. */
const halfU = (D: number, r: number, b: number) => {
  const phi = Math.PI / 2 - (b * Math.PI) / 180
  const h = D - r * (1 - sin(b))
  return r * r * (phi / 2 - Math.sin(2 * phi) / 4) + r * h * Math.cos((b * Math.PI) / 180) + 0.5 * h * h * tan(b)
}

describe('sections by hand', () => {
  test.each<[string, Record<string, unknown>, More, number, number?]>([
    ['a double V of unequal depths and angles: g t + h1² tan(a1/2) + h2² tan(a2/2)', { groove: 'double-v', includedAngle: degrees(50), secondAngle: degrees(60), rootOpening: mm(2), rootFace: mm(2), grooveDepth: mm(18), secondDepth: mm(8) }, { t: 28 }, 56 + 18 ** 2 * tan(25) + 8 ** 2 * tan(30)],
    ['a double V whose first depth follows', { groove: 'double-v', includedAngle: degrees(60), rootOpening: mm(3), rootFace: mm(2), secondDepth: mm(8) }, { t: 30 }, 90 + (20 ** 2 + 8 ** 2) * tan(30)],
    ['a double bevel of unequal depths', { groove: 'double-bevel', bevelAngle: degrees(45), rootOpening: mm(2), rootFace: mm(0), grooveDepth: mm(12) }, { t: 20 }, 40 + 0.5 * (12 ** 2 + 8 ** 2)],
    ['a double J', { groove: 'double-j', bevelAngle: degrees(20), rootOpening: mm(2), rootFace: mm(4), rootRadius: mm(6) }, { t: 44 }, 88 + 2 * halfU(20, 6, 20), 1],
    ['a double U, unequal', { groove: 'double-u', includedAngle: degrees(20), rootOpening: mm(2), rootFace: mm(2), rootRadius: mm(6), secondDepth: mm(15) }, { t: 47 }, 94 + 2 * halfU(30, 6, 10) + 2 * halfU(15, 6, 10), 1],
    ['a compound V whose angle changes at 19 mm', { groove: 'compound-v', includedAngle: degrees(75), bevelAngle: degrees(10), rootOpening: mm(3), rootFace: mm(1.5), angleChange: mm(19) }, { t: 40 }, 120 + 17.5 ** 2 * tan(37.5) + 2 * (21 * 17.5 * tan(37.5) + 0.5 * 21 ** 2 * tan(10))],
    ['a partial penetration bevel by its depth: (t - f)² tan b / 2', { type: 'tee', groove: 'single-bevel', penetration: 'partial', bevelAngle: degrees(45), rootOpening: mm(0), grooveDepth: mm(12) }, { t: 20 }, 72],
    ['a tee with a fillet over each side', { type: 'tee', groove: 'double-bevel', bevelAngle: degrees(45), rootOpening: mm(2), rootFace: mm(2), reinforcingFillet: mm(6) }, { t: 22 }, 44 + 2 * 50 + 2 * 18],
    ['the thinner of two plates counts', { groove: 'square', rootOpening: mm(2), taperAngle: degrees(14), alignment: 'centred' }, { t: 30, tB: 10 }, 20],
    ['an edge weld over two ends', { type: 'edge', groove: 'square', rootOpening: mm(1), grooveDepth: mm(2) }, { t: 3, tB: 4 }, 16],
    ['a V in the ends of an edge joint', { type: 'edge', groove: 'single-v', includedAngle: degrees(60), rootOpening: mm(0), grooveDepth: mm(8) }, { t: 10 }, 64 * tan(30)],
    ['a fillet with unequal legs: z1 z2 / 2', { weld: 'fillet', type: 'tee', filletLeg: mm(8), filletLegB: mm(12) }, {}, 48],
    ['a skewed fillet: z² sin p / 2', { weld: 'fillet', type: 'tee', filletLeg: mm(8), memberAngle: degrees(60) }, {}, 32 * sin(60)],
    ['and both sides of it', { weld: 'fillet', type: 'tee', filletLeg: mm(8), memberAngle: degrees(60), weldedFromBothSides: true }, {}, 64 * sin(60)],
  ])('%s', (_name, joint, more, area, digits = 6) => {
    const drawn = jointGeometry(setting(joint, more))
    expect(drawn.problems).toEqual([])
    expect(drawn.areaMm2 ?? NaN).toBeCloseTo(area, digits)
  })

  it('throats: z/√2, z1 z2/√(z1² + z2²), z cos(p/2)', () => {
    expect(throatOfLegs(8, 8)).toBeCloseTo(5.657, 3)
    expect(throatOfLegs(6, 8)).toBeCloseTo(4.8, 9)
    expect(throatOfLegs(8, 8, 120)).toBeCloseTo(4, 9)
    expect(jointGeometry(setting({ weld: 'fillet', type: 'tee', filletLeg: mm(10) })).throatMm).toBeCloseTo(7.071, 3)
  })

  it('gouging takes away what is stated, and never less than the groove', () => {
    const joint = { groove: 'single-v', includedAngle: degrees(60), rootOpening: mm(2), rootFace: mm(2), backGouging: 'grinding' }
    const [without, shallow, deep] = [null, 4, 8].map((depth) => jointGeometry(setting({ ...joint, backGougeDepth: depth === null ? null : mm(depth) })))
    expect(shallow?.areaMm2).toBeGreaterThan(without?.areaMm2 ?? Infinity)
    expect(deep?.areaMm2).toBeGreaterThan(shallow?.areaMm2 ?? Infinity)
    // Round bottom of 5 mm and 30° sides: half a width of 5 cos 30° + (8 - 2.5) tan 30° at the surface.
    const bottom = deep?.weld[1] ?? []
    expect(Math.max(...bottom.map(({ x }) => x))).toBeCloseTo(5 * Math.cos(Math.PI / 6) + 5.5 * tan(30), 9)
    expect(without?.assumed.join(' ')).toMatch(/depth of back gouging is not given/)
  })

  it('round a pipe the weld is as long as its centre of area runs', () => {
    const drawn = jointGeometry(setting({ groove: 'square', rootOpening: mm(3) }, { t: 10, d: [100, 100], density: 7850 }))
    expect(drawn.weldMetalRoundKg).toBeCloseTo(30 * Math.PI * 90 * 7.85e-6, 9)
    expect(drawn.axis).toBe('axis of the pipe, Ø 100 mm')
    expect(jointGeometry(setting({ groove: 'square', rootOpening: mm(3) }, { t: 10, d: [100, null], density: 7850 })).weldMetalRoundKg, 'of every larger pipe it can’t be told').toBeNull()
  })
})

describe('members', () => {
  const thick = { groove: 'single-v', includedAngle: degrees(60), rootOpening: mm(2), rootFace: mm(1), taperAngle: degrees(45) }
  it.each([['root-side', 0, 16], ['face-side', -6, 10], ['centred', -3, 13]] as const)('a thicker plate flush %s tapers down to the thinner one', (alignment, low, high) => {
    const [, b] = jointGeometry(setting({ ...thick, alignment }, { t: 10, tB: 16 })).plates
    expect(boundsOf([b ?? []])).toMatchObject({ minY: low, maxY: high })
    // At 45° the slope runs as far as it rises, from the corner of the groove.
    const rise = alignment === 'face-side' ? 6 : high - 10
    const [corner, far] = alignment === 'face-side' ? [1, low] : [1 + 9 * tan(30), high]
    expect((b ?? []).some(({ x, y }) => Math.abs(x - (corner + rise)) < 1e-9 && Math.abs(y - far) < 1e-9)).toBe(true)
  })
  it('says that a step or a flush side was taken', () => {
    expect(jointGeometry(setting({ ...thick, taperAngle: null }, { t: 10, tB: 16 })).assumed.join(' ')).toMatch(/No taper is given for the 6 mm.*flush is not given/)
  })
  it('draws an insert in the root and a backing as large as stated', () => {
    const insert = jointGeometry(setting({ groove: 'square', rootOpening: mm(3), backing: 'consumable-insert', insertWidth: mm(2.5), insertHeight: mm(4) })).insert ?? []
    expect(polygonArea(insert)).toBeCloseTo(10, 9)
    const backing = jointGeometry(setting({ groove: 'square', rootOpening: mm(6), backing: 'metal', backingWidth: mm(25), backingThickness: mm(6) })).backing ?? []
    expect(boundsOf([backing])).toEqual({ minX: -12.5, maxX: 12.5, minY: -6, maxY: 0 })
  })
  it('under a tee the backing ends at the face of the standing member, and is as wide as stated', () => {
    const tee = { type: 'tee', groove: 'single-bevel', bevelAngle: degrees(45), rootOpening: mm(6) }
    for (const backing of ['metal', 'ceramic']) {
      expect(boundsOf([jointGeometry(setting({ ...tee, backing, backingWidth: mm(25), backingThickness: mm(6) })).backing ?? []])).toEqual({ minX: -3, maxX: 22, minY: -6, maxY: 0 })
      expect(boundsOf([jointGeometry(setting({ ...tee, backing })).backing ?? []]).minX).toBe(-3)
    }
    expect(boundsOf([jointGeometry(setting({ ...tee, type: 'butt', backing: 'metal', backingWidth: mm(25) })).backing ?? []]).minX).toBe(-12.5)
  })
  it('a ceramic backing has a hollow under the root', () => {
    const [metal, ceramic] = ['metal', 'ceramic'].map((backing) => polygonArea(jointGeometry(setting({ groove: 'square', rootOpening: mm(4), backing })).backing ?? []))
    expect(ceramic).toBeLessThan(metal ?? 0)
  })
})

describe('what can’t be, at its field, in one sentence', () => {
  const v = { groove: 'single-v', includedAngle: degrees(60), rootOpening: mm(2), rootFace: mm(1) }
  const double = { ...v, groove: 'double-v' }
  const fillet = { weld: 'fillet', type: 'tee', filletLeg: mm(6) }
  test.each<[string, Record<string, unknown>, More, string, RegExp]>([
    ['root face ≥ thickness', { ...v, rootFace: mm(20) }, {}, 'joint.rootFace', /leaves nothing to prepare in 20 mm/],
    ['negative root face', { ...v, rootFace: mm(-1) }, {}, 'joint.rootFace', /must be 0 or more/],
    ['negative opening', { ...v, rootOpening: mm(-1) }, {}, 'joint.rootOpening', /must be 0 or more/],
    ['included angle ≥ 180°', { ...v, includedAngle: degrees(190) }, {}, 'joint.includedAngle', /below 180°/],
    ['bevel ≥ 90°', { ...v, groove: 'single-bevel', bevelAngle: degrees(90) }, {}, 'joint.bevelAngle', /below 90°/],
    ['U radius too large', { ...v, groove: 'single-u', rootRadius: mm(40) }, {}, 'joint.rootRadius', /needs .* of depth; the groove has 19 mm/],
    ['radius of nothing', { ...v, groove: 'single-u', rootRadius: mm(0) }, {}, 'joint.rootRadius', /must be above 0/],
    ['the shallow side of a double U', { ...double, groove: 'double-u', rootRadius: mm(8), secondDepth: mm(3) }, { t: 40 }, 'joint.rootRadius', /the groove has 3 mm/],
    ['insert wider than the gap', { ...v, backing: 'consumable-insert', insertWidth: mm(3) }, {}, 'joint.insertWidth', /3 mm wide does not fit in a root opening of 2 mm/],
    ['insert higher than the plate', { ...v, backing: 'consumable-insert', insertHeight: mm(25) }, {}, 'joint.insertHeight', /does not fit in 20 mm/],
    ['backing narrower than the gap', { ...v, rootOpening: mm(10), backing: 'metal', backingWidth: mm(8) }, {}, 'joint.backingWidth', /does not span/],
    ['gouging through', { ...v, backGouging: 'grinding', backGougeDepth: mm(20) }, {}, 'joint.backGougeDepth', /cuts through 20 mm/],
    ['a taper that stands upright', { ...v, taperAngle: degrees(90) }, { t: 10, tB: 20 }, 'joint.taperAngle', /below 90°/],
    ['depths that do not add up', { ...v, grooveDepth: mm(10) }, {}, 'joint.grooveDepth', /do not make up the thickness of 20 mm/],
    ['a groove deeper than the plate', { ...v, rootFace: null, grooveDepth: mm(25) }, {}, 'joint.grooveDepth', /does not fit in 20 mm/],
    ['nothing left for the other side', { ...double, secondDepth: mm(19) }, {}, 'joint.secondDepth', /leaves nothing for the other side/],
    ['second angle of 180°', { ...double, secondAngle: degrees(180) }, {}, 'joint.secondAngle', /below 180°/],
    ['a compound angle that changes above the plate', { ...v, groove: 'compound-v', bevelAngle: degrees(10), angleChange: mm(30) }, {}, 'joint.angleChange', /goes from 1 mm to 20 mm/],
    ['a wall thicker than the pipe', v, { d: [30, 30] }, 'thickness', /does not fit in a pipe of 30 mm/],
    ['second thickness of nothing', v, { tB: 0 }, 'thicknessB', /must be above 0/],
    ['a groove in a lap', { ...v, type: 'lap' }, {}, 'joint.type', /no edges that face each other/],
    ['a double groove in an edge joint', { ...double, type: 'edge', grooveDepth: mm(5) }, {}, 'joint.groove', /welded from one side/],
    ['a V that takes the whole end', { ...v, type: 'edge', includedAngle: degrees(90), grooveDepth: mm(9) }, { t: 5 }, 'joint.grooveDepth', /takes 9 mm of an end that is 5 mm thick/],
    ['members in line', { ...fillet, memberAngle: degrees(180) }, {}, 'joint.memberAngle', /leave no corner/],
    ['a skewed lap', { ...fillet, type: 'lap', memberAngle: degrees(80) }, {}, 'joint.memberAngle', /stand square/],
    ['a second leg of nothing', { ...fillet, filletLegB: mm(0) }, {}, 'joint.filletLegB', /must be above 0/],
    ['a reinforcing fillet of nothing', { type: 'tee', groove: 'single-bevel', bevelAngle: degrees(45), rootOpening: mm(2), rootFace: mm(1), reinforcingFillet: mm(0) }, {}, 'joint.reinforcingFillet', /must be above 0/],
  ])('%s', (_name, joint, more, path, sentence) => {
    const drawn = jointGeometry(setting(joint, more))
    const found = drawn.problems.find((problem) => problem.path === path)
    expect(drawn.problems.map((problem) => problem.path)).toContain(path)
    expect(found?.sentence).toMatch(sentence)
    expect(found?.lacking).toBeUndefined()
    expect(drawn.plates).toEqual([])
  })
  it('a figure that is only missing is told apart from one that can’t be', () => {
    const { problems } = jointGeometry(setting({ groove: 'single-u' }, { t: null }))
    expect(problems.map(({ path, lacking }) => [path, lacking])).toEqual([['thickness', true], ['joint.includedAngle', true], ['joint.rootRadius', true]])
  })
  it('ranges clash only where no values within them go together', () => {
    const ranged = { ...setting({ ...v, grooveDepth: mm(4, 10), rootFace: mm(1, 2) }), thickness: mm(5, 25) }
    expect(jointGeometry(ranged).problems).toEqual([])
    expect(jointGeometry({ ...setting(v), thickness: mm(5, 25), diameter: interval(25, null, 'length') }).problems, 'a thin wall of a large pipe').toEqual([])
  })
})
