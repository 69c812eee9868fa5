// @vitest-environment jsdom
import { screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { describe, expect, it, vi } from 'vitest'
import { jointGeometry } from '@shared/calculations/joint-geometry.ts'
import { jointSchema } from '@shared/schemas/welding.ts'
import { COUPON_STATES, REVISION_STATES } from '@shared/schemas/records.ts'
import { interval } from '@shared/units/convert.ts'
import { Button } from '@/components/Button.tsx'
import { Caution, HAZARD_LIST } from '@/components/Caution.tsx'
import { heatOf } from '@shared/calculations/joint-picture.ts'
import { JointDrawing } from '@/components/joint/JointDrawing.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { Stamp, STAMP_STATES, stampWord } from '@/components/Stamp.tsx'
import { Breadcrumb, EmptyState, ErrorState, NothingFound, Progress, Skeleton } from '@/components/states.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { ProblemError } from '@/lib/problem.ts'
import { show } from '../support/render.tsx'

describe('TitleBlock and Stamp', () => {
  it('opens with the number as the page’s heading, then labelled cells', () => {
    show(<TitleBlock kind="Welding procedure specification" number="WPS-014" revision="B" title="Pulsed" cells={[{ label: 'Process', children: 'GMAW' }]} stamp={<Stamp state="draft" />} stampNote="1 finding blocks review" />)
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('WPS-014rev B')
    expect(screen.getByText('Process').nextSibling?.textContent).toBe('GMAW')
    expect(screen.getByText('Draft')).toBeDefined()
    expect(screen.getByText('1 finding blocks review')).toBeDefined()
  })
  it('has a word for every state a record can be in, and no two alike', () => {
    for (const state of [...REVISION_STATES, ...COUPON_STATES]) expect(STAMP_STATES).toContain(state)
    expect(new Set(STAMP_STATES.map(stampWord)).size).toBe(STAMP_STATES.length)
  })
})

describe('Sheet', () => {
  it('is a region named by its head, rows labelled to their inputs', () => {
    show(
      <Sheet id="metals" title="Base metals" aside="6061-T6">
        <SheetRow label="P-Number" unit="ASME IX" htmlFor="p" verdict="outside" gauge="tested 23">
          <input id="p" />
        </SheetRow>
      </Sheet>,
    )
    const sheet = within(screen.getByRole('region', { name: 'Base metals' }))
    expect(sheet.getByRole('textbox', { name: 'P-Number' })).toBeDefined()
    expect(sheet.getByText('tested 23')).toBeDefined()
  })
})

describe('Button', () => {
  it('takes no second press while pending, and stays focusable', async () => {
    const onClick = vi.fn()
    show(<Button pending onClick={onClick}>Saving</Button>)
    const button = screen.getByRole('button', { name: 'Saving' })
    await userEvent.click(button)
    expect(onClick).not.toHaveBeenCalled()
    expect(button.getAttribute('aria-busy')).toBe('true')
    expect(button.hasAttribute('disabled')).toBe(false)
  })
})

describe('states', () => {
  it('say what failed, which fields, and the request id, and try again', async () => {
    const onRetry = vi.fn()
    show(<ErrorState error={new ProblemError({ type: 'x', title: 'Not saved', status: 422, detail: 'Two fields need another look.', requestId: 'r-77', errors: [{ field: 'a', message: 'A is wrong.' }] })} onRetry={onRetry} />)
    const alert = screen.getByRole('alert')
    for (const text of ['Not saved', 'Two fields need another look.', 'A is wrong.', 'Request r-77']) expect(alert.textContent).toContain(text)
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }))
    expect(onRetry).toHaveBeenCalledTimes(1)
  })
  it('teach when empty', () => {
    show(<EmptyState title="No coupons yet" step={<Button>Open a coupon</Button>} example="One 10 mm plate">What a coupon is for.</EmptyState>)
    expect(screen.getByRole('heading', { name: 'No coupons yet' })).toBeDefined()
    expect(screen.getByText('What a coupon is for.')).toBeDefined()
    expect(screen.getByText('One 10 mm plate')).toBeDefined()
  })
  it('offer to clear filters that leave nothing', async () => {
    const clear = vi.fn()
    show(<NothingFound what="coupons" onClear={clear} />)
    await userEvent.click(screen.getByRole('button', { name: 'Clear the filters' }))
    expect(clear).toHaveBeenCalled()
  })
  it('tell the way back and the wait', () => {
    show(
      <>
        <Breadcrumb trail={[{ label: 'Procedures', to: '/procedures' }, { label: 'WPS-014' }]} />
        <Skeleton label="Reading the coupons" />
        <Progress label="Uploading" value={0.42} />
      </>,
    )
    expect(screen.getByText('WPS-014').getAttribute('aria-current')).toBe('page')
    expect(screen.getByRole('status', { name: 'Reading the coupons' })).toBeDefined()
    expect(screen.getByRole('progressbar', { name: 'Uploading' }).getAttribute('value')).toBe('0.42')
    expect(screen.getByText('42 %')).toBeDefined()
  })
  it('warn of each danger of the work', () => {
    show(<Caution />)
    expect(screen.getAllByRole('listitem')).toHaveLength(HAZARD_LIST.length)
  })
})

describe('JointDrawing', () => {
  const passes = [1, 2, 3].map((number) => ({ number: String(number), layer: null, fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }))
  const mm = (value: number) => interval(value, undefined, 'length')
  const setting = { joint: jointSchema.parse({ groove: 'single-v', includedAngle: interval(60, undefined, 'angle'), rootOpening: mm(3), rootFace: mm(0) }), thickness: mm(10), blocks: [{ id: 'a', passes }], system: 'SI' as const }

  it('numbers its passes and names its dimensions for readers', () => {
    const { container } = show(<JointDrawing geometry={jointGeometry(setting)} />)
    const label = screen.getByRole('img').getAttribute('aria-label')
    expect(label).toContain('thickness 10 mm')
    expect(label).toContain('included angle 60°')
    expect(label).toContain('3 passes.')
    expect([...container.querySelectorAll('text.font-narrow')].map(({ textContent }) => textContent)).toEqual(['1', '2', '3'])
  })
  it('says why it can’t be drawn', () => {
    show(<JointDrawing geometry={jointGeometry({ ...setting, thickness: null })} />)
    expect(screen.getByText('The joint can’t be drawn yet.')).toBeDefined()
    expect(screen.queryByRole('img')).toBeNull()
  })
  it('runs the heat tints from plum to straw', () => {
    expect([0, 1, 2, 3].map((order) => heatOf(order, 4))).toEqual([0, 1, 2, 3])
    expect([0, 1].map((order) => heatOf(order, 2))).toEqual([0, 1])
    const many = Array.from({ length: 9 }, (_, order) => heatOf(order, 9))
    expect(many).toEqual([...many].sort())
    expect([many[0], many.at(-1)]).toEqual([0, 3])
  })
})
