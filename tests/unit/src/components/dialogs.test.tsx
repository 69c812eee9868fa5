// @vitest-environment jsdom
import { act, fireEvent, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import { ConfirmSign, type ConfirmSignProps } from '@/components/ConfirmSign.tsx'
import { DataTable, type Column } from '@/components/DataTable.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FilterBar } from '@/components/FilterBar.tsx'
import { say, sayProblem, Toasts } from '@/components/toast.tsx'
import { ProblemError } from '@/lib/problem.ts'
import { show, showRoutes } from '../support/render.tsx'

describe('Dialog', () => {
  it('closes on Esc unless typed work would be lost', async () => {
    const onClose = vi.fn()
    const { unmount } = show(<Dialog title="Discard" isOpen onClose={onClose}>text</Dialog>)
    expect(screen.getByRole('dialog', { name: 'Discard' })).toBeDefined()
    await userEvent.keyboard('{Escape}')
    expect(onClose).toHaveBeenCalledTimes(1)
    unmount()
    show(<Dialog title="Discard" isOpen onClose={onClose} dismissable={false}>text</Dialog>)
    await userEvent.keyboard('{Escape}')
    expect(onClose).toHaveBeenCalledTimes(1)
  })
})

const signing: ConfirmSignProps = { isOpen: true, onClose: () => undefined, title: 'Approve WPS-014 rev B', statement: 'I approve WPS-014 rev B.', consequence: 'Nobody can change it afterwards.', confirmLabel: 'Sign and approve', onSign: () => Promise.resolve() }

describe('ConfirmSign', () => {
  it('says what is signed and sends the password with it', async () => {
    const onSign = vi.fn(() => Promise.resolve())
    show(<ConfirmSign {...signing} onSign={onSign} />)
    expect(screen.getByText('I approve WPS-014 rev B.')).toBeDefined()
    await userEvent.type(screen.getByLabelText('Your password'), 'a short sentence')
    await userEvent.click(screen.getByRole('button', { name: 'Sign and approve' }))
    expect(onSign).toHaveBeenCalledWith({ password: 'a short sentence', reason: '' })
  })
  it('signs nothing without password or a reason that is needed', async () => {
    const onSign = vi.fn(() => Promise.resolve())
    show(<ConfirmSign {...signing} onSign={onSign} reason={{ label: 'Reason', required: true, missing: 'Say why the finding is accepted.' }} />)
    await userEvent.click(screen.getByRole('button', { name: 'Sign and approve' }))
    expect(onSign).not.toHaveBeenCalled()
    expect(screen.getByText('Re-enter your password to sign.')).toBeDefined()
    expect(screen.getByText('Say why the finding is accepted.')).toBeDefined()
  })
  it('stays open with the refusal on the field, and keeps what was typed', async () => {
    const refusal = new ProblemError({ type: 'x', title: 'Refused', status: 422, detail: 'Not signed.', errors: [{ field: 'password', message: 'This is not your password.' }] })
    show(<ConfirmSign {...signing} reason={{ label: 'Reason', required: false, missing: '' }} onSign={() => Promise.reject(refusal)} />)
    await userEvent.type(screen.getByLabelText(/Reason/), 'Seen by the customer')
    await userEvent.type(screen.getByLabelText('Your password'), 'wrong')
    await userEvent.click(screen.getByRole('button', { name: 'Sign and approve' }))
    expect(await screen.findByText('This is not your password.')).toBeDefined()
    expect(screen.getByLabelText<HTMLTextAreaElement>(/Reason/).value).toBe('Seen by the customer')
  })
  it('shows a refusal that belongs to no field', async () => {
    show(<ConfirmSign {...signing} onSign={() => Promise.reject(new ProblemError({ type: 'x', title: 'Refused', status: 403, detail: 'The author cannot approve their own procedure.' }))} />)
    await userEvent.type(screen.getByLabelText('Your password'), 'right')
    await userEvent.click(screen.getByRole('button', { name: 'Sign and approve' }))
    expect((await screen.findByRole('alert')).textContent).toContain('The author cannot approve')
  })
})

interface Row { id: string; title: string }
const rows: Row[] = [{ id: 'WPS-001', title: 'One' }, { id: 'WPS-002', title: 'Two' }, { id: 'WPS-003', title: 'Three' }]
const columns: Column<Row>[] = [
  { id: 'number', header: 'Number', sort: 'number', cell: (row) => row.id },
  { id: 'title', header: 'Title', sort: 'title', cell: (row) => row.title },
  { id: 'extra', header: 'Extra', hidden: true, cell: (row) => `extra ${row.id}` },
]
const table = (more: Partial<Parameters<typeof DataTable<Row>>[0]> = {}) => <DataTable caption="Procedures" columns={columns} rows={rows} rowKey={(row) => row.id} rowHref={(row) => `/at/${row.id}`} {...more} />

describe('DataTable', () => {
  it('sorts by a column, then the other way round, and says so', async () => {
    const onSort = vi.fn()
    const { unmount } = show(table({ sort: 'number', onSort }))
    expect(screen.getByRole('columnheader', { name: 'Number' }).getAttribute('aria-sort')).toBe('ascending')
    await userEvent.click(screen.getByRole('button', { name: 'Number' }))
    expect(onSort).toHaveBeenLastCalledWith('-number')
    await userEvent.click(screen.getByRole('button', { name: 'Title' }))
    expect(onSort).toHaveBeenLastCalledWith('title')
    unmount()
    show(table({ sort: '-number', onSort }))
    expect(screen.getByRole('columnheader', { name: 'Number' }).getAttribute('aria-sort')).toBe('descending')
  })
  it('moves between rows with the arrow keys and opens with Enter', async () => {
    const { router } = showRoutes([{ path: '/', element: table() }, { path: '/at/:id', element: 'opened' }])
    screen.getByRole('link', { name: 'WPS-001' }).focus()
    await userEvent.keyboard('{ArrowDown}{ArrowDown}{ArrowDown}{ArrowUp}')
    expect(document.activeElement?.textContent).toBe('WPS-002')
    await userEvent.keyboard('{End}')
    expect(document.activeElement?.textContent).toBe('WPS-003')
    await userEvent.keyboard('{Enter}')
    await screen.findByText('opened')
    expect(router.state.location.pathname).toBe('/at/WPS-003')
  })
  it('opens a row that is clicked anywhere', async () => {
    const { router } = showRoutes([{ path: '/', element: table() }, { path: '/at/:id', element: 'opened' }])
    await userEvent.click(screen.getByText('Two'))
    await screen.findByText('opened')
    expect(router.state.location.pathname).toBe('/at/WPS-002')
  })
  it('shows and hides columns, and remembers the choice on this device', async () => {
    const { unmount } = show(table({ storageKey: 'test' }))
    expect(screen.queryByText('extra WPS-001')).toBeNull()
    await userEvent.click(screen.getByRole('button', { name: 'Choose columns' }))
    await userEvent.click(await screen.findByRole('checkbox', { name: 'Extra' }))
    expect(screen.getByText('extra WPS-001')).toBeDefined()
    unmount()
    show(table({ storageKey: 'test' }))
    expect(screen.getByText('extra WPS-001')).toBeDefined()
  })
  it('tells how many there are and fetches more', async () => {
    const onMore = vi.fn()
    show(table({ total: 40, onMore }))
    expect(screen.getByText('3 of 40')).toBeDefined()
    await userEvent.click(screen.getByRole('button', { name: 'Show more' }))
    expect(onMore).toHaveBeenCalled()
  })
})

function Search({ heard }: { heard: (text: string) => void }) {
  const [text, setText] = useState('')
  return <FilterBar label="Find a coupon" search={text} onSearch={(next) => { heard(next); setText(next) }} onClear={text ? () => setText('') : undefined} />
}

describe('FilterBar', () => {
  it('searches when typing rests, once', async () => {
    const heard = vi.fn()
    show(<Search heard={heard} />)
    await userEvent.type(screen.getByRole('searchbox'), '304')
    expect(heard).not.toHaveBeenCalledWith('3')
    await waitFor(() => expect(heard).toHaveBeenCalledWith('304'))
    expect(heard).toHaveBeenCalledTimes(1)
    await userEvent.click(screen.getByRole('button', { name: 'Clear' }))
    expect(screen.getByRole<HTMLInputElement>('searchbox').value).toBe('')
  })
  it('searches at once on Enter', () => {
    const heard = vi.fn()
    show(<Search heard={heard} />)
    fireEvent.change(screen.getByRole('searchbox'), { target: { value: '6061' } })
    fireEvent.keyDown(screen.getByRole('searchbox'), { key: 'Enter' })
    expect(heard).toHaveBeenCalledWith('6061')
  })
})

describe('toasts', () => {
  it('say what was done, with a way back, and what failed, with the request', async () => {
    const undo = vi.fn()
    show(<Toasts />)
    act(() => void say('Draft discarded.', { undo }))
    await userEvent.click(await screen.findByRole('button', { name: 'Undo' }))
    expect(undo).toHaveBeenCalled()
    act(() => void sayProblem(new ProblemError({ type: 'x', title: 'Refused', status: 500, detail: 'The server could not finish this.', requestId: 'r-9' })))
    expect(await screen.findByText('The server could not finish this.')).toBeDefined()
    expect(screen.getByText('Request r-9')).toBeDefined()
  })
})
