/** Every row of the variable tables has its rule, with the class and the basis that the reference gives. */
import { describe, expect, test } from 'vitest'
import rows from '../../../fixtures/standards/asme-ix-variables.json' with { type: 'json' }
import { editions } from '@shared/standards/asme-ix/editions.ts'
import { asmeIx } from '@shared/standards/asme-ix/index.ts'
import type { Process } from '@shared/schemas/welding.ts'
import { effectiveClass } from '@shared/assessment/prepare.ts'

/** Rules whose clause or covered clauses include the paragraph. QW-404.10 and the like stand alone; thickness has a second member. */
const rulesOf = (paragraph: string): typeof asmeIx.rules => asmeIx.rules.filter((rule) => rule.meta.clause === paragraph)

describe('variables of tables QW-253 to QW-257', () => {
  test('there are 236 rows', () => expect(rows).toHaveLength(236))
  for (const row of rows) {
    for (const process of row.process.split('/') as Process[]) {
      test(`${process} ${row.paragraph} ${row.class}`, () => {
        const rules = rulesOf(row.paragraph).filter((rule) => rule.meta.classes[process])
        expect(rules.length).toBeGreaterThan(0)
        for (const rule of rules) {
          const ruleClass = rule.meta.classes[process]!
          const shown = row.class === 'nonessential' ? effectiveClass(ruleClass, false) : effectiveClass(ruleClass, true)
          expect(shown).toBe(row.class)
          expect(rule.meta.editions).toEqual(editions.map(({ id }) => id).filter((id) => !row.edition.startsWith('to ') || id <= row.edition.slice(3, 7)))
          expect(rule.meta.basis).toBe(row.basis_change)
          expect(rule.meta.classBasis).toMatchObject({ [process]: row.basis })
        }
      })
    }
  }
  test('no rule invents a variable for a process', () => {
    const known = new Set(rows.flatMap((row) => row.process.split('/').map((process) => `${process} ${row.paragraph}`)))
    const invented = asmeIx.rules.flatMap((rule) => Object.keys(rule.meta.classes).map((process) => `${process} ${rule.meta.clause}`)).filter((key) => !known.has(key))
    expect([...new Set(invented.map((key) => key.split(' ')[1]))].sort()).toEqual(['QW-202.2', 'QW-202.4', 'QW-401', 'QW-401.1'])
  })
  test('each rule has its own id, and says what it checks and where that stands', () => {
    expect(new Set(asmeIx.rules.map((rule) => rule.meta.id)).size).toBe(asmeIx.rules.length)
    for (const rule of asmeIx.rules) {
      expect(rule.meta.statement.length).toBeGreaterThan(10)
      expect(rule.meta.source).toContain('QW-')
    }
  })
  test('2023 says that it is judged as 2021', () => {
    expect(editions.find(({ id }) => id === '2023')?.note).toContain('2021')
    const of = (edition: string): string[] => asmeIx.rules.filter((rule) => rule.meta.editions.includes(edition)).map((rule) => rule.meta.id)
    expect(of('2023')).toEqual(of('2021'))
    expect(of('2019')).toContain('asme-ix/short-circuit-deposit')
    expect(of('2021')).not.toContain('asme-ix/short-circuit-deposit')
    expect(of('2017')).toContain('asme-ix/vertical-uphill')
    expect(of('2019')).not.toContain('asme-ix/vertical-uphill')
  })
})
