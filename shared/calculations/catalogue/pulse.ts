/** Calculators of the pulsed arc. */
import { SPRAY_TRANSITION, sprayTransition } from '../burn-off.ts'
import { detachmentParameter, pulseFigures, pulseSource } from '../pulse.ts'
import { calculator, type Calculator } from './define.ts'
import { choice, number, quantity, quantityIfAny } from './inputs.ts'

export const pulseCalculators: readonly Calculator[] = [
  calculator({
    id: 'pulse', title: 'Pulsed arc', group: 'pulse', purpose: 'What the settings of a manual pulse come to: mean and RMS current, power, duty, drop and energy.',
    inputs: {
      peakCurrent: quantity('ip', 'Peak current', 'current', 400), backgroundCurrent: quantity('ib', 'Background current', 'current', 50, { least: 0 }), frequency: quantity('f', 'Pulse frequency', 'frequency', 120), onTime: quantity('tp', 'Time at peak', 'pulseTime', 2),
      wireFeed: quantityIfAny('w', 'Wire feed', 'wireFeed', 4.5), wireDiameter: quantityIfAny('d', 'Wire diameter', 'length', 1.2), peakVoltage: quantityIfAny('vp', 'Peak voltage', 'voltage', 32, { least: 0 }), backgroundVoltage: quantityIfAny('vb', 'Background voltage', 'voltage', 20, { least: 0 }), travelSpeed: quantityIfAny('s', 'Travel speed', 'travelSpeed', 400),
    },
    outputs: [
      { key: 'meanCurrent', label: 'Mean current', dimension: 'current' }, { key: 'rmsCurrent', label: 'RMS current', dimension: 'current' }, { key: 'duty', label: 'Duty', decimals: 3 }, { key: 'period', label: 'Period', dimension: 'pulseTime' },
      { key: 'meanVoltage', label: 'Mean voltage', dimension: 'voltage' }, { key: 'power', label: 'Average power', unit: 'W', decimals: 0 }, { key: 'meterPower', label: 'Mean volts × mean amperes', unit: 'W', decimals: 0 }, { key: 'missedPower', label: 'Missed by meters', unit: 'W', decimals: 0 }, { key: 'powerRatio', label: 'True power over meters', decimals: 3 },
      { key: 'dropletVolume', label: 'Wire melted per pulse', unit: 'mm³', decimals: 3 }, { key: 'dropletDiameter', label: 'Drop diameter', unit: 'mm', decimals: 2 }, { key: 'dropletRatio', label: 'Drop over wire diameter', decimals: 2 }, { key: 'detachment', label: 'Detachment parameter', unit: 'A²s', decimals: 0 },
      { key: 'energyPerPulse', label: 'Energy of a pulse', unit: 'J', decimals: 1 }, { key: 'energyPerWire', label: 'Energy per mm of wire', unit: 'J/mm', decimals: 1 }, { key: 'energyPerLength', label: 'Energy per length of weld', dimension: 'heatInput' },
    ],
    calculate: pulseFigures,
    formula: ['duty d = frequency × time at peak / 1000', 'mean current = d × peak + (1 − d) × background', 'RMS current = √(d × peak² + (1 − d) × background²)', 'power = d × peak V × peak A + (1 − d) × background V × background A', 'wire per pulse = wire feed × wire section / frequency', 'drop diameter = ³√(6 × volume / π)'],
    source: pulseSource, validity: 'Rectangular pulses with a duty below 1; peak 100 to 565 A, background 10 to 200 A, 20 to 400 Hz and 1 to 5 ms are plausible. One drop per pulse is assumed.',
    example: { from: 'calc-g-pu-01, calc-g-pu-02 and calc-g-pu-04', expect: { duty: { value: 0.24, within: 0.0001 }, meanCurrent: { value: 134, within: 0.05 }, rmsCurrent: { value: 200.75, within: 0.05 }, meanVoltage: { value: 22.88, within: 0.005 }, power: { value: 3832, within: 0.5 }, meterPower: { value: 3065.9, within: 0.5 }, missedPower: { value: 766.08, within: 0.5 }, powerRatio: { value: 1.2499, within: 0.001 }, dropletVolume: { value: 0.7069, within: 0.001 }, dropletDiameter: { value: 1.1052, within: 0.002 } } },
  }),
  calculator({
    id: 'pulse-detachment', title: 'Drop detachment', group: 'pulse', purpose: 'The detachment parameter of a pulse, which keeps the drop alike when peak and time at peak change.',
    inputs: { peakCurrent: quantity('ip', 'Peak current', 'current', 420), onTime: quantity('tp', 'Time at peak', 'pulseTime', 2.2), exponent: number('n', 'Exponent n', '', 2, { above: 0, most: 5 }) },
    outputs: [{ key: 'detachment', label: 'Detachment parameter', unit: 'A^n·s', decimals: 1 }], calculate: detachmentParameter,
    formula: ['peak current^n × time at peak in seconds'], source: { standard: 'Detachment parameter', edition: '', clause: '', basis: 'memory', note: 'Textbook relation; the exponent is data, not truth.' }, validity: 'n from 1.1 to 2.3 in published fits, about 2 for steel.',
    example: { from: 'calc-g-pu-05', expect: { detachment: { value: 388.08, within: 0.1 } } },
  }),
  calculator({
    id: 'spray-transition', title: 'Spray transition', group: 'pulse', purpose: 'The least current at which a wire goes over to spray; a pulse peak must be above it and the background below.',
    inputs: { wire: choice('m', 'Wire', SPRAY_TRANSITION.map(({ id, wire, gas }) => ({ value: id, label: `${wire}, ${gas}` })), 'mild-steel'), diameter: choice('d', 'Wire diameter', [{ value: '0.030', label: '0.030 in (0.8 mm)' }, { value: '0.035', label: '0.035 in (0.9 mm)' }, { value: '0.045', label: '0.045 in (1.2 mm)' }, { value: '0.052', label: '0.052 in (1.3 mm)' }, { value: '1/16', label: '1/16 in (1.6 mm)' }], '0.045'), current: quantityIfAny('i', 'Current', 'current', 230, { least: 0 }) },
    outputs: [{ key: 'least', label: 'Least current for spray', dimension: 'current' }, { key: 'spray', label: 'Spray', words: { true: 'yes, at or above it', false: 'no, below it' } }], calculate: sprayTransition,
    formula: ['table of least currents by wire, diameter and gas'], source: { standard: 'Least current for spray transfer', edition: '', clause: '', basis: 'secondary', note: 'Table of a filler maker’s handbook.' }, validity: 'The gases of the table; CO2 raises the transition, and above some 18 to 20 % true spray is hard to reach.',
    example: { from: 'table: mild steel 0.045 in, 220 A; 230 A is above', expect: { least: { value: 220, within: 0 }, spray: true } },
  }),
]
