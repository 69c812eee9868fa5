/** Aluminium at the demo firm: pulsed wire welding with ER5356 and ER4043 on one machine, whose panel is set by hand. */
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent, type WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity, settle } from '@shared/units/convert.ts'
import { amps, celsius, feed, filler, gas, metal, mm, noGas, size, travel, variables, vGroove, volts } from './parts.ts'
import { bends, FACE_AND_ROOT, runs, tensions } from './tests.ts'

type Panel = NonNullable<WeldingVariables['processes'][number]['electrical']['panel']>
interface PanelSettings { wireFeed: number; voltage: number; background: number; frequency: number; onTime: number }

/** The knobs of machine M-003, in the words on its panel. */
const panel = ({ wireFeed, voltage, background, frequency, onTime }: PanelSettings): Panel => ({
  machine: 'M-003',
  mode: 'manual pulse',
  caution: 'This mode has no crater fill: circle back over the last 10 mm and break the arc on the weld, never on the plate.',
  settings: [
    { control: 'Wire feed', hint: 'left knob', value: String(wireFeed), unit: 'in/min', scaleMin: 50, scaleMax: 700, min: wireFeed - 15, max: wireFeed + 15 },
    { control: 'Voltage', hint: 'right knob', value: voltage.toFixed(1), unit: 'V', scaleMin: 10, scaleMax: 40, min: settle(voltage - 0.6), max: settle(voltage + 0.6) },
    { control: 'Background', hint: 'menu, line 1', value: background.toFixed(1), unit: 'V', scaleMin: 10, scaleMax: 30, min: null, max: null },
    { control: 'Frequency', hint: 'menu, line 2', value: String(frequency), unit: 'Hz', scaleMin: 20, scaleMax: 300, min: null, max: null },
    { control: 'Pulse on-time', hint: 'menu, line 3', value: onTime.toFixed(1), unit: 'ms', scaleMin: 0.5, scaleMax: 5, min: null, max: null },
  ],
})

interface Weld { wire: 'a510-er5356' | 'a510-er4043'; deposit: ReturnType<typeof mm>; positions: ('1G' | '2G' | '3G')[]; current: ReturnType<typeof amps>; voltage: ReturnType<typeof volts>; wireFeed: ReturnType<typeof feed>; flow: [number, number?]; speed: ReturnType<typeof travel>; set: PanelSettings | null }
const pulsed = ({ wire, deposit, positions, current, voltage, wireFeed, flow, speed, set }: Weld) => ({
  id: 'gmaw', process: 'GMAW' as const, mechanisation: 'semiautomatic' as const, depositThickness: deposit, maxPassThickness: size(5), filler: filler(wire, [1.2]), positions, progression: positions.includes('3G') ? ('up' as const) : null,
  shieldingGas: gas('mix-ar-100', ...flow), backingGas: noGas, trailingGas: noGas,
  electrical: {
    currentType: 'DCEP' as const, transferMode: 'pulsed-spray' as const, pulsed: true, powerSource: 'constant-voltage' as const, current, voltage, wireFeed, travelSpeed: speed,
    ...(set && { pulseFrequency: interval(set.frequency, undefined, 'frequency'), pulseOnTime: interval(set.onTime, undefined, 'pulseTime'), backgroundVoltage: volts(set.background), panel: panel(set) }),
  },
  technique: { bead: 'stringer' as const, initialCleaning: 'Degrease, then a stainless brush kept for aluminium, within 4 h of welding.', interpassCleaning: 'Stainless brush kept for aluminium.', passesPerSide: 'multiple' as const, electrodes: 'single' as const, peening: 'none' as const, closedChamber: false, thermalPreparation: false, nozzleSize: '19 mm', contactTubeDistance: mm(14, 18) },
})
const heat = { minimum: celsius(10), interpassMaximum: celsius(65), maintenance: 'None: let it cool below the interpass temperature.', method: 'Warm to the touch only to drive off moisture.' }
const strip = { backing: 'metal', backingMaterial: '6061 strip, 5 mm, removed' } as const

const plate6061 = (title: string, scope: string, id: string, wire: Weld['wire'], set: PanelSettings): ProcedureContent =>
  procedureContentSchema.parse({
    title, scope,
    variables: variables({
      product: 'plate', joint: { ...vGroove([1, 3], [0.5, 1.5], [70, 90]), ...strip }, baseMetals: { a: metal(id), b: metal(id) }, thickness: mm(3, 12), preheat: heat,
      processes: [pulsed({ wire, deposit: mm(3, 12), positions: ['1G', '2G', '3G'], current: amps(130, 190), voltage: volts(22.8, 24), wireFeed: feed(set.wireFeed - 15, set.wireFeed + 15, 'in/min'), flow: [18, 24], speed: travel(400, 620), set })],
    }),
  })

