/** 8.4.11: heat treatment after welding neither added nor left out. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { meta } from '../meta.ts'

const CONDITION: Readonly<Record<string, string>> = { none: 'no heat treatment after welding' }

const condition = (variables: WeldingVariables): readonly string[] | null => (variables.pwht.condition === null ? null : [CONDITION[variables.pwht.condition] ?? variables.pwht.condition.replaceAll('-', ' ')])

export const pwhtCondition = nameBandRule({
  meta: meta('pwht', { title: 'Heat treatment after welding', clause: '8.4.11', basis: 'read', statement: 'Heat treatment after welding may be neither added nor left out, and its kind stays as tested.' }),
  field: 'pwht.condition',
  at: 'weld',
  label: 'heat treatment after welding',
  asked: (context) => condition(context.procedure),
  tested: (_context, side) => condition(side.variables),
  because: 'Neither added nor omitted; the kind stays as tested.',
})
