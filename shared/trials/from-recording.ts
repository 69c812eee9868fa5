import type { ArcFigures } from '../schemas/arc-data.ts'
import type { BeadContent } from '../schemas/trials.ts'
import { interval, quantity } from '../units/convert.ts'

const tenth = (value: number): number => Number(value.toFixed(1))

/**
 * What a recording of a bead's arc says of it: mean current and voltage and the arc time, and where it pulses the peak and background
 * that the panel may not show. What was measured otherwise (feed, travel, length) stays.
 */
export function measuredFromRecording(measured: BeadContent['measured'], { current, voltage, arcTime, pulse, alternating }: Pick<ArcFigures, 'current' | 'voltage' | 'arcTime' | 'pulse' | 'alternating'>): BeadContent['measured'] {
  // The mean of an alternating current is about nothing: its RMS value is what a meter shows.
  const [amps, volts] = alternating ? [current.rms, voltage.rms] : [current.mean, voltage.mean]
  return {
    ...measured,
    current: interval(Math.round(amps), undefined, 'current'), voltage: interval(tenth(volts), undefined, 'voltage'), arcTime: quantity(tenth(arcTime), 'duration'),
    ...(pulse && { peakCurrent: quantity(Math.round(pulse.peakCurrent), 'current'), backgroundCurrent: quantity(Math.round(pulse.backgroundCurrent), 'current') }),
  }
}
