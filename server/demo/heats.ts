/** Heats and lots of the demo firm with their certificates, and one grade of its own. All invented. */
import { createRequire } from 'node:module'
import PDFDocument from 'pdfkit'
import { pasteChemistry, printChemistry } from '@shared/library/paste-chemistry.ts'
import { writeHeatSchema, type WriteHeat } from '@shared/schemas/heats.ts'
import { quantity } from '@shared/units/convert.ts'
import { attach } from '../services/attachments.ts'
import { createHeat } from '../services/heats.ts'
import { createLibraryItem } from '../services/library-own.ts'
import { checkFiles } from '../services/photo-files.ts'
import type { Firm } from './acts.ts'

interface Told extends Partial<Pick<WriteHeat, 'certificate' | 'certificateType' | 'receivedOn' | 'notes'>> {
  kind: WriteHeat['kind']
  number: string
  grade: string
  libraryId: string
  of: NonNullable<WriteHeat['chemistryOf']>
  chemistry: string
  /** mm */
  size: number
  /** MPa, MPa, %: as tested. */
  tested?: readonly [tensile: number, yieldStrength: number, elongation: number]
  /** Whose paper it is; an invented mill. */
  maker: string
}

const TOLD: readonly Told[] = [
  { kind: 'heat', number: 'K4471', grade: 'A/SA-516 70', libraryId: 'us-a516-70', certificate: 'LF-C-0318', certificateType: '3.1', receivedOn: '2026-01-14', of: 'ladle', chemistry: 'C 0.19 Si 0.34 Mn 1.14 P 0.012 S 0.004 Cr 0.06 Mo 0.02 Ni 0.08 Cu 0.11 V 0.003 Nb 0.002 Ti 0.003 Al 0.034 N 0.005 B <0.0005', size: 12, tested: [532, 358, 27], maker: 'Upper Weir plate mill' },
  { kind: 'heat', number: 'P2208', grade: 'A/SA-36', libraryId: 'us-a36', certificate: 'LF-C-0297', certificateType: '2.2', receivedOn: '2025-11-20', of: 'ladle', chemistry: 'C 0.17 Si 0.21 Mn 0.82 P 0.015 S 0.011 Cr 0.07 Mo 0.01 Ni 0.09 Cu 0.24 V 0.002', size: 12, tested: [447, 293, 29], maker: 'Upper Weir plate mill' },
  { kind: 'heat', number: 'T9032', grade: 'A/SA-106 B', libraryId: 'us-a106-b', certificate: 'LF-C-0305', certificateType: '3.1', receivedOn: '2025-12-03', of: 'ladle', chemistry: 'C 0.20 Si 0.24 Mn 0.71 P 0.010 S 0.006 Cr 0.05 Mo 0.01 Ni 0.04 Cu 0.08 V 0.002', size: 7.1, tested: [468, 311, 33], maker: 'Dunmoor tube works' },
  { kind: 'heat', number: 'S71840', grade: 'A/SA-240 Type 304L', libraryId: 'us-a240-304l', certificate: 'LF-C-0322', certificateType: '3.1', receivedOn: '2026-01-28', of: 'ladle', chemistry: 'C 0.021 Si 0.41 Mn 1.62 P 0.031 S 0.002 Cr 18.15 Mo 0.28 Ni 8.06 Cu 0.33 N 0.072', size: 6, tested: [612, 288, 55], maker: 'Harrow Fell stainless' },
  { kind: 'heat', number: 'A55120', grade: 'B/SB-209 6061-T6', libraryId: 'us-b209-6061-t6', certificate: 'LF-C-0351', certificateType: '3.1', receivedOn: '2026-02-17', of: 'product', chemistry: 'Si 0.64 Fe 0.31 Cu 0.27 Mn 0.08 Mg 0.98 Cr 0.17 Zn 0.05 Ti 0.03', size: 6, tested: [318, 281, 13], maker: 'Brackwater rolling' },
  { kind: 'lot', number: '26-E7018-114', grade: 'E7018', libraryId: 'a51-e7018', certificate: 'LF-C-0330', certificateType: '3.1', receivedOn: '2026-02-02', of: 'deposit', chemistry: 'C 0.06 Si 0.48 Mn 1.24 P 0.013 S 0.008 Cr 0.04 Mo 0.01 Ni 0.05 V 0.01', size: 3.2, tested: [561, 468, 29], maker: 'Skelder electrodes', notes: 'Packets marked E7018 H4R; diffusible hydrogen 3.4 mL/100 g on the certificate.' },
  { kind: 'lot', number: '308-77193', grade: 'ER308L', libraryId: 'a59-er308l', certificate: 'LF-C-0324', certificateType: '3.1', receivedOn: '2026-01-28', of: 'deposit', chemistry: 'C 0.017 Si 0.44 Mn 1.78 P 0.018 S 0.006 Cr 19.92 Mo 0.12 Ni 10.05 Cu 0.09 N 0.052', size: 2.4, maker: 'Skelder electrodes' },
  { kind: 'lot', number: 'AM5-20611', grade: 'ER5356', libraryId: 'a510-er5356', certificate: 'LF-C-0353', certificateType: '2.2', receivedOn: '2026-02-18', of: 'wire', chemistry: 'Si 0.07 Fe 0.14 Cu 0.02 Mn 0.13 Mg 4.91 Cr 0.11 Zn 0.02 Ti 0.11 Be <0.0003', size: 1.2, maker: 'Brackwater wire' },
]

