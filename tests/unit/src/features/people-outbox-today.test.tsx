// @vitest-environment jsdom
import { screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import type { Person } from '@shared/schemas/people.ts'
import { createRoutes } from '@/routes.tsx'
import { ids, mockApi, problem, session, showRoutes } from '../support/render.tsx'

const wim: Person = { id: ids.other, name: 'Wim Aarts', email: 'wim@larkfield.example', roles: ['welder'], active: true, state: 'active', createdAt: '2026-10-02T08:00:00Z', lastSignInAt: null, version: 3 }
const people = { body: { items: [wim], next: null, total: 1 } }
const administrator = session(['people.read', 'people.manage', 'outbox.read', 'today.read'], { roles: ['administrator'] })

describe('people', () => {
  it('lists them; only who manages may invite or change', async () => {
    mockApi({ 'GET /api/people': people })
    const { unmount } = showRoutes(createRoutes, { as: administrator, path: '/people' })
    expect(await screen.findByText('wim@', { exact: false })).toBeDefined()
    expect(screen.getByRole('button', { name: 'Invite a person' })).toBeDefined()
    unmount()
    showRoutes(createRoutes, { as: session(['people.read']), path: '/people' })
    await screen.findByText('Wim Aarts')
    expect(screen.queryByRole('button', { name: 'Invite a person' })).toBeNull()
    expect(screen.queryByRole('button', { name: 'Change Wim Aarts' })).toBeNull()
  })
  it('asks the server for what the address says', async () => {
    const seen = mockApi({ 'GET /api/people': people })
    const { router } = showRoutes(createRoutes, { as: administrator, path: '/people?role=welder&sort=-name' })
    await screen.findByText('Wim Aarts')
    expect(seen[0]?.search).toBe('?role=welder&sort=-name')
    await userEvent.selectOptions(screen.getByLabelText('Role'), '')
    await waitFor(() => expect(router.state.location.search).toBe('?sort=-name'))
  })
  it('invites with roles, and shows what the server refuses on its field', async () => {
    let taken = true
    const seen = mockApi({ 'GET /api/people': people, 'POST /api/people': () => (taken ? problem(422, 'Not invited.', { errors: [{ field: 'email', message: 'wim@larkfield.example is already somebody here.' }] }) : { status: 201, body: wim }) })
    showRoutes(createRoutes, { as: administrator, path: '/people' })
    await userEvent.click(await screen.findByRole('button', { name: 'Invite a person' }))
    const dialog = within(screen.getByRole('dialog'))
    await userEvent.click(dialog.getByRole('button', { name: 'Send the invitation' }))
    expect(await dialog.findByText('Choose at least one role.', { selector: '.text-oxide' })).toBeDefined()
    await userEvent.type(dialog.getByLabelText('Name'), 'Wim Aarts')
    await userEvent.type(dialog.getByLabelText('E-mail'), 'wim@larkfield.example')
    await userEvent.click(dialog.getByRole('button', { name: 'welder' }))
    await userEvent.click(dialog.getByRole('button', { name: 'Send the invitation' }))
    expect(await dialog.findByText('wim@larkfield.example is already somebody here.')).toBeDefined()
    expect(dialog.getByLabelText<HTMLInputElement>('Name').value).toBe('Wim Aarts')
    taken = false
    await userEvent.click(dialog.getByRole('button', { name: 'Send the invitation' }))
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull())
    expect(seen.findLast(({ method }) => method === 'POST')?.body).toEqual({ name: 'Wim Aarts', email: 'wim@larkfield.example', roles: ['welder'] })
  })
  it('shows a change made meanwhile and saves over it only when told again', async () => {
    const versions: (string | null)[] = []
    mockApi({
      'GET /api/people': people,
      [`PATCH /api/people/${ids.other}`]: ({ headers }) => {
        versions.push(headers.get('if-match'))
        return versions.length === 1 ? problem(409, 'Somebody changed this person.', { current: { ...wim, name: 'Willem Aarts', version: 7 } }) : { body: { ...wim, version: 8 } }
      },
    })
    showRoutes(createRoutes, { as: administrator, path: '/people' })
    await userEvent.click(await screen.findByRole('button', { name: 'Change Wim Aarts' }))
    const dialog = within(screen.getByRole('dialog'))
    await userEvent.click(dialog.getByRole('button', { name: 'inspector' }))
    await userEvent.click(dialog.getByRole('switch', { name: /May sign in/ }))
    await userEvent.click(dialog.getByRole('button', { name: 'Save' }))
    expect((await dialog.findByRole('alert')).textContent).toContain('now Willem Aarts, welder, with access')
    expect(dialog.getByRole('button', { name: 'inspector' }).getAttribute('aria-pressed')).toBe('true')
    await userEvent.click(dialog.getByRole('button', { name: 'Save' }))
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull())
    expect(versions).toEqual(['"3"', '"7"'])
  })
})

