// @vitest-environment jsdom
import { configure, fireEvent, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, test } from 'vitest'
import { panelCard } from '@shared/machines/panel-card.ts'
import type { Machine, MachineRow, WriteMachine } from '@shared/schemas/machines.ts'
import type { Revision } from '@shared/schemas/records.ts'
import { barOf, barWords, figureOf, roomAt, roomOf } from '@/components/panel-card/layout.ts'
import { PanelCardView } from '@/components/panel-card/PanelCardView.tsx'
import { PointsPlot } from '@/features/machines/components/PointsPlot.tsx'
import { asFigure, readFigures, readWords, unreadFigures, wrong } from '@/features/machines/words.ts'
import '@/features/machines/pages/CardPage.tsx'
import '@/features/machines/pages/MachinePage.tsx'
import { createRoutes } from '@/routes.tsx'
import { feederMode, knobMode, machine, TODAY } from '../../../../fixtures/machines.ts'
import { aluminiumProcedure, steelProcedure } from '../../../../fixtures/samples.ts'
import { ids, mockApi, session, show, showRoutes } from '../../support/render.tsx'

// The form is large, and a busy machine slow.
configure({ asyncUtilTimeout: 8000 })

const [MACHINE, REVISION] = ['7f0d9b5e-6f0a-4c3b-9a55-0c6a2f1f0071', '7f0d9b5e-6f0a-4c3b-9a55-0c6a2f1f0072']
const stored = (content: WriteMachine, may: string[] = ['save']): Machine => ({ id: MACHINE, number: 'M-007', version: 3, updatedAt: '2026-11-02T08:00:00Z', content, may })
const row = (part: Partial<MachineRow> = {}): MachineRow => ({ id: MACHINE, number: 'M-007', name: 'Bay 2', location: 'Bay 2', modes: [{ key: 'cv', name: 'Wire', kind: 'constant-voltage' }], calibrationDueOn: '2026-12-20', calibration: 'due-soon', processes: ['GMAW'], retired: false, updatedAt: '2026-11-02T08:00:00Z', ...part })
const cardOf = (content: WriteMachine, variables = steelProcedure().variables, processId: string | null = 'fill') => panelCard({ variables, processId, machine: { number: 'M-007', content }, mode: content.modes[0]?.key ?? '', state: 'approved', today: TODAY })
const engineer = session(['machines.read', 'machines.manage', 'procedures.read', 'lookup.read'])
const welder = session(['machines.read', 'procedures.read', 'lookup.read'], { roles: ['welder'] })

const revision = (): Revision => ({ id: REVISION, procedureId: ids.other, number: 'WPS-014', revision: 'B', state: 'approved', author: { id: ids.me, name: 'Ines Callard' }, createdAt: '2026-11-01T08:00:00Z', updatedAt: '2026-11-02T08:00:00Z', version: 3, decidedAt: null, content: steelProcedure(), coupons: [], signatures: [], deviationReason: null, contentSha256: 'a'.repeat(64), may: [] }) as unknown as Revision

describe('a panel card', () => {
  it('shows each figure with the room left', () => {
    show(<PanelCardView card={cardOf(machine([feederMode()]))} />)
    const dials = within(screen.getByRole('region', { name: 'Dial this' }))
    expect(dials.getByText('7.8')).toBeDefined()
    expect(dials.getByText('6.5 to 9.0')).toBeDefined()
    expect(dials.getByRole('img', { name: 'Wire feed: dial 7.8 m/min; room from 6.5 to 9.0 m/min, on a scale from 1 to 20 m/min' })).toBeDefined()
  })
  it('that refuses says so first and shows no figure', () => {
    show(<PanelCardView card={cardOf(machine([feederMode({ transferModes: ['short-circuiting'] })], { calibration: {} }))} />)
    expect(within(screen.getByRole('alert')).getByText(/asks for spray transfer/)).toBeDefined()
    expect(screen.getByRole('region', { name: 'Take care' })).toBeDefined()
    for (const name of ['Dial this', 'Measure this', 'Good to know']) expect(screen.queryByRole('region', { name })).toBeNull()
  })
  it('says what must be measured, and that the figure is hidden', () => {
    show(<PanelCardView card={cardOf(machine([feederMode({ displays: [], controls: [{ key: 'feed', label: 'Feed', sets: 'wireFeed', unit: 'm/min', min: 1, max: 20, step: 0.1, shown: false }] })]))} />)
    expect(screen.getByText('not shown on the panel')).toBeDefined()
    expect(within(screen.getByRole('region', { name: 'Measure this' })).getByText(/650 to 900 mm/)).toBeDefined()
  })
  it('tells the basis of what it says', () => {
    const { variables } = aluminiumProcedure()
    const content = machine([knobMode()])
    show(<PanelCardView card={panelCard({ variables, processId: null, machine: { number: 'M-007', content }, mode: 'knob', state: 'approved', today: TODAY })} />)
    expect(screen.getByText(/stands for several alloys at once/).closest('li')?.textContent).toContain('Basis: common practice')
  })
  it('is drawn to scale', () => {
    const line = { ...cardOf(machine([feederMode()])).lines[0]!, min: 5, max: 10, value: 7.5, scaleMin: 0, scaleMax: 20 }
    expect(barOf(line)).toEqual({ from: 0.25, to: 0.5, at: 0.375 })
    expect(barOf({ ...line, min: null })).toBeNull()
    expect(roomAt({ from: 0.25, to: 0.5 })).toBe(37.5)
    expect([roomAt({ from: 0, to: 0.1 }), roomAt({ from: 0.9, to: 1 })]).toEqual([26, 74])
    expect(roomOf({ ...line, min: 7.5, max: 7.5 })).toBe('only this')
    expect(figureOf(5, { step: 0.1, text: '7.5 m/min' })).toBe('5.0')
    expect(barWords({ ...line, unit: '', text: '7.5' })).toContain('on a scale from 0 to 20')
  })
})

