// @vitest-environment jsdom
import { screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import fc from 'fast-check'
import { describe, expect, it, vi } from 'vitest'
import { standardDetail, standardRow } from '@shared/standards/catalogue.ts'
import { asmeIx } from '@shared/standards/asme-ix/index.ts'
import { bySection, chosenRules } from '@/features/standards/components/rule-search.ts'
import { routes } from '@/features/standards/routes.tsx'
import { mockApi, problem, session, showRoutes } from '../support/render.tsx'

const detail = standardDetail(asmeIx)
const as = session(['standards.read'])
const all = { q: '', process: '', kind: '', basis: '', edition: '' }

describe('the list of standards', () => {
  it('says how many rules there are and how they are known', async () => {
    mockApi({ 'GET /api/standards': { body: { items: [standardRow(asmeIx)] } } })
    showRoutes(routes, { as, path: '/standards' })
    const link = await screen.findByRole('link', { name: 'ASME IX' }, { timeout: 15_000 })
    expect(link.getAttribute('href')).toBe('/standards/asme-ix')
    const row = link.closest('li')
    expect(row?.textContent).toContain(`${detail.rules} rules`)
    expect(row?.textContent).toContain(`${detail.bases.memory ?? 0} from memory`)
  })
})

describe('the page of a standard', () => {
  const open = async (path = '/standards/asme-ix') => {
    mockApi({ 'GET /api/standards/asme-ix': { body: detail } })
    const rendered = showRoutes(routes, { as, path })
    await screen.findByRole('heading', { level: 1, name: 'ASME IX' }, { timeout: 15_000 })
    return rendered
  }

  it('lists every rule with clause, statement and a class for each process', async () => {
    const { container } = await open()
    expect(container.querySelectorAll('tbody tr')).toHaveLength(detail.ruleList.length)
    const row = container.querySelector('#base-metal-p-number')
    if (!(row instanceof HTMLElement)) throw new Error('no row')
    expect(row.textContent).toContain('QW-403.11')
    expect(row.textContent).toContain(detail.ruleList.find(({ id }) => id === 'asme-ix/base-metal-p-number')?.statement ?? '?')
    expect(within(row).getAllByRole('cell').map((cell) => cell.querySelector('.sr-only')?.textContent)).toEqual(['essential', 'essential', 'essential', 'essential', 'essential', 'no such variable'])
    for (const item of detail.outOfScope) expect(screen.getByText(item)).toBeDefined()
  })

  it('is filtered by words, process and class, and says how many are left', async () => {
    const { container, router } = await open()
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Process' }), 'SMAW')
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Class' }), 'supplementary')
    await waitFor(() => expect(container.querySelectorAll('tbody tr')).toHaveLength(chosenRules(detail.ruleList, { ...all, process: 'SMAW', kind: 'supplementary' }).length))
    await userEvent.type(screen.getByRole('searchbox', { name: 'Find a rule' }), 'interpass{Enter}')
    await waitFor(() => expect([...container.querySelectorAll('tbody tr')].map(({ id }) => id)).toEqual(['interpass']))
    expect(screen.getByText(`1 of ${detail.ruleList.length} rules`)).toBeDefined()
    expect(router.state.location.search).toContain('q=interpass')
    await userEvent.click(screen.getByRole('button', { name: 'Clear' }))
    await waitFor(() => expect(container.querySelectorAll('tbody tr')).toHaveLength(detail.ruleList.length))
  })

  it('goes to the rule that the address names', async () => {
    const jump = vi.spyOn(Element.prototype, 'scrollIntoView')
    const { container } = await open('/standards/asme-ix#heat-input')
    expect(jump.mock.contexts).toContain(container.querySelector('#heat-input'))
    expect(container.querySelector('#heat-input')?.className).toContain('bg-straw-bg')
  })

  it('says when there is no such standard, or it could not be read', async () => {
    mockApi({ 'GET /api/standards/aws-d1-1': problem(404, 'There is no such standard here.') })
    const { unmount } = showRoutes(routes, { as, path: '/standards/house-rules' })
    expect(await screen.findByRole('heading', { name: 'No such standard' })).toBeDefined()
    unmount()
    showRoutes(routes, { as, path: '/standards/aws-d1-1' })
    expect((await screen.findByRole('alert')).textContent).toContain('There is no such standard here.')
  })
})

describe('choosing rules', () => {
  it('a filter never adds a rule, and sections hold each rule once', () =>
    fc.assert(fc.property(fc.record({ q: fc.constantFrom('', 'thickness', 'QW-404', 'gas flow', 'zzz'), process: fc.constantFrom('', 'SMAW', 'PAW'), kind: fc.constantFrom('', 'essential', 'dual', 'nonessential'), basis: fc.constantFrom('', 'read', 'memory'), edition: fc.constantFrom('', '2017', '2021') }), (filters) => {
      const chosen = chosenRules(detail.ruleList, filters)
      for (const rule of chosen) {
        expect(detail.ruleList).toContain(rule)
        if (filters.process && filters.kind) expect(rule.classes).toContainEqual(expect.objectContaining({ process: filters.process, class: filters.kind }))
      }
      for (const key of Object.keys(filters) as (keyof typeof filters)[]) expect(chosenRules(detail.ruleList, { ...filters, [key]: '' }).length).toBeGreaterThanOrEqual(chosen.length)
      expect(bySection(chosen).flatMap(([, rules]) => rules).map(({ id }) => id).sort()).toEqual(chosen.map(({ id }) => id).sort())
    }), { numRuns: 40 }))
})
