// @vitest-environment jsdom
import { configure, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it } from 'vitest'
import type { Revision, RevisionState } from '@shared/schemas/records.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import '@/features/lookup/pages/LookUpPage.tsx'
import '@/features/lookup/pages/ShopPage.tsx'
import { asked } from '@/features/lookup/question.ts'
import { cellsOf, dialsOf, windowOf } from '@/features/lookup/shop.ts'
import { createRoutes } from '@/routes.tsx'
import { aluminiumProcedure, steelProcedure } from '../../../../fixtures/samples.ts'
import { ids, mockApi, session, showRoutes } from '../../support/render.tsx'

configure({ asyncUtilTimeout: 8000 })

const welder = session(['lookup.read', 'procedures.read'], { roles: ['welder'] })
const REVISION = '7f0d9b5e-6f0a-4c3b-9a55-0c6a2f1f0101'
const NEWER = '7f0d9b5e-6f0a-4c3b-9a55-0c6a2f1f0102'
const revision = (state: RevisionState, content: ProcedureContent): Revision => ({
  id: REVISION, revision: 'B', state, author: { id: ids.me, name: 'Ines Callard' }, createdAt: '2026-11-01T08:00:00Z', updatedAt: '2026-11-02T08:00:00Z', decidedAt: null, procedureId: ids.other, number: 'WPS-014', version: 1, content, coupons: [], deviationReason: null, contentSha256: 'c'.repeat(64), may: [],
  signatures: state === 'draft' ? [] : [{ id: ids.firm, person: { id: ids.me, name: 'Marit Vance' }, role: 'supervisor', meaning: 'approved', statement: 'I approve.', reason: null, contentSha256: 'c'.repeat(64), signedAt: '2026-11-02T08:00:00Z' }],
})
const shop = (record: Revision, path = `/shop/${REVISION}`, more: Parameters<typeof mockApi>[0] = {}) => {
  mockApi({ [`GET /api/revisions/${REVISION}`]: { body: record }, ...more })
  showRoutes(createRoutes, { as: welder, path })
}

describe('shop card', () => {
  it('shows what to dial on one machine, with the window on its scale', async () => {
    shop(revision('approved', aluminiumProcedure()))
    const dials = within(await screen.findByRole('region', { name: /Dial this on M-03/ }))
    expect(dials.getByText('335')).toBeDefined()
    expect(dials.getByText(/shows the set wire feed/)).toBeDefined()
    // 300 to 370 on a scale of 50 to 800
    expect(dials.getByRole('img', { name: /Wire feed: .* from 33 to 43 per cent/ })).toBeDefined()
    expect(screen.queryByText('Do not weld to this')).toBeNull()
    expect(screen.getByText('Approved')).toBeDefined()
  })
  it('turns to the ranges of the process where no panel is written, process by process', async () => {
    shop(revision('approved', steelProcedure()))
    expect(await screen.findByText('80–130')).toBeDefined()
    await userEvent.click(screen.getByRole('button', { name: 'GMAW' }))
    expect(screen.getByText('180–240')).toBeDefined()
    expect(screen.queryByText('80–130')).toBeNull()
    await userEvent.click(screen.getByRole('button', { name: 'Passes' }))
    expect(screen.getByText(/180–210 A/)).toBeDefined()
  })
  it.each([
    ['draft', /This is a draft/],
    ['withdrawn', /was withdrawn/],
  ] as const)('shouts when it is %s', async (state, why) => {
    shop(revision(state, steelProcedure()))
    const stop = within(await screen.findByRole('alert'))
    expect(stop.getByText('Do not weld to this')).toBeDefined()
    expect(stop.getByText(why)).toBeDefined()
  })
  it('leads from a replaced revision to the one in force', async () => {
    const summary = { author: { id: ids.me, name: 'Ines Callard' }, createdAt: '2026-11-01T08:00:00Z', updatedAt: '2026-11-02T08:00:00Z', decidedAt: null }
    shop(revision('superseded', steelProcedure()), undefined, { [`GET /api/procedures/${ids.other}`]: { body: { id: ids.other, number: 'WPS-014', revisions: [{ id: REVISION, revision: 'B', state: 'superseded', ...summary }, { id: NEWER, revision: 'C', state: 'approved', ...summary }] } } })
    expect((await screen.findByRole('link', { name: /Open revision C/ })).getAttribute('href')).toBe(`/shop/${NEWER}`)
  })
  it('warns when the procedure does not cover the joint that it was opened for', async () => {
    shop(revision('approved', steelProcedure()), `/shop/${REVISION}?joint=${ids.firm}`, { 'GET /api/lookup': { body: { read: [{ label: 'Joint', value: 'JOB-002 B1' }], notRead: [], fits: [], near: [] } } })
    expect(await screen.findByText('Not for this joint')).toBeDefined()
    expect(screen.getByText('JOB-002 B1')).toBeDefined()
  })
})

