// @vitest-environment jsdom
import { configure, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import { libraryRows } from '@shared/library/library-rows.ts'
import { factsOf } from '@/features/library/columns.tsx'
import '@/features/library/pages/LibraryPage.tsx'
import { createRoutes } from '@/routes.tsx'
import { ids, mockApi, session, showRoutes } from '../../support/render.tsx'

configure({ asyncUtilTimeout: 8000 })

describe('library', () => {
  it('has the facts of every row of the reference', () => {
    for (const row of libraryRows()) {
      const { shown, more } = factsOf(row, 'SI')
      expect(shown.length, row.key).toBeGreaterThan(1)
      for (const { value } of [...shown, ...more]) expect(value, row.key).not.toBe('')
    }
  })
  it('shows "not listed" where the source lists nothing, and the basis of a row', async () => {
    const row = libraryRows().find(({ kind, content }) => kind === 'base-metals' && content.p_no === null)
    if (!row) throw new Error('every base metal has a P-Number')
    mockApi({ 'GET /api/library/base-metals': { body: { items: [{ ...row, id: ids.other, origin: 'reference', version: 1 }], next: null, total: 1 } } })
    showRoutes(createRoutes, { as: session(['library.read']), path: '/library/base-metals' })
    await userEvent.click(await screen.findByRole('button', { name: row.title }))
    const panel = within(screen.getByRole('dialog'))
    expect(panel.getByText('P-Number').nextSibling?.textContent).toBe('not listed')
    expect(panel.getByText('Basis and source')).toBeDefined()
  })
})
