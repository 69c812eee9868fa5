/** 8.4.1: degree of mechanisation. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'

const DEGREE: Readonly<Record<NonNullable<ProcessBlock['mechanisation']>, string>> = { manual: 'manual', semiautomatic: 'partly mechanised', machine: 'fully mechanised', automatic: 'automatic' }

const degree = (block: ProcessBlock | null): readonly string[] | null => (block?.mechanisation ? [DEGREE[block.mechanisation]] : null)

export const mechanisation = nameBandRule({
  meta: meta('mechanisation', { title: 'Degree of mechanisation', clause: '8.4.1', basis: 'memory', statement: 'At level 2 manual, partly mechanised, fully mechanised and automatic welding each need their own test; level 1 is believed not to limit it, which is not confirmed.' }),
  field: 'mechanisation',
  at: 'block',
  label: 'degree of mechanisation',
  asked: (context) => degree(context.block),
  tested: (_context, side) => degree(side.block),
  covers: (value, context) => (levelOf(context) === '1' ? { sure: value, maybe: 'any', why: 'Level 1 is believed not to limit the degree of mechanisation, which is not confirmed.' } : { sure: value }),
  because: 'Each degree of mechanisation is qualified by itself.',
})
