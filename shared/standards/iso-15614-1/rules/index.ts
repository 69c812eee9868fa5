/** Every rule of the standard, in the order in which a weld is judged. */
import { wpsContents } from '../../common/iso-15609.ts'
import type { Rule } from '../../rule.ts'
import { editionIds } from '../editions.ts'
import { PROCESSES } from '../meta.ts'
import { currentType, fluxMake, transferMode, wireSystem } from './electrical.ts'
import { depositThickness, filletThroat, parentThickness, parentThicknessSecond } from './thickness.ts'
import { diameter, diameterSecond } from './diameter.ts'
import { fillerDesignation, fillerMake } from './filler.ts'
import { backingGas, carbonDioxideShare, plasmaGas, shieldingGas } from './gas.ts'
import { hardnessTests, heatInputMaximum, heatInputMinimum, waveformControl } from './heat-input.ts'
import { backingAndSides, backingMaterial, branchAngle, jointType, runCount } from './joint.ts'
import { level } from './level.ts'
import { materialGroup } from './material-group.ts'
import { position } from './position.ts'
import { mechanisation, process, processOrder } from './process.ts'
import { initialHeatTreatment, interpass, postHeating, preheat, pwhtCondition, pwhtTemperature } from './temperatures.ts'

export const rules: readonly Rule[] = [
  process,
  level,
  mechanisation,
  processOrder,
  jointType,
  backingAndSides,
  backingMaterial,
  runCount,
  materialGroup,
  parentThickness,
  parentThicknessSecond,
  depositThickness,
  filletThroat,
  diameter,
  diameterSecond,
  branchAngle,
  position,
  fillerDesignation,
  fillerMake,
  fluxMake,
  currentType,
  transferMode,
  wireSystem,
  heatInputMaximum,
  heatInputMinimum,
  waveformControl,
  hardnessTests,
  preheat,
  interpass,
  postHeating,
  pwhtCondition,
  pwhtTemperature,
  initialHeatTreatment,
  shieldingGas,
  carbonDioxideShare,
  backingGas,
  plasmaGas,
  ...wpsContents('iso-15614-1', editionIds, PROCESSES),
]
