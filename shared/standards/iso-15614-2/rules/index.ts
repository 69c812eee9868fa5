/** Every rule of the standard, in the order in which a weld is judged. */
import { wpsContents } from '../../common/iso-15609.ts'
import type { Rule } from '../../rule.ts'
import { editionIds } from '../editions.ts'
import { PROCESSES } from '../meta.ts'
import { fillerTypeRule, materialGroupTwo } from './metal.ts'
import { asTested, position, process } from './names.ts'
import { depositThickness, diameter, filletThroat, parentThickness, parentThicknessSecond } from './size.ts'
import { interpass, preheat } from './temperatures.ts'

export const rules: readonly Rule[] = [process, materialGroupTwo, parentThickness, parentThicknessSecond, depositThickness, filletThroat, diameter, position, fillerTypeRule, preheat, interpass, ...asTested, ...wpsContents('iso-15614-2', editionIds, PROCESSES)]
