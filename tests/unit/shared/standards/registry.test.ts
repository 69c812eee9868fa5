/** What every standard's list of rules must be; how many there are goes into the report of the run. */
import { describe, expect, test } from 'vitest'
import { standards } from '@shared/standards/index.ts'

declare module 'vitest' {
  interface TaskMeta { rules?: { standard: string; name: string; count: number } }
}

describe('rules of each standard', () => {
  for (const standard of standards) {
    test(standard.shortName, ({ task }) => {
      const editions = standard.editions.map(({ id }) => id)
      expect(standard.rules.length).toBeGreaterThan(0)
      expect(new Set(standard.rules.map(({ meta }) => meta.id)).size).toBe(standard.rules.length)
      for (const { meta } of standard.rules) {
        expect([meta.standard, meta.id.split('/')[0]]).toEqual([standard.id, standard.id])
        expect(meta.editions.length, meta.id).toBeGreaterThan(0)
        expect(editions, meta.id).toEqual(expect.arrayContaining([...meta.editions]))
        expect(Object.keys(meta.classes).length, meta.id).toBeGreaterThan(0)
        expect([meta.clause, meta.source, meta.statement].map((text) => text.trim()), meta.id).not.toContain('')
      }
      task.meta.rules = { standard: standard.id, name: standard.shortName, count: standard.rules.length }
    })
  }
})
