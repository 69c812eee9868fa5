import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { baseMetalById, toBaseMetal } from '../../../../shared/library/base-metals.ts'
import { emptyQuestion } from '../../../../shared/lookup/joint-question.ts'
import { rankForJoint, type Candidate } from '../../../../shared/lookup/rank.ts'
import { readJointLine } from '../../../../shared/lookup/read-joint.ts'
import { procedureContentSchema } from '../../../../shared/schemas/welding.ts'
import { interval } from '../../../../shared/units/convert.ts'

const metal = (id: string) => toBaseMetal(baseMetalById(id) ?? {})
interface Given { a?: string; b?: string; min?: number; max?: number; process?: string; positions?: string[]; progression?: string | null; weld?: string; product?: string; block?: Record<string, unknown>; variables?: Record<string, unknown>; blocks?: Record<string, unknown>[] }
const candidate = (id: string, { a = 'us-a516-70', b, min = 5, max = 20, process = 'SMAW', positions = ['1G', '2G', '3G'], progression = 'up', weld = 'groove', product = 'plate', block = {}, variables = {}, blocks }: Given = {}): Candidate => ({
  id,
  content: procedureContentSchema.parse({ title: id, variables: { standards: [{ standard: 'asme-ix', edition: '2023' }], joint: { weld }, product, baseMetals: { a: metal(a), b: metal(b ?? a) }, thickness: interval(min, max, 'length'), processes: blocks ?? [{ id: 'p', process, positions, progression, ...block }], ...variables } }),
})
const ask = (line: string, ...candidates: Candidate[]) => rankForJoint(readJointLine(line, 'SI'), candidates)

describe('what fits', () => {
  it('is told with its reasons', () => {
    const { fits, near } = ask('12 mm A516-70 to A516-70 SMAW 3G', candidate('one'))
    expect(near).toEqual([])
    expect(fits[0]?.reasons).toEqual(['A516-70: the same metal as A/SA-516 70', '12 mm lies within its thickness of 5–20 mm', 'SMAW', '3G is among its positions', 'groove weld'])
  })
  it('comes closest metal first, then tightest range', () => {
    const { fits } = ask('12 mm A516-70 SMAW 3G', candidate('same P-Number', { a: 'us-a36' }), candidate('wide', { min: 1.5, max: 200 }), candidate('tight', { min: 10, max: 14 }), candidate('same group', { a: 'us-a105' }))
    expect(fits.map(({ id }) => id)).toEqual(['tight', 'wide', 'same group', 'same P-Number'])
    expect(fits.every(({ score }) => score > 0 && score <= 100)).toBe(true)
  })
  it('includes the ends of the stated range', () => {
    expect(ask('5 mm A516-70', candidate('one')).fits).toHaveLength(1)
    expect(ask('20 mm A516-70', candidate('one')).fits).toHaveLength(1)
    expect(ask('20.1 mm A516-70', candidate('one')).fits).toHaveLength(0)
    expect(ask('3/16 in A516-70', candidate('one', { min: 4.7625 })).fits).toHaveLength(1)
  })
  it('takes a pair of metals either way round', () => {
    const mixed = candidate('mixed', { a: 'us-a240-304l', b: 'us-a36' })
    expect(ask('A36 to 304L', mixed).fits).toHaveLength(1)
    expect(ask('304L to A36', mixed).fits).toHaveLength(1)
    expect(ask('304L', mixed).fits).toHaveLength(0)
    expect(ask('A36', mixed).fits).toHaveLength(0)
  })
  it('holds a job that requires toughness to procedures written for it', () => {
    const question = { ...readJointLine('12 mm A516-70 SMAW 3G', 'SI'), toughness: true }
    const { fits, near } = rankForJoint(question, [candidate('without'), candidate('not stated', { variables: { toughnessRequired: null } }), candidate('with', { variables: { toughnessRequired: true } })])
    expect(fits.map(({ id }) => id)).toEqual(['with'])
    expect(near.map(({ wants }) => wants)).toEqual([[expect.stringMatching(/job requires toughness/)], [expect.stringMatching(/job requires toughness/)]])
  })
  it('prefers the process alone to one of several', () => {
    const both = candidate('both', { blocks: [{ id: 'r', process: 'GTAW', positions: ['3G'] }, { id: 'f', process: 'SMAW', positions: ['3G'] }] })
    expect(ask('SMAW 3G', both, candidate('alone')).fits.map(({ id }) => id)).toEqual(['alone', 'both'])
    expect(ask('GTAW + SMAW 3G', candidate('alone'), both).fits.map(({ id }) => id)).toEqual(['both'])
  })
})