describe('the machine’s form', () => {
  const open = (more: Parameters<typeof mockApi>[0] = {}, content = machine([feederMode()])) => {
    const seen = mockApi({ [`GET /api/machines/${MACHINE}`]: { body: stored(content) }, [`GET /api/machines/${MACHINE}/files`]: { body: { items: [] } }, ...more })
    showRoutes(createRoutes, { as: engineer, path: `/machines/${MACHINE}` })
    return seen
  }
  const box = async (name: string, index = 0): Promise<HTMLInputElement> => (await screen.findAllByLabelText<HTMLInputElement>(name))[index]!
  const type = (element: HTMLElement, value: string) => {
    fireEvent.change(element, { target: { value } })
    fireEvent.blur(element)
  }

  it('saves figures as typed, decimal comma and all, against the version that was read', async () => {
    const seen = open({ [`PUT /api/machines/${MACHINE}`]: ({ body }) => ({ body: { ...stored(body as WriteMachine), version: 4 } }) })
    type(await box('Step'), '0,25')
    type(await box('Where', 1), 'right knob')
    fireEvent.click(screen.getByRole('button', { name: 'Save' }))
    await waitFor(() => expect(seen.some(({ method }) => method === 'PUT')).toBe(true))
    const put = seen.find(({ method }) => method === 'PUT')
    expect(put?.headers.get('if-match')).toBe('"3"')
    expect((put?.body as WriteMachine).modes[0]?.controls.map(({ step, where }) => [step, where])).toEqual([[0.25, null], [0.5, 'right knob']])
  })
  it('keeps what was typed where it is wrong, and says what would be right', async () => {
    const seen = open()
    type(await box('From'), 'low')
    type(await box('To', 1), '3')
    fireEvent.click(screen.getByRole('button', { name: 'Save' }))
    expect(await screen.findByText('Give a figure, e.g. 12.5.')).toBeDefined()
    expect(await screen.findByText('The top of the scale must be above its bottom.')).toBeDefined()
    expect((await box('From')).value).toBe('low')
    expect(seen.some(({ method }) => method === 'PUT')).toBe(false)
  })
  it('adds a mode, moves it and takes it away', async () => {
    open()
    await box('Step')
    fireEvent.click(screen.getByRole('button', { name: 'Manual pulse' }))
    expect(await screen.findByRole('heading', { name: 'Manual pulse' })).toBeDefined()
    fireEvent.click(screen.getByRole('button', { name: 'Move Manual pulse up' }))
    await waitFor(() => expect(screen.getAllByRole('heading', { level: 2 }).map(({ textContent }) => textContent).filter((text) => text === 'Wire' || text === 'Manual pulse')).toEqual(['Manual pulse', 'Wire']))
    fireEvent.click(screen.getByRole('button', { name: 'Remove Manual pulse' }))
    await waitFor(() => expect(screen.queryByRole('heading', { name: 'Manual pulse' })).toBeNull())
  })
  it('shows what somebody else saved, and loses nothing', async () => {
    const theirs = { ...stored(machine([feederMode()], { location: 'Bay 9' })), version: 4 }
    const seen = open({ [`PUT /api/machines/${MACHINE}`]: ({ headers }) => (headers.get('if-match') === '"3"' ? { status: 409, body: { type: 'about:blank', title: 'Somebody else saved first', status: 409, detail: 'x', current: { ...theirs, sent: {} } } } : { body: { ...stored(machine([feederMode()], { name: 'Mine' })), version: 5 } }) })
    type(await box('Name'), 'Mine')
    fireEvent.click(screen.getByRole('button', { name: 'Save' }))
    expect(await screen.findByText(/They changed place/)).toBeDefined()
    expect((await box('Name')).value).toBe('Mine')
    fireEvent.click(screen.getByRole('button', { name: 'Save mine over it' }))
    await waitFor(() => expect(seen.filter(({ method }) => method === 'PUT').at(-1)?.headers.get('if-match')).toBe('"4"'))
  })
  it('keeps the cursor and the boxes when it is saved, and is then no longer changed', async () => {
    open({ [`PUT /api/machines/${MACHINE}`]: ({ body }) => ({ body: { ...stored(body as WriteMachine), version: 4 } }) })
    const step = await box('Step')
    type(step, '0,25')
    step.focus()
    fireEvent.keyDown(step, { key: 's', ctrlKey: true })
    expect(await screen.findByText('Saved')).toBeDefined()
    expect(document.activeElement).toBe(step)
    expect(step.value).toBe('0,25')
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Save' }).disabled).toBe(true)
  })
  it('is not left with changes before somebody says so', async () => {
    open({ 'GET /api/machines': { body: { items: [], next: null, total: 0 } } })
    type(await box('Name'), 'Another')
    fireEvent.click(within(screen.getByRole('navigation', { name: 'Breadcrumb' })).getByRole('link', { name: 'Machines' }))
    const dialog = within(await screen.findByRole('dialog', { name: 'Leave without saving?' }))
    fireEvent.click(dialog.getByRole('button', { name: 'Stay here' }))
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull())
    expect((await box('Name')).value).toBe('Another')
    fireEvent.click(within(screen.getByRole('navigation', { name: 'Breadcrumb' })).getByRole('link', { name: 'Machines' }))
    fireEvent.click(await screen.findByRole('button', { name: 'Leave without saving' }))
    expect(await screen.findByText('No machine yet')).toBeDefined()
  })
  it('does not save a list of figures with a word in it', async () => {
    const seen = open({}, machine([knobMode()]))
    fireEvent.change((await screen.findAllByLabelText('Diameters, mm'))[0]!, { target: { value: '1.2, thick' } })
    expect(await screen.findByText(/thick is no figure/)).toBeDefined()
    fireEvent.click(screen.getByRole('button', { name: 'Save' }))
    expect(await screen.findByText(/Not saved: something needs a look/)).toBeDefined()
    expect(seen.some(({ method }) => method === 'PUT')).toBe(false)
  })
  it('is text for a welder', async () => {
    mockApi({ [`GET /api/machines/${MACHINE}`]: { body: stored(machine([feederMode()]), []) }, [`GET /api/machines/${MACHINE}/files`]: { body: { items: [] } } })
    showRoutes(createRoutes, { as: welder, path: `/machines/${MACHINE}` })
    expect(await screen.findByText('1 to 20 m/min, step 0.1')).toBeDefined()
    expect(screen.queryByRole('button', { name: 'Save' })).toBeNull()
  })
})