const PULSE_5356: PanelSettings = { wireFeed: 335, voltage: 23.4, background: 17, frequency: 120, onTime: 1.9 }
const PULSE_4043: PanelSettings = { wireFeed: 310, voltage: 22.6, background: 16.4, frequency: 110, onTime: 2.1 }

export const platform6061 = (): ProcedureContent => plate6061('Access platform, 6061-T6, pulsed wire, ER5356', 'Butts in stringers, treads and kick plates.', 'us-b209-6061-t6', 'a510-er5356', PULSE_5356)
export const handrail6063 = (): ProcedureContent => plate6061('Handrail and frames, 6063-T6, pulsed wire, ER4043', 'Butts in extruded sections.', 'us-b221-6063-t6', 'a510-er4043', PULSE_4043)
export const hull5083 = (): ProcedureContent => plate6061('Splash panels, 5083-O, pulsed wire, ER5356', 'Butts in 5083 sheet and plate; no coupon yet.', 'us-b209-5083-o', 'a510-er5356', PULSE_5356)

/**
 * Welding softens these tempers, so a welded specimen answers to the lower strength that QW/QB-422 lists for them:
 * 24 ksi for 6061, 17 ksi for 6063 (from memory: confirm in your edition). The record keeps the figure it was judged by.
 */
const AS_WELDED = { 'us-b209-6061-t6': 165, 'us-b221-6063-t6': 117 } as const

const coupon = (title: string, id: keyof typeof AS_WELDED, heatNumber: string, wire: Weld['wire'], set: PanelSettings) => ({
  title,
  notes: `Strength asked of a welded specimen: ${AS_WELDED[id]} MPa, as QW/QB-422 lists it for welded metal of this temper (from memory, confirm in your edition).`,
  variables: variables({
    product: 'plate', joint: { ...vGroove([2, 2], [1, 1], [80, 80]), ...strip }, thickness: mm(6), preheat: { ...heat, minimum: celsius(19), interpassMaximum: celsius(58) },
    baseMetals: { a: metal(id, { heatNumber, minTensile: quantity(AS_WELDED[id], 'stress') }), b: metal(id, { heatNumber, minTensile: quantity(AS_WELDED[id], 'stress') }) },
    processes: [pulsed({ wire, deposit: mm(6), positions: ['3G'], current: amps(148, 162), voltage: volts(23.2, 23.6), wireFeed: feed(set.wireFeed, undefined, 'in/min'), flow: [21], speed: travel(460, 540), set })],
  }),
})
const tested = { laboratory: 'Wharfside Materials Laboratory' }

export const platform6061Coupon = (): CouponContent =>
  couponContentSchema.parse({
    ...coupon('6061-T6 plate 6 mm, pulsed GMAW, ER5356, 3G up', 'us-b209-6061-t6', 'A55120', 'a510-er5356', PULSE_5356),
    weldedOn: '2026-04-02', welder: 'Anya Brook', welderStamp: 'L11', witness: 'Hal Ostby', machine: 'M-003',
    runSheet: runs('gmaw', 1.2, [['root', 150, 23.3, 480, 19], ['cap', 158, 23.5, 520, 58]], { feed: 8.51 }),
    tension: tensions(19, 6, [21.4, 21.9], 'heat-affected-zone'), bends: bends(FACE_AND_ROOT, 3, 49.5), ...tested, testedOn: '2026-04-10', reportNumber: 'WML-26-0402',
  })

/** At the laboratory: tension is back, two of the bends are still to come. */
export const handrail6063Coupon = (): CouponContent =>
  couponContentSchema.parse({
    ...coupon('6063-T6 section 6 mm, pulsed GMAW, ER4043, 3G up', 'us-b221-6063-t6', 'A60331', 'a510-er4043', PULSE_4043),
    weldedOn: '2026-05-04', welder: 'Anya Brook', welderStamp: 'L11', witness: 'Sam Ferrow', machine: 'M-003',
    runSheet: runs('gmaw', 1.2, [['root', 149, 23.2, 470, 19], ['cap', 155, 23.4, 510, 55]], { feed: 7.87 }),
    tension: tensions(19, 6, [15.6, 15.9], 'heat-affected-zone'), bends: bends(['face', 'face'], 3, 49.5), ...tested, reportNumber: 'WML-26-0504',
  })
