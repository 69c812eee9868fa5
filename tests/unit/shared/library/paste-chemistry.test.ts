import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { pasteChemistry, printChemistry, type ElementShare } from '@shared/library/paste-chemistry.ts'
import { ELEMENTS } from '@shared/schemas/heats.ts'

const steel: ElementShare[] = [{ element: 'C', percent: 0.12 }, { element: 'Mn', percent: 1.35 }, { element: 'P', percent: 0.005, atMost: true }]

describe('a pasted chemistry', () => {
  it.each<[string, string]>([
    ['elements and figures in a run', 'C 0.12 Mn 1.35 P <0.005'],
    ['equal signs, semicolons and decimal commas', 'C=0.12; Mn=1,35; P=<0,005'],
    ['commas between and decimal commas', 'C 0,12, Mn 1,35, P < 0,005'],
    ['commas without a space between', 'C=0.12,Mn=1.35,P=<0.005'],
    ['per cent signs', 'C: 0.12 %, Mn: 1.35%, P: ≤0.005 %'],
    ['per cent signs before the figure', 'C % 0.12 Mn (%) 1.35 P [%] <0.005'],
    ['no space at all', 'C0.12 Mn1.35 P<0.005'],
    ['bare decimals and capitals', 'C .12 MN 1.35 P <.005'],
    ['names', 'Carbon 0.12, Manganese 1.35, Phosphorus <0.005'],
    ['a column', 'C\t0.12\nMn\t1.35\nP\t<0.005'],
    ['parts per million', 'C 0.12 Mn 1.35 P <50 ppm'],
    ['a head over a row, with tabs', 'C\tMn\tP\n0.12\t1.35\t<0.005'],
    ['a head over a row, with tabs and commas', 'C %\tMn %\tP %\r\n0,12\t1,35\t<0,005\r\n'],
    ['a head over a row, with spaces', ' C   Mn    P\n0.12  1.35  <0.005'],
    ['a head over a row, with spaces and per cent signs', 'C % Mn % P %\n0.12 1.35 <0.005'],
    ['a head over a row, comma-separated', 'C,Mn,P\n0.12,1.35,<0.005'],
    ['a head over a row, semicolons and decimal commas', 'C;Mn;P\n0,12;1,35;<0,005'],
    ['a table with bars', '| C | Mn | P |\n|---|---|---|\n| 0.12 | 1.35 | <0.005 |'],
    ['a table in two halves', 'C\tMn\n0.12\t1.35\nP\tS\n<0.005\t-'],
    ['cells that say nothing', 'C\tSi\tMn\tP\n0.12\t-\t1.35\t<0.005'],
  ])('reads %s', (_what, text) => {
    expect(pasteChemistry(text)).toEqual({ rows: steel, unread: [] })
  })

  it.each<[string, string, ElementShare[], { text: string; why: RegExp }[]]>([
    ['words that are no element', 'Heat K4471 C 0.12', [{ element: 'C', percent: 0.12 }], [{ text: 'Heat K 4471', why: /no element/ }]],
    ['a carbon equivalent', 'C 0.12 CEV 0.41', [{ element: 'C', percent: 0.12 }], [{ text: 'CEV 0.41', why: /“CEV” is no element/ }]],
    ['an element without a figure', 'C 0.12 Mn', [{ element: 'C', percent: 0.12 }], [{ text: 'Mn', why: /No figure stands after Mn/ }]],
    ['the balance', 'C 0.12 Fe bal.', [{ element: 'C', percent: 0.12 }], [{ text: 'Fe bal', why: /no figure for Fe/ }]],
    ['a figure without an element', '0.12 Mn 1.35', [{ element: 'Mn', percent: 1.35 }], [{ text: '0.12', why: /No element stands before/ }]],
    ['two points in a figure', 'C 0.1.2 Mn 1.35', [{ element: 'Mn', percent: 1.35 }], [{ text: 'C 0.1.2', why: /no figure for C/ }]],
    ['an element twice', 'C 0.12 C 0.14', [{ element: 'C', percent: 0.12 }], [{ text: 'C 0.14', why: /given before, as 0.12 %/ }]],
    ['a share above the whole', 'C 120', [], [{ text: 'C 120', why: /more than 100 %/ }]],
    ['a negative share', 'C -0.12', [], [{ text: 'C -0.12', why: /no figure for C/ }]],
    ['a span', 'C 0.10-0.15', [], [{ text: 'C 0.10-0.15', why: /no figure for C/ }]],
    ['a dash for nothing reported', 'C 0.12 Mn - P <0.005', steel.filter(({ element }) => element !== 'Mn'), []],
    ['a second row', 'C\tMn\n0.12\t1.35\n0.13\t1.36', steel.slice(0, 2), [{ text: '0.13\t1.36', why: /further row/ }]],
    ['limits of the specification', 'C\tMn\nmax\t0.2\t1.6\nladle\t0.12\t1.35', steel.slice(0, 2), [{ text: 'max\t0.2\t1.6', why: /limits of a specification/ }, { text: 'ladle', why: /no figure/ }]],
    ['a column that is no element', 'Heat\tC\tMn\nK4471\t0.12\t1.35', steel.slice(0, 2), [{ text: 'Heat K4471', why: /“Heat” is no element/ }]],
    ['more figures than headings', 'C,Mn\n0,12,1,35,9', [], [{ text: '0,12,1,35,9', why: /5 values under 2 headings/ }]],
    ['a word in a cell', 'C\tMn\n0.12\ttrace', steel.slice(0, 1), [{ text: 'Mn trace', why: /“trace” is no figure for Mn/ }]],
  ])('says and keeps %s', (_what, text, rows, unread) => {
    const read = pasteChemistry(text)
    expect(read.rows).toEqual(rows)
    for (const one of unread) expect(read.unread.find((left) => left.text === one.text)?.why ?? `nothing says so of ${one.text}`).toMatch(one.why)
  })

  it('of nothing is nothing', () => expect(pasteChemistry(' \n\t')).toEqual({ rows: [], unread: [] }))

  const share = fc.record({ percent: fc.integer({ min: 0, max: 100_000_000 }).map((millionths) => millionths / 1e6), atMost: fc.boolean() })
  const chemistry = fc.tuple(fc.shuffledSubarray([...ELEMENTS]), fc.array(share, { minLength: ELEMENTS.length, maxLength: ELEMENTS.length })).map(([elements, shares]) => elements.map((element, index): ElementShare => ({ element, percent: shares[index]?.percent ?? 0, ...(shares[index]?.atMost && { atMost: true }) })))

  it('is read back as it was printed, whatever it was', () => {
    fc.assert(
      fc.property(chemistry, (rows) => {
        expect(pasteChemistry(printChemistry(rows))).toEqual({ rows, unread: [] })
      }),
    )
  })

  it('is read the same from a table with either decimal sign', () => {
    fc.assert(
      fc.property(chemistry.filter((rows) => rows.length > 1), fc.constantFrom('\t', ';'), fc.constantFrom('.', ','), (rows, between, point) => {
        const cells = printChemistry(rows).split(' ').filter((_, index) => index % 2 === 1).map((cell) => cell.replace('.', point))
        expect(pasteChemistry(`${rows.map(({ element }) => element).join(between)}\n${cells.join(between)}`)).toEqual({ rows, unread: [] })
      }),
    )
  })

  it('never throws, and loses no figure without a word', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const { rows, unread } = pasteChemistry(text)
        expect(new Set(rows.map(({ element }) => element)).size).toBe(rows.length)
        expect(rows.every(({ percent }) => percent >= 0 && percent <= 100)).toBe(true)
        if (/[0-9]/.test(text)) expect(rows.length + unread.length).toBeGreaterThan(0)
      }),
    )
  })
})
