/** 8.3.3: outside diameter of the second member, the run pipe of a branch. */
import { diameterRule } from './diameter.ts'

export const diameterSecond = diameterRule('b')
