/** The cases on which the engine is measured: one procedure of every variable stated, two coupons, and many ways to edit it. */
import type { AssessInput } from '../../shared/assessment/assess.ts'
import type { AssessedCoupon } from '../../shared/schemas/assessment.ts'
import type { StandardId } from '../../shared/schemas/common.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent, type WeldingVariables } from '../../shared/schemas/welding.ts'
import { interval, quantity } from '../../shared/units/convert.ts'

export interface Case {
  name: string
  input: AssessInput
  /** The same procedure in other words: what somebody types, or another record of the same kind. */
  pool: readonly AssessInput[]
}

interface Choice { standard: StandardId; edition: string; level: '1' | '2' | null }

const metal = { specification: 'SA-516', grade: '485', uns: 'K02700', productForm: 'plate', pNumber: '1', groupNumber: 2, iso15608: '1.2', d11Group: 'II', minTensile: quantity(485, 'stress'), minYield: quantity(260, 'stress'), minElongation: quantity(21, 'percent'), impactSpecified: false, condition: 'N' }

/** What a weld of 82 % argon, pulsed GMAW and plate was, or asks for. */
function variables(choice: Choice, thickness: readonly [number, number], deposit: readonly [number, number]): unknown {
  return {
    standards: [choice],
    unitSystem: 'SI',
    toughnessRequired: true,
    impactTemperature: quantity(-20, 'temperature'),
    impactEnergy: quantity(27, 'energy'),
    hardnessRequired: false,
    product: 'plate',
    joint: { weld: 'groove', type: 'butt', penetration: 'full', groove: 'single-v', includedAngle: interval(60, 60, 'angle'), rootOpening: interval(2, 3, 'length'), rootFace: interval(1, 2, 'length'), backing: 'metal', backingMaterial: 'carbon steel', retainers: false, backGouging: 'none', weldedFromBothSides: false },
    baseMetals: { a: metal, b: metal },
    thickness: interval(...thickness, 'length'),
    preheat: { minimum: quantity(50, 'temperature'), interpassMaximum: quantity(220, 'temperature'), maintenance: 'until welding is complete', method: 'burner' },
    postHeating: { used: false, temperature: null, time: null },
    pwht: { condition: 'below-lower-transformation', temperature: interval(590, 620, 'temperature'), time: interval(60, 75, 'time'), heatingRate: '100 °C/h' },
    processes: [
      {
        id: 'p1',
        process: 'GMAW',
        mechanisation: 'machine',
        depositThickness: interval(...deposit, 'length'),
        maxPassThickness: quantity(4, 'length'),
        filler: { added: true, specification: 'SFA-5.18', classification: 'ER70S-6', tradeName: 'Larkfield Trial Wire', fNumber: '6', aNumber: 1, productForm: 'solid', diameters: [quantity(1.2, 'length')], supplemental: false, supplementalAlloyElement: false, consumableInsert: false, fluxIsRecrushedSlag: false, penetrationFlux: false },
        positions: ['1G'],
        progression: 'up',
        shieldingGas: { components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }], isoSymbol: 'M21', name: 'Ar 82 / CO2 18', flow: interval(15, 18, 'gasFlow') },
        backingGas: { name: 'none' },
        trailingGas: { name: 'none' },
        electrical: { currentType: 'DCEP', transferMode: 'pulsed-spray', pulsed: true, waveformControlled: false, powerSource: 'constant-voltage', current: interval(220, 250, 'current'), makerCurrent: interval(150, 320, 'current'), voltage: interval(26, 28, 'voltage'), wireFeed: interval(8, 9, 'wireFeed'), travelSpeed: interval(350, 400, 'travelSpeed'), heatInput: interval(0.8, 1.2, 'heatInput'), heatInputMethod: 'meter', heatInputQuantity: 'arc-energy', pulseFrequency: interval(120, 160, 'frequency'), pulseOnTime: interval(2, 2.4, 'pulseTime'), backgroundCurrent: interval(60, 80, 'current'), peakCurrent: interval(400, 440, 'current') },
        technique: { bead: 'stringer', oscillation: 'none', initialCleaning: 'grinding', interpassCleaning: 'brushing', passesPerSide: 'multiple', electrodes: 'single', electrodeSpacing: quantity(0, 'length'), contactTubeDistance: interval(15, 18, 'length'), nozzleSize: '16 mm', peening: 'none', closedChamber: false, thermalPreparation: false, hotWire: false },
      },
    ],
  }
}

