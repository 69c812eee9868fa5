/** 8.3.2: thickness of the second member. */
import { thicknessRule } from './parent-thickness.ts'

export const parentThicknessSecond = thicknessRule('thicknessB')
