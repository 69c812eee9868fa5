import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { jobJointQuestion, readJointQuery } from '../../../../shared/lookup/joint-query.ts'
import { askedMetal } from '../../../../shared/lookup/joint-question.ts'
import { PIPE_SIZES, pipeSize } from '../../../../shared/lookup/pipe-sizes.ts'
import { readJointLine } from '../../../../shared/lookup/read-joint.ts'
import { lookupQuerySchema } from '../../../../shared/schemas/records.ts'
import { interval } from '../../../../shared/units/convert.ts'

interface Expected { metals?: [string, string]; t?: [number, number]; od?: number; process?: string | null; position?: string | null; weld?: string | null; product?: string | null; progression?: string | null; pulsed?: boolean; notRead?: string[] }

describe('a joint in one line', () => {
  test.each<[string, Expected]>([
    ['12 mm A516-70 to A516-70 SMAW 3G', { metals: ['A516-70', 'A516-70'], t: [12, 12], process: 'SMAW', position: '3G', weld: 'groove', product: null }],
    ['304L pipe 2in sch 40 GTAW 6G', { metals: ['304L', '304L'], t: [3.9116, 3.9116], od: 60.325, process: 'GTAW', position: '6G', product: 'pipe' }],
    ['PF 135 S355 t10', { metals: ['S355', 'S355'], t: [10, 10], process: 'GMAW', position: '3G', progression: 'up', weld: 'groove' }],
    ['6061 1/4 in pulsed GMAW 1F', { metals: ['6061', '6061'], t: [6.35, 6.35], process: 'GMAW', position: '1F', weld: 'fillet', pulsed: true }],
    ['A36 to A516 Gr 70 3/8" FCAW 2F', { metals: ['A36', 'A516 Gr 70'], t: [9.525, 9.525], process: 'FCAW', position: '2F' }],
    ['GTAW/SMAW A106 B 4" sch 80 5G uphill', { metals: ['A106 B', 'A106 B'], t: [8.5598, 8.5598], od: 114.3, process: 'GTAW', position: '5G', progression: 'up', product: 'pipe' }],
    ['S355J2 fillet PB 136 8 mm', { metals: ['S355J2', 'S355J2'], t: [8, 8], process: 'FCAW', position: '2F', weld: 'fillet' }],
    ['1.4404 60.3 x 3.9 mm 141 H-L045', { metals: ['1.4404', '1.4404'], t: [3.9, 3.9], od: 60.3, process: 'GTAW', position: '6G', progression: 'up', product: 'pipe' }],
    ['P-No. 8 to P-No. 1 5-10 mm TIG', { metals: ['P-No. 8', 'P-No. 1'], t: [5, 10], process: 'GTAW', position: null }],
    ['SA-240 Type 304L 1-1/2 in GMAW-P PA', { metals: ['SA-240 Type 304L', 'SA-240 Type 304L'], t: [38.1, 38.1], process: 'GMAW', position: '1G', pulsed: true }],
    ['EN 10025-2 S355JR t=15 111 PC', { metals: ['EN 10025-2 S355JR', 'EN 10025-2 S355JR'], t: [15, 15], process: 'SMAW', position: '2G' }],
    ['304/316L 3 mm GTAW', { metals: ['304', '316L'], t: [3, 3], process: 'GTAW' }],
    ['OD 168.3 mm A106B GTAW 5G', { metals: ['A106B', 'A106B'], od: 168.3, position: '5G', product: 'pipe' }],
    ['PJ 141 P265GH', { position: '5G', progression: 'down', process: 'GTAW' }],
    ['PD 135 S355J2 fillet', { position: '4F', weld: 'fillet' }],
    ['NPS 6 sch 160 A106B 6G', { od: 168.275, notRead: ['sch 160: wall not known here, write the thickness'] }],
    ['304L NPS 12 sch 40S', { od: 323.85, notRead: ['sch 40S: wall not known here, write the thickness'] }],
    ['hello unknown stuff', { process: null, position: null, weld: null, notRead: ['hello', 'unknown', 'stuff'] }],
    ['A516-70 12', { metals: ['A516-70', 'A516-70'], notRead: ['12'] }],
    ['A588 20 mm SAW shiny', { process: 'SAW', notRead: ['shiny'] }],
    ['A36 A516-70 A53 SMAW', { metals: ['A36', 'A516-70'], notRead: ['A53'] }],
    ['', { notRead: [], process: null }],
  ])('%s', (line, expected) => {
    const reading = readJointLine(line, 'SI')
    if (expected.metals) expect([reading.metalA?.text, reading.metalB?.text]).toEqual(expected.metals)
    if (expected.t) expect([reading.thickness?.min?.si, reading.thickness?.max?.si]).toEqual(expected.t)
    if (expected.od !== undefined) expect(reading.diameter?.min?.si).toBe(expected.od)
    for (const key of ['process', 'position', 'weld', 'product', 'progression', 'pulsed'] as const) if (key in expected) expect(reading[key], key).toBe(expected[key])
    expect(reading.notRead).toEqual(expected.notRead ?? [])
  })
  it('takes bare figures in the system of the asker', () => {
    expect(readJointLine('A36 t 1/2', 'US').thickness?.min?.si).toBe(12.7)
    expect(readJointLine('A36 t10', 'SI').thickness?.min?.si).toBe(10)
  })
  it('tells back what was read, with the basis of a pipe size', () => {
    const { read } = readJointLine('304L pipe 2in sch 40 GTAW 6G', 'SI')
    expect(read.find(({ label }) => label === 'Thickness')?.value).toBe('3.9 mm (Schedule 40, ASME B36.10M from memory: confirm)')
    expect(read.find(({ label }) => label === 'Base metals')?.value).toMatch(/A\/SA-312 TP304L, P-No\. 8 Group 1.*to itself/)
  })
  it('says that a P-Number is open rather than picking one', () => {
    const reading = readJointLine('6061 5 mm', 'SI')
    expect(reading.metalA?.pNumber).toBeNull()
    expect(reading.read.find(({ label }) => label === 'Base metals')?.value).toMatch(/open/)
  })
  it('keeps both processes of a combined weld', () => {
    expect(readJointLine('GTAW + SMAW A106B', 'SI').processes).toEqual(['GTAW', 'SMAW'])
  })
  it('never throws, whatever is typed', () => {
    fc.assert(fc.property(fc.string({ maxLength: 120 }), fc.array(fc.constantFrom('A36', 'to', '12', 'mm', '3G', 'sch', '40', '1/2', '"', 'x', 'PF', '135', 'P-No.', '8', 'pipe', 't', 'OD', '-', '/', '|')), (text, parts) => {
      for (const line of [text, parts.join(' ')]) {
        const reading = readJointLine(line, 'SI')
        expect(reading.read.every(({ value }) => typeof value === 'string')).toBe(true)
      }
    }))
  })
})

