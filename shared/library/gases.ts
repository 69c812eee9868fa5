/**
 * Gases and their mixtures, classed by ISO 14175. The table of 2008 is from memory (main groups, sub-groups and the
 * 15 % boundary of M20 and M21 secondary); basis and source travel with each answer.
 */
import type { GasMixture } from '../schemas/welding.ts'
import usual from './data/usual-mixtures.json' with { type: 'json' }
import data from './data/shielding-gases.json' with { type: 'json' }
import { gasRowSchema, type GasRow, type RowContent } from './rows.ts'
import { findRows } from './search.ts'

export type GasComponent = GasMixture['components'][number]
type Gas = GasComponent['gas']

export interface GasClassification {
  /** `M21`, `I3` … ; `Z` for a mixture outside the table; null when the figures are no mixture at all. */
  symbol: string | null
  /** `ISO 14175-M21-ArC-18`; null with the symbol. */
  designation: string | null
  /** The classification, one plain step a line. */
  steps: string[]
  standard: string
  edition: '2008'
  clause: string
  basis: 'memory'
  source: string
}

interface Band { min: number; min_inclusive: boolean; max: number; max_inclusive: boolean }
interface TableRow { symbol: string; balance: string; co2: Band | null; o2: Band | null; h2: Band | null; n2: Band | null; he: Band | null; helium_may_replace_argon: boolean; typical_use: string }

const table: readonly TableRow[] = data.table
const PURE: Readonly<Partial<Record<Gas, string>>> = { Ar: 'I1', He: 'I2', CO2: 'C1', N2: 'N1', O2: 'O1' }
const LETTER: Readonly<Record<Gas, string>> = { Ar: 'Ar', He: 'He', CO2: 'C', O2: 'O', N2: 'N', H2: 'H' }
const NAMES: Readonly<Record<Gas, string>> = { Ar: 'argon', He: 'helium', CO2: 'carbon dioxide', O2: 'oxygen', N2: 'nitrogen', H2: 'hydrogen' }
const ACTIVE = [['CO2', 'co2'], ['O2', 'o2'], ['H2', 'h2'], ['N2', 'n2']] as const

const inBand = (percent: number, band: Band): boolean => (band.min_inclusive ? percent >= band.min : percent > band.min) && (band.max_inclusive ? percent <= band.max : percent < band.max)
const bandText = (band: Band): string => `${band.min_inclusive ? 'from' : 'above'} ${band.min} to ${band.max} %`
const percentText = (percent: number): string => `${Number(percent.toFixed(3))} %`

/** Components with a share, largest first; the same gas named twice is one component. */
function shares(components: readonly GasComponent[]): GasComponent[] {
  const sums = new Map<Gas, number>()
  for (const { gas, percent } of components) if (percent > 0) sums.set(gas, (sums.get(gas) ?? 0) + percent)
  return [...sums].map(([gas, percent]) => ({ gas, percent: Number(percent.toFixed(6)) })).sort((one, other) => other.percent - one.percent)
}

/** Base gas first, then the others by falling percentage, their figures parted by a slash. */
function designate(symbol: string, parts: readonly GasComponent[]): string {
  const [base, ...others] = parts
  const letters = [base, ...others].map((part) => (part ? LETTER[part.gas] : '')).join('')
  const figures = others.map((part) => String(Number(part.percent.toFixed(2)))).join('/')
  return ['ISO 14175', symbol, letters, figures].filter((part) => part !== '').join('-')
}

function symbolOf(parts: readonly GasComponent[], steps: string[]): string {
  const share = new Map(parts.map(({ gas, percent }) => [gas, percent]))
  const [only] = parts
  if (parts.length === 1 && only) {
    const pure = PURE[only.gas]
    steps.push(pure ? `${percentText(100)} ${NAMES[only.gas]} is ${pure}.` : `Pure ${NAMES[only.gas]} is not in the table.`)
    return pure ?? 'Z'
  }
  const [argon, helium] = [share.get('Ar') ?? 0, share.get('He') ?? 0]
  const added = ACTIVE.filter(([gas]) => share.has(gas))
  const balance = argon + helium > 0 ? 'Ar' : share.has('CO2') ? 'CO2' : 'N2'
  if (added.length === 0) {
    steps.push(`Argon and helium alone: the row for ${percentText(helium)} helium.`)
    return table.find((row) => row.symbol === 'I3' && row.he && inBand(helium, row.he))?.symbol ?? 'Z'
  }
  if (helium > 0) steps.push(`Helium counts as argon here: ${percentText(argon + helium)} together.`)
  const components = added.filter(([gas]) => gas !== balance)
  steps.push(`Balance ${balance === 'Ar' ? 'argon' : NAMES[balance]}; added: ${components.map(([gas]) => `${percentText(share.get(gas) ?? 0)} ${NAMES[gas]}`).join(', ')}.`)
  const row = table.find((candidate) => {
    if (candidate.balance !== balance || candidate.symbol === 'I3') return false
    return ACTIVE.every(([gas, column]) => {
      if (gas === balance) return candidate[column] === null
      const [band, percent] = [candidate[column], share.get(gas)]
      return band === null ? percent === undefined : percent !== undefined && inBand(percent, band)
    })
  })
  if (row) steps.push(`${row.symbol} takes ${components.flatMap(([gas, column]) => (row[column] ? [`${NAMES[gas]} ${bandText(row[column])}`] : [])).join(' and ')}.`)
  return row?.symbol ?? 'Z'
}

