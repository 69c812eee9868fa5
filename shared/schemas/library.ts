/** An organization's own rows of the library: what somebody writes; the row itself is made of it in shared/library/own-rows.ts. */
import { z } from 'zod'
import aNumbers from '../library/data/a-numbers.json' with { type: 'json' }
import fNumbers from '../library/data/f-numbers.json' with { type: 'json' }
import isoGroups from '../library/data/iso-15608-groups.json' with { type: 'json' }
import { hasGroups, pNumberProblem } from '../library/p-numbers.ts'
import { processes } from '../library/processes.ts'
import { textOrNull } from './common.ts'
import { GASES } from './welding.ts'

export const OWN_KINDS = ['base-metals', 'filler-metals', 'gases'] as const
export const ownKindSchema = z.enum(OWN_KINDS)
export type OwnKind = z.infer<typeof ownKindSchema>

/** Sub-groups by group. A group without any in the table may have some in another edition, so those are left to whoever writes. */
const ISO_GROUPS = new Map<string, string[]>()
for (const { group, subgroup } of isoGroups.table) ISO_GROUPS.set(group, [...(ISO_GROUPS.get(group) ?? []), ...(subgroup === null ? [] : [subgroup])])

function isIsoGroup(text: string): boolean {
  const [, main, part] = /^(\d{1,2})(?:\.(\d))?$/.exec(text) ?? []
  const parts = main === undefined ? undefined : ISO_GROUPS.get(main)
  return parts !== undefined && (part === undefined || parts.length === 0 || parts.includes(text))
}
const F_NUMBERS: readonly number[] = [...new Set(fNumbers.table.map(({ f_no }) => f_no))].sort((one, other) => one - other)
const A_NUMBERS: readonly number[] = aNumbers.table.map(({ a_no }) => a_no)
const PROCESS_NAMES: ReadonlySet<string> = new Set(processes.flatMap(({ aws, iso_4063, variants }) => [aws, ...iso_4063.map(({ no }) => no), ...variants.map(({ code }) => code)]))
export const D1_1_GROUPS = ['I', 'II', 'III', 'IV'] as const
export const FILLER_GROUPS = ['FM1', 'FM2', 'FM3', 'FM4', 'FM5', 'FM6'] as const

const figure = (what: string, most: number, unit: string) => z.number(`${what} is written as a figure in ${unit}.`).gt(0, `${what} is above 0 ${unit}.`).max(most, `${what} of more than ${most} ${unit} can’t be.`).nullable().default(null)
const source = z.string().trim().min(1, 'Say where the figures come from: a standard, a data sheet, a letter.').max(300)
const upper = (max: number) => textOrNull(max).transform((text) => (text === null ? null : text.toUpperCase()))

export const ownBaseMetalSchema = z
  .object({
    spec: z.string().trim().min(1, 'Name the standard or specification, or the maker’s own name for it.').max(80),
    grade: z.string().trim().max(80).default(''),
    uns_or_en_number: textOrNull(20),
    product_form: z.string().trim().min(1, 'Say in which form it comes: plate, pipe, forging.').max(80),
    p_no: upper(6),
    group_no: z.number('A Group Number is a whole number.').int('A Group Number is a whole number.').min(1, 'Group Numbers begin at 1.').max(9, 'Group Numbers end at 9.').nullable().default(null),
    iso_15608: textOrNull(8),
    aws_d1_1_group: z.enum(D1_1_GROUPS, 'AWS D1.1 has groups I to IV.').nullable().default(null),
    aws_d1_2_m_no: textOrNull(6),
    min_tensile_mpa: figure('A tensile strength', 3000, 'MPa'),
    min_yield_mpa: figure('A yield strength', 3000, 'MPa'),
    min_elongation_pct: figure('An elongation', 100, '%'),
    nominal_composition: textOrNull(120),
    density_kg_m3: figure('A density', 23000, 'kg/m³'),
    source,
    note: textOrNull(600),
  })
  .superRefine((row, context) => {
    const say = (field: string, message: string) => context.addIssue({ code: 'custom', path: [field], message })
    const wrong = row.p_no === null ? null : pNumberProblem(row.p_no)
    if (wrong) say('p_no', wrong)
    if (row.group_no !== null && row.p_no === null) say('group_no', 'A Group Number belongs to a P-Number: give that first.')
    else if (row.group_no !== null && row.p_no !== null && !wrong && !hasGroups(row.p_no)) say('group_no', `P-Number ${row.p_no} has no Group Numbers; only ferrous metals have.`)
    if (row.iso_15608 !== null && !isIsoGroup(row.iso_15608)) say('iso_15608', `ISO/TR 15608 has no group ${row.iso_15608}. A group is written 1 or 8, a sub-group 1.2 or 10.1.`)
    if (row.aws_d1_2_m_no !== null && !/^2[1-7]$/.test(row.aws_d1_2_m_no)) say('aws_d1_2_m_no', 'Material numbers of AWS D1.2 are of aluminium, 21 to 27.')
    if (row.min_yield_mpa !== null && row.min_tensile_mpa !== null && row.min_yield_mpa > row.min_tensile_mpa) say('min_yield_mpa', `A yield of ${row.min_yield_mpa} MPa is above the tensile strength of ${row.min_tensile_mpa} MPa.`)
  })
  .meta({ id: 'OwnBaseMetal' })
