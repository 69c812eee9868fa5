// @vitest-environment jsdom
import { act, fireEvent, render, screen, waitFor, within } from '@testing-library/react'
import { useMemo } from 'react'
import { useForm, useWatch, type FieldValues } from 'react-hook-form'
import { describe, expect, it } from 'vitest'
import { JointLiveProvider } from '@/components/joint/live.tsx'
import { Toasts } from '@/components/toast.tsx'
import { SheetContext, type SheetValue, type WeldContent } from '@/components/variables/context.ts'
import { JointSheet } from '@/components/variables/JointSheet.tsx'
import { weldingVariablesSchema, type WeldingVariables } from '@shared/schemas/welding.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { interval } from '@shared/units/convert.ts'
import '../support/render.tsx'

const variables = (change: (weld: WeldingVariables) => void = () => undefined): WeldingVariables => {
  const weld = weldingVariablesSchema.parse({ standards: [{ standard: 'aws-d1-1', edition: '2020' }], thickness: interval(12, undefined, 'length'), joint: { groove: 'single-v', includedAngle: interval(55, 65, 'angle'), rootOpening: interval(3, undefined, 'length'), rootFace: interval(1, undefined, 'length') }, baseMetals: { a: { libraryId: 'us-a516-70' } }, processes: [{ id: 'p1', process: 'GTAW' }, { id: 'p2', process: 'GMAW' }] })
  change(weld)
  return weld
}


let now: WeldingVariables
function Desk({ start, system, record = 'procedure', read = false }: { start: WeldingVariables; system: UnitSystem; record?: 'procedure' | 'coupon'; read?: boolean }) {
  const form = useForm<FieldValues>({ defaultValues: { variables: start } })
  const content = useWatch({ control: form.control }) as WeldContent
  now = content.variables
  const sheet: SheetValue = useMemo(() => ({ content, system, control: read ? null : form.control, record, findings: new Map(), attention: false, couponNumber: () => undefined }), [content, system, read, form.control, record])
  return (
    <SheetContext value={sheet}>
      <JointLiveProvider>
        <JointSheet />
      </JointLiveProvider>
      <Toasts />
    </SheetContext>
  )
}
const show = (start = variables(), more: { system?: UnitSystem; record?: 'procedure' | 'coupon'; read?: boolean } = {}) => render(<Desk start={start} system={more.system ?? 'SI'} {...more} />)
const slider = (name: string) => screen.getByRole('slider', { name })
const box = (id: string) => {
  const found = document.querySelector<HTMLInputElement>(`#${id}`)
  if (!found) throw new Error(`no field is #${id}`)
  return found
}
const area = () => document.querySelector('#joint figcaption dd')?.textContent
const ends = (value: WeldingVariables['thickness'] | undefined) => [value?.min?.si, value?.max?.si]

