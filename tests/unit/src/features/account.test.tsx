// @vitest-environment jsdom
import { screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { createRoutes } from '@/routes.tsx'
import { mockApi, nobody, problem, session, showRoutes } from '../support/render.tsx'

const token = 'abcdefghijklmnopqrstuvwxyz'

describe('sign-in', () => {
  it('signs in and leads back to the page asked for', async () => {
    const seen = mockApi({ 'POST /api/session': { body: session(['account.change']) } })
    const { router } = showRoutes(createRoutes, { as: nobody, path: '/account' })
    await screen.findByRole('heading', { name: 'Sign in' })
    expect(router.state.location.search).toBe('?to=%2Faccount')
    await userEvent.type(screen.getByLabelText('E-mail'), ' Edda@Larkfield.example')
    await userEvent.type(screen.getByLabelText('Password'), 'a short sentence{Enter}')
    expect(await screen.findByRole('heading', { name: 'Edda Nilsen' })).toBeDefined()
    expect(seen[0]?.body).toEqual({ email: 'edda@larkfield.example', password: 'a short sentence' })
  })
  it('keeps what was typed when refused, and says why', async () => {
    mockApi({ 'POST /api/session': problem(401, 'E-mail and password do not fit together.') })
    showRoutes(createRoutes, { as: nobody, path: '/sign-in' })
    await userEvent.type(await screen.findByLabelText('E-mail'), 'edda@larkfield.example')
    await userEvent.type(screen.getByLabelText('Password'), 'wrong')
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }))
    expect((await screen.findByRole('alert')).textContent).toBe('E-mail and password do not fit together.')
    expect(screen.getByLabelText<HTMLInputElement>('E-mail').value).toBe('edda@larkfield.example')
    expect(screen.getByLabelText<HTMLInputElement>('Password').value).toBe('wrong')
  })
  it('asks nothing of the server with an unfinished form', async () => {
    const seen = mockApi({})
    showRoutes(createRoutes, { as: nobody, path: '/sign-in' })
    await userEvent.type(await screen.findByLabelText('E-mail'), 'edda')
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }))
    expect(await screen.findByText('Write an e-mail address like name@example.com.')).toBeDefined()
    expect(screen.getByText('Write your password.')).toBeDefined()
    expect(seen).toHaveLength(0)
  })
  it('shows the password on request', async () => {
    mockApi({})
    showRoutes(createRoutes, { as: nobody, path: '/sign-in' })
    const box = await screen.findByLabelText<HTMLInputElement>('Password')
    expect(box.type).toBe('password')
    await userEvent.click(screen.getByRole('button', { name: 'Show what I type' }))
    expect(box.type).toBe('text')
  })
})

describe('links from e-mails', () => {
  it('asks for a reset link without telling who exists', async () => {
    const seen = mockApi({ 'POST /api/password-resets': { status: 202 } })
    showRoutes(createRoutes, { as: nobody, path: '/forgot-password' })
    await userEvent.type(await screen.findByLabelText('E-mail'), 'sol@larkfield.example{Enter}')
    expect(await screen.findByText(/If sol@larkfield.example belongs to somebody here/)).toBeDefined()
    expect(seen[0]?.body).toEqual({ email: 'sol@larkfield.example' })
  })
  it('sets a password with a reset link; a spent link is explained', async () => {
    let spent = false
    mockApi({ [`PUT /api/password-resets/${token}`]: () => (spent ? problem(404, 'This link was used or has run out. Ask for a new one.') : { status: 204 }) })
    spent = true
    showRoutes(createRoutes, { as: nobody, path: `/reset-password/${token}` })
    await userEvent.type(await screen.findByLabelText('New password'), 'a short sentence')
    await userEvent.click(screen.getByRole('button', { name: 'Set the password' }))
    expect((await screen.findByRole('alert')).textContent).toContain('Ask for a new one')
    spent = false
    await userEvent.click(screen.getByRole('button', { name: 'Set the password' }))
    expect(await screen.findByText('The new password is set.')).toBeDefined()
  })
  it('welcomes an invited person by name', async () => {
    const seen = mockApi({ [`GET /api/invitations/${token}`]: { body: { name: 'Wim Aarts', email: 'wim@larkfield.example', organization: 'Larkfield Fabrication' } }, [`PUT /api/invitations/${token}`]: { status: 204 } })
    showRoutes(createRoutes, { as: nobody, path: `/invitation/${token}` })
    expect(await screen.findByRole('heading', { name: 'Welcome, Wim Aarts' })).toBeDefined()
    await userEvent.type(screen.getByLabelText('New password'), 'short')
    await userEvent.click(screen.getByRole('button', { name: /Accept/ }))
    expect(await screen.findByText(/Use at least 12 characters/)).toBeDefined()
    await userEvent.type(screen.getByLabelText('New password'), ' no, a sentence')
    await userEvent.click(screen.getByRole('button', { name: /Accept/ }))
    expect(await screen.findByText(/Your account is open/)).toBeDefined()
    expect(seen.filter(({ method }) => method === 'PUT')).toHaveLength(1)
  })
  it('explains an invitation that does not work', async () => {
    mockApi({ [`GET /api/invitations/${token}`]: problem(404, 'This invitation was used or has run out.') })
    showRoutes(createRoutes, { as: nobody, path: `/invitation/${token}` })
    expect((await screen.findByRole('alert')).textContent).toContain('used or has run out')
    expect(screen.queryByLabelText('New password')).toBeNull()
  })
})

describe('account page', () => {
  it('puts a refused password change on its field and keeps what was typed', async () => {
    mockApi({ 'PUT /api/account/password': problem(422, 'Not changed.', { errors: [{ field: 'currentPassword', message: 'This is not your present password.' }] }) })
    showRoutes(createRoutes, { path: '/account' })
    await userEvent.type(await screen.findByLabelText('Present password'), 'wrong')
    await userEvent.type(screen.getByLabelText('New password'), 'a much longer sentence')
    await userEvent.click(screen.getByRole('button', { name: 'Change the password' }))
    expect(await screen.findByText('This is not your present password.')).toBeDefined()
    expect(screen.getByLabelText<HTMLInputElement>('New password').value).toBe('a much longer sentence')
  })
  it('switches units at once and takes them back when refused', async () => {
    let answer: () => { status?: number; body?: unknown } = () => ({ body: session(undefined, { unitSystem: 'US' }) })
    const seen = mockApi({ 'PATCH /api/account': () => answer() })
    showRoutes(createRoutes, { path: '/account' })
    const units = await screen.findByLabelText<HTMLSelectElement>(/Figures/)
    await userEvent.selectOptions(units, 'US')
    await waitFor(() => expect(units.value).toBe('US'))
    expect(seen[0]?.body).toEqual({ unitSystem: 'US' })
    answer = () => problem(500, 'The server could not finish this.')
    await userEvent.selectOptions(units, 'SI')
    await waitFor(() => expect(units.value).toBe('US'))
    expect(await screen.findByText('The server could not finish this.')).toBeDefined()
  })
  it('asks before signing out everywhere', async () => {
    const seen = mockApi({ 'DELETE /api/sessions': problem(500, 'Not now.') })
    showRoutes(createRoutes, { path: '/account' })
    await userEvent.click(await screen.findByRole('button', { name: 'Sign out everywhere…' }))
    expect(screen.getByRole('dialog').textContent).toContain('this one too')
    expect(seen).toHaveLength(0)
    await userEvent.click(screen.getByRole('button', { name: 'Sign out everywhere' }))
    await waitFor(() => expect(seen.map(({ method, path }) => `${method} ${path}`)).toEqual(['DELETE /api/sessions']))
  })
})
