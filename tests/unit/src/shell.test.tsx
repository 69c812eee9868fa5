// @vitest-environment jsdom
import { act, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { createRoutes } from '@/routes.tsx'
import { call } from '@/lib/api.ts'
import { mockApi, nobody, problem, session, showRoutes } from './support/render.tsx'

const today = { 'GET /api/today': { body: { tasks: [], counts: {} } } }

describe('shell', () => {
  it('sends people who are not signed in to sign-in', async () => {
    mockApi({ 'GET /api/session': { body: nobody } })
    const { router } = showRoutes(createRoutes, { as: null, path: '/people?role=welder' })
    await screen.findByRole('heading', { name: 'Sign in' })
    expect(router.state.location).toMatchObject({ pathname: '/sign-in', search: '?to=%2Fpeople%3Frole%3Dwelder' })
  })
  it('shows only places that the person may go', async () => {
    mockApi(today)
    showRoutes(createRoutes, { as: session(['today.read', 'coupons.read', 'lookup.read']) })
    await screen.findByRole('heading', { name: 'Today' })
    const places = within(screen.getAllByRole('navigation', { name: 'Main' })[0] ?? document.body)
    expect(places.getAllByRole('link').map(({ textContent }) => textContent)).toEqual(['Today', 'Coupons'])
  })
  it('keeps the lesser places behind one button, by role too', async () => {
    mockApi(today)
    const { router } = showRoutes(createRoutes, { as: session(['today.read', 'standards.read', 'outbox.read']) })
    await userEvent.click(await screen.findByRole('button', { name: 'More' }))
    expect((await screen.findAllByRole('menuitem')).map(({ textContent }) => textContent)).toEqual(['Standards', 'Outbox'])
    await userEvent.click(screen.getByRole('menuitem', { name: 'Outbox' }))
    await waitFor(() => expect(router.state.location.pathname).toBe('/outbox'))
  })
  it('puts the cursor into the joint search with / and looks the line up', async () => {
    mockApi(today)
    const { router } = showRoutes(createRoutes, { as: session(['today.read', 'lookup.read']) })
    await screen.findByRole('heading', { name: 'Today' })
    await userEvent.keyboard('/')
    expect(document.activeElement).toBe(screen.getAllByLabelText('Find a procedure for a joint')[0])
    await userEvent.keyboard('6061 8 mm PA{Enter}')
    await waitFor(() => expect(router.state.location).toMatchObject({ pathname: '/look-up', search: '?line=6061%208%20mm%20PA' }))
  })
  it('leaves / to whoever is typing', async () => {
    mockApi({ 'GET /api/people': { body: { items: [], next: null, total: 0 } } })
    showRoutes(createRoutes, { as: session(['people.read', 'lookup.read']), path: '/people' })
    const box = await screen.findByRole<HTMLInputElement>('searchbox')
    await userEvent.type(box, '1/2')
    expect(box.value).toBe('1/2')
  })
  it('has a page for addresses that lead nowhere', async () => {
    mockApi({})
    showRoutes(createRoutes, { path: '/nowhere' })
    expect(await screen.findByRole('heading', { name: 'No sheet under this number' })).toBeDefined()
    expect(document.title).toBe('Page not found · Sidebend')
    expect(screen.getByRole('link', { name: 'Skip to the page' }).getAttribute('href')).toBe('#page')
  })
  it('follows the person’s theme', async () => {
    mockApi(today)
    showRoutes(createRoutes, { as: session(undefined, { theme: 'night' }) })
    await screen.findByRole('heading', { name: 'Today' })
    expect(document.documentElement.classList.contains('night')).toBe(true)
    document.documentElement.classList.remove('night')
  })
  it('changes units from the menu', async () => {
    const seen = mockApi({ ...today, 'PATCH /api/account': { body: session(undefined, { unitSystem: 'US' }) } })
    showRoutes(createRoutes, {})
    await userEvent.click(await screen.findByRole('button', { name: /Edda Nilsen/ }))
    await userEvent.click(await screen.findByRole('menuitemradio', { name: /US customary/ }))
    await waitFor(() => expect(seen.find(({ method }) => method === 'PATCH')?.body).toEqual({ unitSystem: 'US' }))
  })
  it('lets somebody signed out meanwhile sign in over the page, which stays as it was', async () => {
    let out = false
    mockApi({
      'GET /api/people': () => (out ? problem(401, 'Sign in first.') : { body: { items: [], next: null, total: 0 } }),
      'GET /api/session': () => ({ body: out ? nobody : session(['people.read']) }),
      'POST /api/session': () => {
        out = false
        return { body: session(['people.read']) }
      },
    })
    showRoutes(createRoutes, { as: session(['people.read']), path: '/people' })
    const box = await screen.findByRole<HTMLInputElement>('searchbox')
    await userEvent.type(box, 'half typed')
    out = true
    await act(async () => {
      await call('listPeople').catch(() => undefined)
    })
    const dialog = within(await screen.findByRole('dialog', { name: 'You were signed out' }))
    await userEvent.type(dialog.getByLabelText('E-mail'), 'edda@larkfield.example')
    await userEvent.type(dialog.getByLabelText('Password'), 'a short sentence')
    await userEvent.click(dialog.getByRole('button', { name: 'Sign in' }))
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull())
    expect(screen.getByRole<HTMLInputElement>('searchbox').value).toBe('half typed')
  })
})
