import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { mergeContents, type Side } from '@/lib/draft/merge.ts'
import { same, writePath } from '@/lib/draft/paths.ts'
import { steelProcedure } from '../../../../fixtures/samples.ts'

const LISTS = ['variables.processes']
const base = steelProcedure()
const set = (content: ProcedureContent, path: string, value: unknown): ProcedureContent => {
  const written = writePath(content, path, value)
  if (!written) throw new Error(`no ${path}`)
  return written
}
const merge = (mine: ProcedureContent, theirs: ProcedureContent, choose?: (path: string) => Side | undefined) => mergeContents(base, mine, theirs, LISTS, choose)
const paths = ({ differences }: { differences: readonly { path: string; by: string }[] }) => differences.map(({ path, by }) => `${by} ${path}`)

describe('mergeContents', () => {
  it('takes what only one of them changed from that one', () => {
    const mine = set(base, 'variables.thickness', interval(6, 18, 'length'))
    const theirs = set(base, 'title', 'Another title')
    const { content, differences } = merge(mine, theirs)
    expect(content.title).toBe('Another title')
    expect(content.variables.thickness).toEqual(mine.variables.thickness)
    expect(paths({ differences })).toEqual(['theirs title', 'mine variables.thickness'])
  })
  it('leaves a field that both changed to the person, and keeps mine until then', () => {
    const mine = set(base, 'variables.preheat.minimum', quantity(20, 'temperature'))
    const theirs = set(base, 'variables.preheat.minimum', quantity(80, 'temperature'))
    expect(paths(merge(mine, theirs))).toEqual(['both variables.preheat.minimum'])
    expect(merge(mine, theirs).content.variables.preheat.minimum?.si).toBe(20)
    expect(merge(mine, theirs, () => 'theirs').content.variables.preheat.minimum?.si).toBe(80)
  })
  it('never mixes two metals or fillers', () => {
    const mine = set(base, 'variables.baseMetals.a', { ...base.variables.baseMetals.a, grade: 'Gr. 60' })
    const theirs = set(base, 'variables.baseMetals.a', { ...base.variables.baseMetals.a, pNumber: '8' })
    expect(paths(merge(mine, theirs))).toEqual(['both variables.baseMetals.a'])
  })
  it('follows a process by its id when they moved it', () => {
    const mine = set(base, 'variables.processes.0.progression', 'down')
    const theirs = set(base, 'variables.processes', [...base.variables.processes].reverse())
    const { content } = merge(mine, theirs)
    expect(content.variables.processes.map(({ id }) => id)).toEqual(['fill', 'root'])
    expect(content.variables.processes[1]?.progression).toBe('down')
  })
  it('keeps a process that I added and drops one that they removed untouched', () => {
    const added = { ...base.variables.processes[0]!, id: 'p3' }
    const mine = set(base, 'variables.processes', [...base.variables.processes, added])
    const theirs = set(base, 'variables.processes', base.variables.processes.slice(1))
    expect(merge(mine, theirs).content.variables.processes.map(({ id }) => id)).toEqual(['fill', 'p3'])
  })
  it('asks about a process that I changed and they removed', () => {
    const mine = set(base, 'variables.processes.0.progression', 'down')
    const theirs = set(base, 'variables.processes', base.variables.processes.slice(1))
    expect(paths(merge(mine, theirs))).toEqual(['both variables.processes#root'])
    expect(merge(mine, theirs).content.variables.processes).toHaveLength(2)
    expect(merge(mine, theirs, () => 'theirs').content.variables.processes).toHaveLength(1)
  })
  it('loses no change of either side, whatever was changed', () => {
    const edits = fc.uniqueArray(fc.constantFrom('title', 'scope', 'notes', 'variables.joint.notes', 'variables.preheat.method', 'variables.preheat.maintenance', 'variables.pwht.notes', 'variables.processes.0.technique.notes', 'variables.processes.1.technique.nozzleSize'))
    fc.assert(
      fc.property(edits, edits, (my, their) => {
        const mine = my.reduce((content, path) => set(content, path, `mine ${path}`), base)
        const theirs = their.reduce((content, path) => set(content, path, `theirs ${path}`), base)
        const forMine = merge(mine, theirs, () => undefined).content
        for (const path of my) expect(same(set(forMine, path, `mine ${path}`), forMine)).toBe(true)
        for (const path of their.filter((one) => !my.includes(one))) expect(same(set(forMine, path, `theirs ${path}`), forMine)).toBe(true)
        expect(merge(mine, theirs).differences.filter(({ by }) => by === 'both')).toHaveLength(my.filter((one) => their.includes(one)).length)
      }),
    )
  })
})
