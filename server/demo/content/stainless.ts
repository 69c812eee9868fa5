/** Austenitic stainless at the demo firm: thin plate by GTAW with a purged root. */
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent } from '@shared/schemas/welding.ts'
import { amps, celsius, filler, gas, metal, mm, noGas, size, travel, variables, vGroove, volts } from './parts.ts'
import { bends, FACE_AND_ROOT, runs, tensions } from './tests.ts'

interface Weld { wire: 'a59-er308l' | 'a59-er316l'; deposit: ReturnType<typeof mm>; positions: ('1G' | '2G' | '3G')[]; current: ReturnType<typeof amps>; voltage: ReturnType<typeof volts>; flow: [number, number?]; purge: [number, number?]; speed: ReturnType<typeof travel> }
const gtaw = ({ wire, deposit, positions, current, voltage, flow, purge, speed }: Weld) => ({
  id: 'gtaw', process: 'GTAW' as const, mechanisation: 'manual' as const, depositThickness: deposit, maxPassThickness: size(3), filler: filler(wire, [1.6, 2.4].slice(0, flow.length)), positions, progression: 'up' as const,
  shieldingGas: gas('mix-ar-100', ...flow), backingGas: gas('mix-ar-100', ...purge), trailingGas: noGas,
  electrical: { currentType: 'DCEN' as const, pulsed: false, powerSource: 'constant-current' as const, current, voltage, travelSpeed: speed, tungstenClassification: 'EWLa-1.5', tungstenDiameter: mm(2.4).min },
  technique: { bead: 'stringer' as const, initialCleaning: 'Stainless brush and solvent; no carbon steel tools.', interpassCleaning: 'Stainless brush.', passesPerSide: 'multiple' as const, electrodes: 'single' as const, peening: 'none' as const, closedChamber: false, thermalPreparation: false, nozzleSize: 'No. 8, 12 mm', notes: 'Purge until the root is covered by two layers.' },
})
const heat = { minimum: celsius(10), interpassMaximum: celsius(150), maintenance: 'None above the minimum.', method: 'None.' }

const procedure = (title: string, scope: string, id: string, wire: Weld['wire']): ProcedureContent =>
  procedureContentSchema.parse({
    title, scope,
    variables: variables({
      product: 'plate', joint: vGroove([1.5, 3], [0.5, 1.5]), baseMetals: { a: metal(id), b: metal(id) }, thickness: mm(2, 12), preheat: heat,
      processes: [gtaw({ wire, deposit: mm(2, 12), positions: ['1G', '2G', '3G'], current: amps(70, 140), voltage: volts(10, 13), flow: [8, 12], purge: [6, 10], speed: travel(50, 120) })],
    }),
  })

export const stainless304 = (): ProcedureContent => procedure('Dosing line and tank fittings, 304L, TIG', 'Butts in 304L sheet, plate and formed fittings.', 'us-a240-304l', 'a59-er308l')
export const stainless316 = (): ProcedureContent => {
  const content = procedure('Chlorine contact panels, 316L, TIG', 'Butts in 316L plate; coupon being welded.', 'us-a240-316l', 'a59-er316l')
  // Not decided yet, so the checks cannot tell: heat treatment after welding and the purge.
  return { ...content, variables: { ...content.variables, pwht: { ...content.variables.pwht, condition: null }, processes: content.variables.processes.map((block) => ({ ...block, backingGas: null })) } }
}

const settings = { current: amps(88, 118), voltage: volts(10.8, 12), flow: [10] as [number], purge: [8] as [number], speed: travel(62, 84) }

export const stainless304Coupon = (): CouponContent =>
  couponContentSchema.parse({
    title: '304L plate 6 mm, GTAW purged, 3G up',
    variables: variables({
      product: 'plate', joint: vGroove([2, 2], [1, 1], [60, 60]), thickness: mm(6), preheat: { ...heat, minimum: celsius(17), interpassMaximum: celsius(128) },
      baseMetals: { a: metal('us-a240-304l', { heatNumber: 'S71840', certificate: 'LF-C-0322' }), b: metal('us-a240-304l', { heatNumber: 'S71840', certificate: 'LF-C-0322' }) },
      processes: [gtaw({ wire: 'a59-er308l', deposit: mm(6), positions: ['3G'], ...settings })],
    }),
    weldedOn: '2026-03-24', welder: 'Anya Brook', welderStamp: 'L11', witness: 'Hal Ostby', machine: 'M-001',
    runSheet: runs('gtaw', 1.6, [['root', 92, 11, 64, 17], ['fill', 112, 11.6, 78, 84], ['cap', 104, 11.4, 70, 128]]),
    tension: tensions(19, 6, [65.4, 66.1]), bends: bends(FACE_AND_ROOT, 6, 24), laboratory: 'Wharfside Materials Laboratory', testedOn: '2026-04-01', reportNumber: 'WML-26-0324',
  })

/** On the bench: two passes are in, nothing is tested. */
export const stainless316Coupon = (): CouponContent =>
  couponContentSchema.parse({
    title: '316L plate 6 mm, GTAW purged, 3G up',
    variables: variables({
      product: 'plate', joint: vGroove([2, 2], [1, 1], [60, 60]), thickness: mm(6), preheat: { ...heat, minimum: celsius(18) },
      baseMetals: { a: metal('us-a240-316l', { heatNumber: 'S80217' }), b: metal('us-a240-316l', { heatNumber: 'S80217' }) },
      processes: [gtaw({ wire: 'a59-er316l', deposit: mm(6), positions: ['3G'], ...settings })],
    }),
    weldedOn: '2026-05-06', welder: 'Joe Pell', welderStamp: 'L07', machine: 'M-001',
    runSheet: runs('gtaw', 1.6, [['root', 94, 11, 66, 18], ['fill', 110, 11.5, 76, 90]]),
  })