const mail = { id: ids.other, to: ['ines@larkfield.example'], subject: 'WPS-014 rev B, signed', state: 'caught', attempts: 1, error: null, attachments: [{ name: 'WPS-014-B.pdf', bytes: 184220 }], createdAt: '2026-11-30T09:00:00Z', sentAt: null }

describe('outbox', () => {
  it('lists caught mail and opens one with its links and attachments', async () => {
    mockApi({ 'GET /api/outbox': { body: { items: [mail], next: null, total: 1 } }, [`GET /api/outbox/${ids.other}`]: { body: { ...mail, text: 'Set a password:\nhttp://127.0.0.1:3001/invitation/abc' } } })
    showRoutes(createRoutes, { as: administrator, path: '/outbox' })
    await userEvent.click(await screen.findByRole('link', { name: 'WPS-014 rev B, signed' }))
    expect((await screen.findByRole('link', { name: /invitation\/abc/ })).getAttribute('href')).toBe('http://127.0.0.1:3001/invitation/abc')
    expect(screen.getByRole('link', { name: 'Download' }).getAttribute('href')).toBe(`/api/outbox/${ids.other}/attachments/0`)
    expect(screen.getByText('184 kB')).toBeDefined()
  })
  it('teaches when empty', async () => {
    mockApi({ 'GET /api/outbox': { body: { items: [], next: null, total: 0 } } })
    showRoutes(createRoutes, { as: administrator, path: '/outbox' })
    expect(await screen.findByRole('heading', { name: 'Nothing has been sent' })).toBeDefined()
  })
  it('shows a mail that is not there as not found', async () => {
    mockApi({})
    showRoutes(createRoutes, { as: administrator, path: `/outbox/${ids.firm}` })
    expect((await screen.findByRole('alert')).textContent).toContain('There is no such record.')
  })
})

describe('today', () => {
  it('lists what waits, and the first step of the person’s roles', async () => {
    mockApi({ 'GET /api/today': { body: { tasks: [{ kind: 'returned', title: 'WPS-012 rev A', detail: 'State the interpass maximum.', href: '/revisions/1', at: '2026-11-27T10:00:00Z' }], counts: { approvedProcedures: 7 } } } })
    showRoutes(createRoutes, { as: session(['today.read', 'procedures.draft']) })
    expect((await screen.findByRole('link', { name: 'WPS-012 rev A' })).getAttribute('href')).toBe('/revisions/1')
    expect(screen.getByText('State the interpass maximum.')).toBeDefined()
    expect(screen.getByText('approved procedures').nextSibling?.textContent).toBe('7')
    expect(screen.getByRole('link', { name: 'Draft a procedure' }).getAttribute('href')).toBe('/procedures/new')
  })
  it('offers no step that the policies refuse', async () => {
    mockApi({ 'GET /api/today': { body: { tasks: [], counts: {} } } })
    showRoutes(createRoutes, { as: session(['today.read']) })
    expect(await screen.findByRole('heading', { name: 'Nothing waits for you' })).toBeDefined()
    expect(screen.queryByRole('link', { name: 'Draft a procedure' })).toBeNull()
  })
})
