// @vitest-environment jsdom
import { configure, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { writeHeatSchema, type Heat } from '@shared/schemas/heats.ts'
import '@/features/library/pages/HeatPage.tsx'
import '@/features/library/pages/HeatsPage.tsx'
import '@/features/library/pages/NewHeatPage.tsx'
import { createRoutes } from '@/routes.tsx'
import { ids, mockApi, problem, session, showRoutes } from '../../support/render.tsx'

configure({ asyncUtilTimeout: 8000 })

const MAY = ['library.read', 'heats.read', 'heats.manage']
const heat = (content: object = {}, more: Partial<Heat> = {}): Heat => ({ id: ids.other, version: 1, updatedAt: '2026-03-01T08:00:00.000Z', content: writeHeatSchema.parse({ kind: 'heat', number: 'K4471', grade: 'A/SA-516 70', libraryId: 'us-a516-70', chemistryOf: 'ladle', chemistry: [{ element: 'C', percent: 0.18 }, { element: 'Mn', percent: 1.2 }], ...content }), files: [], namedBy: [], may: ['save', 'attach', 'remove'], ...more })
const cell = (element: string) => screen.getByLabelText<HTMLInputElement>(`${element} %`)
const paste = () => screen.getByLabelText<HTMLTextAreaElement>('Paste from the certificate')
const figures = () => within(screen.getByRole('region', { name: 'What follows from it' }))

describe('a heat', () => {
  it('takes a pasted chemistry, shows what follows at once, and keeps what it couldn’t read', async () => {
    const seen = mockApi({ 'POST /api/heats': (asked) => ({ status: 201, body: heat(asked.body as object) }) })
    showRoutes(createRoutes, { as: session(MAY), path: '/library/heats/new' })
    await userEvent.type(await screen.findByLabelText('Heat number'), 'Z9')
    const grade = screen.getByRole('combobox', { name: 'Grade' })
    await userEvent.type(grade, 'Mill 12')
    await userEvent.tab()
    await userEvent.click(paste())
    await userEvent.paste('C=0,18; Mn=1,35; B <0.0005; CEV 0.41')
    expect(cell('C').value).toBe('0.18')
    expect(cell('Mn').value).toBe('1.35')
    expect(cell('B').value).toBe('<0.0005')
    expect(paste().value).toBe('CEV 0.41')
    expect(screen.getByText(/“CEV” is no element/)).toBeDefined()
    // 0.18 + 1.35/6
    expect(figures().getByText('0.405')).toBeDefined()
    expect(figures().getByText('Pcm is stated for C up to 0.17 %; this steel has 0.18 %.')).toBeDefined()
    await userEvent.click(screen.getByRole('button', { name: 'Record it' }))
    await waitFor(() => expect(seen.find(({ method }) => method === 'POST')?.body).toMatchObject({ kind: 'heat', number: 'Z9', grade: 'Mill 12', libraryId: null, chemistry: [{ element: 'C', percent: 0.18 }, { element: 'Mn', percent: 1.35 }, { element: 'B', percent: 0.0005, atMost: true }] }))
  })

  it('reads a table pasted into any cell', async () => {
    mockApi({})
    showRoutes(createRoutes, { as: session(MAY), path: '/library/heats/new?kind=lot' })
    await userEvent.click(await screen.findByLabelText('C %'))
    await userEvent.paste('C\tCr\tNi\tCo\n0,02\t19,9\t10,1\t0,05')
    expect([cell('C').value, cell('Cr').value, cell('Ni').value, cell('Co').value]).toEqual(['0.02', '19.9', '10.1', '0.05'])
    expect(figures().getByText('Ferrite number')).toBeDefined()
    expect(figures().getByText(/Say that the analysis is of the deposit/)).toBeDefined()
    await userEvent.selectOptions(screen.getByLabelText('Analysis of'), 'deposit')
    expect(figures().getByText('A-Number')).toBeDefined()
  })

  it('refuses more than the whole and what is no figure at the field; nothing is sent and nothing lost', async () => {
    const seen = mockApi({ [`GET /api/heats/${ids.other}`]: { body: heat() } })
    showRoutes(createRoutes, { as: session(MAY), path: `/library/heats/${ids.other}` })
    await screen.findByRole('heading', { level: 1, name: 'K4471' })
    await userEvent.clear(cell('Mn'))
    await userEvent.type(cell('Mn'), '100')
    expect(screen.getByText('The elements add up to 100.18 %, which is more than the whole.')).toBeDefined()
    await userEvent.click(screen.getByRole('button', { name: 'Save' }))
    await userEvent.clear(cell('Mn'))
    await userEvent.type(cell('Mn'), 'much')
    expect(cell('Mn').getAttribute('aria-invalid')).toBe('true')
    expect(screen.getByText(/“much” is no figure for Mn/)).toBeDefined()
    await userEvent.click(screen.getByRole('button', { name: 'Save' }))
    expect(await screen.findByText(/Mn much: correct what is no figure/)).toBeDefined()
    expect(cell('Mn').value).toBe('much')
    expect(seen.filter(({ method }) => method === 'PUT')).toEqual([])
  })

  it('shows somebody else’s save, and takes theirs or saves over it', async () => {
    let stored = heat()
    const seen = mockApi({
      [`GET /api/heats/${ids.other}`]: () => ({ body: stored }),
      [`PUT /api/heats/${ids.other}`]: ({ headers, body }) => {
        if (headers.get('If-Match') !== '"2"') {
          stored = heat({ certificate: 'MC-9' }, { version: 2 })
          return problem(409, 'Somebody else saved.', { current: { ...stored, sent: body } })
        }
        return { body: heat(body as object, { version: 3 }) }
      },
    })
    showRoutes(createRoutes, { as: session(MAY), path: `/library/heats/${ids.other}` })
    await userEvent.type(await screen.findByLabelText(/Certificate number/), 'MC-1')
    await userEvent.click(screen.getByRole('button', { name: 'Save' }))
    expect(await screen.findByText('Somebody else saved K4471 since you opened it')).toBeDefined()
    expect(screen.getByText(/They changed the certificate\./)).toBeDefined()
    await userEvent.click(screen.getByRole('button', { name: 'Save mine over it' }))
    await waitFor(() => expect(seen.at(-1)).toMatchObject({ method: 'PUT', body: { certificate: 'MC-1' } }))
    expect(await screen.findByText('Saved')).toBeDefined()
  })

  it('is text for whoever only reads, with its certificates and the records that name it', async () => {
    const file = { id: ids.me, fileName: 'MC.pdf', mediaType: 'application/pdf', bytes: 1200, sha256: 'a'.repeat(64), uploadedAt: '2026-03-01T08:00:00.000Z', uploadedBy: { id: ids.me, name: 'Hal' } }
    mockApi({ [`GET /api/heats/${ids.other}`]: { body: heat({}, { may: [], files: [file], namedBy: [{ kind: 'coupon', id: ids.me, number: 'PQR-001', title: 'Plate', state: 'certified' }] }) } })
    showRoutes(createRoutes, { as: session(['library.read', 'heats.read']), path: `/library/heats/${ids.other}` })
    expect(await screen.findByRole('link', { name: 'MC.pdf' })).toBeDefined()
    expect(screen.getByRole('link', { name: 'PQR-001' }).getAttribute('href')).toBe(`/coupons/${ids.me}`)
    expect(screen.queryByRole('button', { name: 'Save' })).toBeNull()
    expect(screen.queryByRole('button', { name: /Remove/ })).toBeNull()
    expect(screen.queryByRole('textbox')).toBeNull()
  })

  it('is listed with what follows from its chemistry', async () => {
    const { content } = heat()
    mockApi({ 'GET /api/heats': { body: { items: [{ id: ids.other, updatedAt: '2026-03-01T08:00:00.000Z', files: 0, ...content }], next: null, total: 1 } } })
    showRoutes(createRoutes, { as: session(MAY), path: '/library/heats' })
    expect((await screen.findByRole('link', { name: 'K4471' })).getAttribute('href')).toBe(`/library/heats/${ids.other}`)
    expect(screen.getByText('CE 0.380 · Pcm 0.240')).toBeDefined()
  })
})