describe('what misses by little says what it wants', () => {
  test.each<[string, Given, RegExp]>([
    ['25 mm A516-70 SMAW 3G', {}, /thickness is 5–20 mm; 25 mm is outside/],
    ['12 mm A516-70 SMAW 4G', {}, /SMAW is for 1G, 2G, 3G; 4G is asked/],
    ['12 mm A516-70 GMAW 3G', {}, /is for SMAW, not GMAW/],
    ['12 mm 304L SMAW 3G', {}, /is for A\/SA-516 70, not 304L/],
    ['12 mm A516-70 SMAW fillet', {}, /groove welds, not fillet/],
    ['12 mm A516-70 SMAW pipe', {}, /is for plate, not pipe/],
    ['12 mm A516-70 SMAW 3G', { variables: { thickness: null } }, /states no base metal thickness/],
    ['12 mm A516-70 111 PG', { positions: ['3G'] }, /welded upward; downward is asked/],
    ['12 mm A516-70 111 PF', { positions: ['3G'], progression: null }, /no progression stated/],
    ['12 mm A516-70 pulsed GMAW 3G', { process: 'GMAW' }, /does not state pulsed/],
    ['OD 60.3 mm A106B SMAW', { a: 'us-a106-b', product: 'pipe', variables: { diameter: interval(100, 300, 'length') } }, /outside diameter is 100–300 mm; 60.3 mm is outside/],
  ])('%s', (line, given, want) => {
    const { fits, near } = ask(line, candidate('one', given))
    expect(fits).toEqual([])
    expect(near[0]?.wants.join(' ')).toMatch(want)
  })
  it('but another joint altogether is no near miss', () => {
    expect(ask('40 mm 304L GTAW 6G', candidate('one'))).toEqual({ fits: [], near: [] })
  })
  it('every process of a document must allow the position', () => {
    const { near } = ask('GTAW 3G', candidate('both', { blocks: [{ id: 'r', process: 'GTAW', positions: ['3G'] }, { id: 'f', process: 'SMAW', positions: ['1G'] }] }))
    expect(near[0]?.wants).toEqual(['Its SMAW is for 1G; 3G is asked.'])
  })
})

describe('not listed is never equal to not listed', () => {
  it('two metals without a P-Number are two metals', () => {
    const s355 = candidate('s355', { a: 'en-10025-2-s355j2' })
    expect(ask('S690QL', s355).fits).toEqual([])
    expect(ask('S355J2', s355).fits).toHaveLength(1)
  })
  it('with toughness the Group must be the same', () => {
    const a36 = candidate('a36', { a: 'us-a36', variables: { toughnessRequired: true } })
    expect(ask('A516-70 SMAW', a36).near[0]?.wants[0]).toMatch(/not shown to be of the same Group/)
    expect(ask('A516-60 SMAW', a36).fits).toHaveLength(1)
  })
})

it('a question in which nothing was read ranks nothing', () => {
  expect(rankForJoint(emptyQuestion, [candidate('one')])).toEqual({ fits: [], near: [] })
})

it('a fit never depends on the other candidates, nor on their order', () => {
  const thickness = fc.tuple(fc.integer({ min: 1, max: 30 }), fc.integer({ min: 0, max: 30 }))
  fc.assert(
    fc.property(fc.array(thickness, { minLength: 1, maxLength: 6 }), fc.integer({ min: 1, max: 60 }), (spans, asked) => {
      const candidates = spans.map(([min, more], index) => candidate(String(index), { min, max: min + more }))
      const line = `${asked} mm A516-70 SMAW 3G`
      const ids = (list: readonly { id: string }[]) => list.map(({ id }) => id).sort()
      const ranked = ask(line, ...candidates)
      expect(ids(ranked.fits)).toEqual(ids(spans.flatMap(([min, more], index) => (asked >= min && asked <= min + more ? [{ id: String(index) }] : []))))
      expect(ids(ask(line, ...[...candidates].reverse()).fits)).toEqual(ids(ranked.fits))
      expect(ranked.fits.every(({ score }, index) => index === 0 || score <= (ranked.fits[index - 1]?.score ?? 0))).toBe(true)
    }),
    { numRuns: 40 },
  )
})
