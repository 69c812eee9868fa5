import type { CouponQualification, TestVerdict, Verdict } from '@shared/schemas/assessment.ts'
import type { Quantity } from '@shared/schemas/common.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { STANDARD_NAME, BASIS_WORD, BEND_KIND, capital, NDT_METHOD, PLACE, said, TENSION_KIND, yesNo } from './words.ts'
import { standardWithEdition } from './judgements.ts'
import { drawTable, type Cell, type Column } from './layout/table.ts'
import type { Context } from './weld-sections.ts'

const AS_VERDICT: Readonly<Record<TestVerdict['verdict'], Verdict>> = { pass: 'within', fail: 'outside', 'cannot-tell': 'cannot-tell' }
const RANK = { fail: 0, 'cannot-tell': 1, pass: 2 } as const
const WORD = { pass: 'accepted', fail: 'not accepted', 'cannot-tell': 'cannot tell' } as const

/** How a test was judged under each standard: worst verdict as the mark, a sentence and clause for each. */
function judged(testId: string, qualifications: readonly CouponQualification[]): Cell {
  const found = qualifications.flatMap((qualification) => qualification.results.filter((result) => result.testId === testId).map((result) => ({ qualification, result })))
  const [first] = [...found].sort((a, b) => RANK[a.result.verdict] - RANK[b.result.verdict])
  if (!first) return { text: 'not judged', soft: true }
  const text = found.map(({ qualification, result }) => {
    const lead = qualifications.length > 1 ? `${STANDARD_NAME[qualification.standard]}: ${WORD[result.verdict]}` : capital(WORD[result.verdict])
    return `${lead}. ${result.sentence} (${result.clause}${result.basis === 'read' ? '' : `, ${BASIS_WORD[result.basis]}`})`
  })
  return { text: text.join('\n'), verdict: AS_VERDICT[first.result.verdict] }
}

const right = (title: string, unit: string, share: number): Column => ({ title, unit, share, align: 'right' })
const RESULT: Column = { title: 'Judged', share: 44 }
const joinValues = (values: readonly string[]): string => values.join(', ')

/** The visual examination: what was seen, as facts, and how it was judged. */
function drawVisual({ sheet, figures }: Context, { visual }: CouponContent, judge: (id: string) => Cell): void {
  if (!visual) return
  const seen = (label: string, value: boolean | null): string[] => (value === null ? [] : [`${label}: ${yesNo(value)}`])
  const measured = (label: string, value: Quantity | null): string[] => (value === null ? [] : [`${label}: ${figures.quantity(value, 'length')}`])
  const found = [
    ...seen('cracks', visual.cracks), ...seen('craters full', visual.cratersFull), ...seen('root sound', visual.rootSound), ...seen('profile accepted', visual.profileAccepted),
    ...measured('undercut', visual.undercut), ...measured('reinforcement', visual.reinforcement), ...measured('root concavity', visual.rootConcavity), ...measured('melt-through', visual.meltThrough), ...measured('weld thickness there', visual.weldThickness),
  ]
  sheet.subhead('Visual examination', '', 60)
  drawTable(sheet, [{ title: 'Found', share: 56 }, RESULT], [[capital(found.join('; ')) || 'nothing stated', judge('visual')]])
}

