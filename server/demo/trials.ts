/** Trials of the demo firm: a manual pulse dialled in bead by bead, and a short one on steel. Invented figures. */
import { baseMetalById, baseMetalTitle } from '@shared/library/base-metals.ts'
import { beadContentSchema, type BeadContent } from '@shared/schemas/trials.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { gas } from './content/parts.ts'
import { addBead, createTrial } from '../services/trials.ts'
import type { Firm } from './acts.ts'
import type { PersonKey } from './people.ts'

type Faults = BeadContent['faults']
interface Came { score: number; faults?: [Faults[number]['fault'], number][]; note: string; current: number; voltage: number; seconds: number; /** Peak and background current off the recorder. */ peaks?: [number, number] }

const metalOf = (id: string) => {
  const row = baseMetalById(id)
  if (!row) throw new Error(`the library has no ${id}`)
  return { metalId: id, metal: baseMetalTitle(row) }
}
const came = ({ score, faults = [], note, current, voltage, seconds, peaks }: Came) => ({
  score, note, faults: faults.map(([fault, severity]) => ({ fault, severity })),
  measured: { current: interval(current, undefined, 'current'), voltage: interval(voltage, undefined, 'voltage'), length: quantity(150, 'length'), arcTime: quantity(seconds, 'duration'), ...(peaks && { peakCurrent: quantity(peaks[0], 'current'), backgroundCurrent: quantity(peaks[1], 'current') }) },
})

interface Dialled { feed: number; volts: number; frequency: number }
const pulse = (machineId: string, { feed, volts, frequency }: Dialled, result: Came): BeadContent =>
  beadContentSchema.parse({
    machineId, modeKey: 'manual-pulse', process: 'GMAW', ...metalOf('us-b209-6061-t6'), thickness: quantity(6, 'length'), joint: 'T joint on scrap of the same plate', position: '2F',
    wireId: 'a510-er5356', wire: 'ER5356', wireDiameter: quantity(1.2, 'length'), gas: gas('mix-ar-100', 20), stickOut: quantity(16, 'length'),
    settings: [
      { control: 'wire-feed', label: 'Wire feed', sets: 'wireFeed', value: feed, unit: 'in/min' }, { control: 'voltage', label: 'Voltage', sets: 'voltage', value: volts, unit: 'V' }, { control: 'background-voltage', label: 'Background', sets: 'backgroundVoltage', value: 17, unit: 'V' },
      { control: 'pulse-frequency', label: 'Frequency', sets: 'pulseFrequency', value: frequency, unit: 'Hz' }, { control: 'pulse-on-time', label: 'Pulse on-time', sets: 'pulseOnTime', value: 1.9, unit: 'ms' },
    ],
    ...came(result),
  })

const PULSED: readonly (readonly [Dialled, Came])[] = [
  [{ feed: 300, volts: 22.4, frequency: 110 }, { score: 2, faults: [['cold-lap', 2], ['bead-too-high', 2]], note: 'First guess, off the ER4043 card. Sits on top of the plate and rolls over at the lower toe.', current: 131, voltage: 22.3, seconds: 19.2 }],
  [{ feed: 315, volts: 22.4, frequency: 110 }, { score: 2, faults: [['arc-too-short', 2], ['spatter', 1]], note: 'More wire and nothing else: the arc went short and it stubs every few drops.', current: 137, voltage: 22.3, seconds: 18.5 }],
  [{ feed: 315, volts: 22.4, frequency: 116 }, { score: 3, faults: [['bead-too-high', 1]], note: 'Frequency brought along with the wire. Much quieter, still a bit proud.', current: 141, voltage: 22.4, seconds: 18.9 }],
  [{ feed: 325, volts: 22.4, frequency: 116 }, { score: 3, faults: [['arc-too-short', 1], ['bead-too-high', 1]], note: 'Hotter, good lower toe. Arc a touch short again.', current: 146, voltage: 22.4, seconds: 18.4 }],
  [{ feed: 325, volts: 23, frequency: 116 }, { score: 4, note: 'Volts up six tenths: wets out at both toes. One or two ticks.', current: 149, voltage: 23, seconds: 18, peaks: [385, 84] }],
  [{ feed: 325, volts: 23, frequency: 119 }, { score: 4, note: 'Ticks are gone. A steady hum.', current: 152, voltage: 23, seconds: 17.8, peaks: [386, 84] }],
  [{ feed: 332, volts: 23, frequency: 119 }, { score: 5, note: 'This is the one. Even ripples, leg 6, no soot to speak of; broke the fillet, fused to the root.', current: 154, voltage: 23.1, seconds: 17.6, peaks: [388, 85] }],
  [{ feed: 332, volts: 24, frequency: 119 }, { score: 2, faults: [['arc-too-long', 2], ['soot', 2], ['crater-crack', 1]], note: 'One volt more to see where it ends: hisses, black beside the bead, and the crater cracked before I circled back.', current: 158, voltage: 24, seconds: 17.9, peaks: [401, 86] }],
]

const shortArc = (machineId: string, { feed, volts }: Omit<Dialled, 'frequency'>, result: Came): BeadContent =>
  beadContentSchema.parse({
    machineId, modeKey: 'wire', process: 'GMAW', ...metalOf('us-a36'), thickness: quantity(5, 'length'), joint: 'Lap', position: '2F', wireId: 'a518-er70s-6', wire: 'ER70S-6', wireDiameter: quantity(1.2, 'length'), gas: gas('mix-ar-82-co2-18', 15), stickOut: quantity(12, 'length'),
    settings: [{ control: 'wire-feed', label: 'Wire', sets: 'wireFeed', value: feed, unit: 'm/min' }, { control: 'voltage', label: 'Volts', sets: 'voltage', value: volts, unit: 'V' }, { control: 'inductance', label: 'Softness', sets: 'inductance', value: 2, unit: '' }],
    ...came(result),
  })

const STEEL: readonly (readonly [Omit<Dialled, 'frequency'>, Came])[] = [
  [{ feed: 4.5, volts: 17.5 }, { score: 2, faults: [['cold-lap', 2]], note: 'Ropey, lies on the top plate.', current: 166, voltage: 17.1, seconds: 24 }],
  [{ feed: 4.5, volts: 19 }, { score: 3, faults: [['spatter', 1]], note: 'Wets better, spits now and then.', current: 168, voltage: 18.5, seconds: 23.5 }],
  [{ feed: 5, volts: 19 }, { score: 4, note: 'Bacon in the pan. Leg 5 both sides.', current: 181, voltage: 18.6, seconds: 21 }],
]

/** T-001 on M-003 and T-002 on M-002. @param machineIds in the order of their numbers */
export async function makeTrials({ act, actors }: Firm, machineIds: readonly string[]): Promise<void> {
  const log = (by: PersonKey, title: string, goal: string, beads: readonly BeadContent[]) =>
    act(async (tenant) => {
      const { id } = await createTrial(tenant, actors[by], { title, goal })
      for (const content of beads) await addBead(tenant, actors[by], id, { content, copyOf: null, changes: null })
    })
  const [, plain = '', pulsing = ''] = machineIds
  await log('anya', 'ER5356 on 6 mm 6061, T joint, manual pulse', 'Leg 6 mm, both toes wetted, a steady hum, a broken fillet fused to the root.', PULSED.map(([dialled, result]) => pulse(pulsing, dialled, result)))
  await log('joe', 'ER70S-6 lap on 5 mm, short arc', 'Leg 5 mm without cold lap.', STEEL.map(([dialled, result]) => shortArc(plain, dialled, result)))
}
