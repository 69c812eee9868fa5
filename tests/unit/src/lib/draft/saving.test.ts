import { describe, expect, it } from 'vitest'
import { ProblemError } from '@/lib/problem.ts'
import { retryDelay, saving, startSaving, type RecordRules, type Saving, type SavingEvent } from '@/lib/draft/saving.ts'

interface Content { text: string }
interface Kept { version: number; content: Content; updatedAt: string; open: boolean }
const rules: RecordRules<Content, Kept> = { settle: ({ text }) => ({ text: text.trim() }), isOpen: ({ open }) => open }
const kept = (text: string, version = 1, open = true): Kept => ({ version, content: { text }, updatedAt: '2026-12-01T10:00:00.000Z', open })
const refused = (status: number) => new ProblemError({ type: 'about:blank', title: 'No', status, detail: 'No.' })
const run = (...events: SavingEvent<Content, Kept>[]): Saving<Content, Kept> => events.reduce((state, event) => saving(state, event, rules), startSaving<Content, Kept>(kept('a'), rules))
const edited = (text: string): SavingEvent<Content, Kept> => ({ type: 'edited', content: { text } })
const sent = (text: string): SavingEvent<Content, Kept> => ({ type: 'sent', content: { text } })
const failed = (status: number, theirs: Kept | null = null): SavingEvent<Content, Kept> => ({ type: 'failed', problem: refused(status), theirs })

describe('saving', () => {
  it('is saved until something differs from what the server holds', () => {
    expect(run(edited('a')).phase).toBe('saved')
    expect(run(edited('a ')).phase).toBe('saved')
    expect(run(edited('b')).phase).toBe('changed')
    expect(run(edited('b'), edited('a')).phase).toBe('saved')
  })
  it('takes the version of what was stored, and saves again what was typed meanwhile', () => {
    const stored: SavingEvent<Content, Kept> = { type: 'stored', record: kept('b', 2) }
    expect(run(edited('b'), sent('b'), stored)).toMatchObject({ phase: 'saved', version: 2, base: { text: 'b' }, dirty: false })
    expect(run(edited('b'), sent('b'), edited('bc'), stored)).toMatchObject({ phase: 'changed', version: 2, base: { text: 'b' }, dirty: true })
  })
  it('keeps trying when out of reach, slower each time and never hastened by typing', () => {
    const once = run(edited('b'), sent('b'), failed(0))
    expect(once).toMatchObject({ phase: 'unreachable', dirty: true, failures: 1, base: { text: 'a' } })
    expect(saving(once, edited('bc'), rules).phase).toBe('unreachable')
    expect(run(edited('b'), sent('b'), failed(503), sent('b'), failed(0)).failures).toBe(2)
    expect([1, 2, 3, 9].map(retryDelay)).toEqual([2000, 4000, 8000, 30000])
  })
  it('waits for a change when the server refuses it as it stands', () => {
    const state = run(edited('b'), sent('b'), failed(422))
    expect(state.phase).toBe('refused')
    expect(saving(state, edited('c'), rules)).toMatchObject({ phase: 'changed', problem: null })
  })
  it('holds both versions in a conflict until they are joined', () => {
    const state = run(edited('b'), sent('b'), failed(409, kept('x', 5)))
    expect(state).toMatchObject({ phase: 'conflict', base: { text: 'a' }, theirs: { version: 5 } })
    expect(saving(state, edited('bc'), rules).phase).toBe('conflict')
    expect(saving(state, { type: 'merged', content: { text: 'bx' } }, rules)).toMatchObject({ phase: 'changed', version: 5, base: { text: 'x' }, theirs: null, dirty: true })
    expect(saving(state, { type: 'merged', content: { text: 'x' } }, rules)).toMatchObject({ phase: 'saved', version: 5, dirty: false })
  })
  it('closes when the record can no longer be written or is gone', () => {
    expect(run(edited('b'), sent('b'), failed(409, kept('x', 5, false))).phase).toBe('closed')
    expect(run(edited('b'), sent('b'), failed(404)).phase).toBe('closed')
  })
  it('follows somebody else only while nothing of its own is at stake', () => {
    const overtaken: SavingEvent<Content, Kept> = { type: 'overtaken', record: kept('x', 4) }
    expect(run(overtaken)).toMatchObject({ phase: 'saved', version: 4, base: { text: 'x' } })
    expect(run(edited('b'), overtaken)).toMatchObject({ phase: 'changed', version: 1 })
  })
})
