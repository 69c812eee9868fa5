/** Heats of base metal and lots of filler metal, with the chemistry of their certificates. */
import { z } from 'zod'
import { idSchema, quantityOrNull, textOrNull } from './common.ts'
import { personRefSchema } from './records.ts'

export const ELEMENTS = ['C', 'Si', 'Mn', 'P', 'S', 'Cr', 'Mo', 'Ni', 'Cu', 'V', 'Nb', 'Ti', 'Al', 'N', 'B', 'W', 'Co', 'Mg', 'Zn', 'Fe', 'Zr', 'Be', 'Pb', 'Sn', 'H', 'O', 'Ta', 'Ca'] as const
export const elementSchema = z.enum(ELEMENTS)
export type Element = z.infer<typeof elementSchema>

/** Mass per cent by element; what isn't listed wasn't reported. `atMost`: the certificate says "<", so the figure is a bound. */
export const chemistrySchema = z
  .array(z.object({ element: elementSchema, percent: z.number().min(0, 'A share can’t be below 0 %.').max(100, 'A share can’t be above 100 %.'), atMost: z.boolean().optional() }))
  .max(ELEMENTS.length)
  .default([])
  .superRefine((rows, context) => {
    rows.forEach((row, index) => { if (rows.findIndex((other) => other.element === row.element) !== index) context.addIssue({ code: 'custom', path: [index, 'element'], message: `${row.element} is given twice.` }) })
    const sum = rows.reduce((total, row) => total + row.percent, 0)
    if (sum > 100.0001) context.addIssue({ code: 'custom', path: [], message: `The elements add up to ${Math.round(sum * 1000) / 1000} %, which is more than the whole.` })
  })
export type Chemistry = z.infer<typeof chemistrySchema>

export const writeHeatSchema = z
  .object({
    kind: z.enum(['heat', 'lot']),
    number: z.string().trim().min(1, 'Give the heat or lot number on the certificate.').max(60),
    libraryId: z.string().trim().max(80).nullable().default(null),
    grade: z.string().trim().min(1, 'Name the grade or classification.').max(120),
    certificate: textOrNull(120),
    /** As the certificate says, e.g. 3.1. */
    certificateType: textOrNull(20),
    receivedOn: z.iso.date().nullable().default(null),
    thickness: quantityOrNull,
    diameter: quantityOrNull,
    tensile: quantityOrNull,
    yield: quantityOrNull,
    elongation: quantityOrNull,
    /** Whether the shares are of the heat's own certificate or of the deposit. */
    chemistryOf: z.enum(['ladle', 'product', 'deposit', 'wire']).nullable().default(null),
    chemistry: chemistrySchema,
    notes: textOrNull(2000),
  })
  .meta({ id: 'WriteHeat' })
export type WriteHeat = z.infer<typeof writeHeatSchema>
export const certificateFileSchema = z.object({ id: idSchema, fileName: z.string(), mediaType: z.string(), bytes: z.number().int(), sha256: z.string(), uploadedAt: z.iso.datetime(), uploadedBy: personRefSchema }).meta({ id: 'CertificateFile' })
export const heatRowSchema = z.object({ id: idSchema, kind: z.enum(['heat', 'lot']), number: z.string(), libraryId: z.string().nullable(), grade: z.string(), certificate: z.string().nullable(), certificateType: z.string().nullable(), receivedOn: z.string().nullable(), chemistryOf: writeHeatSchema.shape.chemistryOf, chemistry: chemistrySchema, files: z.number().int(), updatedAt: z.iso.datetime() }).meta({ id: 'HeatRow' })
export type HeatRow = z.infer<typeof heatRowSchema>
/** A record that names a heat, a lot or a library row. */
export const namedBySchema = z.object({ kind: z.enum(['procedure', 'coupon', 'heat']), id: idSchema, number: z.string(), title: z.string(), state: z.string() }).meta({ id: 'NamedBy' })
export type NamedBy = z.infer<typeof namedBySchema>
export const heatSchema = z.object({ id: idSchema, version: z.number().int(), updatedAt: z.iso.datetime(), content: writeHeatSchema, files: z.array(certificateFileSchema), namedBy: z.array(namedBySchema), may: z.array(z.string()) }).meta({ id: 'Heat' })
export type Heat = z.infer<typeof heatSchema>
