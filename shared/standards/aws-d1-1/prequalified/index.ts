/** Conditions of a prequalified procedure (Clause 5). Every one must hold; one that fails means that a test is needed. */
import type { Rule } from '../../rule.ts'
import { pqBaseMetal, pqFiller, pqGas, pqPowerSource, pqPreheat, pqProcess, pqPwht, pqToughness } from './materials.ts'
import { pqCurrent, pqDiameter, pqMinimumFillet, pqMinimumPartial, pqPassThickness, pqSinglePassFillet } from './sizes.ts'
import { pqGasFlowRange, pqJoint, pqLayerWidth, pqProgression, pqRanges, pqStates } from './technique.ts'

export const prequalifiedRules: readonly Rule[] = [
  pqProcess,
  pqPowerSource,
  pqBaseMetal,
  pqFiller,
  pqPreheat,
  pqJoint,
  pqMinimumFillet,
  pqMinimumPartial,
  pqDiameter,
  pqCurrent,
  pqPassThickness,
  pqSinglePassFillet,
  pqLayerWidth,
  pqProgression,
  pqGas,
  pqGasFlowRange,
  ...pqRanges,
  ...pqStates,
  pqPwht,
  pqToughness,
]
