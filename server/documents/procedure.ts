import { sequenceOf } from '@shared/calculations/pass-layout.ts'
import type { Assessment } from '@shared/schemas/assessment.ts'
import type { RevisionState, Signature } from '@shared/schemas/records.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { drawFindings, drawLeftOverRanges } from './findings.ts'
import { drawJoint } from './joint-section.ts'
import { Judgements, standardWithEdition } from './judgements.ts'
import { drawWideFact } from './layout/facts.ts'
import { Figures, type PrintedUnits } from './layout/figures.ts'
import { Sheet, type Paper } from './layout/sheet.ts'
import { drawSignatures } from './layout/signature-page.ts'
import { drawTable, type Column } from './layout/table.ts'
import type { TitleBlock } from './layout/title-block.ts'
import { CAUTION, UNCONTROLLED } from './notices.ts'
import { dateWords, gasName, processName, said, CURRENT_TYPE, LAYER, STATE_WORD } from './words.ts'
import { drawApplication, drawBaseMetals, drawElectrical, drawFillers, drawGases, drawHeat, drawPositions, drawTechnique, metalsLine, type Context } from './weld-sections.ts'

export interface ProcedureDocument {
  organization: { name: string; address: string }
  number: string
  revision: string
  state: RevisionState
  content: ProcedureContent
  /** The supporting coupons, in the order in which they are to be named. */
  coupons: readonly { number: string; title: string }[]
  assessments: readonly Assessment[]
  signatures: readonly Signature[]
  /** Why "outside" or "cannot tell" findings were accepted; printed when present. */
  deviationReason: string | null
  author: string
  /** ISO date-times. `printed` is the only moment the file itself carries, so the same data give the same bytes. */
  dates: { drafted: string; approved: string | null; printed: string }
  paper: Paper
  units: PrintedUnits
  contentSha256: string
  verifyUrl: string | null
}

const STAMP: Readonly<Record<RevisionState, TitleBlock['stamp']>> = {
  draft: { text: 'draft', tone: 'straw', edge: 'dashed' },
  'in-review': { text: 'in review', tone: 'plum', edge: 'single' },
  approved: { text: 'approved', tone: 'jade', edge: 'double' },
  superseded: { text: 'superseded', tone: 'soft', edge: 'dashed' },
  withdrawn: { text: 'withdrawn', tone: 'oxide', edge: 'dashed' },
}
const STAMP_NOTE: Readonly<Record<RevisionState, string>> = {
  draft: 'not for production',
  'in-review': 'not for production',
  approved: 'for production',
  superseded: 'replaced by a later revision',
  withdrawn: 'not to be used',
}

/** Cautions that follow from what the procedure uses; our own words, no figures. */
function cautions(document: ProcedureDocument): string[] {
  const { variables } = document.content
  const blocks = variables.processes
  const metals = [variables.baseMetals.a, variables.baseMetals.b]
  const hasNumber = (test: RegExp) => metals.some((metal) => metal.pNumber !== null && test.test(metal.pNumber))
  const gases = new Set(blocks.flatMap((block) => [block.shieldingGas, block.backingGas, block.trailingGas, block.plasmaGas].flatMap((gas) => gas?.components.map((part) => part.gas) ?? [])))
  return [
    'Welding fume and gases can harm the lungs, arc rays burn eyes and skin, noise harms hearing, and the circuit can kill. Ventilate or extract at the source, keep your head out of the plume, insulate yourself from work and ground, and wear the protection that the shop\'s rules call for. Read the safety data sheets of base metals, filler metals and gases first.',
    hasNumber(/^(8|10H|10I|4[1-5])/) || metals.some((metal) => metal.iso15608?.startsWith('8')) ? 'High-chromium and nickel alloys: the fume can contain hexavalent chromium and nickel. Extract it at the source.' : '',
    hasNumber(/^2[1-5]$/) ? 'Aluminium: bright metal reflects arc rays and the arc makes much ozone. Cover skin, extract, and remove oxide with tools kept for aluminium.' : '',
    ['Ar', 'He', 'N2', 'CO2'].some((gas) => gases.has(gas as 'Ar')) ? 'Shielding and purging gases displace air. Measure oxygen before anyone enters a purged pipe, vessel or pit.' : '',
    variables.preheat.minimum && variables.preheat.minimum.si >= 50 ? `Preheat to at least the temperature stated and measure it before each arc start; hot metal looks the same as cold.` : '',
  ].filter(Boolean)
}

function titleBlock(document: ProcedureDocument): TitleBlock {
  const { content, state } = document
  const approver = document.signatures.filter((signature) => signature.meaning === 'approved').at(-1)
  const blocking = document.assessments.reduce((sum, assessment) => sum + assessment.counts.outside + assessment.counts.cannotTell, 0)
  return {
    organization: document.organization,
    kind: 'Welding procedure specification',
    number: document.number,
    revision: document.revision,
    title: content.title,
    cells: [
      { label: 'Process', lines: content.variables.processes.map(processName) },
      { label: 'Standard', share: 1.25, lines: content.variables.standards.map((choice) => [standardWithEdition(choice), choice.level ? `level ${choice.level}` : '', choice.route === 'prequalified' ? 'prequalified' : ''].filter(Boolean).join(', ')) },
      { label: 'Supported by', share: 0.95, lines: document.coupons.length > 0 ? [document.coupons.map((coupon) => coupon.number).join(', ')] : ['none linked'] },
      { label: 'Who and when', share: 1.3, lines: [document.author, `drafted ${dateWords(document.dates.drafted)}`, ...(approver ? [approver.person.name, `approved ${dateWords(approver.signedAt)}`] : [document.dates.approved && state !== 'draft' && state !== 'in-review' ? `approved ${dateWords(document.dates.approved)}` : 'not approved'])] },
    ],
    stamp: STAMP[state],
    stampNote: state === 'approved' && document.deviationReason ? 'for production, with open findings: see Findings' : state === 'draft' && blocking > 0 ? `${blocking} finding${blocking === 1 ? '' : 's'} to settle` : STAMP_NOTE[state],
  }
}