/**
 * Classes a mixture by ISO 14175:2008, Table 2, from nominal volume percentages.
 * @returns the symbol and how it came about; symbol null when the percentages do not sum to 100
 */
export function classifyGas(components: readonly GasComponent[]): GasClassification {
  const told = { standard: data.standard, edition: '2008', clause: data.clause, basis: 'memory', source: data.basis_note } as const
  const parts = shares(components)
  const sum = parts.reduce((total, { percent }) => total + percent, 0)
  if (parts.length === 0) return { ...told, symbol: null, designation: null, steps: ['No gas is stated.'] }
  if (Math.abs(sum - 100) > 0.01) return { ...told, symbol: null, designation: null, steps: [`The components sum to ${percentText(sum)}; a mixture sums to 100 %.`] }
  const steps = [`The components sum to 100 %: ${parts.map(({ gas, percent }) => `${percentText(percent)} ${NAMES[gas]}`).join(', ')}.`]
  const symbol = symbolOf(parts, steps)
  if (symbol === 'Z') steps.push('No row of the table holds this mixture: Z.')
  return { ...told, symbol, designation: designate(symbol, parts), steps }
}

const componentsOf = (mixture: Readonly<Partial<Record<string, number>>>): GasComponent[] => (Object.keys(LETTER) as Gas[]).flatMap((gas) => (mixture[gas] ? [{ gas, percent: mixture[gas] }] : []))
const key = (components: readonly GasComponent[]): string => shares(components).map(({ gas, percent }) => `${gas.toLowerCase()}-${percent}`).join('-').replaceAll('.', '_')
const describe = (components: readonly GasComponent[]): string => shares(components).map(({ gas, percent }) => `${gas} ${Number(percent.toFixed(2))}`).join(', ')

const mixture = (name: string, components: GasComponent[], awsDesignation: string | null, use: string | null, basis: string, source: string): GasRow => ({ id: `mix-${key(components)}`, name, symbol: classifyGas(components).symbol, awsDesignation, components, limits: null, use, basis, source })

const pureGas: Readonly<Record<string, Gas>> = { I1: 'Ar', I2: 'He', C1: 'CO2', N1: 'N2', O1: 'O2' }
const classRow = (row: TableRow): GasRow => ({
  id: `iso-14175-${row.symbol.toLowerCase()}`,
  name: `ISO 14175 ${row.symbol}`,
  symbol: row.symbol,
  awsDesignation: null,
  components: pureGas[row.symbol] ? [{ gas: pureGas[row.symbol] ?? 'Ar', percent: 100 }] : [],
  limits: [...ACTIVE.flatMap(([gas, column]) => (row[column] ? [`${gas} ${bandText(row[column])}`] : [])), ...(row.he ? [`He ${bandText(row.he)}`] : []), `balance ${row.balance}`].join(', '),
  use: row.typical_use,
  basis: data.basis,
  source: `${data.standard}:${data.edition}, ${data.clause}`,
})

const a532 = data.aws_a5_32.designations.flatMap(({ sg, mixture: written }) => {
  const components = componentsOf(Object.fromEntries([...written.matchAll(/(Ar|He|CO2|O2|N2|H2) ([\d.]+)/g)].map(([, gas, percent]) => [gas ?? '', Number(percent)])))
  return components.length > 0 ? [mixture(describe(components), components, sg, null, data.aws_a5_32.basis, `${data.aws_a5_32.standard}, ${data.aws_a5_32.edition}`)] : []
})
const practice = usual.mixtures.map(({ name, components, use }) => mixture(name, componentsOf(components), null, use, usual.basis, usual.source))

/** Mixtures with their composition first, then the classes of the standard. */
export const gases: readonly GasRow[] = [...new Map([...practice, ...a532].map((row) => [row.id, row])).values(), ...table.map(classRow)]

/** @returns the reference row with that key, or null */
export const gasById = (id: string): GasRow | null => gases.find((row) => row.id === id) ?? null

/** The gas in words: `Ar 82, CO2 18`. */
export const gasTitle = (row: GasRow): string => (row.components.length > 0 && row.id.startsWith('mix-') ? describe(row.components) : row.name)
export const gasSearch = (row: GasRow): string => [row.symbol, row.name, row.awsDesignation, describe(row.components), row.components.map(({ percent }) => percent).join('/'), row.use].filter((part) => part !== null && part !== '').join(' | ')

/** Type-ahead over symbol, composition (`82/18`, `argon 18 co2`) and use; at most `limit` rows. */
export const findGases = (query: string, limit = 20): GasRow[] => findRows(gases, query, (row) => ({ title: gasTitle(row), search: gasSearch(row) }), limit)

/**
 * Copies a library row into a record; the flow stays open.
 * @throws ZodError when the content is not a gas's
 */
export function toGasMixture(content: RowContent<GasRow>): GasMixture {
  const row = gasRowSchema.parse(content)
  return { libraryId: row.id, components: row.components, isoSymbol: row.symbol, name: gasTitle(row).slice(0, 80), flow: null }
}