/** Specimens asked for and recorded, then each kind of test with its results and how they were judged. */
export function drawTests(context: Context, content: CouponContent, qualifications: readonly CouponQualification[]): void {
  const { sheet, figures } = context
  const judge = (id: string) => judged(id, qualifications)
  const computed = (testId: string) => {
    const found = qualifications.flatMap((qualification) => qualification.results).find((result) => result.testId === testId && result.computed)?.computed
    return found ? `${Number(found.value.toPrecision(4))} ${found.unit}` : ''
  }
  sheet.section('Tests', [content.laboratory, content.reportNumber].filter(Boolean).join(' · '), () => {
    for (const qualification of qualifications) {
      sheet.subhead(`Specimens · ${standardWithEdition(qualification)}`, qualification.readyToCertify ? 'complete' : 'not complete', 60)
      drawTable(sheet, [{ title: 'Specimen', share: 40 }, right('Required', '', 12), right('Recorded', '', 12), { title: 'Instead', share: 24 }, { title: 'Clause', share: 22 }], qualification.specimens.map((specimen) => [
        specimen.label, String(specimen.required), { text: String(specimen.recorded), strong: specimen.recorded < specimen.required }, { text: specimen.alternative ?? '', soft: true }, [specimen.clause, specimen.basis === 'read' ? '' : BASIS_WORD[specimen.basis]].filter(Boolean).join(' · '),
      ]))
      if (qualification.missing.length > 0) sheet.callout(`${qualification.missing.length} still missing for certification under ${standardWithEdition(qualification)}`, qualification.missing.map((item) => `${item.message} (${item.clause})`).join('\n'), 'straw')
    }
    const group = (title: string, columns: readonly Column[], rows: readonly (readonly Cell[])[]) => {
      if (rows.length === 0) return
      sheet.subhead(title, '', 60)
      drawTable(sheet, columns, rows)
    }
    const length = figures.unit('length')
    drawVisual(context, content, judge)
    group('Non-destructive testing', [{ title: 'Method', share: 18 }, { title: 'Whole length', share: 11 }, { title: 'Result', share: 12 }, { title: 'Report', share: 19 }, { title: 'Note', share: 16 }, RESULT], (content.ndt ?? []).map((test) => [
      { text: `${test.method}, ${NDT_METHOD[test.method]}`, strong: true }, yesNo(test.wholeLength) || 'not stated', test.accepted === null ? 'not stated' : test.accepted ? 'accepted' : 'not accepted', test.reportNumber ?? '', { text: test.note ?? '', soft: true }, judge(test.id),
    ]))
    group('Tension', [{ title: 'Specimen', share: 9 }, { title: 'Kind', share: 12 }, right('Width', length, 10), right('Thickness', length, 10), right('Load', figures.unit('force'), 11), right('Strength', 'from load and area', 12), { title: 'Fracture', share: 15 }, RESULT], content.tension.map((test) => [
      { text: test.specimen, strong: true }, TENSION_KIND[test.kind], test.kind === 'turned' ? `Ø ${figures.cell(test.diameter, 'length')}` : figures.cell(test.width, 'length'), figures.cell(test.thickness, 'length'), figures.cell(test.load, 'force'),
      computed(test.id) || (test.reportedStrength ? `${figures.quantity(test.reportedStrength, 'stress')} reported` : ''), [said(PLACE, test.fracture), test.fractureType].filter(Boolean).join(', '), judge(test.id),
    ]))
    group('Bends', [{ title: 'Specimen', share: 9 }, { title: 'Kind', share: 14 }, right('Thickness', length, 10), right('Former', length, 10), right('Angle', '', 8), { title: 'Openings', unit: length, share: 22 }, RESULT], content.bends.map((test) => [
      { text: test.specimen, strong: true }, BEND_KIND[test.kind], figures.cell(test.thickness, 'length'), figures.cell(test.formerDiameter, 'length'), figures.quantity(test.angle, 'angle'),
      test.broke ? 'broke' : test.openings.length > 0 ? joinValues(test.openings.map((opening) => `${figures.cell(opening.size, 'length')}${opening.corner ? ' at a corner' : ''}${opening.fromInternalFlaw ? ' from a flaw' : ''}`)) : test.inspected ? 'none' : 'not inspected', judge(test.id),
    ]))
    group('Macro sections', [{ title: 'Specimen', share: 9 }, { title: 'Fusion complete', share: 14 }, { title: 'Cracks', share: 10 }, right('Leg 1', length, 12), right('Leg 2', length, 12), RESULT], content.macros.map((test) => [
      { text: test.specimen, strong: true }, yesNo(test.fusionComplete) || 'not stated', yesNo(test.cracks) || 'not stated', figures.cell(test.leg1, 'length'), figures.cell(test.leg2, 'length'), judge(test.id),
    ]))
    group('Toughness', [{ title: 'Notch', share: 16 }, { title: 'Size', share: 12 }, right('Temperature', figures.unit('temperature'), 12), right('Energy', figures.unit('energy'), 20), right('Expansion', length, 16), RESULT], content.toughness.map((test) => [
      { text: PLACE[test.place], strong: true }, test.size ?? '', figures.cell(test.temperature, 'temperature'), joinValues(test.values.map((value) => figures.cell(value, 'energy'))), joinValues(test.lateralExpansion.map((value) => figures.cell(value, 'length'))), judge(test.id),
    ]))
    group('Hardness', [{ title: 'Place', share: 16 }, { title: 'Scale', share: 8 }, { title: 'Values', share: 34 }, right('Highest', '', 8), RESULT], content.hardness.map((test) => [
      { text: PLACE[test.place], strong: true }, test.scale, joinValues(test.values.map(String)), test.values.length > 0 ? String(Math.max(...test.values)) : '', judge(test.id),
    ]))
    const none = [content.tension, content.bends, content.macros, content.toughness, content.hardness, content.ndt ?? []].every((tests) => tests.length === 0) && !content.visual
    if (none) sheet.callout('No test results recorded', 'Nothing has been tested yet, so this record says nothing about the soundness of the weld.', 'straw')
  }, 80)
}