describe('the designer, by keys', () => {
  it('moves a handle by arrows; drawing, field and figures follow at once, and the form when the hand rests', async () => {
    show()
    expect(area()).toBe('106 mm²')
    const angle = slider('Included angle')
    expect(angle.getAttribute('aria-valuetext')).toBe('60°')
    angle.focus()
    fireEvent.keyDown(angle, { key: 'ArrowRight' })
    fireEvent.keyDown(slider('Included angle'), { key: 'ArrowRight' })
    expect(slider('Included angle').getAttribute('aria-valuetext')).toBe('62°')
    expect(box('row-joint-includedAngle').value).toBe('57')
    expect(area()).toBe('109 mm²')
    expect(ends(now.joint.includedAngle), 'not written yet').toEqual([55, 65])
    await waitFor(() => expect(ends(now.joint.includedAngle)).toEqual([57, 67]))
  })
  it('keeps to what can be: Home and End are the ends, and an impossible step is not taken', () => {
    show(variables((weld) => { weld.joint.groove = 'single-u'; weld.joint.rootRadius = interval(8, undefined, 'length'); weld.joint.includedAngle = interval(20, undefined, 'angle') }))
    const radius = slider('Root radius')
    fireEvent.keyDown(radius, { key: 'End' })
    expect(slider('Root radius').getAttribute('aria-valuetext')).toBe('8 mm')
    fireEvent.keyDown(slider('Root face'), { key: 'Home' })
    expect(slider('Root face').getAttribute('aria-valuetext')).toBe('0 mm')
  })
  it('writes a figure at its handle on Enter; Esc leaves it as it was', async () => {
    show()
    fireEvent.keyDown(slider('Root opening'), { key: 'Enter' })
    const editor = screen.getByRole('textbox', { name: /^Root opening mm/ })
    fireEvent.change(editor, { target: { value: '2-6' } })
    expect(slider('Root opening').getAttribute('aria-valuetext')).toBe('4 mm')
    fireEvent.keyDown(editor, { key: 'Escape' })
    expect(slider('Root opening').getAttribute('aria-valuetext')).toBe('3 mm')
    fireEvent.keyDown(slider('Root opening'), { key: 'Enter' })
    const again = screen.getByRole('textbox', { name: /^Root opening mm/ })
    fireEvent.change(again, { target: { value: '1/8 in' } })
    fireEvent.keyDown(again, { key: 'Enter' })
    await waitFor(() => expect(now.joint.rootOpening?.min).toMatchObject({ si: 3.175, typed: '1/8 in' }))
    fireEvent.keyDown(slider('Root opening'), { key: 'Enter' })
    const wrong = screen.getByRole('textbox', { name: /^Root opening mm/ })
    fireEvent.change(wrong, { target: { value: 'wide' } })
    fireEvent.keyDown(wrong, { key: 'Enter' })
    expect(screen.getByRole('alert').textContent).toMatch(/wide/)
  })
})

describe('the designer, by typing and dragging', () => {
  it('redraws at each key, before the field is left', () => {
    show()
    const opening = box('row-joint-rootOpening-to')
    fireEvent.focus(opening)
    fireEvent.change(opening, { target: { value: '5' } })
    expect(slider('Root opening').getAttribute('aria-valuetext')).toBe('4 mm')
    expect(ends(now.joint.rootOpening)).toEqual([3, 3])
    fireEvent.blur(opening)
    expect(ends(now.joint.rootOpening)).toEqual([3, 5])
  })
  it('lights up the dimension of the field, and the field of the handle', () => {
    show()
    fireEvent.focus(box('row-joint-rootFace'))
    expect(document.querySelector('[data-mark="joint.rootFace"] text')?.getAttribute('class')).toContain('fill-steel')
    fireEvent.blur(box('row-joint-rootFace'))
    act(() => slider('Root opening').focus())
    expect(box('row-joint-rootOpening').closest('.outline-steel')).not.toBeNull()
    expect(box('row-joint-rootFace').closest('.outline-steel')).toBeNull()
  })
  it('says at the field what can’t be, and draws nothing', async () => {
    show()
    const face = box('row-joint-rootFace')
    fireEvent.focus(face)
    fireEvent.change(face, { target: { value: '14-16' } })
    fireEvent.blur(face)
    await waitFor(() => expect(document.querySelector('#row-joint-rootFace-error')?.textContent).toMatch(/root face of 15 mm leaves nothing to prepare in 12 mm/))
    expect(screen.queryByRole('slider')).toBeNull()
    expect(face.value, 'nothing typed is lost').toBe('14')
  })
  it('follows the hand while it drags, in steps, and keeps the range as wide', async () => {
    show()
    const at = (type: string, clientX: number) => fireEvent(slider('Included angle'), new MouseEvent(type, { bubbles: true, cancelable: true, clientX, clientY: 0, button: 0 }))
    at('pointerdown', 100)
    at('pointermove', 120)
    const during = Number.parseFloat(slider('Included angle').getAttribute('aria-valuetext') ?? '')
    expect(during).toBeGreaterThan(60)
    expect(Number.isInteger(during)).toBe(true)
    at('pointerup', 120)
    await waitFor(() => expect(ends(now.joint.includedAngle)).toEqual([during - 5, during + 5]))
  })
  it('reads in inches and steps in 32nds for whoever reads in inches', () => {
    show(variables((weld) => { weld.thickness = interval(0.5, undefined, 'length', 'in'); weld.joint.rootOpening = interval(0.125, undefined, 'length', 'in') }), { system: 'US' })
    fireEvent.keyDown(slider('Root opening'), { key: 'ArrowUp' })
    expect(box('row-joint-rootOpening').value).toBe('5/32')
    expect(area()).toMatch(/in²$/)
  })
})

