// @vitest-environment jsdom
import { screen, within } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { createRoutes } from '@/routes.tsx'
import { mockApi, session, showRoutes } from '../../support/render.tsx'

const at = '2026-03-14T09:00:00.000Z'
const task = (kind: string, title: string) => ({ kind, title, detail: `${title} in words`, href: `/${kind}`, at })

describe('today', () => {
  it('keeps what is merely in force apart from what waits for a hand', async () => {
    mockApi({ 'GET /api/today': { body: { tasks: [task('review', 'WPS-009 B'), task('approved', 'WPS-001 A'), task('joint', 'Joint 3 of JOB-001')], counts: {} } } })
    showRoutes(createRoutes, { as: session(['today.read']) })
    await screen.findByRole('heading', { name: 'Waiting for you' })
    const sheet = (name: string) => within(screen.getByRole('heading', { name }).closest('section') ?? document.body)
    expect(sheet('Waiting for you').getAllByRole('link').map(({ textContent }) => textContent)).toEqual(['WPS-009 B'])
    expect(sheet('Joints to weld').getAllByRole('link').map(({ textContent }) => textContent)).toEqual(['Joint 3 of JOB-001'])
    expect(sheet('Newly in force').getAllByRole('link').map(({ textContent }) => textContent)).toEqual(['WPS-001 A'])
  })
  it('says that nothing waits', async () => {
    mockApi({ 'GET /api/today': { body: { tasks: [], counts: {} } } })
    showRoutes(createRoutes, { as: session(['today.read']) })
    expect(await screen.findByRole('heading', { name: 'Nothing waits for you' })).toBeDefined()
  })
})