describe('figures of the card', () => {
  it('have a window only where a scale makes sense', () => {
    expect(windowOf({ scaleMin: 0, scaleMax: 10, min: 2, max: 4 })).toEqual({ from: 0.2, to: 0.4 })
    expect(windowOf({ scaleMin: 0, scaleMax: 10, min: null, max: 4 })).toEqual({ from: 0, to: 0.4 })
    expect(windowOf({ scaleMin: 10, scaleMax: 10, min: 2, max: 4 })).toBeNull()
    expect(windowOf({ scaleMin: null, scaleMax: 10, min: 2, max: 4 })).toBeNull()
    expect(windowOf({ scaleMin: 0, scaleMax: 10, min: 8, max: 4 })).toBeNull()
  })
  it('are read in the welder’s own units', () => {
    const { variables } = aluminiumProcedure()
    const block = variables.processes[0]
    if (!block) throw new Error('no process')
    expect(cellsOf(variables, block, 'US').find(({ label }) => label === 'Metal')?.value).toContain('3/16')
    expect(cellsOf(variables, block, 'SI').find(({ label }) => label === 'Metal')?.value).toContain('4.8')
    expect(cellsOf(variables, block, 'SI').find(({ label }) => label === 'Gas')?.value).toMatch(/^Argon \(I1\)/)
    expect(dialsOf({ electrical: { ...block.electrical, panel: null } }, 'US').dials.map(({ label }) => label)).toContain('Wire feed')
  })
})

describe('look-up', () => {
  it('tells while it is typed how a line is read, and what is not understood', async () => {
    mockApi({})
    showRoutes(createRoutes, { as: welder, path: '/look-up' })
    await userEvent.type(await screen.findByLabelText('The joint'), '12 mm A516-70 SMAW 3G purple')
    const read = screen.getByLabelText('How it was read')
    expect(await within(read).findByText('12 mm')).toBeDefined()
    expect(within(read).getByText('3G')).toBeDefined()
    expect(await screen.findByText('purple')).toBeDefined()
  })
  it('lists what fits with its reasons and what is near with its wants, and remembers the question', async () => {
    const seen = mockApi({ 'GET /api/lookup': { body: { read: [], notRead: [], fits: [{ revisionId: REVISION, procedureId: ids.other, number: 'WPS-001', revision: 'B', title: 'Tank shell', processes: ['SMAW'], reasons: ['3G is among its positions'], score: 80 }], near: [{ revisionId: NEWER, procedureId: ids.me, number: 'WPS-002', revision: 'A', title: 'Beams', processes: ['GMAW'], wants: ['It is for GMAW, not SMAW.'] }] } } })
    showRoutes(createRoutes, { as: welder, path: '/look-up' })
    await userEvent.type(await screen.findByLabelText('The joint'), 'SMAW 3G{Enter}')
    expect((await screen.findByRole('link', { name: /WPS-001/ })).getAttribute('href')).toBe(`/shop/${REVISION}`)
    expect(screen.getByText('3G is among its positions')).toBeDefined()
    expect(screen.getByText('It is for GMAW, not SMAW.')).toBeDefined()
    expect(seen.find(({ path }) => path === '/api/lookup')?.search).toBe('?line=SMAW+3G&unitSystem=SI')
    expect(localStorage.getItem('sidebend.lookup')).toBe('{"line":"SMAW 3G"}')
  })
  it('leaves out of an address what no question can hold', () => {
    expect(asked({ process: 'GLUE', position: '3G', jointId: 'none', line: ' ' })).toEqual({ position: '3G' })
  })
})