describe('passes', () => {
  it('are laid out from bead sizes, moved, given to another process; and taken back', async () => {
    show()
    const bead = (name: string, text: string) => {
      fireEvent.change(screen.getByRole('textbox', { name }), { target: { value: text } })
      fireEvent.blur(screen.getByRole('textbox', { name }))
    }
    fireEvent.click(screen.getByRole('button', { name: 'Lay out from bead size' }))
    expect(screen.getByRole('alert').textContent).toMatch(/bead section above 0/)
    bead('Bead, GTAW, mm²', '15')
    bead('Bead, GMAW, mm²', '25')
    expect(document.body.textContent).toContain('about 5 passes of that size')
    fireEvent.click(screen.getByRole('button', { name: 'Lay out from bead size' }))
    await waitFor(() => expect(now.processes.map(({ passes }) => passes.length)).toEqual([1, 4]))
    await waitFor(() => expect(document.querySelectorAll('#joint [data-pass]')).toHaveLength(5))
    const list = () => within(screen.getByRole('region', { name: 'Pass sequence' })).getAllByRole('listitem')
    await waitFor(() => expect(list()).toHaveLength(5))
    fireEvent.click(screen.getByRole('button', { name: 'Move place 2 earlier' }))
    await waitFor(() => expect(now.processes.flatMap(({ passes }) => passes.map(({ order }) => order))).toEqual([2, 1, 3, 4, 5]))
    await waitFor(() => expect(screen.getByRole<HTMLSelectElement>('combobox', { name: 'Place 1, process' }).value).toBe('p2'))
    fireEvent.change(screen.getByRole('combobox', { name: 'Place 1, process' }), { target: { value: 'p1' } })
    await waitFor(() => expect(now.processes.map(({ passes }) => passes.length)).toEqual([2, 3]))
    await waitFor(() => expect(screen.getByRole<HTMLSelectElement>('combobox', { name: 'Place 1, process' }).value).toBe('p1'))
    fireEvent.click(screen.getByRole('button', { name: 'Take out place 5' }))
    await waitFor(() => expect(list()).toHaveLength(4))
    fireEvent.click(screen.getByRole('button', { name: 'Add to the sequence' }))
    await waitFor(() => expect(list()).toHaveLength(5))
  })
  it('are not planned on a coupon, which logs them', () => {
    show(variables(), { record: 'coupon' })
    expect(screen.queryByRole('region', { name: 'Pass sequence' })).toBeNull()
    expect(slider('Included angle')).toBeTruthy()
  })
})

describe('standard details', () => {
  it('fill the joint as detailed, and say what fit-up may leave', async () => {
    show()
    fireEvent.click(screen.getByRole('button', { name: 'Standard details' }))
    const dialog = screen.getByRole('dialog')
    expect(dialog.textContent).toContain('as detailed')
    fireEvent.click(within(dialog).getByRole('button', { name: 'Use B-U2-GF, 60°' }))
    await waitFor(() => expect(now.joint).toMatchObject({ designation: 'B-U2-GF', groove: 'single-v', includedAngle: { min: { si: 60 }, max: { si: 70 } }, rootOpening: { min: { si: 0 }, max: { si: 5 } }, backing: 'none', weldedFromBothSides: true }))
    await waitFor(() => expect(document.querySelector('#joint')?.textContent).toContain('B-U2-GF, at fit-up'))
    expect(document.querySelector('#joint')?.textContent).toMatch(/Root face not limited.*AWS D1\.1 2020, Fig\. 5\.1, from memory: confirm/)
  })
})

it('to be read, it is a picture: no handle, no box', () => {
  show(variables(), { read: true })
  expect(screen.queryByRole('slider')).toBeNull()
  expect(document.querySelector('#joint input, #joint select')).toBeNull()
  expect(screen.getByRole('img').getAttribute('aria-label')).toMatch(/thickness 12 mm, root opening 3 mm, root face 1 mm, included angle 55–65°/)
})
