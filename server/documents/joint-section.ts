import { geometryOf, jointGeometry, settingOf } from '@shared/calculations/joint-geometry.ts'
import { dimensionsInWords } from '@shared/calculations/joint-placing.ts'
import { passSchema, type RunRow } from '@shared/schemas/welding.ts'
import { drawFactColumn, drawFacts, drawWideFact, factsHeight, type Fact } from './layout/facts.ts'
import type { Figures } from './layout/figures.ts'
import { drawJointSection } from './layout/joint-drawing.ts'
import { PAD, SOFT } from './layout/sheet.ts'
import { drawLines, heightOf, setText } from './layout/text.ts'
import { COLOUR } from './layout/tokens.ts'
import { jointFacts, type Context } from './weld-sections.ts'
import { GROOVE, JOINT_TYPE, said } from './words.ts'

/** Exact by definition: 1 lb = 0.45359237 kg, 1 ft = 0.3048 m. */
const LB_PER_FT = 0.3048 / 0.45359237
function massWords(kgPerM: number, figures: Figures): string {
  const metric = `${kgPerM.toPrecision(3)} kg/m`
  const customary = `${(kgPerM * LB_PER_FT).toPrecision(3)} lb/ft`
  if (figures.units === 'SI') return metric
  if (figures.units === 'US') return customary
  return figures.first === 'SI' ? `${metric} (${customary})` : `${customary} (${metric})`
}

/**
 * The joint: drawn cross-section with its pass build-up on the left, its facts and computed figures on the right.
 * @param beads a coupon's run sheet, which is its build-up
 */
export function drawJoint(context: Context, beads: readonly RunRow[] = []): void {
  const { sheet, figures, variables } = context
  const { joint } = variables
  const welded = variables.processes.map(({ id }) => ({ id, passes: beads.filter((row) => row.processId === id).map((row) => passSchema.parse({ number: row.pass, layer: row.layer })) }))
  const geometry = beads.length > 0 ? jointGeometry({ ...settingOf(variables, figures.first), blocks: welded }) : geometryOf(variables, figures.first)
  const facts: Fact[] = [
    ...jointFacts(context),
    ...(geometry.areaMm2 === null ? [] : [{ label: 'Weld section', value: figures.value(geometry.areaMm2, 'area') }]),
    ...(geometry.throatMm === null ? [] : [{ label: 'Throat, flat face', value: figures.value(Number(geometry.throatMm.toFixed(2)), 'length') }]),
    ...(geometry.weldMetalKgPerM === null ? [] : [{ label: 'Weld metal', value: massWords(geometry.weldMetalKgPerM, figures) }]),
  ]
  const summary = [said(GROOVE, joint.groove), joint.weld, said(JOINT_TYPE, joint.type)].filter(Boolean).join(', ')
  const drawn = geometry.plates.length > 0
  const column = sheet.width * 0.4
  const factsTall = factsHeight(sheet, facts, column - PAD, 0.36)
  const note = [`Section drawn to scale${beads.length > 0 ? '' : ' at the middle of each tolerance'}${geometry.passes.length > 0 ? '; beads show the order of welding, not their true shape' : ''}.`, ...geometry.assumed].join(' ')
  sheet.section('Joint', summary, () => {
    if (drawn) {
      const width = sheet.width - column
      const lines = setText(sheet.faces, SOFT, note, width - 2 * PAD)
      const height = Math.max(150, Math.min(factsTall + 8, 230), heightOf(lines, SOFT) + 140)
      sheet.ensure(Math.max(height, factsTall + 8))
      const top = sheet.y
      const frame = { x: sheet.left, y: top, width, height: height - heightOf(lines, SOFT) - 6 }
      const words = `Cross-section of the joint: ${summary}. ${dimensionsInWords(geometry.dimensions)}. ${geometry.passes.length > 0 ? `Passes in order: ${geometry.passes.map((pass) => pass.number).join(', ')}.` : ''}`
      sheet.tag('Figure', () => drawJointSection(sheet.doc, sheet.faces, geometry, frame), { alt: words })
      sheet.tag('P', () => drawLines(sheet.faces, SOFT, lines, sheet.left + PAD, top + height - heightOf(lines, SOFT) - 4))
      const used = Math.max(height, factsTall + 8)
      sheet.artifact(() => sheet.doc.lineWidth(0.5).strokeColor(COLOUR.rule).moveTo(sheet.left + width, top).lineTo(sheet.left + width, top + used).stroke())
      drawFactColumn(sheet, facts, sheet.left + width + PAD, top + 4, column - 2 * PAD, 0.36)
      sheet.y = top + used
    } else {
      drawFacts(sheet, facts)
      for (const sentence of geometry.impossible) sheet.paragraph(`Not drawn: ${sentence}`, SOFT)
    }
    if (joint.notes) drawWideFact(sheet, { label: 'Notes', value: joint.notes })
  }, 200)
}