export type OwnBaseMetal = z.output<typeof ownBaseMetalSchema>

export const ownFillerSchema = z
  .object({
    spec: z.string().trim().min(1, 'Name the specification, or the maker’s own name for it.').max(80),
    classification: z.string().trim().min(1, 'Give the classification.').max(60),
    uns: textOrNull(20),
    f_no: z.number('An F-Number is a whole number.').int('An F-Number is a whole number.').nullable().default(null).refine((number) => number === null || F_NUMBERS.includes(number), { error: (issue) => `There is no F-Number ${String(issue.input)}. They are ${F_NUMBERS.join(', ')}.` }),
    a_no: z.number('An A-Number is a whole number.').int('An A-Number is a whole number.').nullable().default(null).refine((number) => number === null || A_NUMBERS.includes(number), { error: (issue) => `There is no A-Number ${String(issue.input)}. They run from 1 to ${A_NUMBERS.length}, for ferrous weld metal.` }),
    iso_9606_filler_group: z.enum(FILLER_GROUPS, 'ISO 9606 has the filler groups FM1 to FM6.').nullable().default(null),
    hydrogen_designator: textOrNull(40),
    min_tensile_mpa: figure('A tensile strength', 3000, 'MPa'),
    min_yield_mpa: figure('A yield strength', 3000, 'MPa'),
    min_elongation_pct: figure('An elongation', 100, '%'),
    nominal_composition: textOrNull(120),
    processes: z.array(z.string().trim().max(20)).min(1, 'Name a process that it is for, as AWS letters or an ISO 4063 number.').max(12),
    diameters_mm: z.array(z.number('Give each size as a figure in mm, e.g. 0.9, 1.2.').gt(0, 'A size is above 0 mm.').max(20, 'A size of more than 20 mm can’t be.')).max(20).default([]),
    source,
    notes: textOrNull(600),
  })
  .superRefine((row, context) => {
    const unknown = row.processes.find((name) => !PROCESS_NAMES.has(name.toUpperCase()))
    if (unknown !== undefined) context.addIssue({ code: 'custom', path: ['processes'], message: `“${unknown}” is no process that is known here. Write AWS letters (GMAW) or an ISO 4063 number (135).` })
    if (row.f_no !== null && row.f_no >= 20 && row.a_no !== null) context.addIssue({ code: 'custom', path: ['a_no'], message: `A-Numbers are of ferrous weld metal; a filler of F-Number ${row.f_no} has none.` })
    if (row.min_yield_mpa !== null && row.min_tensile_mpa !== null && row.min_yield_mpa > row.min_tensile_mpa) context.addIssue({ code: 'custom', path: ['min_yield_mpa'], message: `A yield of ${row.min_yield_mpa} MPa is above the tensile strength of ${row.min_tensile_mpa} MPa.` })
  })
  .meta({ id: 'OwnFiller' })
export type OwnFiller = z.output<typeof ownFillerSchema>

export const ownGasSchema = z
  .object({
    name: z.string().trim().min(1, 'Give the mixture a name.').max(80),
    awsDesignation: textOrNull(40),
    components: z.array(z.object({ gas: z.enum(GASES), percent: z.number('Give the share in per cent.').gt(0, 'A share is above 0 %.').max(100, 'A share can’t be above 100 %.') })).min(1, 'Give the parts by volume; pure gas is one part of 100 %.').max(6),
    use: textOrNull(200),
    source,
  })
  .superRefine(({ components }, context) => {
    components.forEach(({ gas }, index) => {
      if (components.findIndex((other) => other.gas === gas) !== index) context.addIssue({ code: 'custom', path: ['components', index, 'gas'], message: `${gas} is given twice.` })
    })
    const sum = components.reduce((total, { percent }) => total + percent, 0)
    if (components.length > 0 && Math.abs(sum - 100) > 0.01) context.addIssue({ code: 'custom', path: ['components'], message: `The parts add up to ${Number(sum.toFixed(3))} %; a mixture is 100 %.` })
  })
  .meta({ id: 'OwnGas' })
export type OwnGas = z.output<typeof ownGasSchema>

export const ownSchemas = { 'base-metals': ownBaseMetalSchema, 'filler-metals': ownFillerSchema, gases: ownGasSchema } as const

/** An own row with its kind. */
export const writeLibraryItemSchema = z
  .discriminatedUnion('kind', [z.object({ kind: z.literal('base-metals'), content: ownBaseMetalSchema }), z.object({ kind: z.literal('filler-metals'), content: ownFillerSchema }), z.object({ kind: z.literal('gases'), content: ownGasSchema })])
  .meta({ id: 'WriteLibraryItem' })
export type WriteLibraryItem = z.output<typeof writeLibraryItemSchema>
