/** What a logger recorded of the handrail coupon's cap: a pulsed arc with one stop. Invented, the same each time. */
import { Readable } from 'node:stream'
import type { Coupon } from '../models/coupon.ts'
import { keepRecording } from '../services/arc-files.ts'
import { addArcRecording, attachArcRecording } from '../services/arc-recordings.ts'
import type { Firm } from './acts.ts'
import type { PersonKey } from './people.ts'

const RATE = 2000
/** Hz, ms; the machine's settings for ER4043. Amperes and volts make the means of the pass, 155 A and 23.4 V. */
const PULSE = { frequency: 110, onTime: 2.1, peak: 388, background: 85, peakVoltage: 32.1, backgroundVoltage: 20.8 }
/** s: open circuit, arc, stop, arc, over. */
const TIMES = { ignition: 0.4, stop: 3.4, again: 3.75, end: 6.75, over: 7 }

/** Even noise in ±1 that is the same in every run. */
function noise(): () => number {
  let state = 4043
  return () => {
    state = (state * 1_664_525 + 1_013_904_223) % 4_294_967_296
    return state / 2_147_483_648 - 1
  }
}

function* rows(): Generator<string> {
  const random = noise()
  yield 'Channel 1;shunt 500 A;;\nChannel 2;torch to plate;;\nTime [s];Current [A];Voltage [V]\n'
  for (let k = 0; k < TIMES.over * RATE; k++) {
    const t = k / RATE
    const burning = (t >= TIMES.ignition && t < TIMES.stop) || (t >= TIMES.again && t < TIMES.end)
    const on = (t * PULSE.frequency) % 1 < (PULSE.onTime / 1000) * PULSE.frequency
    const current = burning ? (on ? PULSE.peak : PULSE.background) + 5 * random() : 0.3 * random()
    const voltage = burning ? (on ? PULSE.peakVoltage : PULSE.backgroundVoltage) + 0.5 * random() : 63 + 0.1 * random()
    yield `${t.toFixed(4)};${current.toFixed(1)};${voltage.toFixed(2)}\n`
  }
}

/** Uploads the recording and attaches it to the coupon's last pass, with the 51 mm that were welded meanwhile. */
export async function recordArc({ act, actors, services }: Firm, by: PersonKey, coupon: Coupon): Promise<void> {
  const actor = actors[by]
  const text = Buffer.from([...rows()].join(''))
  const kept = await keepRecording(services.storage, actor.organizationId, { name: `${coupon.number} cap.csv`, stream: Readable.from([text]), choice: {} })
  await act(async (tenant) => {
    const recording = await addArcRecording(services.storage, tenant, actor, kept)
    await attachArcRecording(tenant, actor, recording.id, recording.version, { couponId: coupon.id, runRowId: coupon.content.runSheet.at(-1)?.id ?? null, beadId: null, weldLength: 51 })
  })
}
