/** Conditions of a prequalified procedure (Clause 5). Every one must hold; one that fails means that a test is needed. */
import type { Rule } from '../../rule.ts'
import { pqBaseMetal } from './base-metal.ts'
import { pqCurrent } from './current.ts'
import { pqDiameter } from './electrode-diameter.ts'
import { pqFiller } from './filler.ts'
import { pqGas } from './gas.ts'
import { pqGasFlowRange } from './gas-flow-range.ts'
import { pqJoint } from './joint-detail.ts'
import { pqLayerWidth } from './layer-width.ts'
import { pqMinimumFillet } from './minimum-fillet.ts'
import { pqMinimumPartial } from './minimum-partial.ts'
import { pqPassThickness } from './pass-thickness.ts'
import { pqPowerSource } from './power-source.ts'
import { pqPreheat } from './preheat.ts'
import { pqProcess } from './process.ts'
import { pqPwht } from './pwht.ts'
import { pqRanges } from './setting-ranges.ts'
import { pqSinglePassFillet } from './single-pass-fillet.ts'
import { pqStates } from './states.ts'
import { pqToughness } from './toughness.ts'
import { pqProgression } from './vertical-progression.ts'

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
