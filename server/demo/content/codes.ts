/** Work to other codes at the demo firm: a frame to AWS D1.1, a gangway to AWS D1.2, a skid to ISO 15614-1 level 2. Settings are usual ones, invented for these records. */
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent, type WeldingVariables } from '@shared/schemas/welding.ts'
import type { StandardChoice } from '@shared/schemas/common.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { amps, celsius, feed, filler, gas, metal, mm, noGas, size, travel, variables, vGroove, volts } from './parts.ts'
import { bends, FOUR_SIDE, runs, tensions } from './tests.ts'

type Block = WeldingVariables['processes'][number]
type BlockInput = Parameters<typeof variables>[0]['processes'][number]
const by = (choice: StandardChoice, given: Parameters<typeof variables>[0]): WeldingVariables => ({ ...variables(given), standards: [choice] })
const kilojoules = (min: number, max?: number) => interval(min, max, 'heatInput')
const joules = (values: readonly number[]) => values.map((value) => quantity(value, 'energy'))
const examined = (method: 'VT' | 'RT' | 'UT' | 'PT' | 'MT', reportNumber: string) => ({ id: method.toLowerCase(), method, wholeLength: true, accepted: true, reportNumber })
const clean = { initialCleaning: 'Grind to bright metal 25 mm either side.', interpassCleaning: 'Chip and brush each layer.', passesPerSide: 'multiple', electrodes: 'single', peening: 'none', closedChamber: false, thermalPreparation: false } as const
const tested = { laboratory: 'Wharfside Materials Laboratory', machine: 'M-002' }

/** What a block asks for, or what it was: the same weld with a spread or without. */
interface Spread { deposit: ReturnType<typeof mm>; current: Block['electrical']['current']; voltage: Block['electrical']['voltage']; wire: Block['electrical']['wireFeed']; speed: Block['electrical']['travelSpeed']; heat: Block['electrical']['heatInput']; flow: [number, number?] }

const structural: StandardChoice = { standard: 'aws-d1-1', edition: '2020', level: null }
const fluxCored = ({ deposit, current, voltage, wire, speed, heat, flow }: Spread): BlockInput => ({
  id: 'fcaw', process: 'FCAW', mechanisation: 'semiautomatic', depositThickness: deposit, maxPassThickness: size(6), positions: ['3G'], progression: 'up',
  filler: filler('a520-e71t-1c', [1.2], { tradeName: 'Weirwire 71' }), shieldingGas: gas('mix-co2-100', ...flow), backingGas: noGas, trailingGas: noGas,
  electrical: { currentType: 'DCEP', transferMode: 'spray', pulsed: false, waveformControlled: false, powerSource: 'constant-voltage', current, makerCurrent: amps(150, 280), voltage, wireFeed: wire, travelSpeed: speed, heatInput: heat, heatInputMethod: 'meter' },
  technique: { ...clean, bead: 'both', oscillation: 'none', electrodeCount: 1, nozzleSize: '16 mm', contactTubeDistance: mm(18, 22) },
})
const frame = { product: 'plate', joint: { ...vGroove([6, 6], [0, 0], [45, 45]), backing: 'metal', backingMaterial: 'A572 Gr. 50 strip, 6 mm', weldedFromBothSides: false } } as const
const frameHeat = { maintenance: 'Not below the minimum until the joint is complete.', method: 'Torch, contact thermometer.' }

export const frameD11 = (): ProcedureContent =>
  procedureContentSchema.parse({
    title: 'Pipe rack frames, A572-50 plate, flux-cored wire uphill', scope: 'Complete-penetration splices to AWS D1.1.',
    variables: by(structural, { ...frame, baseMetals: { a: metal('us-a572-50'), b: metal('us-a572-50') }, thickness: mm(3, 40), preheat: { ...frameHeat, minimum: celsius(20), interpassMaximum: celsius(200) }, processes: [fluxCored({ deposit: mm(3, 40), current: amps(175, 200), voltage: volts(24, 25.5), wire: feed(6.9, 7.7), speed: travel(140, 165), heat: kilojoules(1.6, 2.1), flow: [19, 21] })] }),
  })

