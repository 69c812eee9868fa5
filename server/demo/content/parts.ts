/** Small builders for the demo firm's records: figures as somebody would type them, metals and fillers from the library. */
import type { z } from 'zod'
import { baseMetalById, toBaseMetal } from '@shared/library/base-metals.ts'
import { fillerById, toFiller } from '@shared/library/filler-metals.ts'
import { gasById, toGasMixture } from '@shared/library/gases.ts'
import { gasMixtureSchema, weldingVariablesSchema, type BaseMetal, type Filler, type GasMixture, type WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'

export const mm = (min: number, max?: number) => interval(min, max, 'length')
export const size = (value: number) => quantity(value, 'length')
export const celsius = (value: number) => quantity(value, 'temperature')
export const amps = (min: number, max?: number) => interval(min, max, 'current')
export const volts = (min: number, max?: number) => interval(min, max, 'voltage')
export const travel = (min: number, max?: number) => interval(min, max, 'travelSpeed')
export const feed = (min: number, max: number | undefined = undefined, unit = 'm/min') => interval(min, max, 'wireFeed', unit)
const degrees = (min: number, max?: number) => interval(min, max, 'angle')

const found = <T>(row: T | null, id: string): T => {
  if (row === null) throw new Error(`the library has no ${id}`)
  return row
}

export const metal = (id: string, more: Partial<BaseMetal> = {}): BaseMetal => ({ ...toBaseMetal(found(baseMetalById(id), id)), ...more })
export const filler = (id: string, sizes: readonly number[], more: Partial<Filler> = {}): Filler => ({ ...toFiller(found(fillerById(id), id)), diameters: sizes.map(size), supplemental: false, consumableInsert: false, penetrationFlux: false, supplementalAlloyElement: false, ...more })
export const gas = (id: string, min: number, max?: number): GasMixture => ({ ...toGasMixture(found(gasById(id), id)), flow: interval(min, max, 'gasFlow') })
export const noGas: GasMixture = gasMixtureSchema.parse({ name: 'none' })

type VariablesInput = Omit<z.input<typeof weldingVariablesSchema>, 'standards'>

/** Variables under ASME IX; what the trade always states for such a weld is filled in. */
export const variables = (given: VariablesInput): WeldingVariables =>
  weldingVariablesSchema.parse({
    standards: [{ standard: 'asme-ix', edition: '2021' }],
    toughnessRequired: false,
    pwht: { condition: 'none' },
    ...given,
    joint: { weld: 'groove', type: 'butt', penetration: 'full', groove: 'single-v', backing: 'none', retainers: false, backGouging: 'none', ...given.joint },
  })

/** A plain V with its usual fit-up. */
export const vGroove = (root: [number, number], face: [number, number], angle: [number, number] = [60, 70]) => ({ includedAngle: degrees(...angle), rootOpening: mm(...root), rootFace: mm(...face) })
