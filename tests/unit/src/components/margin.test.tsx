// @vitest-environment jsdom
import { screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import fc from 'fast-check'
import { describe, expect, it, vi } from 'vitest'
import { stackNotes } from '@/components/margin/layout.ts'
import { Margin } from '@/components/margin/Margin.tsx'
import { MarginLayout } from '@/components/margin/MarginLayout.tsx'
import { MarginNote } from '@/components/margin/MarginNote.tsx'
import { SectionNav } from '@/components/SectionNav.tsx'
import { VerdictTally, worstVerdict } from '@/components/Verdict.tsx'
import { findings } from '@/gallery/fixtures.ts'
import { show } from '../support/render.tsx'

describe('MarginNote', () => {
  it('says verdict, class, sentence and clause, and offers the fixes', async () => {
    const onFix = vi.fn()
    show(<MarginNote finding={findings.outside} onFix={onFix} couponNumber={() => 'PQR-009'} />)
    const note = screen.getByRole('article', { name: 'Outside: Thickness, groove' })
    expect(note.textContent).toContain('Outside · essential')
    expect(note.textContent).toContain('QW-451.1')
    expect(note.textContent).toContain('25 mm is above the 20 mm')
    await userEvent.click(screen.getByRole('button', { name: 'Set to 20 mm' }))
    expect(onFix).toHaveBeenCalledWith(findings.outside.fixes[0], findings.outside)
  })
  it('opens to how it was reached, with bounds, coupon and basis', () => {
    show(<MarginNote finding={findings.outside} couponNumber={() => 'PQR-009'} />)
    const reasoning = within(screen.getByRole('group'))
    expect(reasoning.getByText('Covered: 5 to 20 mm.')).toBeDefined()
    expect(reasoning.getByText('Decided by PQR-009.')).toBeDefined()
    expect(reasoning.getAllByRole('listitem')).toHaveLength(3)
    expect(reasoning.getByText(/secondary source/)).toBeDefined()
  })
  it('names what is missing and warns of figures from memory without being opened', () => {
    show(<MarginNote finding={findings.cannotTell} />)
    const note = screen.getByRole('article')
    expect(note.textContent).toContain('Cannot tell · supplementary essential')
    expect(note.textContent).toContain('Missing: travel speed of passes 2 to 4 on PQR-009.')
    expect(screen.getAllByText('From memory: confirm in your edition.').length).toBeGreaterThan(0)
  })
  it('offers no fixes to those who cannot use them', () => {
    show(<MarginNote finding={findings.outside} />)
    expect(screen.queryByRole('button')).toBeNull()
  })
  it('has a shape of its own for each verdict', () => {
    const shape = (key: keyof typeof findings) => {
      const { container, unmount } = show(<MarginNote finding={findings[key]} />)
      const name = container.querySelector('article svg')?.firstElementChild?.tagName
      unmount()
      return name
    }
    expect([shape('within'), shape('outside'), shape('cannotTell')]).toEqual(['rect', 'path', 'circle'])
  })
})

describe('Margin', () => {
  it('puts the worst first and folds several that stand within', async () => {
    show(<Margin findings={[findings.within, findings.cannotTell, findings.withinToo, findings.outside]} />)
    expect(screen.getAllByRole('article').map((note) => note.getAttribute('aria-label'))).toEqual(['Outside: Thickness, groove', 'Cannot tell: Heat input'])
    await userEvent.click(screen.getByRole('button', { name: /2 variables/ }))
    expect(screen.getAllByRole('article')).toHaveLength(4)
  })
  it('draws nothing without findings', () => {
    const { container } = show(<Margin findings={[]} />)
    expect(container.querySelector('[data-margin]')).toBeNull()
  })
  it('keeps its notes in the reading order of their rows', () => {
    show(
      <MarginLayout nav={<SectionNav sections={[{ id: 'a', label: 'Base metals', verdict: 'outside' }]} />} head={<VerdictTally counts={{ within: 3, outside: 1, cannotTell: 0 }} />}>
        <p>row</p>
        <Margin findings={[findings.outside]} />
        <p>next row</p>
      </MarginLayout>,
    )
    const note = screen.getByRole('article')
    expect(screen.getByText('row').compareDocumentPosition(note) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy()
    expect(note.compareDocumentPosition(screen.getByText('next row')) & Node.DOCUMENT_POSITION_FOLLOWING).toBeTruthy()
    expect(screen.getByRole('status').getAttribute('aria-label')).toBe('1 outside, 0 cannot tell, 3 within')
    expect(screen.getByRole('link', { name: /Base metals/ }).querySelector('[aria-label="Outside"]')).not.toBeNull()
  })
})

describe('stackNotes', () => {
  it('keeps a note at its anchor where there is room and pushes it down where not', () => {
    expect(stackNotes([{ anchor: 100, height: 50 }, { anchor: 120, height: 30 }, { anchor: 400, height: 10 }], 0, 8)).toEqual({ tops: [100, 158, 400], bottom: 410 })
  })
  it('never overlaps, never starts above its anchor or the head', () => {
    fc.assert(
      fc.property(fc.array(fc.record({ anchor: fc.integer({ min: 0, max: 2000 }), height: fc.integer({ min: 1, max: 300 }) }), { maxLength: 20 }), fc.integer({ min: 0, max: 200 }), (notes, from) => {
        const { tops, bottom } = stackNotes(notes, from, 8)
        const boxes = notes.map((note, index) => ({ top: tops[index] ?? 0, end: (tops[index] ?? 0) + note.height })).sort((a, b) => a.top - b.top)
        notes.forEach((note, index) => expect(tops[index]).toBeGreaterThanOrEqual(Math.max(note.anchor, from)))
        boxes.forEach((box, index) => index > 0 && expect(box.top).toBeGreaterThanOrEqual((boxes[index - 1]?.end ?? 0) + 8))
        if (boxes.length > 0) expect(bottom).toBe(Math.max(...boxes.map(({ end }) => end)))
      }),
    )
  })
})

describe('worstVerdict', () => {
  it('is outside, then cannot tell, then within', () => {
    expect(worstVerdict(['within', 'cannot-tell', 'outside'])).toBe('outside')
    expect(worstVerdict(['within', 'cannot-tell'])).toBe('cannot-tell')
    expect(worstVerdict([])).toBeNull()
  })
})
