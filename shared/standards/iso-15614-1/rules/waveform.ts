/** 8.4.7: waveform control as tested, where heat input counts. */
import { cannotTell, names, notStated } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { waveform } from '../energy.ts'
import { meta } from '../meta.ts'

/** Change of control between conventional and waveform-controlled power sources. */
export const waveformControl: Rule = {
  meta: meta('waveform', { title: 'Waveform control', clause: '8.4.7', basis: 'memory', statement: 'Where the waveform is controlled, energy comes from instantaneous values in coupon and production alike; a change of control must be looked up, where heat input counts.' }),
  field: 'electrical.waveformControlled',
  at: 'block',
  label: 'Waveform control',
  applies: (context) => context.toughness !== false || context.procedure.hardnessRequired !== false,
  range: () => null,
  check(context, sides) {
    if (!context.block || (context.toughness === false && context.procedure.hardnessRequired === false)) return null
    const own = waveform(context.block.electrical)
    if (own === null) return notStated('waveform control', `${context.path}.electrical.waveformControlled`)
    const had = sides.map((side) => (side.block ? waveform(side.block.electrical) : null))
    if (had.includes(own)) return { verdict: 'within', sentence: `Waveform control is as on ${names(sides)}.`, asked: [own ? 'controlled' : 'not controlled'], range: null }
    if (had.includes(null)) return cannotTell(`${names(sides)} does not record whether the waveform was controlled.`, sides.map((side) => `${side.coupon.number}: electrical.waveformControlled`))
    return cannotTell(`The waveform is ${own ? '' : 'not '}controlled, and on ${names(sides)} it was ${own ? 'not ' : ''}so. What the clause says of that change is not known here.`, ['the clause on waveform-controlled current in your edition'], { asked: [own ? 'controlled' : 'not controlled'] })
  },
}
