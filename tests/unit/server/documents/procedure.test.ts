import { describe, expect, it, vi } from 'vitest'
import { interval } from '@shared/units/convert.ts'
import { GROOVE_TYPES, procedureContentSchema } from '@shared/schemas/welding.ts'
import { renderProcedure, type ProcedureDocument } from '../../../../server/documents/procedure.ts'
import { aluminiumProcedure, procedureDocument, stainlessProcedure, steelAssessment, steelProcedure } from '../../../fixtures/samples.ts'
import { boxesOf, infoOf, pagesOf, wordsOf } from './read.ts'

vi.setConfig({ testTimeout: 120_000 })
const render = (given: Partial<ProcedureDocument> = {}) => renderProcedure(procedureDocument(given))
let whole: Promise<Buffer> | undefined
/** The sample as it stands, drawn once. */
const sample = () => (whole ??= render())

describe('a procedure as PDF', () => {
  it('carries the title block, the footer and the page count on every page', async () => {
    const pages = pagesOf(await sample())
    expect(pages.length).toBeGreaterThan(2)
    pages.forEach((page, index) => {
      for (const text of ['Larkfield Fabrication', 'WELDING PROCEDURE SPECIFICATION', 'WPS-014', 'rev B', 'APPROVED', 'SMAW, manual', 'ASME BPVC.IX · 2021', 'PQR-009,', 'PQR-011', 'Ilse Brandt', 'approved 20 Nov 2026', 'WPS-014 rev B · approved']) expect(page, `page ${index + 1}`).toContain(text)
      expect(page).toContain(`Page ${index + 1} of ${pages.length}`)
      expect(page).toContain('A printed copy is not kept up to date')
      expect(page).toContain('electric shock can injure or kill')
    })
  })

  it('prints the variables of each process, the findings with figures and clause, and who signed what', async () => {
    const text = wordsOf(await sample())
    for (const part of [
      'SA-516 Gr. 70', 'P-1 · group 2', 'SFA-5.1 E7018', 'ER70S-6', '82 % Ar + 18 % CO2', '14–18 L/min', '55–65°', '0–1.5 mm', '180–240', 'uphill', '16 °C', '250 °C', 'weave at most 3 electrode diameters',
      '25 mm is above the 20 mm that the 10 mm coupon PQR-009 qualifies.', 'QW-451.1', 'Missing: deposited thickness of GMAW on PQR-009.', 'memory: confirm in your edition', 'qualified: 5 to 20 mm', 'qualified: -35 °C and over', 'cannot be told', '25 outside', 'welded 10',
      'Approved with open findings. Reason recorded by the approver:', 'joints above 20 mm are on hold',
      'Maren Oduya, supervisor', 'signed 20 Nov 2026, 14:05:09 UTC', 'I have read this revision and its findings and release it for production.', 'SHA-256 of the content signed: 5d41402abc4b2a76b9719d911017c592ae3b6b2e9f6a1c0d7b8e4f5a6b7c8d9e',
      'https://sidebend.larkfield.example/check/WPS-014-B', '1 outside · 1 cannot tell · 8 within',
    ]) expect(text).toContain(part)
  })

  it('leaves no finding out: every sentence is printed, and a range without a row of its own gets one', async () => {
    const assessment = steelAssessment()
    const extra = { ...assessment.findings[0]!, field: 'processes.1.technique.somethingNew', title: 'Weave width', sentence: 'The weave of 12 mm is above 10 mm.' }
    const text = wordsOf(await render({ assessments: [{ ...assessment, findings: [...assessment.findings, extra] }] }))
    for (const finding of [...assessment.findings, extra]) expect(text).toContain(finding.sentence)
    expect(text).toContain('FURTHER RANGES')
  })

  it('says once what holds for every process, and names the processes where they differ', async () => {
    const assessment = steelAssessment()
    const pwht = assessment.findings.find((finding) => finding.title === 'PWHT')!
    const thickness = assessment.findings[0]!
    const twice = { ...assessment, findings: [...['root', 'fill'].map((processId) => ({ ...pwht, processId })), { ...thickness, processId: 'root' }, { ...thickness, processId: 'fill', clause: 'QW-403.10' }] }
    const text = wordsOf(await render({ assessments: [twice] }))
    expect(text.split('None was done and none is asked for.')).toHaveLength(2)
    expect(text).toContain('PWHT · SMAW, GMAW')
    expect(text).toContain('SMAW · QW-451.1')
    expect(text).toContain('GMAW · QW-403.10')
  })

  it('names what is missing in words, not by its place in the record', async () => {
    const assessment = steelAssessment()
    const findings = [{ ...assessment.findings[4]!, missing: ['procedure: processes.1.backingGas', 'PQR-009: technique.initialCleaning'] }]
    const text = wordsOf(await render({ assessments: [{ ...assessment, findings }] }))
    for (const part of ['Missing: procedure: backing gas;', 'technique, initial cleaning.']) expect(text).toContain(part)
    expect(text).not.toContain('processes.1')
  })

  it('says that a signature was made over other content', async () => {
    expect(wordsOf(await render({ contentSha256: 'f'.repeat(64) }))).toContain('(differs from the content printed here)')
    expect(wordsOf(await sample())).not.toContain('differs from the content')
  })

  it('warns on a draft: not judged, not signed, no approval, no deviation', async () => {
    const text = wordsOf(await render({ state: 'draft', assessments: [], signatures: [], deviationReason: null, verifyUrl: null }))
    for (const part of ['DRAFT', 'not for production', 'Not judged', 'Not signed', 'not approved']) expect(text).toContain(part)
    for (const part of ['Approved with open findings', 'approved 20 Nov']) expect(text).not.toContain(part)
  })

  it('writes figures in SI, in US units or in both, the record\'s own first', async () => {
    const content = aluminiumProcedure()
    const given = { content, assessments: [], number: 'WPS-021', coupons: [], signatures: [], deviationReason: null }
    const [si, us, both] = [wordsOf(await render({ ...given, units: 'SI' })), wordsOf(await render({ ...given, units: 'US' })), wordsOf(await render({ ...given, units: 'both' }))]
    expect(si).toContain('7.6–9.4 m/min')
    expect(si).not.toContain('in/min (')
    expect(us).toContain('300–370 in/min')
    expect(us).toContain('3/16 to 1 in')
    expect(us).not.toMatch(/\d mm\b/)
    expect(both).toContain('300–370 in/min (7.6–9.4 m/min)')
    expect(both).toContain('60 °F (16 °C)')
    for (const text of [si, us, both]) expect(text).toContain('ER5356')
    expect(us).toContain('The panel shows the set wire feed, not the measured one.')
  })

  it.each(['A4', 'Letter'] as const)('keeps every word on %s inside the frame', async (paper) => {
    const pdf = await render({ paper, units: 'both', content: stainlessProcedure() })
    const pages = boxesOf(pdf)
    expect(pages[0]?.width).toBeCloseTo(paper === 'A4' ? 595.28 : 612, 1)
    for (const page of pages) for (const word of page.words) {
      expect(word.xMin, word.text).toBeGreaterThanOrEqual(24)
      expect(word.xMax, word.text).toBeLessThanOrEqual(page.width - 24)
      expect(word.yMax, word.text).toBeLessThanOrEqual(page.height - 24)
    }
  })

  it('wraps long names and numbers instead of cutting them', async () => {
    const author = 'Wilhelmina Oyelaran-Featherstonehaugh of the Northern Pressure Equipment Department'
    const content = { ...steelProcedure(), title: `Groove weld ${'of plate with a very long description '.repeat(4)}`.trim() }
    const pdf = await render({ author, content, number: 'WPS-NORTH-PRESSURE-000123', signatures: [] })
    const text = wordsOf(pdf)
    expect(text.replace(/[- ]/g, '')).toContain(author.replace(/[- ]/g, ''))
    expect(text).toContain('WPS-NORTH-PRESSURE-000123 rev B · approved')
    for (const page of boxesOf(pdf)) for (const word of page.words) expect(word.xMax).toBeLessThanOrEqual(page.width - 24)
  })

  it('sets names in other letters and puts signs that the faces lack into words', async () => {
    const content = { ...steelProcedure(), notes: 'Łukasz Őrsi, Ελένη, Ирина: t ≤ 3 mm, R ≥ 2 Ω, µm ² ³ × ° 漢' }
    expect(wordsOf(await render({ content }))).toContain('Łukasz Őrsi, Ελένη, Ирина: t at most 3 mm, R at least 2 ohm, µm ² ³ × ° ?')
  })

  it('is tagged, titled, bookmarked, and draws the joint with words for those who can\'t see it', async () => {
    const pdf = await sample()
    const info = infoOf(pdf)
    expect(info).toMatch(/Title: +WPS-014 rev B: Groove weld, carbon steel plate/)
    expect(info).toMatch(/Tagged: +yes/)
    const structure = infoOf(pdf, '-struct-text')
    for (const part of ['Sect "Joint"', 'Sect "Base metals"', 'Table', 'TH', 'Figure', 'LBody']) expect(structure).toContain(part)
    for (const entry of ['/Lang (en)', ...['Joint', 'Base metals', 'Pass table', 'Findings', 'Signatures'].map((title) => `/Title (${title})`)]) expect(pdf.includes(entry), entry).toBe(true)
    // Words beyond ASCII are stored as UTF-16, high byte first.
    const stored = (text: string) => pdf.includes(text) || pdf.includes(Buffer.from(text, 'utf16le').swap16())
    for (const words of ['Range gauge, Thickness, groove: qualified', 'Cross-section of the joint: single-V, groove, butt joint.']) expect(stored(words), words).toBe(true)
  })

  it('says why a joint is not drawn', async () => {
    const content = steelProcedure()
    const blind = { ...content, variables: { ...content.variables, joint: { ...content.variables.joint, includedAngle: null } } }
    expect(wordsOf(await render({ content: blind }))).toContain('Not drawn: The included angle is not given.')
  })

  it('prints a draft with almost nothing in it, and says what is not stated', async () => {
    const content = procedureContentSchema.parse({ title: 'Started', variables: { standards: [{ standard: 'iso-15614-2', edition: '2005' }], processes: [{ id: 'one' }] } })
    const text = wordsOf(await render({ content, state: 'draft', coupons: [], assessments: [], signatures: [], deviationReason: null }))
    for (const part of ['process not stated', 'not stated to not stated', 'none linked', 'ISO 15614-2 · 2005', 'Not drawn: The groove type is not given.']) expect(text).toContain(part)
  })

  it.each(GROOVE_TYPES)('draws a %s groove, or says why not', async (groove) => {
    const content = steelProcedure()
    const joint = { ...content.variables.joint, groove, bevelAngle: interval(30, 30, 'angle'), rootRadius: interval(6, 6, 'length'), rootFace: interval(1, 1, 'length') }
    const pdf = await render({ content: { ...content, variables: { ...content.variables, joint, thickness: interval(25, 25, 'length') } }, assessments: [] })
    const text = wordsOf(pdf)
    expect(text.includes('Section drawn to scale') || text.includes('Not drawn:')).toBe(true)
    for (const word of boxesOf(pdf)[0]?.words ?? []) expect(word.xMax, word.text).toBeLessThanOrEqual(595 - 24)
  })

  it('gives the same bytes for the same document', async () => {
    const first = await sample()
    expect(first.equals(await render())).toBe(true)
    expect(first.equals(await render({ units: 'US' }))).toBe(false)
    vi.resetModules()
    const { renderProcedure: fresh } = await import('../../../../server/documents/procedure.ts')
    expect(first.equals(await fresh(procedureDocument()))).toBe(true)
  })
})
