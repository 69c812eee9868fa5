// @vitest-environment jsdom
import { configure, screen, waitFor } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useForm, useWatch, type FieldValues } from 'react-hook-form'
import { describe, expect, it } from 'vitest'
import { baseMetalById, toBaseMetal } from '@shared/library/base-metals.ts'
import { fillerById, toFiller } from '@shared/library/filler-metals.ts'
import { ownRow } from '@shared/library/own-rows.ts'
import { ownFillerSchema, type WriteLibraryItem } from '@shared/schemas/library.ts'
import { libraryRows } from '@shared/library/library-rows.ts'
import type { BaseMetal } from '@shared/schemas/welding.ts'
import { SheetContext, type WeldContent } from '@/components/variables/context.ts'
import { FillerEditor } from '@/components/variables/FillerEditor.tsx'
import { HeatNumberEditor } from '@/components/variables/HeatNumber.tsx'
import { steelProcedure } from '../../../../fixtures/samples.ts'
import { ids, mockApi, show } from '../../support/render.tsx'

configure({ asyncUtilTimeout: 8000 })

const metal = (id: string): BaseMetal => {
  const row = baseMetalById(id)
  if (!row) throw new Error(`no ${id}`)
  return toBaseMetal(row)
}

/** A weld whose form holds what a draft's would. */
function Weld({ content, children }: { content: WeldContent; children: React.ReactNode }) {
  const { control } = useForm<FieldValues>({ defaultValues: content })
  const now = useWatch({ control }) as WeldContent
  return <SheetContext value={{ content: now, system: 'SI', control, findings: new Map(), attention: false, couponNumber: () => undefined }}>{children}</SheetContext>
}

const weldOf = (id: string, filler = 'a51-e7018'): WeldContent => {
  const { variables } = steelProcedure()
  const row = fillerById(filler)
  const [block] = variables.processes
  if (!row || !block) throw new Error('the sample has a process, the library its filler')
  return { variables: { ...variables, baseMetals: { a: metal(id), b: metal(id) }, processes: [{ ...block, filler: toFiller(row) }] } }
}
const heat = (number: string) => ({ id: number === 'K4471' ? ids.other : ids.me, kind: 'heat', number, libraryId: 'us-a516-70', grade: 'A/SA-516 70', certificate: 'MC-7', certificateType: '3.1', receivedOn: null, chemistryOf: null, chemistry: [], files: 1, updatedAt: '2026-03-01T08:00:00.000Z' })

describe('the heat number of a metal', () => {
  it('offers the recorded heats of its grade, and leads to the one that is named', async () => {
    const seen = mockApi({ 'GET /api/heats': { body: { items: [heat('K4471'), heat('K4502')], next: null, total: 2 } } })
    const { container } = show(<Weld content={weldOf('us-a516-70')}><HeatNumberEditor path="baseMetals.a.heatNumber" label="Heat number, A" max={60} /></Weld>)
    await waitFor(() => expect([...container.querySelectorAll('datalist option')].map((option) => option.getAttribute('value'))).toEqual(['K4471', 'K4502']))
    expect(seen[0]?.search).toContain('libraryId=us-a516-70')
    expect(seen[0]?.search).toContain('kind=heat')
    await userEvent.type(screen.getByLabelText('Heat number, A'), 'K4471')
    expect((await screen.findByRole('link', { name: 'Recorded, certificate MC-7' })).getAttribute('href')).toBe(`/library/heats/${ids.other}`)
    await userEvent.type(screen.getByLabelText('Heat number, A'), 'X')
    expect(screen.queryByRole('link')).toBeNull()
  })

  it('asks for nothing where the metal is not from the library', () => {
    const seen = mockApi({})
    const content = weldOf('us-a516-70')
    content.variables.baseMetals.a = { ...content.variables.baseMetals.a, libraryId: null }
    show(<Weld content={content}><HeatNumberEditor path="baseMetals.a.heatNumber" label="Heat number, A" max={60} /></Weld>)
    expect(seen).toEqual([])
  })

  it('is a lot of its classification for a filler', async () => {
    const seen = mockApi({ 'GET /api/heats': { body: { items: [], next: null, total: 0 } } })
    show(<Weld content={weldOf('us-a516-70')}><HeatNumberEditor path="processes.0.filler.lot" label="Lot" max={60} /></Weld>)
    await waitFor(() => expect(seen[0]?.search).toMatch(/kind=lot.*libraryId=a51-e7018/))
  })
})

describe('the filler of a draft', () => {
  it('carries folded advice that follows the metals and the filler', async () => {
    const er5356 = libraryRows().find(({ key }) => key === 'a510-er5356')
    if (!er5356) throw new Error('the reference has ER5356')
    mockApi({ 'GET /api/library/filler-metals': { body: { items: [{ ...er5356, id: ids.other, origin: 'own', version: 1 }], next: null, total: 1 } } })
    show(<Weld content={weldOf('us-b209-5083-o', 'a510-er4043')}><FillerEditor path="processes.0.filler" label="Filler metal" process="GMAW" /></Weld>)
    expect(screen.getByText(/^Something speaks against it; \d things to mind$/)).toBeDefined()
    expect(screen.getByText(/4043 is not for .*5083/)).toBeDefined()
    expect(screen.getByText(/Never one setting for ER4043 and ER5356/)).toBeDefined()
    const box = screen.getByRole('combobox', { name: 'Filler metal' })
    await userEvent.clear(box)
    await userEvent.type(box, 'ER5356')
    const option = await screen.findByRole('option', { name: /ER5356/ })
    expect(option.textContent).toContain('our own')
    await userEvent.click(option)
    expect(await screen.findByText(/^Suits the metals, as far as is said here/)).toBeDefined()
    await userEvent.click(screen.getByLabelText('No filler (autogenous)'))
    expect(screen.queryByText(/Never one setting/)).toBeNull()
  })

  it('reads strength and composition of the organization’s own rows', async () => {
    const written: WriteLibraryItem = { kind: 'filler-metals', content: ownFillerSchema.parse({ spec: 'LF wire', classification: 'LFW-90', f_no: 6, min_tensile_mpa: 620, nominal_composition: 'Mn-1Ni-Mo', iso_9606_filler_group: 'FM2', processes: ['GMAW'], source: 'Maker' }) }
    const row = ownRow(written)
    mockApi({ 'GET /api/library/filler-metals': { body: { items: [{ ...row, id: ids.other, origin: 'own', version: 1 }], next: null, total: 1 } } })
    const content = weldOf('us-a572-60')
    const [block] = content.variables.processes
    if (!block) throw new Error('the sample has a process')
    block.filler = toFiller(row.content)
    show(<Weld content={content}><FillerEditor path="processes.0.filler" label="Filler metal" process="GMAW" /></Weld>)
    expect(await screen.findByText(/Weld metal of at least 620 MPa on metal of at least 520 MPa: matching/)).toBeDefined()
  })
})
