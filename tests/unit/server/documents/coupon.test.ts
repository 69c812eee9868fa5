import sharp from 'sharp'
import { describe, expect, it, vi } from 'vitest'
import { renderCoupon, type CouponDocument } from '../../../../server/documents/coupon.ts'
import { aluminiumCoupon, couponDocument, stainlessCoupon, steelCoupon, steelQualification } from '../../../fixtures/samples.ts'
import { boxesOf, infoOf, pagesOf, wordsOf } from './read.ts'
import { qualifyCoupon } from '../../../../shared/assessment/assess.ts'
import { frameD11Coupon, skidIsoCoupon } from '../../../../server/demo/content/codes.ts'

vi.setConfig({ testTimeout: 120_000 })
const render = (given: Partial<CouponDocument> = {}) => renderCoupon(couponDocument(given))
let whole: Promise<Buffer> | undefined
/** The sample as it stands, drawn once. */
const sample = () => (whole ??= render())

describe('a coupon as PDF', () => {
  it('is headed as a record of what was welded, on every page', async () => {
    const pages = pagesOf(await sample())
    pages.forEach((page, index) => {
      for (const text of ['PROCEDURE QUALIFICATION RECORD', 'PQR-009', 'CERTIFIED', 'WPS-014 rev A', 'on 6 Oct 2026', 'certified 20 Nov 2026', 'PQR-009 · certified']) expect(page).toContain(text)
      expect(page).toContain(`Page ${index + 1} of ${pages.length}`)
    })
  })

  it('prints welder, heats, readings, computed heat input, results as judged, and ranges', async () => {
    const text = wordsOf(await sample())
    for (const part of [
      'Anselm Petrović, stamp L7', 'H48812', 'EN 10204 3.1, no. 77120', 'LTH-26-0412', 'keyhole held throughout',
      '526 MPa is not below 485 MPa.', '525.7 MPa', 'Not accepted. 469 MPa is below 485 MPa and it broke in the weld.', '1.5, 4 at a corner', 'heat-affected zone', '88, 94, 71', '221, 234, 229, 218, 240', '240', 'The construction code sets the energy; it is not named here.',
      'One more face bend is needed. (QW-451.1)', 'four side bends', 'RANGE OF QUALIFICATION', 'qualified: 5 to 20 mm', 'A coupon of 10 mm qualifies from 5 mm to 2T, 20 mm.', 'Position is not essential without toughness.', 'any',
      'states that this record is a true account', 'The coupon was prepared, welded and tested as this record says.',
    ]) expect(text).toContain(part)
  })

  it('computes heat input and travel speed from the readings: 92 A, 22 V, 300 mm in 190 s give 1.28 kJ/mm', async () => {
    const row = pagesOf(await sample()).join('\n').split('\n').find((line) => /^ *1 root SMAW/.test(line))
    expect(22 * 92 * 190 / 300 / 1000).toBeCloseTo(1.282, 3)
    expect(row).toContain('88–92 21–22 95 300 190 20 1.17–1.28')
  })

  it('does not guess heat input where the waveform is controlled and no energy was read', async () => {
    const content = aluminiumCoupon()
    const without = { ...content, runSheet: content.runSheet.map((row) => ({ ...row, instantaneousEnergy: null })) }
    expect(wordsOf(await render({ content, qualifications: [], units: 'US' }))).toContain('11.5')
    const text = wordsOf(await render({ content: without, qualifications: [], units: 'US' }))
    expect(text).toContain('cannot tell')
    expect(text).toContain('instantaneous energy from the power source')
  })

  it('repeats the head of a long run sheet and loses no row', async () => {
    const pages = pagesOf(await render({ content: steelCoupon(60) }))
    const withRows = pages.filter((page) => /^ *\d+ (root|hot|fill|cap) (SMAW|GMAW) /m.test(page))
    expect(withRows.length).toBeGreaterThan(1)
    for (const page of withRows) expect(page).toMatch(/PASS LAYER PROCESS/)
    const numbers = pages.flatMap((page) => [...page.matchAll(/^ *(\d+) (?:root|hot|fill|cap) (?:SMAW|GMAW) /gm)].map((match) => Number(match[1])))
    expect(numbers).toEqual(Array.from({ length: 60 }, (_, index) => index + 1))
  })

  it('judges a result under each standard by name', async () => {
    const second = { ...steelQualification(), standard: 'aws-d1-1' as const, edition: '2020', results: steelQualification().results.map((result) => ({ ...result, clause: 'Clause 6' })) }
    const text = wordsOf(await render({ qualifications: [steelQualification(), second] }))
    expect(text).toContain('ASME BPVC.IX: not accepted.')
    expect(text).toContain('AWS D1.1: not accepted.')
    expect(text).toContain('RANGE OF QUALIFICATION · AWS D1.1 · 2020')
  })

  it('lays photographs out with caption, tag and fingerprint, and survives one that can\'t be read', async () => {
    const jpeg = await sharp({ create: { width: 640, height: 480, channels: 3, background: '#7a8894' } }).jpeg().toBuffer()
    const photos = [{ caption: 'Root side after cleaning', tag: 'root', jpeg, sha256: 'a'.repeat(64) }, { caption: 'Face bend FB1', tag: 'bend', jpeg, sha256: 'b'.repeat(64) }, { caption: 'Damaged file', tag: 'macro', jpeg: Buffer.from('not a picture'), sha256: 'c'.repeat(64) }]
    const pdf = await render({ photos })
    const text = wordsOf(pdf)
    for (const part of ['PHOTOGRAPHS', 'Root side after cleaning', `SHA-256 ${'b'.repeat(64)}`, 'This picture could not be read.']) expect(text).toContain(part)
    expect(pdf.toString('latin1').match(/\/Subtype \/Image/g)).toHaveLength(2)
    expect(pdf.length).toBeGreaterThan((await sample()).length)
  })

  it('prints what the application asks, the visual examination and every non-destructive test', async () => {
    const content = skidIsoCoupon()
    const qualifications = content.variables.standards.map(({ standard, edition, level }) => qualifyCoupon({ id: 'c', number: 'PQR-011', certified: true, content }, standard, edition, level))
    const text = wordsOf(await render({ content, qualifications }))
    for (const part of ['WHAT THE APPLICATION ASKS', '27 J at -20 °C', 'level 2', 'Non-destructive testing', 'VT, visual', 'RT, radiography', 'WML-26-0518-R', '266 HV10', '74, 81, 69', 'Post-heating', 'arc energy', 'Impact values specified']) expect(text).toContain(part)
    const frame = frameD11Coupon()
    const seen = wordsOf(await render({ content: frame, qualifications: [qualifyCoupon({ id: 'c', number: 'PQR-009', certified: true, content: frame }, 'aws-d1-1', '2020', null)] }))
    for (const part of ['Visual examination', 'Cracks: no; craters full: yes; root sound: yes', 'undercut: 0.3 mm', 'Visual examination is accepted. (6.10.1)', 'UT, ultrasonics']) expect(seen).toContain(part)
  })

  it('says that an open coupon supports nothing', async () => {
    const text = wordsOf(await render({ content: stainlessCoupon(), state: 'welding', signatures: [], qualifications: [] }))
    for (const part of ['WELDING', 'supports no procedure yet', 'This record is not certified.', 'No test results recorded', 'Not signed', 'Łukasz Őrsi', 'not certified']) expect(text).toContain(part)
    expect(text).not.toContain('states that this record is a true account')
  })

  it.each(['A4', 'Letter'] as const)('keeps every word on %s inside the frame, in both units', async (paper) => {
    for (const page of boxesOf(await render({ paper, units: 'both', content: steelCoupon(60) }))) for (const word of page.words) {
      expect(word.xMin, word.text).toBeGreaterThanOrEqual(24)
      expect(word.xMax, word.text).toBeLessThanOrEqual(page.width - 24)
      expect(word.yMax, word.text).toBeLessThanOrEqual(page.height - 24)
    }
  })

  it('is titled and gives the same bytes for the same record', async () => {
    const [first, second] = [await sample(), await render()]
    expect(first.equals(second)).toBe(true)
    expect(infoOf(first)).toMatch(/Title: +PQR-009: 10 mm plate, 3G/)
  })
})
