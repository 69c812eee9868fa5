import { describe, expect, it } from 'vitest'
import { baseMetalById, baseMetals, toBaseMetal } from '@shared/library/base-metals.ts'
import { fillerAdvice, fillerCare, suitableFillers, type FillerAdvice } from '@shared/library/filler-advice.ts'
import { fillers, matchFillers, toFiller } from '@shared/library/filler-metals.ts'
import { baseMetalSchema, fillerSchema, type BaseMetal, type Filler, type Process } from '@shared/schemas/welding.ts'

const metal = (id: string): BaseMetal => {
  const row = baseMetalById(id)
  if (!row) throw new Error(`no ${id}`)
  return toBaseMetal(row)
}
const filler = (classification: string): Filler => {
  const [row] = matchFillers(classification)
  if (!row) throw new Error(`no ${classification}`)
  return { ...toFiller(row), classification }
}
const advise = (a: string, b: string, classification: string, process: Process, serviceTemperature: number | null = null): FillerAdvice => fillerAdvice({ a: metal(a), b: metal(b), filler: filler(classification), process, serviceTemperature })
const said = (advice: FillerAdvice, id: string) => advice.remarks.find((remark) => remark.id === id)

describe('whether a filler suits', () => {
  it.each<[string, string, string, Process, FillerAdvice['verdict']]>([
    ['us-a516-70', 'us-a516-70', 'E7018', 'SMAW', 'suits'],
    ['us-a516-70', 'us-a36', 'E7018', 'SMAW', 'suits'],
    ['us-a36', 'us-a36', 'ER70S-6', 'GMAW', 'suits'],
    ['us-a572-50', 'us-a572-50', 'E6010', 'SMAW', 'unfit'],
    ['us-a36', 'us-a36', 'E71T-GS', 'FCAW', 'unfit'],
    ['us-a514-f', 'us-a514-f', 'E7018', 'SMAW', 'cannot-tell'],
    ['us-a387-11-1', 'us-a387-11-1', 'E8018-B2', 'SMAW', 'cannot-tell'],
    ['us-a387-12-1', 'us-a387-12-1', 'E9018-B3', 'SMAW', 'cannot-tell'],
    ['us-a387-22-1', 'us-a387-22-1', 'E9018-B3', 'SMAW', 'suits'],
    ['us-a240-304l', 'us-a240-304l', 'ER308L', 'GTAW', 'suits'],
    ['us-a240-316l', 'us-a240-316l', 'ER308L', 'GTAW', 'unfit'],
    ['us-a240-316l', 'us-a240-316l', 'ER316L', 'GTAW', 'suits'],
    ['us-a240-2205', 'us-a240-2205', 'ER2209', 'GTAW', 'suits'],
    ['us-a240-304l', 'us-a240-304l', 'ER2209', 'GTAW', 'cannot-tell'],
    ['us-a240-2205', 'us-a240-2205', 'ER309LMo', 'GTAW', 'cannot-tell'],
    ['us-a240-410', 'us-a240-410', 'ER308L', 'GTAW', 'cannot-tell'],
    ['us-a240-410', 'us-a240-410', 'ER430', 'GTAW', 'suits'],
    ['us-a240-904l', 'us-a240-904l', 'ER385', 'GTAW', 'unfit'],
    ['us-a240-304l', 'us-a36', 'E309L-16', 'SMAW', 'suits'],
    ['us-a240-304l', 'us-a36', 'E7018', 'SMAW', 'cannot-tell'],
    ['us-a553-1', 'us-a553-1', 'ENiCrMo-6', 'SMAW', 'suits'],
    ['us-b209-6061-t6', 'us-b209-6061-t6', 'ER4043', 'GMAW', 'suits'],
    ['us-b209-6061-t6', 'us-b209-6061-t6', 'ER5356', 'GMAW', 'suits'],
    ['us-b209-5083-o', 'us-b209-5083-o', 'ER4043', 'GMAW', 'unfit'],
    ['us-b209-6061-t6', 'us-b209-5083-o', 'ER4043', 'GMAW', 'unfit'],
    ['us-b209-6061-t6', 'us-b209-5083-o', 'ER5356', 'GMAW', 'suits'],
    ['us-b209-5454-o', 'us-b209-5454-o', 'ER5554', 'GMAW', 'suits'],
    ['us-b209-3003-o', 'us-b209-3003-o', 'ER1100', 'GMAW', 'cannot-tell'],
    ['us-b209-6061-t6', 'us-b209-6061-t6', 'ER70S-6', 'GMAW', 'unfit'],
    ['us-a36', 'us-a36', 'ER4043', 'GMAW', 'unfit'],
    ['us-b443-625', 'us-b443-625', 'ERNiCrMo-4', 'GTAW', 'cannot-tell'],
  ])('%s to %s with %s: %#', (a, b, classification, process, verdict) => {
    const advice = advise(a, b, classification, process)
    expect(advice.verdict, JSON.stringify(advice.remarks.map(({ kind, text }) => [kind, text]))).toBe(verdict)
  })

  it('can’t be told of metals and fillers that nobody listed', () => {
    const unknown = baseMetalSchema.parse({ specification: 'Mill special 7' })
    expect(fillerAdvice({ a: unknown, b: unknown, filler: filler('E7018'), process: 'SMAW' }).verdict).toBe('cannot-tell')
    expect(fillerAdvice({ a: metal('us-a36'), b: metal('us-a36'), filler: fillerSchema.parse({ classification: 'Brand X' }), process: 'SMAW' }).verdict).toBe('cannot-tell')
    expect(fillerAdvice({ a: baseMetalSchema.parse({}), b: baseMetalSchema.parse({}), filler: filler('E7018'), process: 'SMAW' }).remarks[0]?.text).toMatch(/Name the base metals/)
    expect(fillerAdvice({ a: metal('us-a36'), b: metal('us-a36'), filler: fillerSchema.parse({}), process: 'SMAW' })).toEqual({ verdict: 'cannot-tell', remarks: [] })
  })

  it('takes a second metal that isn’t stated as the first', () => {
    expect(fillerAdvice({ a: metal('us-a36'), b: baseMetalSchema.parse({}), filler: filler('E7018'), process: 'SMAW' }).verdict).toBe('suits')
  })

  it('minds low carbon of L grades', () => {
    const plain: Filler = { ...filler('E316L-16'), libraryId: 'a54-e316-16', classification: 'E316-16' }
    const advice = fillerAdvice({ a: metal('us-a240-316l'), b: metal('us-a240-316l'), filler: plain, process: 'SMAW' })
    expect(said(advice, 'low-carbon')?.text).toMatch(/low-carbon grade; E316-16 is not a low-carbon filler/)
    expect(said(advise('us-a240-316l', 'us-a240-316l', 'ER316L', 'GTAW'), 'low-carbon')).toBeUndefined()
  })

  it('warns of 6xxx without filler', () => {
    expect(fillerAdvice({ a: metal('us-b209-6061-t6'), b: metal('us-b209-6061-t6'), filler: fillerSchema.parse({ added: false }), process: 'GTAW' }).remarks[0]?.text).toMatch(/prone to cracks/)
  })
})

