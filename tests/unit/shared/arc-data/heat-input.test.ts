/** Heat input of a recording by QW-409.1(c). */
import { describe, expect, it } from 'vitest'
import { arcHeatInput } from '../../../../shared/arc-data/heat-input.ts'
import { interval } from '../../../../shared/units/convert.ts'

const figures = { energy: 38000, averageInstantaneousPower: 3832 }
const nothing = { weldLength: null, length: null, travelSpeed: null, of: 'pass 2' }

describe('heat input of a recording', () => {
  it('is energy over length, and says whose length', () => {
    // 38 kJ over 127 mm is 7.60 kJ/in.
    expect((arcHeatInput(figures, { ...nothing, weldLength: 127, length: 300 })?.heatInput ?? 0) * 25.4).toBeCloseTo(7.6, 6)
    expect(arcHeatInput(figures, { ...nothing, length: 127 })?.how).toBe('energy 38000 J over 127 mm, the length of pass 2')
  })
  it('is power over the slowest travel speed without a length', () => {
    const told = arcHeatInput(figures, { ...nothing, travelSpeed: interval(300, 400, 'travelSpeed') })
    expect(told?.heatInput).toBeCloseTo(0.7664, 6)
    expect(told?.how).toContain('the slowest travel speed of pass 2')
    expect(arcHeatInput(figures, nothing)).toBeNull()
  })
  it('says that energy over length is too low where the arc burned unrecorded', () => {
    const gaps = { count: 1, duration: 2.5 }
    expect(arcHeatInput({ ...figures, gaps }, { ...nothing, weldLength: 127 })?.how).toContain('too low where the arc burned in the 2.5 s that were not recorded')
    expect(arcHeatInput({ ...figures, gaps: { count: 0, duration: 0 } }, { ...nothing, weldLength: 127 })?.how).not.toContain('too low')
    expect(arcHeatInput({ ...figures, gaps }, { ...nothing, travelSpeed: interval(300, undefined, 'travelSpeed') })?.how).not.toContain('too low')
  })
})
