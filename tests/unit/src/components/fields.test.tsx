// @vitest-environment jsdom
import { fireEvent, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { ComboBox, type ComboItem } from '@/components/fields/ComboBox.tsx'
import { IntervalField, QuantityField, type IntervalFieldProps, type QuantityFieldProps } from '@/components/fields/quantity.tsx'
import { Checkbox, Select, Switch, TagPicker, TextField } from '@/components/fields/text.tsx'
import { show } from '../support/render.tsx'

function OneQuantity({ start = null, heard, ...props }: Partial<QuantityFieldProps> & { start?: Quantity | null; heard: (value: Quantity | null) => void }) {
  const [value, setValue] = useState(start)
  return (
    <>
      <QuantityField label="Thickness" dimension="length" system="SI" {...props} value={value} onChange={(next) => { heard(next); setValue(next) }} />
      <button type="button" onClick={() => setValue(quantity(20, 'length'))}>Set to 20 mm</button>
    </>
  )
}

describe('QuantityField', () => {
  it('reads what people write when the field is left, and shows it in the reader’s unit', async () => {
    const heard = vi.fn()
    show(<OneQuantity heard={heard} />)
    const box = screen.getByRole('textbox', { name: 'Thickness' })
    await userEvent.type(box, '1/2 in')
    expect(heard).not.toHaveBeenCalled()
    await userEvent.tab()
    expect(heard).toHaveBeenCalledWith(expect.objectContaining({ si: 12.7, unit: 'in', typed: '1/2 in' }))
    expect((box as HTMLInputElement).value).toBe('1/2 in')
    expect(screen.getByText('= 12.7 mm')).toBeDefined()
  })
  it('keeps an unreadable text, says what is wrong, and keeps the last good value', async () => {
    const heard = vi.fn()
    const onUnread = vi.fn()
    show(<OneQuantity heard={heard} start={quantity(10, 'length')} onUnread={onUnread} />)
    const box = screen.getByRole('textbox', { name: 'Thickness' })
    await userEvent.clear(box)
    await userEvent.type(box, 'thick')
    await userEvent.tab()
    expect((box as HTMLInputElement).value).toBe('thick')
    expect(box.getAttribute('aria-invalid')).toBe('true')
    expect(onUnread).toHaveBeenLastCalledWith(expect.stringContaining('thick'))
    expect(heard).not.toHaveBeenCalled()
  })
  it('empties to null', async () => {
    const heard = vi.fn()
    show(<OneQuantity heard={heard} start={quantity(10, 'length')} />)
    await userEvent.clear(screen.getByRole('textbox', { name: 'Thickness' }))
    await userEvent.tab()
    expect(heard).toHaveBeenCalledWith(null)
  })
  it('shows a value that came from elsewhere and clears the error', async () => {
    show(<OneQuantity heard={() => undefined} />)
    const box = screen.getByRole('textbox', { name: 'Thickness' })
    await userEvent.type(box, 'thick')
    await userEvent.tab()
    await userEvent.click(screen.getByRole('button', { name: 'Set to 20 mm' }))
    expect((box as HTMLInputElement).value).toBe('20')
    expect(box.getAttribute('aria-invalid')).toBeNull()
  })
})

function OneInterval({ start = null, heard, ...props }: Partial<IntervalFieldProps> & { start?: Interval | null; heard: (value: Interval | null) => void }) {
  const [value, setValue] = useState(start)
  return <IntervalField label="Voltage" dimension="voltage" system="SI" {...props} value={value} onChange={(next) => { heard(next); setValue(next) }} />
}
const boxes = () => [screen.getByRole<HTMLInputElement>('textbox', { name: 'Voltage, from' }), screen.getByRole<HTMLInputElement>('textbox', { name: 'Voltage, to' })] as const

describe('IntervalField', () => {
  it('fills both boxes from 18-22 typed in the first', async () => {
    const heard = vi.fn()
    show(<OneInterval heard={heard} />)
    await userEvent.type(boxes()[0], '18-22')
    await userEvent.tab()
    expect(heard).toHaveBeenCalledTimes(1)
    expect(heard.mock.calls[0]?.[0]).toMatchObject({ min: { si: 18 }, max: { si: 22 }, all: false })
    expect(boxes().map(({ value }) => value)).toEqual(['18', '22'])
  })
  it('takes one end alone, then the other', async () => {
    const heard = vi.fn()
    show(<OneInterval heard={heard} />)
    await userEvent.type(boxes()[0], '18')
    await userEvent.tab()
    expect(heard.mock.lastCall?.[0]).toMatchObject({ min: { si: 18 }, max: null })
    await userEvent.type(boxes()[1], '22')
    await userEvent.tab()
    expect(heard.mock.lastCall?.[0]).toMatchObject({ min: { si: 18 }, max: { si: 22 } })
  })
  it('names both figures when they run the wrong way', async () => {
    show(<OneInterval heard={() => undefined} start={interval(18, 22, 'voltage')} />)
    await userEvent.clear(boxes()[0])
    await userEvent.type(boxes()[0], '25')
    await userEvent.tab()
    expect(screen.getByText(/Voltage: the lower figure, 25, is above the upper, 22/)).toBeDefined()
    expect(boxes()[0].value).toBe('25')
  })
  it('knows "all" only where it applies', async () => {
    const heard = vi.fn()
    const { unmount } = show(<OneInterval heard={heard} />)
    await userEvent.type(boxes()[0], 'all')
    await userEvent.tab()
    expect(screen.getByText(/does not apply here/)).toBeDefined()
    expect(heard).not.toHaveBeenCalled()
    unmount()
    show(<OneInterval heard={heard} allowAll allMeans="plate and pipe" />)
    await userEvent.type(boxes()[0], 'all')
    await userEvent.tab()
    expect(heard).toHaveBeenCalledWith({ min: null, max: null, all: true })
    expect(screen.getByText('plate and pipe')).toBeDefined()
    expect(screen.queryByRole('textbox', { name: 'Voltage, to' })).toBeNull()
  })
  it('goes from "all" to a figure and back to nothing', async () => {
    const heard = vi.fn()
    show(<OneInterval heard={heard} allowAll start={{ min: null, max: null, all: true }} />)
    await userEvent.clear(boxesFrom())
    await userEvent.type(boxesFrom(), '60')
    await userEvent.tab()
    expect(heard.mock.lastCall?.[0]).toMatchObject({ min: { si: 60 }, max: null, all: false })
    await userEvent.clear(boxes()[0])
    await userEvent.tab()
    expect(heard.mock.lastCall?.[0]).toBeNull()
  })
  it('shows the two ends of a tolerance as figures', async () => {
    show(<OneInterval heard={() => undefined} />)
    await userEvent.type(boxes()[0], '20 ± 2')
    await userEvent.tab()
    expect(boxes().map(({ value }) => value)).toEqual(['18', '22'])
  })
  it('reads nothing twice', async () => {
    const heard = vi.fn()
    show(<OneInterval heard={heard} start={interval(18, 22, 'voltage')} />)
    await userEvent.click(boxes()[0])
    await userEvent.tab()
    await userEvent.tab()
    expect(heard).not.toHaveBeenCalled()
  })
})
const boxesFrom = () => screen.getByRole<HTMLInputElement>('textbox', { name: 'Voltage, from' })

const METALS: ComboItem<{ p: string }>[] = [
  { id: '1', title: 'SA-516 Gr. 70', subtitle: 'P-1', data: { p: '1' } },
  { id: '2', title: 'SA-240 304L', subtitle: 'P-8', data: { p: '8' } },
]
const find = (text: string) => Promise.resolve(METALS.filter(({ title }) => title.toLowerCase().includes(text.toLowerCase())))

describe('ComboBox', () => {
  it('finds as one types and picks with the keyboard', async () => {
    const onPick = vi.fn()
    show(<ComboBox label="Base metal" text="" onPick={onPick} load={find} queryKey="metals" />)
    await userEvent.type(screen.getByRole('combobox', { name: 'Base metal' }), '304')
    await screen.findByRole('option', { name: /304L/ })
    await userEvent.keyboard('{ArrowDown}{Enter}')
    expect(onPick).toHaveBeenCalledWith(METALS[1], 'SA-240 304L')
  })
  it('keeps an own text only where allowed', async () => {
    const onPick = vi.fn()
    const { unmount } = show(<ComboBox label="Base metal" text="" onPick={onPick} load={find} queryKey="metals" allowOwn />)
    await userEvent.type(screen.getByRole('combobox'), 'Unobtainium')
    await userEvent.tab()
    await waitFor(() => expect(onPick).toHaveBeenCalledWith(null, 'Unobtainium'))
    unmount()
    onPick.mockClear()
    show(<ComboBox label="Base metal" text="SA-516 Gr. 70" onPick={onPick} load={find} queryKey="metals" />)
    await userEvent.clear(screen.getByRole('combobox'))
    await userEvent.type(screen.getByRole('combobox'), 'zzz')
    await userEvent.tab()
    await waitFor(() => expect(screen.getByRole<HTMLInputElement>('combobox').value).toBe('SA-516 Gr. 70'))
    expect(onPick).not.toHaveBeenCalled()
  })
})

describe('plain fields', () => {
  it('tie label, description and error to the box', () => {
    show(<TextField label="Heat number" description="From the certificate." error="Heat number: write it as stamped." defaultValue="x" />)
    const box = screen.getByRole('textbox', { name: 'Heat number' })
    const described = box.getAttribute('aria-describedby')?.split(' ').map((id) => document.getElementById(id)?.textContent)
    expect(described).toEqual(['From the certificate.', 'Heat number: write it as stamped.'])
    expect(box.getAttribute('aria-invalid')).toBe('true')
  })
  it('offer an empty choice that means not stated', () => {
    show(<Select label="Groove" empty="Not stated" options={[{ value: 'single-v', label: 'Single V' }]} />)
    expect(screen.getByRole<HTMLSelectElement>('combobox', { name: 'Groove' }).value).toBe('')
  })
  it('tick, switch and pick', async () => {
    const onChange = vi.fn()
    show(
      <>
        <Checkbox label="Peened" onChange={onChange} />
        <Switch label="Pulsed" onChange={onChange} />
      </>,
    )
    fireEvent.click(screen.getByRole('checkbox', { name: 'Peened' }))
    await userEvent.click(screen.getByRole('switch', { name: 'Pulsed' }))
    expect(onChange).toHaveBeenCalledTimes(2)
  })
  it('picks tags in the order of the list, not of the clicks', async () => {
    const onChange = vi.fn()
    show(<TagPicker label="Positions" options={[{ value: '1G' }, { value: '2G' }, { value: '3G' }]} value={['3G']} onChange={onChange} />)
    await userEvent.click(screen.getByRole('button', { name: '1G' }))
    expect(onChange).toHaveBeenLastCalledWith(['1G', '3G'])
    await userEvent.click(screen.getByRole('button', { name: '3G' }))
    expect(onChange).toHaveBeenLastCalledWith([])
    expect(screen.getByRole('button', { name: '3G' }).getAttribute('aria-pressed')).toBe('true')
  })
})

describe('a figure that is still being typed', () => {
  it('counts once typing has rested, without leaving the field', async () => {
    const heard = vi.fn()
    show(<OneInterval heard={heard} start={interval(18, 22, 'voltage')} />)
    await userEvent.clear(boxes()[1])
    await userEvent.type(boxes()[1], '24')
    await waitFor(() => expect(heard.mock.lastCall?.[0]).toMatchObject({ min: { si: 18 }, max: { si: 24 } }), { timeout: 4000 })
    expect(document.activeElement).toBe(boxes()[1])
  })
  it('is not taken while it runs the wrong way or can’t be read', async () => {
    const heard = vi.fn()
    show(<OneInterval heard={heard} start={interval(18, 22, 'voltage')} />)
    await userEvent.clear(boxes()[1])
    await userEvent.type(boxes()[1], '2')
    await new Promise((resolve) => setTimeout(resolve, 800))
    expect(heard).not.toHaveBeenCalled()
    expect(screen.queryByText(/above the upper/)).toBeNull()
  })
  it('is never read anew in another system than it was typed in', async () => {
    const heard = vi.fn()
    show(<IntervalField label="Thickness" dimension="length" system="US" value={{ min: { si: 18, unit: 'mm', typed: '18' }, max: null, all: false }} onChange={heard} />)
    expect(screen.getByRole<HTMLInputElement>('textbox', { name: 'Thickness, from' }).value).toBe('18 mm')
    await userEvent.type(screen.getByRole('textbox', { name: 'Thickness, to' }), '1')
    await waitFor(() => expect(heard).toHaveBeenCalled(), { timeout: 4000 })
    expect(heard.mock.lastCall?.[0]).toMatchObject({ min: { si: 18, unit: 'mm' }, max: { si: 25.4, unit: 'in' } })
  })
})
