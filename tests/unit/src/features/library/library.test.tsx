// @vitest-environment jsdom
import { configure, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { libraryRows } from '@shared/library/library-rows.ts'
import { factsOf } from '@/features/library/columns.tsx'
import '@/features/library/pages/LibraryItemPage.tsx'
import '@/features/library/pages/LibraryPage.tsx'
import '@/features/library/pages/OwnRowPage.tsx'
import { createRoutes } from '@/routes.tsx'
import { ids, mockApi, problem, session, showRoutes } from '../../support/render.tsx'

configure({ asyncUtilTimeout: 8000 })

describe('library', () => {
  it('has the facts of every row of the reference', () => {
    for (const row of libraryRows()) {
      const { shown, more } = factsOf(row, 'SI')
      expect(shown.length, row.key).toBeGreaterThan(1)
      for (const { value } of [...shown, ...more]) expect(value, row.key).not.toBe('')
    }
  })
  it('leads from the list to a row’s own page, which says "not listed" where the source lists nothing, and the basis of each figure', async () => {
    const row = libraryRows().find(({ kind, content }) => kind === 'base-metals' && content.p_no === null && content.iso_15608_basis === 'memory')
    if (!row) throw new Error('every base metal has a P-Number')
    const item = { ...row, id: ids.other, origin: 'reference', version: 1 }
    mockApi({ 'GET /api/library/base-metals': { body: { items: [item], next: null, total: 1 } }, [`GET /api/library/base-metals/${ids.other}`]: { body: item }, [`GET /api/library/base-metals/${ids.other}/uses`]: { body: { items: [{ kind: 'procedure', id: ids.me, number: 'WPS-007 rev A', title: 'Shell', state: 'approved' }] } } })
    showRoutes(createRoutes, { as: session(['library.read']), path: '/library/base-metals' })
    await userEvent.click(await screen.findByRole('link', { name: row.title }))
    expect(await screen.findByRole('heading', { level: 1, name: row.title })).toBeDefined()
    expect(screen.getByText('P-Number').nextSibling?.textContent).toBe('not listed')
    expect(screen.getByText('ISO 15608').parentElement?.textContent).toMatch(/from memory$/)
    expect((await screen.findByRole('link', { name: 'WPS-007 rev A' })).getAttribute('href')).toBe(`/revisions/${ids.me}`)
    expect(screen.queryByRole('link', { name: 'Start our own from it' })).toBeNull()
    expect(screen.getByRole('heading', { name: 'Fillers that suit' })).toBeDefined()
  })

  it('asks whether a filler suits a metal, and always says what to mind of ER4043', async () => {
    const row = libraryRows().find(({ key }) => key === 'a510-er4043')
    const metal = libraryRows().find(({ key }) => key === 'us-b209-5083-o')
    if (!row || !metal) throw new Error('the reference has ER4043 and 5083')
    const item = { ...row, id: ids.other, origin: 'reference', version: 1 }
    mockApi({ [`GET /api/library/filler-metals/${ids.other}`]: { body: item }, [`GET /api/library/filler-metals/${ids.other}/uses`]: { body: { items: [] } }, 'GET /api/library/base-metals': { body: { items: [{ ...metal, id: ids.me, origin: 'reference', version: 1 }], next: null, total: 1 } } })
    showRoutes(createRoutes, { as: session(['library.read']), path: `/library/filler-metals/${ids.other}` })
    expect(await screen.findByText(/Never one setting for ER4043 and ER5356/)).toBeDefined()
    expect(screen.getByText(/dark grey when anodised/)).toBeDefined()
    await userEvent.type(screen.getByRole('combobox', { name: 'Base metal' }), '5083')
    await userEvent.click(await screen.findByRole('option', { name: new RegExp(metal.title) }))
    expect(await screen.findByText(/4043 is not for .*5083/)).toBeDefined()
    expect(screen.getAllByText('Does not suit').length).toBeGreaterThan(0)
  })

  it('adds a row of one’s own: what can’t be is said at its field, and nothing typed is lost', async () => {
    const stored = { id: ids.other, kind: 'gases', key: 'own-baymix', title: 'Bay mix', subtitle: '', origin: 'own', basis: 'own', source: 'Contract', content: {}, version: 1 }
    const seen = mockApi({ 'POST /api/library': { status: 201, body: stored } })
    showRoutes(createRoutes, { as: session(['library.read', 'library.manage']), path: '/library/gases/new' })
    await userEvent.type(await screen.findByLabelText('Name'), 'Bay mix')
    const share = screen.getByLabelText('Share of CO2 in per cent')
    await userEvent.clear(share)
    await userEvent.type(share, '8')
    await userEvent.click(screen.getByRole('button', { name: 'Add it' }))
    expect(await screen.findByText('The parts add up to 90 %; a mixture is 100 %.')).toBeDefined()
    expect(screen.getByText(/Say where the figures come from/)).toBeDefined()
    expect(seen.filter(({ method }) => method === 'POST')).toEqual([])
    await userEvent.clear(share)
    await userEvent.type(share, '18')
    await userEvent.type(screen.getByLabelText(/Where the figures come from/), 'Contract')
    await userEvent.click(screen.getByRole('button', { name: 'Add it' }))
    await waitFor(() => expect(seen.find(({ method }) => method === 'POST')?.body).toEqual({ kind: 'gases', content: { name: 'Bay mix', awsDesignation: null, use: null, components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }], source: 'Contract' } }))
  })

  it('puts what the server refuses at its field', async () => {
    mockApi({ 'POST /api/library': problem(422, 'Your library has it.', { errors: [{ field: 'content.spec', message: 'LF 12 is in your library already.' }] }) })
    showRoutes(createRoutes, { as: session(['library.read', 'library.manage']), path: '/library/base-metals/new' })
    for (const [label, text] of [[/Standard or specification/, 'LF 12'], [/Product form/, 'plate'], [/Where the figures come from/, 'Mill']] as const) await userEvent.type(await screen.findByLabelText(label), text)
    await userEvent.type(screen.getByLabelText(/^P-Number/), '12')
    await userEvent.tab()
    await userEvent.click(screen.getByRole('button', { name: 'Add it' }))
    expect(await screen.findByText(/There is no P-Number 12/)).toBeDefined()
    await userEvent.clear(screen.getByLabelText(/^P-Number/))
    await userEvent.click(screen.getByRole('button', { name: 'Add it' }))
    expect(await screen.findByText('LF 12 is in your library already.')).toBeDefined()
    expect(screen.getByLabelText<HTMLInputElement>(/Standard or specification/).value).toBe('LF 12')
  })
})
