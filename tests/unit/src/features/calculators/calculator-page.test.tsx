// @vitest-environment jsdom
import { configure, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { beforeAll, describe, expect, it, vi } from 'vitest'
import { calculators } from '../../../../../shared/calculations/catalogue.ts'
import { routes } from '../../../../../src/features/calculators/routes.tsx'
import { session, showRoutes } from '../../support/render.tsx'

// What a busy machine may take.
configure({ asyncUtilTimeout: 15_000 })
vi.setConfig({ testTimeout: 60_000 })

// A page is a chunk of its own; the first reading of it takes longer than a test waits.
beforeAll(() => Promise.all([import('../../../../../src/features/calculators/pages/CalculatorPage.tsx'), import('../../../../../src/features/calculators/pages/CalculatorsPage.tsx')]))

const open = async (path: string, as = session()) => {
  const shown = showRoutes(routes, { path, as })
  await screen.findByRole('heading', { level: 1 })
  return shown
}
/** The result stands twice in the page, beside the inputs and under them; a style sheet shows one. */
const results = () => screen.getAllByRole('region', { name: 'Result' }).map((region) => region.textContent ?? '')
const box = (name: string | RegExp) => screen.getByRole('textbox', { name })

describe('every calculator', () => {
  it.each(calculators.map(({ id, title }) => [id, title] as const))('%s opens with its worked example, and nothing in it is no number', async (id, title) => {
    await open(`/calculators/${id}`)
    expect(screen.getByRole('heading', { level: 1, name: title })).toBeTruthy()
    const page = screen.getByRole('article').textContent ?? ''
    expect(page).not.toMatch(/NaN|Infinity|undefined|null/)
    expect(results()[0]).not.toContain('No result yet')
    expect(screen.queryByText('To be put right')).toBeNull()
    expect(screen.getByRole('region', { name: 'Worked example' }).textContent).toMatch(/\d/)
  })
})

describe('typing', () => {
  it('calculates at each key and keeps the address in step without adding to the history', async () => {
    const user = userEvent.setup()
    const { router } = await open('/calculators/heat-input-meter?v=24&i=180&s=250')
    expect(results()[0]).toContain('1.04 kJ/mm')
    await user.clear(box('Travel speed'))
    expect(results()[0]).toContain('Still wanted: Travel speed')
    await user.type(box('Travel speed'), '10 in/min')
    expect(results()[0]).toContain('1.02 kJ/mm')
    expect(screen.getByText('= 254 mm/min')).toBeTruthy()
    await waitFor(() => expect(router.state.location.search).toBe('?v=24&i=180&s=10+in%2Fmin'))
    expect(router.state.historyAction).toBe('REPLACE')
    expect((box('Travel speed') as HTMLInputElement).value).toBe('10 in/min')
  })

  it('names the field of a figure that can’t be read, and keeps what was typed', async () => {
    const user = userEvent.setup()
    await open('/calculators/heat-input-meter?v=24&i=180&s=250')
    await user.clear(box('Voltage'))
    await user.type(box('Voltage'), '18-22')
    await user.tab()
    expect(await screen.findByText(/^Voltage: "18-22" holds more than one number/)).toBeTruthy()
    expect((box('Voltage') as HTMLInputElement).value).toBe('18-22')
    expect(box('Voltage').getAttribute('aria-invalid')).toBe('true')
    expect(results()[0]).toContain('To be put right: Voltage')
  })

  it('reads a bare figure in the person’s own units', async () => {
    const user = userEvent.setup()
    const { router } = await open('/calculators/heat-input-meter?v=24&i=180', session(undefined, { unitSystem: 'US' }))
    await user.type(box('Travel speed'), '10')
    expect(results()[0]).toContain('25.9 kJ/in')
    await waitFor(() => expect(router.state.location.search).toContain('s=10+in%2Fmin'))
    expect((box('Travel speed') as HTMLInputElement).value).toBe('10')
  })

  it('says loudly when the figures lie outside the validity', async () => {
    await open('/calculators/preheat-method-b?cet=0.6&t=30&hd=5&q=1.5&ta=20')
    const [said] = screen.getAllByRole('note', { name: 'Outside its validity' })
    expect(said?.textContent).toMatch(/CET of 0\.6.* is outside the range/)
  })

  it('refuses a composition above the whole at the element', async () => {
    const user = userEvent.setup()
    await open('/calculators/carbon-equivalents')
    const manganese = box('Manganese, %')
    await user.clear(manganese)
    await user.type(manganese, '104')
    await user.tab()
    expect((await screen.findAllByText(/^Manganese must be at most 100 %/)).length).toBeGreaterThan(0)
    expect((manganese as HTMLInputElement).value).toBe('104')
  })

  it('asks for a composition that is empty, rather than count it as nothing', async () => {
    await open('/calculators/carbon-equivalents?c=')
    expect(results()[0]).toContain('The composition is not given.')
    expect(results()[0]).not.toMatch(/\d/)
  })

  it('lets base metal B be left out', async () => {
    await open('/calculators/ferrite-dilution?d=30&sa=50&aCr=18&aNi=9&aC=0.05&fCr=20&fNi=10&fC=0.02')
    expect(results()[0]).toMatch(/FN|below/)
    expect(screen.getByRole('rowheader', { name: 'Base metal A' })).toBeTruthy()
    expect(screen.queryByRole('rowheader', { name: 'Base metal B' })).toBeNull()
  })

  it('fills in the example again', async () => {
    const user = userEvent.setup()
    await open('/calculators/heat-input-meter?v=99&i=180&s=250')
    const [fill] = screen.getAllByRole('button', { name: 'Fill in the example' })
    if (fill) await user.click(fill)
    expect((box('Voltage') as HTMLInputElement).value).toBe('24')
  })

  it('copies a link that carries the figures', async () => {
    const user = userEvent.setup()
    const write = vi.spyOn(navigator.clipboard, 'writeText').mockResolvedValue()
    await open('/calculators/heat-input-meter?v=24&i=180&s=250')
    await user.clear(box('Voltage'))
    await user.type(box('Voltage'), '26')
    await user.click(screen.getByRole('button', { name: 'Copy link' }))
    expect(write).toHaveBeenCalledWith(expect.stringContaining('/calculators/heat-input-meter?v=26&i=180&s=250'))
  })

  it('follows an address that comes from elsewhere', async () => {
    const { router } = await open('/calculators/heat-input-meter?v=24&i=180&s=250')
    await router.navigate('/calculators/heat-input-meter?v=30&i=180&s=250')
    await waitFor(() => expect((box('Voltage') as HTMLInputElement).value).toBe('30'))
  })
})

describe('source', () => {
  it('says plainly that a figure is from memory', async () => {
    await open('/calculators/preheat-seferian')
    expect(screen.getByText('From memory: confirm in your edition.')).toBeTruthy()
  })
  it('labels an estimate', async () => {
    await open('/calculators/haz-hardness-yurioka')
    expect(screen.getAllByText(/^Advisory: an estimate/).length).toBeGreaterThan(0)
  })
})

describe('the list', () => {
  it('finds what people call it', async () => {
    const user = userEvent.setup()
    await open('/calculators')
    expect(screen.getAllByRole('link').length).toBeGreaterThanOrEqual(calculators.length)
    await user.type(screen.getByRole('searchbox'), 't8/5')
    const found = await screen.findByRole('region', { name: 'Found' })
    expect(within(found).getAllByRole('link')[0]?.textContent).toContain('Cooling time t8/5')
  })
  it('says so when there is none, with a way back', async () => {
    const user = userEvent.setup()
    await open('/calculators?q=zzz')
    await user.click(screen.getByRole('button', { name: 'Clear the filters' }))
    expect(screen.getAllByRole('link').length).toBeGreaterThanOrEqual(calculators.length)
  })
  it('answers an address that names no calculator', async () => {
    await open('/calculators/guess-work')
    expect(screen.getByRole('link', { name: 'All calculators' })).toBeTruthy()
  })
})
