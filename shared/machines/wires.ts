/** Whether a program's wires, diameters and gases are those of a procedure; null is "cannot tell". */
import { classifyGas } from '../library/gases.ts'
import { bareClassification, resolveFiller } from '../library/filler-metals.ts'
import type { MachineProgram } from '../schemas/machines.ts'
import { GASES, type GasMixture } from '../schemas/welding.ts'

const squeezed = (text: string): string => bareClassification(text).replace(/[^A-Z0-9]/g, '')

/** ER5356 is ER5356 whether written "ER 5356", "er5356" or "AWS A5.10 ER5356". */
export function isSameWire(one: string, other: string): boolean {
  const [a, b] = [squeezed(one), squeezed(other)]
  if (a === '' || b === '') return false
  const words = (text: string) => text.toUpperCase().split(/[\s,;/()]+/).map(squeezed)
  return a === b || words(one).includes(b) || words(other).includes(a)
}

/** Sizes of wire are nominal: 0.045 in (1.14 mm) is sold as 1.2 mm, 3/64 in is 1.19, 0.035 in is 0.9. [common practice] */
const NOMINAL_MM = 0.065
export const isSameDiameter = (one: number, other: number): boolean => Math.abs(one - other) <= NOMINAL_MM

export interface WireFamily { key: string; name: string }

/** By the number of the AWS specification, and of the ISO standard, in which the library lists the wire. */
const FAMILY_OF_SPEC: readonly (readonly [RegExp, WireFamily])[] = [
  [/5\.(?:9|4|22)\b|14343|3581\b|17633/, { key: 'stainless', name: 'stainless steel' }],
  [/5\.(?:11|14)\b|18274|14172/, { key: 'nickel', name: 'nickel alloy' }],
  [/5\.(?:6|7)\b|24373/, { key: 'copper', name: 'copper alloy' }],
  [/5\.16\b|24034/, { key: 'titanium', name: 'titanium' }],
  [/5\.(?:1|5|17|18|20|23|28|29|36)\b|14341|2560|636\b|17632|16834|21952|14171|3580|18275/, { key: 'steel', name: 'carbon or low-alloy steel' }],
]
const aluminium = (series: string): WireFamily => ({ key: `aluminium-${series}`, name: `aluminium ${series}xxx` })

/**
 * The alloy family of a wire: what a machine's program cannot serve together. The library's specification tells it; aluminium goes
 * by the digit of its series (AWS A5.10, ISO 18273).
 * @returns null when the library does not list it and its letters do not tell
 */
export function wireFamily(classification: string): WireFamily | null {
  const row = resolveFiller(classification.trim())
  if (row && /5\.10\b|18273/.test(row.spec)) return aluminium(/(\d)\d{3}/.exec(row.classification)?.[1] ?? '')
  if (row) return FAMILY_OF_SPEC.find(([pattern]) => pattern.test(row.spec))?.[1] ?? null
  const [, series] = /^(?:ER|R|S AL |AL ?)?([1345])\d{3}[A-Z]?$/i.exec(classification.trim()) ?? []
  return series === undefined ? null : aluminium(series)
}

export const isAluminiumWire = (classification: string): boolean => wireFamily(classification)?.key.startsWith('aluminium') ?? false

/** Families that one program stands for; more than one means that it lumps alloys together. */
export const familiesOf = (wires: readonly string[]): WireFamily[] => [...new Map(wires.flatMap((wire) => wireFamily(wire) ?? []).map((family) => [family.key, family])).values()]

const WORDS: Readonly<Record<string, string>> = { ARGON: 'Ar', HELIUM: 'He', CO2: 'CO2', OXYGEN: 'O2', NITROGEN: 'N2', HYDROGEN: 'H2' }
type Components = GasMixture['components']

/**
 * A gas as people write it on a machine or in a log: "Ar 100", "argon", "82 Ar 18 CO2", "Ar/CO2 82/18", "Ar + 2 % O2".
 * The base gas, named first, may be left without its share: it is the rest.
 * @returns null when it names no gas, or the shares do not make 100 %
 */
