// @vitest-environment jsdom
import { screen, within } from '@testing-library/react'
import { describe, expect, it } from 'vitest'
import { revisionImpact } from '@shared/assessment/impact.ts'
import { sideBySide } from '@shared/assessment/side-by-side.ts'
import { standards } from '@shared/standards/index.ts'
import { interval } from '@shared/units/convert.ts'
import { ImpactTable } from '@/components/impact/ImpactTable.tsx'
import { MarginNote } from '@/components/margin/MarginNote.tsx'
import { SideBySide } from '@/components/standards/SideBySide.tsx'
import { rulePath } from '@/components/standards/words.ts'
import { findings } from '@/gallery/fixtures.ts'
import { coupon, procedure } from '../../shared/standards/builders.ts'
import { show } from '../support/render.tsx'

describe('ImpactTable', () => {
  const impact = revisionImpact({
    before: procedure(),
    after: { ...procedure({ change: (v) => { v.joint.rootOpening = interval(4, 5, 'length'); v.thickness = interval(20, 60, 'length') } }), title: 'Thicker plate' },
    standard: 'asme-ix',
    edition: '2021',
    coupons: [coupon()],
  })

  it('says what follows, and puts what needs something first', () => {
    show(<ImpactTable impact={impact} name="ASME BPVC.IX" />)
    const section = screen.getByRole('region', { name: 'What the changes mean under ASME BPVC.IX' })
    expect(section.textContent).toContain('A new qualification is needed under ASME IX: Base metal thickness.')
    expect(section.textContent).toContain('1 essential, 1 nonessential, 1 editorial')
    const rows = within(section).getAllByRole('listitem')
    expect(rows.map((row) => row.querySelector('p')?.textContent)).toEqual(['Base metal thickness', 'Title', 'Root opening'])
    expect(rows[0]?.textContent).toMatch(/before: 20 mm.*now: 20–60 mm.*Requalify · essential/)
    expect(rows[0]?.textContent).toContain('To weld: ')
    expect(rows[2]?.textContent).toContain('Revise only · nonessential')
  })

  it('links each clause to its rule, and nothing where no rule judges', () => {
    show(<ImpactTable impact={impact} name="ASME BPVC.IX" />)
    expect(screen.getAllByRole('link').map((link) => link.getAttribute('href'))).toEqual(['/standards/asme-ix#base-metal-thickness', '/standards/asme-ix#root-spacing'])
  })
})

describe('SideBySide', () => {
  it('has a row a variable and a cell a standard, each saying something', () => {
    const table = sideBySide(coupon({ thickness: 10, processes: [['SMAW', 10]] }))
    show(<SideBySide table={table} />)
    const rows = within(screen.getByRole('table')).getAllByRole('row').slice(1)
    expect(rows).toHaveLength(table.rows.length)
    for (const row of rows) {
      const cells = within(row).getAllByRole('cell')
      expect(cells).toHaveLength(standards.length)
      for (const cell of cells) expect(cell.textContent?.replace(/^[^:]*: /, '').trim()).not.toBe('')
    }
    const thickness = rows.find((row) => row.querySelector('th')?.textContent === 'Base metal thickness')
    expect(thickness?.textContent).toContain('1.5 mm to 20 mm')
    expect(within(thickness ?? document.body).getAllByRole('link')[0]?.getAttribute('href')).toBe('/standards/asme-ix#base-metal-thickness')
  })

  it('says in words where nothing can be told', () => {
    show(<SideBySide table={sideBySide(coupon({ certified: false, change: (v) => (v.thickness = null) }))} />)
    const row = screen.getByRole('rowheader', { name: 'Base metal thickness' }).closest('tr')
    expect(row?.querySelector('td')?.textContent).toContain('Cannot tell.')
    expect(screen.getByText('as it would be, once certified').tagName).toBe('DIV')
  })
})

describe('a verdict opens to its reasoning', () => {
  it('inputs, bounds, steps, source, and the rule itself', () => {
    show(<MarginNote finding={{ ...findings.outside, standard: 'asme-ix', ruleId: 'asme-ix/base-metal-thickness' }} couponNumber={() => 'PQR-009'} />)
    const reasoning = within(screen.getByRole('group'))
    expect(reasoning.getByText(/^Asked: /)).toBeDefined()
    expect(reasoning.getByText(/^Welded: /)).toBeDefined()
    expect(reasoning.getByText(/^Covered: /)).toBeDefined()
    for (const link of screen.getAllByRole('link')) expect(link.getAttribute('href')).toBe('/standards/asme-ix#base-metal-thickness')
    expect(screen.getAllByRole('link')).toHaveLength(2)
  })

  it('a finding of the record has no rule to open', () => {
    show(<MarginNote finding={{ ...findings.outside, standard: 'asme-ix', ruleId: 'assessment/contradiction' }} />)
    expect(screen.queryByRole('link')).toBeNull()
    expect(rulePath('asme-ix', 'aws-d1-1/preheat')).toBeNull()
  })
})