function coupon(number: string, choice: Choice, T: number, change: (variables: WeldingVariables) => void): AssessedCoupon {
  const content: CouponContent = couponContentSchema.parse({
    title: `Pulsed GMAW on ${T} mm plate`,
    variables: variables(choice, [T, T], [T, T]),
    weldedOn: '2026-03-02',
    testedOn: '2026-03-09',
    welder: 'Welder 14',
    laboratory: 'Larkfield test house',
    reportNumber: number,
    tension: [1, 2].map((n) => ({ id: `t${n}`, specimen: `T${n}`, kind: 'reduced-section', width: quantity(19, 'length'), thickness: quantity(T, 'length'), load: quantity(10 * T, 'force'), fracture: 'base-metal', fractureType: 'ductile' })),
    bends: [1, 2, 3, 4].map((n) => ({ id: `b${n}`, specimen: `B${n}`, kind: 'side', thickness: quantity(10, 'length'), formerDiameter: quantity(40, 'length'), angle: quantity(180, 'angle'), inspected: true })),
    macros: [{ id: 'm1', specimen: 'M1', fusionComplete: true, cracks: false }],
    toughness: (['weld', 'heat-affected-zone'] as const).map((place) => ({ id: place, place, temperature: quantity(-20, 'temperature'), size: '10 x 10', values: [quantity(60, 'energy'), quantity(70, 'energy'), quantity(65, 'energy')] })),
  })
  const observed = content.variables.processes[0]?.electrical
  if (observed) Object.assign(observed, { current: interval(235, undefined, 'current'), voltage: interval(27, undefined, 'voltage'), travelSpeed: interval(370, undefined, 'travelSpeed'), wireFeed: interval(8.5, undefined, 'wireFeed'), heatInput: interval(1.2, undefined, 'heatInput') })
  change(content.variables)
  return { id: number, number, certified: true, content }
}

/** Edits the n-th time: other settings and sizes, and now and then one that no coupon covers. */
function edit(given: ProcedureContent, n: number): ProcedureContent {
  const content = structuredClone(given)
  const { variables } = content
  const block = variables.processes[0]
  if (!block) throw new Error('The procedure has no process.')
  const { electrical, filler } = block
  const step = (most: number, per = 1): number => Math.floor(n / per) % (most + 1)
  electrical.current = interval(218 + step(6), 240 + step(14, 3), 'current')
  electrical.voltage = interval(26 + step(5) / 10, 27.5 + step(9, 5) / 10, 'voltage')
  electrical.travelSpeed = interval(350 + step(12), 385 + step(20, 2), 'travelSpeed')
  electrical.heatInput = interval(null, 1 + step(19, 7) / 100, 'heatInput')
  variables.preheat.minimum = quantity(40 + step(30, 4), 'temperature')
  variables.preheat.interpassMaximum = quantity(200 + step(45, 2), 'temperature')
  // The lower of the two thicknesses and the deposit stay within what either coupon gives, save for one in ten.
  const thickest = 20 + step(4, 6)
  variables.thickness = interval(16 + step(3), thickest, 'length')
  block.depositThickness = interval(null, thickest, 'length')
  if (n % 10 === 4) variables.thickness = interval(8, thickest, 'length')
  if (n % 10 === 7) filler.fNumber = '4'
  if (n % 40 === 9) variables.preheat.minimum = null
  return procedureContentSchema.parse(content)
}

function build(name: string, choice: Choice, size: number): Case {
  const procedure = procedureContentSchema.parse({ title: 'Groove welds in carbon steel plate', variables: variables(choice, [16, 24], [24, 24]) })
  const coupons = [coupon('PQR-101', choice, 20, () => undefined), coupon('PQR-102', choice, 25, (own) => { own.preheat.minimum = quantity(60, 'temperature') })]
  const input: AssessInput = { procedure, coupons, standard: choice.standard, edition: choice.edition, level: choice.level }
  return { name, input, pool: Array.from({ length: size }, (_, n) => ({ ...input, procedure: edit(procedure, n) })) }
}

/** Pulsed GMAW with toughness on two coupons, under three standards. @param size procedures in each pool, every one an object of its own */
export const cases = (size: number): Case[] => [
  build('ASME IX', { standard: 'asme-ix', edition: '2021', level: null }, size),
  build('AWS D1.1', { standard: 'aws-d1-1', edition: '2020', level: null }, size),
  build('ISO 15614-1, level 2', { standard: 'iso-15614-1', edition: '2017+A1:2019', level: '2' }, size),
]
