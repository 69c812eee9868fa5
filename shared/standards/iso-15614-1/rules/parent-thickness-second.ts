/** 8.3.2: parent thickness of the second of two unequal members. */
import { thicknessRule } from './parent-thickness.ts'

export const parentThicknessSecond = thicknessRule('b')
