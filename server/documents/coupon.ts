import type { CouponQualification } from '@shared/schemas/assessment.ts'
import type { CouponState, Signature } from '@shared/schemas/records.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { drawQualified } from './coupon-ranges.ts'
import { drawTests } from './coupon-tests.ts'
import { drawJoint } from './joint-section.ts'
import { standardWithEdition } from './judgements.ts'
import { drawFacts, drawWideFact } from './layout/facts.ts'
import { Figures, type PrintedUnits } from './layout/figures.ts'
import { drawPhotos, type Photograph } from './layout/photos.ts'
import { Sheet, type Paper } from './layout/sheet.ts'
import { drawSignatures } from './layout/signature-page.ts'
import type { TitleBlock } from './layout/title-block.ts'
import { CAUTION, UNCONTROLLED } from './notices.ts'
import { drawRunSheet } from './run-sheet-section.ts'
import { COUPON_STATE_WORD, dateWords, processName } from './words.ts'
import { drawApplication, drawBaseMetals, drawElectrical, drawFillers, drawGases, drawHeat, drawPositions, drawTechnique, metalsLine, type Context } from './weld-sections.ts'

export interface CouponDocument {
  organization: { name: string; address: string }
  number: string
  state: CouponState
  content: CouponContent
  /** The procedure revision that the coupon was welded to. */
  procedure: { number: string; revision: string } | null
  /** One for each standard and edition under which the coupon is judged. */
  qualifications: readonly CouponQualification[]
  photos: readonly Photograph[]
  signatures: readonly Signature[]
  inspector: string
  /** ISO date-times. `printed` is the only moment the file itself carries, so the same data give the same bytes. */
  dates: { opened: string; certified: string | null; printed: string }
  paper: Paper
  units: PrintedUnits
  contentSha256: string
  verifyUrl: string | null
}

const STAMP: Readonly<Record<CouponState, TitleBlock['stamp']>> = {
  planned: { text: 'planned', tone: 'straw', edge: 'dashed' },
  welding: { text: 'welding', tone: 'straw', edge: 'dashed' },
  testing: { text: 'testing', tone: 'plum', edge: 'single' },
  certified: { text: 'certified', tone: 'jade', edge: 'double' },
  rejected: { text: 'rejected', tone: 'oxide', edge: 'dashed' },
}
const STAMP_NOTE: Readonly<Record<CouponState, string>> = {
  planned: 'supports no procedure yet', welding: 'supports no procedure yet', testing: 'supports no procedure yet', certified: 'may support a procedure', rejected: 'supports no procedure',
}

function titleBlock(document: CouponDocument): TitleBlock {
  const { content } = document
  const decided = document.state === 'rejected' ? 'rejected' : 'certified'
  const certifier = document.signatures.filter((signature) => signature.meaning === decided).at(-1)
  return {
    organization: document.organization,
    kind: 'Procedure qualification record',
    number: document.number,
    revision: null,
    title: content.title,
    cells: [
      { label: 'Process', lines: content.variables.processes.map(processName) },
      { label: 'Standard', share: 1.25, lines: content.variables.standards.map((choice) => [standardWithEdition(choice), choice.level ? `level ${choice.level}` : ''].filter(Boolean).join(', ')) },
      { label: 'Welded to', lines: [document.procedure ? `${document.procedure.number} rev ${document.procedure.revision}` : 'no procedure linked', content.weldedOn ? `on ${dateWords(content.weldedOn)}` : 'date not stated'] },
      { label: 'Who and when', share: 1.3, lines: [document.inspector, `opened ${dateWords(document.dates.opened)}`, ...(certifier ? [certifier.person.name, `${decided} ${dateWords(certifier.signedAt)}`] : [document.dates.certified && document.state === 'certified' ? `certified ${dateWords(document.dates.certified)}` : 'not certified'])] },
    ],
    stamp: STAMP[document.state],
    stampNote: STAMP_NOTE[document.state],
  }
}

function drawWelding({ sheet }: Context, content: CouponContent): void {
  const facts = ([
    ['Welder', [content.welder, content.welderStamp ? `stamp ${content.welderStamp}` : ''].filter(Boolean).join(', ')],
    ['Date welded', dateWords(content.weldedOn)],
    ['Witness', content.witness],
    ['Machine', content.machine],
    ['Laboratory', content.laboratory],
    ['Laboratory report', [content.reportNumber, content.testedOn ? `tested ${dateWords(content.testedOn)}` : ''].filter(Boolean).join(', ')],
  ] as const).map(([label, value]) => ({ label, value: value || 'not stated' }))
  sheet.section('Welding and testing', '', () => drawFacts(sheet, facts), 50)
}

const statementFor = (document: CouponDocument): string => {
  const standards = document.content.variables.standards.map(standardWithEdition).join(' and ')
  return document.state === 'certified'
    ? `Certification: ${document.organization.name} states that this record is a true account of what was welded and measured, and that the coupon was prepared, welded and tested in accordance with ${standards}. Each person below signed by re-entering a password, for exactly the content named by its SHA-256 value.`
    : `This record is not certified. When it is, ${document.organization.name} will state here that the coupon was prepared, welded and tested in accordance with ${standards}.`
}

/**
 * The procedure qualification record as a PDF: variables as welded, run sheet, test results as judged, ranges of qualification, photographs and certification.
 * Pure: reads no clock and no store; the same document gives the same bytes.
 */
export async function renderCoupon(document: CouponDocument): Promise<Buffer> {
  const { content, state } = document
  const { variables } = content
  const figures = new Figures(document.units, variables.unitSystem)
  const status = COUPON_STATE_WORD[state]
  const sheet = new Sheet({
    paper: document.paper,
    titleBlock: titleBlock(document),
    info: {
      title: `${document.number}: ${content.title}`,
      subject: `Procedure qualification record, ${status}`,
      author: document.inspector,
      keywords: [...variables.processes.map(processName), ...variables.standards.map(standardWithEdition), metalsLine(variables)].join('; '),
      created: new Date(document.dates.printed),
    },
    identity: `${document.number} · ${status}`,
    footer: { notice: `Printed ${dateWords(document.dates.printed)}. ${UNCONTROLLED}`, caution: CAUTION },
  })
  const context: Context = { sheet, figures, variables, judgements: null }
  drawJoint(context, content.runSheet)
  drawBaseMetals(context)
  drawApplication(context)
  drawWelding(context, content)
  drawFillers(context)
  drawPositions(context)
  drawHeat(context)
  drawGases(context)
  drawElectrical(context)
  drawTechnique(context)
  drawRunSheet(context, content.runSheet)
  drawTests(context, content, document.qualifications)
  drawQualified(context, document.qualifications)
  drawPhotos(sheet, document.photos)
  if (content.notes) sheet.section('Notes', '', () => drawWideFact(sheet, { label: 'Notes', value: content.notes ?? '' }), 40)
  sheet.section('Certification', status, () =>
    drawSignatures(sheet, document.signatures, {
      contentSha256: document.contentSha256,
      verifyUrl: document.verifyUrl,
      statement: statementFor(document),
      none: 'No one has signed this record. It supports no procedure until it is certified.',
    }), 120)
  return sheet.finish()
}