describe('strength', () => {
  it.each<[string, string, string, string, RegExp]>([
    ['us-a516-70', 'us-a36', 'E7018', 'suits', /at least 490 MPa on metal of at least 400 and 485 MPa: matching/],
    ['us-a516-70', 'us-a36', 'E6010', 'care', /matches the weaker metal only/],
    ['us-a516-70', 'us-a516-70', 'E6010', 'care', /undermatching, for which/],
    ['us-b209-6061-t6', 'us-b209-6061-t6', 'ER4043', 'cannot-tell', /sets no strength/],
    ['us-a240-s31254', 'us-a240-s31254', 'E385-16', 'cannot-tell', /No minimum strength of A\/SA-240 S31254/],
    ['us-a387-22-1', 'us-a387-22-1', 'E9018-B3', 'suits', /after heat treatment/],
  ])('of %s and %s with %s is %s', (a, b, classification, kind, text) => {
    const advice = advise(a, b, classification, 'SMAW')
    expect(said(advice, 'strength') ?? said(advice, 'undermatching')).toMatchObject({ kind, text: expect.stringMatching(text) as string })
  })
})

describe('hydrogen', () => {
  it.each<[string, Process, string, RegExp]>([
    ['E7018-H4', 'SMAW', 'fact', /H4: at most 4 mL.*scale D/],
    ['E7018H8R', 'SMAW', 'fact', /H8: at most 8 mL.*scale C/],
    ['E7018-H16', 'SMAW', 'fact', /scale A/],
    ['E7018M', 'SMAW', 'fact', /H4/],
    ['E 42 4 B 42 H5', 'SMAW', 'fact', /H5: at most 5 mL.*scale D/],
    ['E7018', 'SMAW', 'cannot-tell', /offers H4, H8 or H16/],
    ['E6010', 'SMAW', 'care', /Cellulose/],
    ['E6013', 'SMAW', 'care', /Not a low-hydrogen electrode/],
    ['ER70S-6', 'GTAW', 'fact', /scale D/],
    ['ER70S-6', 'GMAW', 'fact', /scale C/],
  ])('of %s by %s', (classification, process, kind, text) => {
    expect(fillerCare(filler(classification), process).find(({ id }) => id === 'hydrogen')).toMatchObject({ kind, text: expect.stringMatching(text) as string })
  })

  it('is not told of where it does not matter', () => {
    for (const classification of ['ER4043', 'ER308L', 'ERNiCrMo-3']) expect(fillerCare(filler(classification), 'GTAW').map(({ id }) => id)).not.toContain('hydrogen')
  })
})