describe('the card’s page', () => {
  const answers = () => {
    const content = machine([feederMode()])
    return {
      'GET /api/procedures': { body: { items: [], next: null, total: 0 } },
      'GET /api/machines': { body: { items: [row()], next: null, total: 1 } },
      [`GET /api/machines/${MACHINE}`]: { body: stored(content, []) },
      [`GET /api/revisions/${REVISION}`]: { body: revision() },
      [`GET /api/revisions/${REVISION}/panel-card`]: { body: cardOf(content) },
    }
  }
  it('asks for the machine first, then shows its card', async () => {
    const seen = mockApi(answers())
    const { router } = showRoutes(createRoutes, { as: welder, path: `/machines/card?revision=${REVISION}&process=fill` })
    await userEvent.selectOptions(await screen.findByLabelText('Machine in front of you'), await screen.findByRole('option', { name: 'M-007 Bay 2' }))
    expect(await screen.findByText('7.8')).toBeDefined()
    expect(router.state.location.pathname).toBe(`/machines/${MACHINE}/card`)
    expect(new URLSearchParams(seen.find(({ path }) => path.endsWith('/panel-card'))?.search).get('process')).toBe('fill')
    // The fill's cap pass has a range of its own and can be asked for.
    await userEvent.selectOptions(screen.getByLabelText('Pass'), 'cap')
    await waitFor(() => expect(new URLSearchParams(seen.at(-1)?.search).get('pass')).toBe('cap'))
  })
  it('says that a machine has no mode for the process', async () => {
    mockApi({ ...answers(), [`GET /api/machines/${MACHINE}`]: { body: stored(machine([feederMode({ processes: ['FCAW'] })]), []) } })
    showRoutes(createRoutes, { as: welder, path: `/machines/${MACHINE}/card?revision=${REVISION}&process=fill` })
    expect(await screen.findByText(/no mode for this process/)).toBeDefined()
  })
  it('in the shop view takes the place of the ranges, and is remembered on this device', async () => {
    mockApi(answers())
    showRoutes(createRoutes, { as: welder, path: `/shop/${REVISION}` })
    await userEvent.click(await screen.findByRole('button', { name: 'GMAW' }))
    expect(screen.getByText('180–240')).toBeDefined()
    await userEvent.selectOptions(await screen.findByLabelText('Machine in front of you'), await screen.findByRole('option', { name: 'M-007 Bay 2' }))
    expect(await screen.findByText('7.8')).toBeDefined()
    expect(screen.queryByText('180–240')).toBeNull()
    expect(localStorage.getItem('sidebend.shop.machine')).toBe(`"${MACHINE}"`)
  })
})

