import { describe, expect, test, vi } from 'vitest'
import { remember, rememberPair } from '@shared/standards/common/remember.ts'

describe('remember', () => {
  test('works each text out once, and gives the same answer again', () => {
    const work = vi.fn((text: string) => ({ text }))
    const remembered = remember(work)
    const first = remembered('F-6')
    expect(first).toEqual({ text: 'F-6' })
    expect(remembered('F-6')).toBe(first)
    expect(remembered('f-6')).not.toBe(first)
    expect(work.mock.calls).toEqual([['F-6'], ['f-6']])
  })

  test('an answer of null or undefined is an answer', () => {
    const work = vi.fn((text: string) => (text === '' ? null : undefined))
    const remembered = remember(work)
    expect([remembered(''), remembered(''), remembered('x'), remembered('x')]).toEqual([null, null, undefined, undefined])
    expect(work).toHaveBeenCalledTimes(2)
  })

  test('names of object properties are texts like any other', () => {
    const remembered = remember((text) => `<${text}>`)
    for (const text of ['__proto__', 'constructor', 'toString']) expect(remembered(text)).toBe(`<${text}>`)
  })

  test('an error is thrown each time, and not taken for an answer', () => {
    let calls = 0
    const remembered = remember(() => {
      calls += 1
      if (calls === 1) throw new RangeError('not yet')
      return calls
    })
    expect(() => remembered('x')).toThrow(RangeError)
    expect(remembered('x')).toBe(2)
    expect(remembered('x')).toBe(2)
  })

  test('forgets after 500 texts, so that typing can not fill the memory', () => {
    const work = vi.fn((text: string) => text.length)
    const remembered = remember(work)
    for (let i = 0; i < 500; i += 1) remembered(`text ${i}`)
    remembered('text 0')
    expect(work).toHaveBeenCalledTimes(500)
    remembered('one more')
    remembered('text 0')
    expect(work).toHaveBeenCalledTimes(502)
  })

  test('two functions do not share what they know', () => {
    const [upper, lower] = [remember((text) => text.toUpperCase()), remember((text) => text.toLowerCase())]
    expect([upper('Ab'), lower('Ab'), upper('Ab')]).toEqual(['AB', 'ab', 'AB'])
  })
})

describe('rememberPair', () => {
  test('tells pairs apart, also where the texts joined would be alike', () => {
    const work = vi.fn((a: string, b: string) => `${a}|${b}`)
    const remembered = rememberPair(work)
    expect([remembered('1', '5A'), remembered('15', 'A'), remembered('5A', '1'), remembered('1', '5A')]).toEqual(['1|5A', '15|A', '5A|1', '1|5A'])
    expect(work).toHaveBeenCalledTimes(3)
  })
})