describe('metals', () => {
  it('agree on a number or leave it open', () => {
    expect(askedMetal('304L')).toMatchObject({ pNumber: '8', groupNumber: 1, iso15608: '8.1' })
    expect(askedMetal('304L', 'pipe')?.libraryIds).toEqual(['us-a312-tp304l'])
    expect(askedMetal('A913')).toMatchObject({ pNumber: null })
    expect(askedMetal('mystery')).toBeNull()
  })
})

describe('pipe sizes', () => {
  it('are found however they are written, and a wall is thinner than the radius', () => {
    expect(pipeSize('1-1/2')?.outside).toBe(1.9)
    expect(pipeSize('7')).toBeNull()
    for (const size of PIPE_SIZES) {
      expect(size[40]).toBeLessThan(size[80])
      expect(size[80]).toBeLessThan(size.outside / 2)
    }
    expect(PIPE_SIZES.every(({ outside }, index) => index === 0 || outside > (PIPE_SIZES[index - 1]?.outside ?? 0))).toBe(true)
  })
})

describe('queries and job joints', () => {
  it('parts override the line', () => {
    const reading = readJointQuery(lookupQuerySchema.parse({ line: 'A36 10 mm SMAW 3G', thickness: '12', position: '4G', process: 'GMAW', metalB: 'A516-70' }))
    expect(reading).toMatchObject({ position: '4G', process: 'GMAW', metalA: { text: 'A36' }, metalB: { text: 'A516-70' } })
    expect(reading.thickness?.min?.si).toBe(12)
  })
  it('say what can\'t be read', () => {
    const reading = readJointQuery(lookupQuerySchema.parse({ thickness: 'thick', metalA: 'mystery' }))
    expect(reading.notRead).toEqual(['mystery (not a metal of the library)', expect.stringMatching(/"thick" is not a length/)])
    expect(reading.metalA?.text).toBe('mystery')
  })
  it('a job joint asks what it states', () => {
    expect(jobJointQuestion({ metalA: 'A36', metalB: null, process: 'SMAW', weld: 'groove', product: 'plate', thickness: interval(12, undefined, 'length'), diameter: null, position: '3G' })).toMatchObject({ metalA: { text: 'A36' }, metalB: { text: 'A36' }, processes: ['SMAW'], position: '3G', diameter: null })
  })
})