export function readGas(text: string): Components | null {
  const plain = Object.entries(WORDS).reduce((line, [word, gas]) => line.replace(new RegExp(word, 'gi'), gas), text.replace(/₂/g, '2').replace(/carbon dioxide/gi, 'CO2'))
  const tokens = [...plain.matchAll(/\b(CO2|O2|N2|H2|Ar|He)\b|(\d+(?:[.,]\d+)?)\s*%?/gi)]
  const names = tokens.flatMap(([, gas]) => GASES.filter((one) => one.toUpperCase() === gas?.toUpperCase()))
  const shares = tokens.flatMap(([, , share]) => (share === undefined ? [] : [Number(share.replace(',', '.'))]))
  if (names.length === 0 || new Set(names).size !== names.length) return null
  const sum = shares.reduce((total, share) => total + share, 0)
  if (shares.length === names.length) return Math.abs(sum - 100) < 0.01 ? names.map((gas, index) => ({ gas, percent: shares[index] ?? 0 })) : null
  if (shares.length !== names.length - 1 || sum >= 100) return null
  // The base gas is named first: "Ar + 2 % O2". Which gas "CO2 18 Ar" means by its figure cannot be told.
  const [base] = names
  if (names.length > 1 && base !== 'Ar' && base !== 'He') return null
  return names.map((gas, index) => ({ gas, percent: index === 0 ? 100 - sum : (shares[index - 1] ?? 0) }))
}

const key = (components: Components): string => [...components].filter(({ percent }) => percent > 0).sort((one, other) => one.gas.localeCompare(other.gas)).map(({ gas, percent }) => `${gas} ${Number(percent.toFixed(2))}`).join(' ')
const isSymbol = (text: string): boolean => /^(?:I[1-3]|M[1-3]\d?|C[12]|R[12]|N[1-5]|O1)$/i.test(text.trim())

/**
 * Whether a gas written as text is the procedure's; a text that is a symbol of ISO 14175 (M21) is compared by symbol.
 * @returns null when either side does not say enough
 */
export function isSameGas(text: string, mixture: GasMixture | null): boolean | null {
  if (!mixture) return null
  if (isSymbol(text)) {
    const symbol = mixture.isoSymbol ?? classifyGas(mixture.components).symbol
    return symbol === null ? null : symbol.toUpperCase() === text.trim().toUpperCase()
  }
  if (mixture.name && mixture.name.trim().toLowerCase() === text.trim().toLowerCase()) return true
  const read = readGas(text)
  return read === null || mixture.components.length === 0 ? null : key(read) === key(mixture.components)
}

/** The gas in words of this module, e.g. "Ar 82 CO2 18", as a program's measured points name it. */
export const gasText = (mixture: GasMixture | null): string | null => (mixture && mixture.components.length > 0 ? [...mixture.components].sort((one, other) => other.percent - one.percent).map(({ gas, percent }) => `${gas} ${Number(percent.toFixed(2))}`).join(' ') : (mixture?.name ?? null))

/** Whether any of a program's list is it: null when the list is empty, or nothing in it can be told. */
export function among<T>(list: readonly T[], same: (one: T) => boolean | null): boolean | null {
  const answers = list.map(same)
  return answers.includes(true) ? true : answers.length > 0 && answers.every((answer) => answer === false) ? false : null
}

/** The procedure's wire of this card. */
export interface CardWire { classification: string | null; /** mm */ diameter: number | null; gas: GasMixture | null }

/** How well a program is made for a wire: each point true, false, or null where it does not say. */
export const programFit = ({ wires, diameters, gases }: Pick<MachineProgram, 'wires' | 'diameters' | 'gases'>, wire: CardWire) => ({
  wire: wire.classification === null ? null : among(wires, (one) => isSameWire(one, wire.classification ?? '')),
  diameter: wire.diameter === null ? null : among(diameters, (one) => isSameDiameter(one, wire.diameter ?? 0)),
  gas: among(gases, (one) => isSameGas(one, wire.gas)),
})

/** The shop's own measurements of this wire, diameter and gas, in whatever trims. */
export const measurementsFor = ({ measured }: Pick<MachineProgram, 'measured'>, wire: CardWire): MachineProgram['measured'] =>
  measured.filter((one) => wire.classification !== null && wire.diameter !== null && isSameWire(one.wire, wire.classification) && isSameDiameter(one.diameter, wire.diameter) && isSameGas(one.gas, wire.gas) === true)