export const frameD11Coupon = (): CouponContent =>
  couponContentSchema.parse({
    title: 'A572-50 plate 20 mm, FCAW, 3G up, to AWS D1.1',
    variables: by(structural, {
      ...frame, thickness: mm(20), preheat: { ...frameHeat, minimum: celsius(20), interpassMaximum: celsius(190) },
      baseMetals: { a: metal('us-a572-50', { heatNumber: 'R3317', certificate: 'LF-C-0344' }), b: metal('us-a572-50', { heatNumber: 'R3317', certificate: 'LF-C-0344' }) },
      processes: [fluxCored({ deposit: mm(20), current: amps(188), voltage: volts(24.8), wire: feed(7.3), speed: travel(150), heat: kilojoules(1.87), flow: [20] })],
    }),
    ...tested, weldedOn: '2026-05-12', welder: 'Anya Brook', welderStamp: 'L11', witness: 'Hal Ostby', testedOn: '2026-05-20', reportNumber: 'WML-26-0512',
    runSheet: runs('fcaw', 1.2, [['root', 188, 24.8, 150, 20], ['fill', 188, 24.8, 150, 120], ['fill', 188, 24.8, 150, 160], ['cap', 188, 24.8, 150, 190]], { feed: 7.3 }),
    visual: { cracks: false, cratersFull: true, rootSound: true, profileAccepted: true, undercut: size(0.3), reinforcement: size(2) },
    ndt: [examined('UT', 'WML-26-0512-U')],
    tension: tensions(19, 20, [189.5, 191.2]), bends: bends(FOUR_SIDE, 10, 38),
  })

const aluminium: StandardChoice = { standard: 'aws-d1-2', edition: '2014', level: null }
const pulsed = ({ deposit, current, voltage, wire, speed, heat, flow }: Spread): BlockInput => ({
  id: 'gmaw', process: 'GMAW', mechanisation: 'semiautomatic', depositThickness: deposit, maxPassThickness: size(5), positions: ['3G'], progression: 'up',
  filler: filler('a510-er5356', [1.2]), shieldingGas: gas('mix-ar-100', ...flow), backingGas: noGas, trailingGas: noGas,
  electrical: { currentType: 'DCEP', transferMode: 'pulsed-spray', pulsed: true, powerSource: 'constant-voltage', current, voltage, wireFeed: wire, travelSpeed: speed, heatInput: heat },
  technique: { ...clean, bead: 'stringer', oscillation: 'none', initialCleaning: 'Degrease, then a stainless brush kept for aluminium.', interpassCleaning: 'Stainless brush kept for aluminium.', nozzleSize: '19 mm', contactTubeDistance: mm(14, 18) },
})
const gangway = { product: 'plate', joint: { ...vGroove([2, 2], [1, 1], [80, 80]), backing: 'metal', backingMaterial: '6061 strip, 5 mm, removed' }, serviceTemperature: celsius(40) } as const
/** What D1.2 lets vary is not confirmed, so the procedure asks for what was welded. */
const railSettings: Spread = { deposit: mm(10), current: amps(154, 162), voltage: volts(23.3, 23.7), wire: feed(8.4, 8.6), speed: travel(480, 520), heat: null, flow: [21] }
const coolMetal = { maintenance: 'None: let it cool below the interpass temperature.', method: 'Warm to the touch only to drive off moisture.' }
/** The tempers' strength before welding; welded metal answers to the code's own lower figure. */
const t6 = (more: Parameters<typeof metal>[1] = {}) => metal('us-b209-6061-t6', { condition: 'T6', ...more })

export const gangwayD12 = (): ProcedureContent =>
  procedureContentSchema.parse({
    title: 'Gangway rails, 6061-T6, pulsed wire, ER5356', scope: 'Butts in rails and stiffeners to AWS D1.2.',
    variables: by(aluminium, { ...gangway, pwht: { condition: 'none' }, baseMetals: { a: t6(), b: t6() }, thickness: mm(10), preheat: { ...coolMetal, minimum: celsius(20), interpassMaximum: celsius(60) }, processes: [{ ...pulsed(railSettings), passes: [{ number: '1', layer: 'root' }, { number: '2', layer: 'fill' }, { number: '3', layer: 'cap' }] }] }),
  })

export const gangwayD12Coupon = (): CouponContent =>
  couponContentSchema.parse({
    title: '6061-T6 plate 10 mm, pulsed GMAW, 3G up, to AWS D1.2',
    variables: by(aluminium, {
      ...gangway, thickness: mm(10), preheat: { ...coolMetal, minimum: celsius(20), interpassMaximum: celsius(60) },
      baseMetals: { a: t6({ heatNumber: 'A55120', certificate: 'LF-C-0351' }), b: t6({ heatNumber: 'A55120', certificate: 'LF-C-0351' }) },
      processes: [pulsed(railSettings)],
    }),
    ...tested, machine: 'M-003', weldedOn: '2026-05-14', welder: 'Anya Brook', welderStamp: 'L11', witness: 'Sam Ferrow', testedOn: '2026-05-22', reportNumber: 'WML-26-0514',
    runSheet: runs('gmaw', 1.2, [['root', 156, 23.4, 490, 20], ['fill', 158, 23.5, 500, 48], ['cap', 160, 23.6, 510, 60]], { feed: 8.5 }),
    visual: { cracks: false, cratersFull: true, rootSound: true, profileAccepted: true, undercut: size(0.2), reinforcement: size(1.5) },
    ndt: [examined('RT', 'WML-26-0514-R')],
    tension: tensions(19, 10, [35.4, 35.9], 'heat-affected-zone'), bends: bends(FOUR_SIDE, 3, 49.5),
  })

