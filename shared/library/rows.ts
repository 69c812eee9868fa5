/** The rows of the reference library, as zod schemas: reference data, an organization's own rows and stored contents all parse with them. */
import { z } from 'zod'

const text = z.string().nullable()
const number = z.number().nullable()

/** Key: specification, grade and product form. MPa, %, kg/m³. null = not listed, which is never equal to another null. */
export const baseMetalRowSchema = z.object({
  id: z.string().min(1).max(80),
  spec: z.string().min(1),
  grade: z.string(),
  uns_or_en_number: text,
  product_form: z.string(),
  p_no: text,
  group_no: number,
  iso_15608_group: text,
  iso_15608_subgroup: text,
  aws_d1_1_group: text,
  aws_d1_2_m_no: text,
  min_tensile_mpa: number,
  min_yield_mpa: number,
  min_elongation_pct: number,
  nominal_composition: text,
  density_kg_m3: number,
  aliases: z.array(z.string()),
  basis: z.string(),
  p_no_basis: text,
  group_no_basis: text,
  iso_15608_basis: text,
  properties_basis: text,
  source: z.string(),
  note: text,
})
export type BaseMetalRow = z.infer<typeof baseMetalRowSchema>

/** Key: specification and classification. A-No. null = not applicable (nonferrous) or not decided by the classification. */
export const fillerRowSchema = z.object({
  id: z.string().min(1).max(80),
  spec: z.string().min(1),
  classification: z.string().min(1),
  uns: text,
  f_no: number,
  a_no: number,
  iso_9606_filler_group: text,
  hydrogen_designator: text,
  min_tensile_mpa: number,
  min_yield_mpa: number,
  min_elongation_pct: number,
  nominal_composition: text,
  current_types: z.array(z.string()),
  positions: z.array(z.string()),
  processes: z.array(z.string()),
  diameters_mm: z.array(z.number()),
  notes: text,
  a_no_basis: text,
  basis: z.string(),
  properties_basis: text,
  uns_basis: text,
  source: z.string(),
})
export type FillerRow = z.infer<typeof fillerRowSchema>

/** A mixture with its composition, or (no components) a class of ISO 14175. Volume per cent. */
export const gasRowSchema = z.object({
  id: z.string().min(1).max(80),
  name: z.string(),
  symbol: text,
  awsDesignation: text,
  components: z.array(z.object({ gas: z.enum(['Ar', 'He', 'CO2', 'O2', 'N2', 'H2']), percent: z.number().min(0).max(100) })),
  limits: text,
  use: text,
  basis: z.string(),
  source: z.string(),
})
export type GasRow = z.infer<typeof gasRowSchema>

export const positionRowSchema = z.object({ asme_aws: text, weld_type: z.enum(['groove', 'fillet']), product: z.string(), progression: z.enum(['up', 'down']).nullable(), iso_6947: z.string(), basis: z.string(), note: text })
export type PositionRow = z.infer<typeof positionRowSchema>

export const processRowSchema = z.object({
  aws: z.string(),
  name: z.string(),
  iso_4063: z.array(z.object({ no: z.string(), what: z.string() })),
  mechanisation: z.array(z.string()),
  thermal_efficiency_k: number,
  k_basis: text,
  variants: z.array(z.object({ code: z.string(), what: z.string(), iso_letter: z.string().optional() })),
  note: text,
})
export type ProcessRow = z.infer<typeof processRowSchema>

/** A stored content and the reference row are both accepted where a row is copied into a record. */
export type RowContent<T> = T | Record<string, unknown>
