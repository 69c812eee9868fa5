/** Run sheets and test results of the demo coupons. */
import type { CouponContent, RunRow } from '@shared/schemas/welding.ts'
import { bendTestSchema, runRowSchema, tensionTestSchema } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { amps, celsius, size, travel, volts } from './parts.ts'

/** layer, A, V, mm/min, interpass °C */
export type Run = readonly [layer: 'root' | 'hot' | 'fill' | 'cap', current: number, voltage: number, speed: number, interpass: number]

/** Rows of a run sheet for one process, numbered from `first`. */
export const runs = (processId: string, diameter: number, list: readonly Run[], { first = 1, length = 300, feed }: { first?: number; length?: number; feed?: number } = {}): RunRow[] =>
  list.map(([layer, current, voltage, speed, interpass], index) =>
    runRowSchema.parse({
      id: `${processId}-${first + index}`,
      processId,
      pass: String(first + index),
      layer,
      fillerDiameter: size(diameter),
      current: amps(current),
      voltage: volts(voltage),
      wireFeed: feed === undefined ? null : interval(feed, undefined, 'wireFeed'),
      travelSpeed: travel(speed),
      length: size(length),
      arcTime: quantity(Math.round((length / speed) * 60), 'duration'),
      interpass: celsius(interpass),
    }),
  )

/** Reduced-section tension specimens: width and thickness in mm, load in kN. */
export const tensions = (width: number, thickness: number, loads: readonly number[], fracture: 'base-metal' | 'weld' | 'heat-affected-zone' = 'base-metal'): CouponContent['tension'] =>
  loads.map((load, index) =>
    tensionTestSchema.parse({ id: `t${index + 1}`, specimen: `T${index + 1}`, kind: 'reduced-section', width: size(width), thickness: size(thickness), load: quantity(load, 'force'), reportedStrength: quantity(Math.round((load * 1000) / (width * thickness)), 'stress'), fracture, fractureType: 'ductile' }),
  )

type BendKind = CouponContent['bends'][number]['kind']

/** Guided bends to 180°; `open` gives the size in mm of an open discontinuity by specimen. */
export const bends = (kinds: readonly BendKind[], thickness: number, former: number, open: Readonly<Record<string, number>> = {}): CouponContent['bends'] =>
  kinds.map((kind, index) => {
    const specimen = `${kind === 'side' ? 'S' : kind === 'face' ? 'F' : 'R'}${index + 1}`
    const opening = open[specimen]
    return bendTestSchema.parse({ id: `b${index + 1}`, specimen, kind, thickness: size(thickness), formerDiameter: size(former), angle: quantity(180, 'angle'), openings: opening === undefined ? [] : [{ size: size(opening), fromInternalFlaw: false }], inspected: true })
  })

export const FACE_AND_ROOT: readonly BendKind[] = ['face', 'face', 'root', 'root']
export const FOUR_SIDE: readonly BendKind[] = ['side', 'side', 'side', 'side']