function drawPasses(context: Context): void {
  const { sheet, figures, variables } = context
  const passes = sequenceOf(variables.processes).flatMap(({ block, pass }) => { const laidBy = variables.processes[block]; return laidBy ? [{ block: laidBy, pass }] : [] })
  if (passes.length === 0) return
  const column = (title: string, unit: string, share: number): Column => ({ title, unit, share, align: 'right' })
  sheet.section('Pass table', `${passes.length} ${passes.length === 1 ? 'entry' : 'entries'}`, () => {
    drawTable(
      sheet,
      [{ title: 'Pass', share: 7 }, { title: 'Layer', share: 8 }, { title: 'Process', share: 10 }, { title: 'Filler', share: 15 }, { title: 'Polarity', share: 10 }, column('Diameter', figures.unit('length'), 12), column('Current', figures.unit('current'), 11), column('Voltage', figures.unit('voltage'), 11), column('Wire feed', figures.unit('wireFeed'), 15), column('Travel', figures.unit('travelSpeed'), 16)],
      passes.map(({ block, pass }) => [
        { text: pass.number, strong: true }, said(LAYER, pass.layer), processName(block).split(',')[0] ?? '', block.filler.classification ?? (block.filler.added === false ? 'none' : ''),
        said(CURRENT_TYPE, block.electrical.currentType), figures.cell(pass.fillerDiameter, 'length'),
        figures.cellInterval(pass.current ?? block.electrical.current, 'current'), figures.cellInterval(pass.voltage ?? block.electrical.voltage, 'voltage'),
        figures.cellInterval(pass.wireFeed ?? block.electrical.wireFeed, 'wireFeed'), figures.cellInterval(pass.travelSpeed ?? block.electrical.travelSpeed, 'travelSpeed'),
      ]),
    )
  }, 60)
}

/**
 * The welding procedure specification as a PDF: variables with their range gauges, findings, cautions and signatures.
 * Pure: reads no clock and no store; the same document gives the same bytes.
 */
export async function renderProcedure(document: ProcedureDocument): Promise<Buffer> {
  const { content, state } = document
  const { variables } = content
  const figures = new Figures(document.units, variables.unitSystem)
  const processes = new Map(variables.processes.map((block) => [block.id, processName(block).split(',')[0] ?? '']))
  const judgements = new Judgements(document.assessments, processes)
  const status = STATE_WORD[state]
  const sheet = new Sheet({
    paper: document.paper,
    titleBlock: titleBlock(document),
    info: {
      title: `${document.number} rev ${document.revision}: ${content.title}`,
      subject: `Welding procedure specification, ${status}`,
      author: document.author,
      keywords: [...variables.processes.map(processName), ...variables.standards.map(standardWithEdition), metalsLine(variables), ...new Set(variables.processes.map((block) => gasName(block.shieldingGas)).filter(Boolean))].join('; '),
      created: new Date(document.dates.printed),
    },
    identity: `${document.number} rev ${document.revision} · ${status}`,
    footer: { notice: `Printed ${dateWords(document.dates.printed)}. ${UNCONTROLLED}`, caution: CAUTION },
  })
  const context: Context = { sheet, figures, variables, judgements }
  const approvedWithReason = document.deviationReason !== null && document.deviationReason.trim() !== ''
  if (content.scope) {
    sheet.section('Scope', '', () => sheet.paragraph(content.scope ?? ''), 40)
  }
  drawJoint(context)
  drawBaseMetals(context)
  drawApplication(context)
  drawFillers(context)
  drawPositions(context)
  drawHeat(context)
  drawGases(context)
  drawElectrical(context)
  drawTechnique(context)
  drawPasses(context)
  drawLeftOverRanges(context, judgements)
  drawFindings(sheet, document.assessments, approvedWithReason ? document.deviationReason : null, processes)
  if (document.coupons.length > 0) {
    sheet.section('Supporting records', '', () => document.coupons.forEach((coupon) => drawWideFact(sheet, { label: coupon.number, value: coupon.title, strong: true })), 36)
  }
  if (content.notes) sheet.section('Notes', '', () => sheet.paragraph(content.notes ?? ''), 40)
  sheet.section('Cautions', 'read before striking an arc', () => cautions(document).forEach((text) => sheet.paragraph(text)), 60)
  sheet.section('Signatures', status, () =>
    drawSignatures(sheet, document.signatures, {
      contentSha256: document.contentSha256,
      verifyUrl: document.verifyUrl,
      statement: 'Each person below signed by re-entering a password, and with that confirmed the statement beside the name for exactly the content named by its SHA-256 value.',
      none: 'No one has signed this revision. It is not released for production.',
    }), 120)
  return sheet.finish()
}
