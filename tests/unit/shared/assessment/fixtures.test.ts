/** The published cases stand as they were found: each with an id of its own, its source and how that is known. */
import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, test } from 'vitest'
import { z } from 'zod'
import { basisSchema } from '@shared/schemas/assessment.ts'

const folder = path.join(import.meta.dirname, '../../../fixtures/cases')
const caseSchema = z.object({ id: z.string().regex(/^[a-z0-9-]+$/), standard: z.string().min(2), title: z.string().min(3), given: z.record(z.string(), z.unknown()), expect: z.record(z.string(), z.unknown()), source: z.string().min(3), basis: basisSchema })
const disputedSchema = z.array(z.object({ id: z.string(), reason: z.string().min(20) }))
const read = (file: string): unknown => JSON.parse(readFileSync(path.join(folder, file), 'utf8'))
const files = readdirSync(folder).filter((file) => file.endsWith('.json') && file !== 'disputed.json').sort()
const ids = files.flatMap((file) => z.array(z.object({ id: z.string() })).parse(read(file)).map(({ id }) => id))

describe('published cases', () => {
  test('every file is known', () => expect(files).toEqual(expect.arrayContaining(['asme-ix-procedure.json', 'aws-structural-procedure.json', 'calculations.json', 'iso-procedure.json', 'materials.json', 'records.json'])))
  test.each(files)('%s: every case has its source and basis', (file) => {
    const cases = z.array(z.unknown()).parse(read(file))
    expect(cases.length).toBeGreaterThan(0)
    for (const one of cases) expect(caseSchema.safeParse(one).error?.message ?? '', JSON.stringify(one).slice(0, 80)).toBe('')
  })
  test('no id is used twice', () => expect(new Set(ids).size).toBe(ids.length))
  test('a disputed case is one of them, with a reason', () => {
    for (const { id } of disputedSchema.parse(read('disputed.json'))) expect(ids).toContain(id)
  })
})
