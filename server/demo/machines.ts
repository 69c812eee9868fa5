/** The demo firm's three machines, invented with their limits. */
import { newControl } from '@shared/machines/patterns.ts'
import { writeMachineSchema, type PanelQuantity, type WriteMachine } from '@shared/schemas/machines.ts'

/** A day so many days from the given one. */
const from = (today: string, days: number): string => new Date(Date.parse(`${today}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10)

const control = (sets: PanelQuantity, label: string, where: string, unit: string, min: number, max: number, step: number | null, shown = true) => newControl(sets, { label, where, unit, min, max, step, shown })
const meters = [{ quantity: 'current' as const, unit: 'A', when: 'while-welding' as const, resolution: 1 }, { quantity: 'voltage' as const, unit: 'V', when: 'while-welding' as const, resolution: 0.1 }]

/** Sets its feed and its pulse exactly, says what it does and hands the figures out; takes TIG and stick too. */
const precise = (today: string): WriteMachine =>
  writeMachineSchema.parse({
    name: 'Bay 1 precise pulse', kind: 'several', serial: 'LF-PP-0117', location: 'Bay 1', feeder: 'Four-roll feeder on the boom', gunTypes: ['push-pull', 'tig-torch', 'electrode-holder'], dutyCycle: { percent: 60, current: 350 }, dataOutput: true,
    calibration: { certificate: 'WML-CAL-26-071', doneOn: from(today, -150), dueOn: from(today, 215), accuracyNote: 'All three against the laboratory’s shunt and tachometer.', accuracy: { current: 1, voltage: 1, wireFeed: 1 } },
    notes: 'Gives volts and amps 5000 times a second at the socket on the back, as a file.',
    modes: [
      {
        key: 'pulse', name: 'Pulse', kind: 'pulsed-one-knob', processes: ['GMAW'], transferModes: ['pulsed-spray'], polarities: ['DCEP'],
        controls: [control('wireFeed', 'Feed', 'big wheel', 'm/min', 1, 22, 0.05), control('trim', 'Arc length', 'small wheel', '', -10, 10, 1), control('hotStart', 'Start power', 'menu, line 1', '%', 100, 150, 5), control('craterCurrent', 'Crater level', 'menu, line 2', '%', 20, 100, 5), control('craterTime', 'Crater time', 'menu, line 3', 's', 0, 5, 0.1), control('preFlow', 'Gas before', 'menu, line 4', 's', 0, 5, 0.1), control('postFlow', 'Gas after', 'menu, line 5', 's', 0, 20, 0.5)],
        displays: [...meters.map((one) => ({ ...one, when: 'always' as const })), { quantity: 'wireFeed', unit: 'm/min', when: 'always', resolution: 0.05 }],
        programs: [
          { key: 'almg-12', label: 'AlMg 1.2', wires: ['ER5356', 'ER5183'], diameters: [1.2], gases: ['Ar 100'], measured: [{ wire: 'ER5356', diameter: 1.2, gas: 'Ar 100', trim: 0, points: [{ knob: 7, wireFeed: 7, voltage: 22.6, current: 134 }, { knob: 8, wireFeed: 8, voltage: 23.1, current: 148 }, { knob: 9, wireFeed: 9, voltage: 23.6, current: 161 }, { knob: 10, wireFeed: 10, voltage: 24.2, current: 174 }] }] },
          { key: 'alsi-12', label: 'AlSi 1.2', wires: ['ER4043'], diameters: [1.2], gases: ['Ar 100'], measured: [{ wire: 'ER4043', diameter: 1.2, gas: 'Ar 100', trim: 0, points: [{ knob: 6, wireFeed: 6, voltage: 19.9, current: 133 }, { knob: 7, wireFeed: 7, voltage: 20.6, current: 150 }, { knob: 8, wireFeed: 8, voltage: 21.2, current: 166 }] }] },
          { key: 'fe-12', label: 'Fe 1.2', wires: ['ER70S-6'], diameters: [1.2], gases: ['Ar 82 CO2 18'] },
        ],
        reach: { current: { min: 25, max: 400 }, voltage: { min: 12, max: 38 }, wireFeed: { min: 1, max: 22 } }, has: { craterFill: true, hotStart: true, ramp: true, preFlow: true, postFlow: true },
      },
      {
        key: 'spray', name: 'Wire, plain', kind: 'constant-voltage', processes: ['GMAW', 'FCAW'], transferModes: ['short-circuiting', 'globular', 'spray'], polarities: ['DCEP'],
        controls: [control('wireFeed', 'Feed', 'big wheel', 'm/min', 1, 22, 0.05), control('voltage', 'Volts', 'small wheel', 'V', 12, 38, 0.1), control('inductance', 'Arc force', 'menu, line 1', '', -10, 10, 1)],
        displays: meters.map((one) => ({ ...one, when: 'always' as const })), reach: { current: { min: 25, max: 400 }, voltage: { min: 12, max: 38 }, wireFeed: { min: 1, max: 22 } }, has: { craterFill: true, hotStart: true, preFlow: true, postFlow: true },
      },
      {
        key: 'tig', name: 'TIG', kind: 'constant-current', processes: ['GTAW'], polarities: ['DCEN', 'DCEP'],
        controls: [control('current', 'Amps', 'big wheel', 'A', 4, 300, 1), control('upSlope', 'Rise', 'menu, line 1', 's', 0, 10, 0.1), control('downSlope', 'Fall', 'menu, line 2', 's', 0, 20, 0.1), control('postFlow', 'Gas after', 'menu, line 3', 's', 0, 60, 1)],
        displays: meters, reach: { current: { min: 4, max: 300 } }, has: { craterFill: true, ramp: true, preFlow: true, postFlow: true },
      },
      { key: 'stick', name: 'Stick', kind: 'constant-current', processes: ['SMAW'], polarities: ['DCEP', 'DCEN'], controls: [control('current', 'Amps', 'big wheel', 'A', 10, 350, 1), control('hotStart', 'Hot start', 'menu, line 1', '%', 0, 100, 5)], displays: meters, reach: { current: { min: 10, max: 350 } }, has: { hotStart: true } },
    ],
  })

/** Two knobs and two meters; nothing is stored and nothing pulses. */
const plain = (today: string): WriteMachine =>
  writeMachineSchema.parse({
    name: 'Bay 2 feeder', kind: 'wire', serial: 'LF-CV-0042', location: 'Bay 2', feeder: 'Two-roll feeder on the trolley', gunTypes: ['standard'], dutyCycle: { percent: 60, current: 300 },
    calibration: { certificate: 'WML-CAL-25-119', doneOn: from(today, -388), dueOn: from(today, -23), accuracyNote: 'Volts read low by half a volt on the last certificate.', accuracy: {} },
    modes: [{
      key: 'wire', name: 'Wire', kind: 'constant-voltage', processes: ['GMAW', 'FCAW'], transferModes: ['short-circuiting', 'globular', 'spray'], polarities: ['DCEP', 'DCEN'],
      controls: [control('wireFeed', 'Wire', 'left knob', 'm/min', 1, 18, 0.5), control('voltage', 'Volts', 'right knob', 'V', 15, 38, 0.5), control('inductance', 'Softness', 'switch at the back', '', 1, 3, 1)],
      displays: meters, reach: { current: { min: 40, max: 350 }, voltage: { min: 15, max: 38 }, wireFeed: { min: 1, max: 18 } }, has: {},
    }],
  })

/** One button for all aluminium, a pulse that is set by hand, and no way to fill a crater. */
const lumping = (today: string): WriteMachine =>
  writeMachineSchema.parse({
    name: 'Bay 3 pulse', kind: 'wire', serial: 'LF-SP-0063', location: 'Bay 3, aluminium', feeder: 'Built in', gunTypes: ['standard', 'spool-gun'], dutyCycle: { percent: 40, current: 250 },
    calibration: { certificate: 'WML-CAL-25-160', doneOn: from(today, -347), dueOn: from(today, 18), accuracyNote: null, accuracy: {} },
    notes: 'The pulse of the one-knob programs stops with the trigger: no crater fill in any mode.',
    modes: [
      {
        key: 'manual-pulse', name: 'Manual pulse', kind: 'manual-pulse', processes: ['GMAW'], transferModes: ['pulsed-spray'], polarities: ['DCEP'],
        controls: [control('wireFeed', 'Wire feed', 'left knob', 'in/min', 50, 700, 1), control('voltage', 'Voltage', 'right knob', 'V', 10, 40, 0.1), control('backgroundVoltage', 'Background', 'menu, line 1', 'V', 10, 30, 0.1), control('pulseFrequency', 'Frequency', 'menu, line 2', 'Hz', 20, 300, 1), control('pulseOnTime', 'Pulse on-time', 'menu, line 3', 'ms', 0.5, 5, 0.1)],
        displays: [{ quantity: 'current', unit: 'A', when: 'after-welding', resolution: 1 }], reach: { current: { min: 30, max: 250 }, voltage: { min: 10, max: 32 }, wireFeed: { min: 1.27, max: 17.78 } }, has: {},
      },
      {
        key: 'pulse', name: 'Pulse, one knob', kind: 'pulsed-one-knob', processes: ['GMAW'], transferModes: ['pulsed-spray'], polarities: ['DCEP'],
        controls: [control('knob', 'Power', 'left knob', '', 0, 10, 0.1), control('trim', 'Arc', 'right knob', '', -5, 5, 0.5)],
        displays: meters, reach: { current: { min: 30, max: 250 }, voltage: { min: 10, max: 32 }, wireFeed: { min: 1.27, max: 17.78 } }, has: {},
        programs: [
          { key: 'alu-12', label: 'Aluminium 1.2', wires: ['ER4043', 'ER5356'], diameters: [1.2], gases: ['Ar 100'], measured: [{ wire: 'ER5356', diameter: 1.2, gas: 'Ar 100', trim: 1, points: [{ knob: 4, wireFeed: 6.3, voltage: 21.4, current: 118, measuredOn: '2026-03-30' }, { knob: 5, wireFeed: 7.4, voltage: 22.4, current: 136, measuredOn: '2026-03-30' }, { knob: 6, wireFeed: 8.5, voltage: 23.3, current: 155, measuredOn: '2026-03-30' }, { knob: 7, wireFeed: 9.6, voltage: 24.2, current: 171, measuredOn: '2026-03-30' }] }] },
          { key: 'steel-09', label: 'Steel 0.9', wires: ['ER70S-6'], diameters: [0.9], gases: ['Ar 82 CO2 18'] },
        ],
      },
      {
        key: 'one-knob', name: 'Short arc, one knob', kind: 'one-knob', processes: ['GMAW'], transferModes: ['short-circuiting', 'globular'], polarities: ['DCEP'],
        controls: [control('knob', 'Power', 'left knob', '', 0, 10, 0.1), control('trim', 'Arc', 'right knob', '', -5, 5, 0.5)],
        displays: meters, reach: { current: { min: 30, max: 250 } }, has: {}, programs: [{ key: 'steel-09', label: 'Steel 0.9', wires: ['ER70S-6', 'ER70S-3'], diameters: [0.9], gases: ['Ar 82 CO2 18', 'CO2 100'] }, { key: 'stainless-09', label: 'Stainless 0.9', wires: ['ER308LSi', 'ER316LSi'], diameters: [0.9], gases: ['Ar 98 CO2 2'] }],
      },
    ],
  })

/** M-001 to M-003, in the order in which they are registered; calibrations are told from the day on which the demo is loaded. */
export const demoMachines = (today: string): WriteMachine[] => [precise(today), plain(today), lumping(today)]
