/** One coupon under every standard: each cell says something, and nothing that can't be told reads like coverage. */
import { describe, expect, test } from 'vitest'
import { qualifyUnderAll, sideBySide } from '@shared/assessment/side-by-side.ts'
import type { AssessedCoupon } from '@shared/schemas/assessment.ts'
import { sideBySideSchema, type SideBySide, type SideCell } from '@shared/schemas/standards.ts'
import { asmeIx } from '@shared/standards/asme-ix/index.ts'
import { standardDetail, standardRow, ruleAnchor } from '@shared/standards/catalogue.ts'
import { standards } from '@shared/standards/index.ts'
import type { Standard } from '@shared/standards/rule.ts'
import { coupon } from '../standards/builders.ts'

const cell = (table: SideBySide, variable: string, standard = 'asme-ix', process?: string): SideCell => {
  const found = table.rows.find((row) => row.variable === variable && (process === undefined || row.process === process))?.cells.find((one) => one.standard === standard)
  if (!found) throw new Error(`no ${variable} under ${standard}`)
  return found
}

describe('one coupon under all standards', () => {
  test('one entry a standard: the edition that the coupon names, else the newest', () => {
    const all = qualifyUnderAll(coupon({ edition: '2019' }))
    expect(all.map(({ standard }) => standard)).toEqual(standards.map(({ id }) => id))
    expect(all.find(({ standard }) => standard === 'asme-ix')).toMatchObject({ edition: '2019', reason: null })
    for (const { standard, edition, qualification, reason } of all.filter(({ standard: id }) => id !== 'asme-ix')) {
      expect(standards.find(({ id }) => id === standard)?.editions.map(({ id }) => id)).toContain(edition)
      expect(qualification ? qualification.standard : reason).toEqual(qualification ? standard : expect.stringContaining('outside the rules'))
    }
  })

  test('an edition that is not kept, or a process that no rule knows, gives the reason and no range', () => {
    const old = sideBySide(coupon({ edition: '1998' }))
    expect(old.standards[0]).toMatchObject({ edition: null, reason: expect.stringContaining('edition 1998 of ASME IX') as string })
    expect(cell(old, 'thickness')).toMatchObject({ state: 'cannot-tell', ranges: [] })
    const [other] = qualifyUnderAll(coupon({ change: (v) => v.processes.forEach((one) => (one.process = 'OTHER')) }), [asmeIx])
    expect(other).toMatchObject({ qualification: null, reason: 'This process is outside the rules of ASME IX kept here.' })
    const [none] = qualifyUnderAll(coupon({ change: (v) => v.processes.forEach((one) => (one.process = null)) }), [asmeIx])
    expect(none?.reason).toBe('The welding process is not recorded, so nothing can be told.')
  })

  test.each<[string, AssessedCoupon]>([
    ['plate', coupon()],
    ['two processes', coupon({ processes: [['GTAW', 5], ['SAW', 15]] })],
    ['with toughness', coupon({ toughness: true, processes: [['GMAW', 20]] })],
    ['an almost empty record', coupon({ change: (v) => { v.thickness = null; v.baseMetals.a.pNumber = null; v.baseMetals.b.pNumber = null; v.pwht.condition = null; v.preheat.minimum = null } })],
    ['a process outside one standard', coupon({ processes: [['PAW', 4], ['SMAW', 16]] })],
  ])('%s: every row has a cell a standard, and none is blank', (_, record) => {
    const table = sideBySide(record)
    expect(sideBySideSchema.parse(table)).toEqual(table)
    expect(table.rows.length).toBeGreaterThan(5)
    for (const { cells } of table.rows) {
      expect(cells.map(({ standard }) => standard)).toEqual(standards.map(({ id }) => id))
      for (const { state, words, ranges, clause } of cells) {
        expect(words.trim()).not.toBe('')
        if (state === 'range') {
          expect(ranges.length).toBeGreaterThan(0)
          expect(clause).not.toBeNull()
        }
        if (state === 'no-range' || state === 'not-a-variable') expect(ranges).toEqual([])
      }
    }
  })

  test('figures with clause and basis; several variables in one cell are told apart', () => {
    const table = sideBySide(coupon({ thickness: 10, processes: [['SMAW', 10]] }))
    expect(cell(table, 'thickness')).toMatchObject({ state: 'range', words: '1.5 mm to 20 mm', clause: 'QW-451.1', basis: 'secondary' })
    expect(cell(table, 'filler').words).toBe('F-Number: F-4; A-Number: A-1 or A-2')
    expect(cell(table, 'positions')).toMatchObject({ state: 'no-range', clause: 'QW-405.1 and QW-405.3' })
    expect(cell(table, 'preheat').words).toBe('-35 °C and up')
  })

  test('what the record lacks can\'t be told', () => {
    const table = sideBySide(coupon({ change: (v) => { v.thickness = null; v.baseMetals.a.pNumber = null; v.preheat.minimum = null } }))
    for (const variable of ['thickness', 'preheat']) expect(cell(table, variable)).toMatchObject({ state: 'cannot-tell' })
    expect(cell(table, 'preheat').words).toContain('has no preheat recorded')
    expect(cell(table, 'groups').words).not.toMatch(/^P-1/)
  })

  test('without toughness tests heat input is not covered where toughness counts', () => {
    expect(cell(sideBySide(coupon({ toughness: false })), 'heatInput').words).toContain('does not cover it')
    expect(cell(sideBySide(coupon({ toughness: true })), 'heatInput').state).toBe('range')
  })

  test('rows stand by process', () => {
    const table = sideBySide(coupon({ thickness: 20, processes: [['GTAW', 5], ['SMAW', 15]] }), [asmeIx])
    expect(cell(table, 'deposit', 'asme-ix', 'GTAW').words).toBe('Up to 10 mm')
    expect(cell(table, 'deposit', 'asme-ix', 'SMAW').words).toBe('Up to 30 mm')
  })
})

describe('a standard\'s page', () => {
  test('holds every rule, with the classes of its processes and the weaker of the bases', () => {
    const detail = standardDetail(asmeIx)
    expect(detail.ruleList).toHaveLength(asmeIx.rules.length)
    const paw = detail.ruleList.find(({ id }) => id === 'asme-ix/base-metal-thickness')?.classes.find(({ process }) => process === 'PAW')
    expect(paw).toEqual({ process: 'PAW', class: 'essential', basis: 'memory' })
    expect(Object.values(detail.bases).reduce((sum, count) => sum + count, 0)).toBe(asmeIx.rules.length)
    expect(standardRow(asmeIx)).toMatchObject({ id: 'asme-ix', routes: ['test'], rules: asmeIx.rules.length })
  })

  test.each<[string, Standard]>(standards.map((standard) => [standard.id, standard]))('%s: anchors name one rule each', (_, standard) => {
    const anchors = standard.rules.map(({ meta }) => ruleAnchor(meta.id))
    expect(new Set(anchors).size).toBe(anchors.length)
    for (const anchor of anchors) expect(anchor).toMatch(/^[a-z0-9-]+$/)
  })
})