const european: StandardChoice = { standard: 'iso-15614-1', edition: '2017+A1:2019', level: '2' }
const solidWire = ({ deposit, current, voltage, wire, speed, heat, flow }: Spread): BlockInput => ({
  id: 'gmaw', process: 'GMAW', mechanisation: 'semiautomatic', depositThickness: deposit, maxPassThickness: size(3), positions: ['3G'], progression: 'up',
  filler: filler('iso-14341-g42-4-m21-3si1', [1.2], { tradeName: 'Weirwire SG2' }), shieldingGas: gas('mix-ar-82-co2-18', ...flow), backingGas: noGas, trailingGas: noGas,
  electrical: { currentType: 'DCEP', transferMode: 'spray', pulsed: false, waveformControlled: false, powerSource: 'constant-voltage', current, voltage, wireFeed: wire, travelSpeed: speed, heatInput: heat, heatInputMethod: 'meter', heatInputQuantity: 'arc-energy' },
  technique: { ...clean, bead: 'stringer', oscillation: 'none', nozzleSize: '16 mm', contactTubeDistance: mm(15, 20) },
})
const skid = { product: 'plate', hardnessRequired: true, toughnessRequired: true, impactTemperature: celsius(-20), impactEnergy: quantity(27, 'energy'), postHeating: { used: false }, joint: { ...vGroove([2, 3], [1, 2], [60, 60]), weldedFromBothSides: false } } as const
const plateJ2 = (more: Parameters<typeof metal>[1] = {}) => metal('en-10025-2-s355j2', { condition: 'N', impactSpecified: true, ...more })
const skidHeat = { maintenance: 'Held between passes.', method: 'Propane torch, contact thermometer.' }

export const skidIso = (): ProcedureContent =>
  procedureContentSchema.parse({
    title: 'Pump skids, S355J2 plate, solid wire uphill', scope: 'Butts in skid beams to ISO 15614-1 level 2.',
    variables: by(european, { ...skid, baseMetals: { a: plateJ2(), b: plateJ2() }, thickness: mm(10, 40), preheat: { ...skidHeat, minimum: celsius(100), interpassMaximum: celsius(200) }, processes: [{ ...solidWire({ deposit: mm(3, 40), current: amps(180, 200), voltage: volts(24, 26), wire: feed(6, 7), speed: travel(240, 300), heat: kilojoules(0.95, 1.1), flow: [12, 15] }), passes: [{ number: '1', layer: 'root' }, { number: '2-n', layer: 'fill' }] }] }),
  })

export const skidIsoCoupon = (): CouponContent =>
  couponContentSchema.parse({
    title: 'S355J2 plate 20 mm, GMAW, 3G up, to ISO 15614-1 level 2',
    variables: by(european, {
      ...skid, thickness: mm(20), preheat: { ...skidHeat, minimum: celsius(100), interpassMaximum: celsius(200) },
      baseMetals: { a: plateJ2({ heatNumber: 'E8842', certificate: 'LF-C-0360' }), b: plateJ2({ heatNumber: 'E8842', certificate: 'LF-C-0360' }) },
      processes: [solidWire({ deposit: mm(20), current: amps(180, 200), voltage: volts(24, 26), wire: feed(6.5), speed: travel(270), heat: kilojoules(1.06), flow: [14] })],
    }),
    ...tested, weldedOn: '2026-05-18', welder: 'Joe Pell', welderStamp: 'L07', witness: 'Hal Ostby', testedOn: '2026-05-28', reportNumber: 'WML-26-0518',
    runSheet: runs('gmaw', 1.2, [['root', 182, 24.2, 262, 100], ['fill', 190, 25, 270, 150], ['fill', 192, 25.1, 272, 180], ['fill', 192, 25.1, 272, 190], ['cap', 190, 25, 268, 200]], { feed: 6.5 }),
    ndt: [examined('VT', 'LF-V-0518'), examined('RT', 'WML-26-0518-R'), examined('MT', 'WML-26-0518-M')],
    tension: tensions(25, 20, [262.5, 264.1]), bends: bends(FOUR_SIDE, 10, 40),
    macros: [{ id: 'm1', specimen: 'M1', fusionComplete: true, cracks: false }],
    toughness: (['weld', 'heat-affected-zone'] as const).map((place, index) => ({ id: `i${index + 1}`, place, temperature: celsius(-20), size: '10 × 10', values: joules(place === 'weld' ? [74, 81, 69] : [96, 88, 103]) })),
    hardness: [
      { id: 'h1', scale: 'HV10', place: 'weld', values: [212, 218, 221] },
      { id: 'h2', scale: 'HV10', place: 'heat-affected-zone', values: [238, 251, 266, 244] },
      { id: 'h3', scale: 'HV10', place: 'base-metal', values: [164, 168, 161] },
    ],
  })