describe('the list', () => {
  it('shows where each calibration stands', async () => {
    mockApi({ 'GET /api/machines': { body: { items: [row(), row({ id: ids.other, number: 'M-008', calibration: 'lapsed' })], next: null, total: 2 } } })
    showRoutes(createRoutes, { as: engineer, path: '/machines' })
    const table = within(await screen.findByRole('table', { name: 'Machines' }))
    expect(table.getByText('Due soon')).toBeDefined()
    expect(table.getByText('Lapsed')).toBeDefined()
    expect(screen.getByRole('link', { name: 'Register a machine' }).getAttribute('href')).toBe('/machines/new')
  })
  it('tells who only reads that others register, before anything is typed', async () => {
    mockApi({})
    showRoutes(createRoutes, { as: welder, path: '/machines/new' })
    await screen.findByText('You read the machines; others register them')
    expect(screen.queryByRole('textbox', { name: 'Name' })).toBeNull()
  })

  it('begins a machine from patterns', async () => {
    const seen = mockApi({ 'POST /api/machines': ({ body }) => ({ status: 201, body: stored(body as WriteMachine) }) })
    showRoutes(createRoutes, { as: engineer, path: '/machines/new' })
    await userEvent.type(await screen.findByLabelText('Name'), 'Bay 4')
    await userEvent.click(screen.getByLabelText(/^TIG ?Amps/))
    await userEvent.click(screen.getByLabelText(/^Stick ?Amps/))
    await userEvent.click(screen.getByRole('button', { name: 'Register it' }))
    await waitFor(() => expect(seen.find(({ method }) => method === 'POST')?.body).toMatchObject({ name: 'Bay 4', kind: 'several', modes: [{ key: 'tig', processes: ['GTAW'] }, { key: 'stick', processes: ['SMAW'] }] }))
  })
})

describe('what is typed', () => {
  test.each<[unknown, number | null]>([['12.5', 12.5], ['12,5', 12.5], [' ', null], ['', null], [3, 3], ['x', NaN]])('%o is read', (text, figure) => expect(asFigure(text)).toEqual(figure))
  it('in lists is parted, and what is no figure is told', () => {
    expect(readWords(' ER4043, ER5356;; ')).toEqual(['ER4043', 'ER5356'])
    expect(readFigures('0.9, 1.2 1,6')).toEqual([0.9, 1.2, 1.6])
    expect(unreadFigures('0.9, thick')).toEqual(['thick'])
  })
  it('wrong is a sentence', () => {
    expect(wrong({ type: 'invalid_type', message: 'Invalid input' })).toBe('Give a figure, e.g. 12.5.')
    expect(wrong({ type: 'custom', message: 'As the schema says.' })).toBe('As the schema says.')
    expect(wrong(undefined)).toBeUndefined()
  })
})

describe('the plot of points', () => {
  const point = (knob: number, wireFeed: number | null, voltage: number | null) => ({ knob, wireFeed, voltage, current: null, measuredOn: null, note: null })
  it('is told in words, whatever the order of the points', () => {
    show(<PointsPlot points={[point(7, 9.6, 24.2), point(4, 6.3, 21.4)]} title="ER5356" />)
    expect(screen.getByRole('img', { name: 'ER5356: knob from 4 to 7, wire feed from 6.3 to 9.6 m/min, volts from 21.4 to 24.2 V' })).toBeDefined()
  })
  it('of one point, or of half-typed ones, is not drawn', () => {
    show(<PointsPlot points={[point(7, 9.6, null), point(NaN, 3, null)]} title="ER5356" />)
    expect(screen.getByText(/Two points or more/)).toBeDefined()
  })
})
