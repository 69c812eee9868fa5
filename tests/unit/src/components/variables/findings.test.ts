import { describe, expect, it } from 'vitest'
import { blocking, gaugeOf, placeFindings, RECORD, sectionVerdicts, testedInWords } from '@/components/variables/findings.ts'
import { placedRows } from '@/components/variables/catalogue.ts'
import { labelOf, missingInWords, valueInWords } from '@/components/variables/labels.ts'
import { steelAssessment, steelProcedure } from '../../../../fixtures/samples.ts'

const content = steelProcedure()
const rows = placedRows(content.variables.processes)
const { findings } = steelAssessment()
const one = (field: string) => {
  const found = findings.find((finding) => finding.field === field)
  if (!found) throw new Error(`no finding at ${field}`)
  return found
}

describe('placing findings', () => {
  it('puts each beside the row that reaches furthest into its field', () => {
    const placed = placeFindings(findings, rows)
    expect(placed.get('thickness')?.map(({ title }) => title)).toEqual(['Groove thickness'])
    expect(placed.get('baseMetals')?.map(({ title }) => title)).toEqual(['Base metal P-Number'])
    expect(placed.get('processes.1.electrical.heatInput')).toHaveLength(1)
  })
  it('loses none: what has no row stands with the record, what points above rows at the first below', () => {
    const stray = [{ ...one('thickness'), field: 'standards' }, { ...one('thickness'), field: 'preheat' }, { ...one('thickness'), field: 'variables.processes.0.filler.libraryId' }]
    const placed = placeFindings(stray, rows)
    expect([...placed.values()].flat()).toHaveLength(3)
    expect(placed.get(RECORD)).toHaveLength(1)
    expect(placed.get('processes.0.filler')).toHaveLength(1)
  })
  it('marks each sheet with its worst', () => {
    const verdicts = sectionVerdicts(placeFindings(findings, rows), rows)
    expect(verdicts.get('base-metals')).toBe('outside')
    expect(verdicts.get('process-2-process')).toBe('cannot-tell')
    expect(verdicts.get('process-1-filler')).toBe('within')
  })
  it('draws the worst that compares figures, and words where names are compared', () => {
    expect(gaugeOf([one('preheat.minimum'), one('thickness')])).toMatchObject({ asked: { min: 5, max: 25 }, tested: [10] })
    const own = { ...one('thickness'), tested: [], asked: { min: 0, max: 25 } }
    expect(gaugeOf([own, one('thickness')])).toMatchObject({ asked: { min: 5, max: 25 }, tested: [10] })
    expect(gaugeOf([own])).toMatchObject({ asked: { min: 0, max: 25 }, tested: [] })
    expect(gaugeOf([{ ...one('thickness'), verdict: 'within' }, { ...own, verdict: 'outside' }])).toMatchObject({ tested: [] })
    expect(gaugeOf([one('baseMetals.a.pNumber')])).toBeNull()
    expect(testedInWords([one('baseMetals.a.pNumber')], () => 'PQR-009')).toBe('PQR-009 welded 1 to 1')
  })
  it('counts what stands in the way as the server does', () => {
    expect(blocking(findings).map(({ verdict }) => verdict)).toEqual(['outside', 'cannot-tell'])
  })
})

describe('words', () => {
  it('name a field as the sheet does, with its process where there are several', () => {
    expect(labelOf('variables.thickness', content)).toBe('Thickness')
    expect(labelOf('variables.processes#fill.electrical.current', content)).toBe('GMAW: Amps')
    expect(valueInWords('variables.processes#fill.electrical.current', content.variables.processes[1]?.electrical.current, content, 'SI')).toBe('180–240 A')
    expect(valueInWords('variables.joint.backing', 'metal', content, 'SI')).toBe('Metal')
    expect(valueInWords('variables.thickness', null, content, 'SI')).toBe('not stated')
  })
  it('say what is missing without paths', () => {
    expect(missingInWords(['procedure: thickness', 'PQR-009: electrical.current', 'travel speed of passes 2 to 4'], content)).toEqual(['Thickness, on this sheet', 'Amps, on PQR-009', 'travel speed of passes 2 to 4'])
  })
})