const require = createRequire(import.meta.url)
const face = (weight: number): string => require.resolve(`@fontsource/inter/files/inter-latin-${weight}-normal.woff`)

/** A plain certificate of one page, as a mill would print it. */
async function paper({ kind, number, grade, certificate, certificateType, receivedOn, chemistry, of, tested, size, maker }: Told): Promise<Buffer> {
  const created = new Date(`${receivedOn ?? '2026-01-01'}T08:00:00Z`)
  // No built-in face is wanted; pdfkit's types know only a name here.
  const doc = new PDFDocument({ size: 'A4', margin: 56, font: null as unknown as string, info: { Title: `${certificate} ${number}`, Author: maker, CreationDate: created, ModDate: created } })
  const chunks: Buffer[] = []
  const done = new Promise<void>((resolve) => doc.on('end', resolve))
  doc.on('data', (chunk: Buffer) => chunks.push(chunk))
  doc.font(face(600)).fontSize(16).text(maker)
  doc.font(face(400)).fontSize(9).text(`Inspection certificate ${certificateType}, invented for the demonstration`).moveDown(1.5)
  for (const [label, value] of [['Certificate', certificate], [kind === 'heat' ? 'Heat' : 'Lot', number], [kind === 'heat' ? 'Grade' : 'Classification', grade], [kind === 'heat' ? 'Thickness' : 'Size', `${size} mm`], ['Delivered to', 'Larkfield Fabrication'], ['Date', receivedOn]]) {
    doc.font(face(400)).fontSize(10).text(`${label}:  ${value ?? ''}`)
  }
  doc.moveDown().font(face(600)).fontSize(11).text(`Chemistry of ${of === 'deposit' ? 'the deposit' : of === 'wire' ? 'the wire' : of === 'product' ? 'the product' : 'the ladle'}, mass per cent`)
  doc.font(face(400)).fontSize(10)
  for (const row of pasteChemistry(chemistry).rows) doc.text(printChemistry([row]).replace(' ', '   '))
  if (tested) doc.moveDown().font(face(600)).fontSize(11).text('Tension test').font(face(400)).fontSize(10).text(`Tensile ${tested[0]} MPa, yield ${tested[1]} MPa, elongation ${tested[2]} %`)
  doc.end()
  await done
  return Buffer.concat(chunks)
}

function contentOf({ kind, number, grade, libraryId, certificate, certificateType, receivedOn, notes, of, chemistry, size, tested }: Told): WriteHeat {
  const { rows, unread } = pasteChemistry(chemistry)
  if (unread.length > 0) throw new Error(`${number}: ${unread[0]?.text} is no chemistry`)
  return writeHeatSchema.parse({
    kind, number, grade, libraryId, certificate, certificateType, receivedOn, notes, chemistryOf: of, chemistry: rows,
    ...(kind === 'heat' ? { thickness: quantity(size, 'length') } : { diameter: quantity(size, 'length') }),
    ...(tested && { tensile: quantity(tested[0], 'stress'), yield: quantity(tested[1], 'stress'), elongation: quantity(tested[2], 'percent') }),
  })
}

/** Five heats that the coupons name and three lots, each with its certificate; one plate of the firm's own specification. */
export async function recordHeats({ services, actors, act }: Firm): Promise<void> {
  const papers = await checkFiles(await Promise.all(TOLD.map(async (told) => ({ name: `${told.certificate} ${told.number}.pdf`, bytes: await paper(told) }))))
  await act(async (tenant) => {
    for (const [index, told] of TOLD.entries()) {
      const { id } = await createHeat(tenant, contentOf(told))
      await attach(services.storage, tenant, actors.hal, { heatId: id }, papers.slice(index, index + 1))
    }
    await createLibraryItem(tenant, {
      kind: 'base-metals',
      content: {
        spec: 'LF-MS-014', grade: 'Wear plate 400', uns_or_en_number: null, product_form: 'plate', p_no: null, group_no: null, iso_15608: null, aws_d1_1_group: null, aws_d1_2_m_no: null,
        min_tensile_mpa: 1200, min_yield_mpa: 950, min_elongation_pct: 10, nominal_composition: 'low-alloy Q&T', density_kg_m3: 7850, source: 'Larkfield material specification 14, from the mill’s data sheet', note: 'Chutes and liners only; welded soft, never loaded across the weld.',
      },
    })
  })
}
