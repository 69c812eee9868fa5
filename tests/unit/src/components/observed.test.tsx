// @vitest-environment jsdom
import { fireEvent, screen } from '@testing-library/react'
import { useState } from 'react'
import { describe, expect, it } from 'vitest'
import type { Interval } from '@shared/schemas/common.ts'
import { interval } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { ObservedField } from '@/components/fields/observed.tsx'
import { show } from '../support/render.tsx'

let value: Interval | null = null
function Kept({ start, system }: { start: Interval | null; system: UnitSystem }) {
  const [kept, setKept] = useState(start)
  value = kept
  return <ObservedField label="Thickness" dimension="length" system={system} value={kept} onChange={setKept} />
}
const open = (start: Interval | null, system: UnitSystem = 'SI') => {
  show(<Kept start={start} system={system} />)
  return screen.getByRole<HTMLInputElement>('textbox', { name: 'Thickness' })
}
const leave = (box: HTMLInputElement, text: string) => {
  fireEvent.change(box, { target: { value: text } })
  fireEvent.blur(box)
}

describe('a value as it was measured', () => {
  it.each<[string, Interval | null, UnitSystem, string]>([
    ['one figure', interval(10, undefined, 'length'), 'SI', '10'],
    ['a spread', interval(2, 3, 'length'), 'SI', '2–3'],
    ['only one end', interval(null, 3, 'length'), 'SI', '≤ 3'],
    ['inches read by somebody who reads mm', interval(0.25, 0.5, 'length', 'in'), 'SI', '0.25 in to 0.5 in'],
    ['nothing', null, 'SI', ''],
  ])('stands in one box: %s', (_name, start, system, text) => {
    const box = open(start, system)
    expect(box.value).toBe(text)
    // What is shown is read again as what is stored.
    fireEvent.blur(box)
    expect(value).toEqual(start)
  })
  it('is both ends at once', () => {
    const box = open(null)
    leave(box, '12.7')
    expect(value).toMatchObject({ min: { si: 12.7 }, max: { si: 12.7 }, all: false })
    leave(box, '2-3')
    expect(value).toMatchObject({ min: { si: 2 }, max: { si: 3 } })
    leave(box, '1/2 in')
    expect(value).toMatchObject({ min: { si: 12.7, unit: 'in' }, max: { si: 12.7 } })
    expect(screen.getByText('= 12.7 mm')).toBeDefined()
    leave(box, '')
    expect(value).toBeNull()
  })
  it('keeps what can’t be read, with the reason, and the last good value', () => {
    const box = open(interval(10, undefined, 'length'))
    leave(box, 'thick')
    expect(box.value).toBe('thick')
    expect(screen.getByText(/"thick" is not a length/)).toBeDefined()
    leave(box, 'all')
    expect(screen.getByText(/what was measured is a figure/)).toBeDefined()
    expect(value).toMatchObject({ min: { si: 10 } })
  })
})