describe('ER4043 and ER5356', () => {
  it.each(['ER4043', 'ER5356'])('%s carries what tells the two apart, each with its basis', (classification) => {
    const care = fillerCare(filler(classification), 'GMAW')
    for (const id of ['one-setting', 'f-number', 'service-limit', 'colour', 'burn-off']) expect(care.map((remark) => remark.id)).toContain(id)
    expect(care.find(({ id }) => id === 'one-setting')).toMatchObject({ kind: 'care', basis: 'common-practice', text: expect.stringMatching(/^Never one setting.*2 to 3 V apart.*10 to 20 % more wire feed/) as string })
    expect(care.find(({ id }) => id === 'f-number')).toMatchObject({ basis: 'memory', text: expect.stringMatching(/F-Number 23.*F-Number 22/) as string })
  })

  it('are judged by the service temperature', () => {
    expect(advise('us-b209-6061-t6', 'us-b209-6061-t6', 'ER5356', 'GMAW', 80).verdict).toBe('unfit')
    expect(advise('us-b209-6061-t6', 'us-b209-6061-t6', 'ER5356', 'GMAW', 65).verdict).toBe('suits')
    expect(advise('us-b209-6061-t6', 'us-b209-6061-t6', 'ER4043', 'GMAW', 80).verdict).toBe('suits')
    expect(advise('us-b209-5454-o', 'us-b209-5454-o', 'ER5554', 'GMAW', 120).verdict).toBe('suits')
  })
})

describe('fillers for a pair', () => {
  it('are those that suit, matching strength first', () => {
    const found = suitableFillers(metal('us-a516-70'), metal('us-a516-70'), 'SMAW')
    expect(found.map(({ row }) => row.classification)).toEqual(expect.arrayContaining(['E7018', 'E7016']))
    expect(found.every(({ row }) => row.processes.some((name) => ['SMAW', '111'].includes(name)))).toBe(true)
    expect(found.map(({ row }) => row.classification)).not.toContain('E6010')
    expect(suitableFillers(metal('us-b209-5083-o'), metal('us-b209-5083-o'), null).map(({ row }) => row.classification)).toEqual(expect.arrayContaining(['ER5356', 'ER5183', 'ER5556']))
  })

  it('stand nearest in alloy first for stainless metals', () => {
    const found = suitableFillers(metal('us-a240-304l'), metal('us-a240-304l'), 'GTAW').map(({ row }) => row.classification)
    expect(found.slice(0, 3).every((name) => /308L|347|19 9 L/.test(name)), found.join()).toBe(true)
    expect(found.indexOf('ER310')).toBeGreaterThan(found.indexOf('ER316L'))
  })

  it('never throw, and every remark names what it rests on', () => {
    for (const row of baseMetals.filter((_, index) => index % 7 === 0)) {
      for (const one of fillers.filter((_, index) => index % 5 === 0)) {
        const { verdict, remarks } = fillerAdvice({ a: toBaseMetal(row), b: toBaseMetal(row), filler: toFiller(one), process: 'GTAW' })
        expect(['suits', 'unfit', 'cannot-tell']).toContain(verdict)
        for (const { source, text } of remarks) expect([source.length > 3, text.endsWith('.')], text).toEqual([true, true])
      }
    }
  })
})
