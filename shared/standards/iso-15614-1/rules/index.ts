/** Every rule of the standard, in the order in which a weld is judged. */
import { wpsContents } from '../../common/iso-15609.ts'
import type { Rule } from '../../rule.ts'
import { editionIds } from '../editions.ts'
import { PROCESSES } from '../meta.ts'
import { backingAndSides } from './backing-and-sides.ts'
import { backingGas } from './backing-gas.ts'
import { backingMaterial } from './backing-material.ts'
import { branchAngle } from './branch-angle.ts'
import { carbonDioxideShare } from './carbon-dioxide.ts'
import { currentType } from './current-type.ts'
import { depositThickness } from './deposit-thickness.ts'
import { diameter } from './diameter.ts'
import { diameterSecond } from './diameter-second.ts'
import { fillerDesignation } from './filler-designation.ts'
import { fillerMake } from './filler-make.ts'
import { filletThroat } from './fillet-throat.ts'
import { fluxMake } from './flux.ts'
import { hardnessTests } from './hardness-tests.ts'
import { heatInputMaximum } from './heat-input-maximum.ts'
import { heatInputMinimum } from './heat-input-minimum.ts'
import { impactTests } from './impact-tests.ts'
import { initialHeatTreatment } from './initial-heat-treatment.ts'
import { interpass } from './interpass.ts'
import { jointType } from './joint-type.ts'
import { level } from './level.ts'
import { materialGroup } from './material-group.ts'
import { mechanisation } from './mechanisation.ts'
import { parentThickness } from './parent-thickness.ts'
import { parentThicknessSecond } from './parent-thickness-second.ts'
import { plasmaGas } from './plasma-gas.ts'
import { position } from './position.ts'
import { postHeating } from './post-heating.ts'
import { preheat } from './preheat.ts'
import { process } from './process.ts'
import { processOrder } from './process-order.ts'
import { pwhtCondition } from './pwht.ts'
import { pwhtTemperature } from './pwht-temperature.ts'
import { runCount } from './run-count.ts'
import { shieldingGas } from './shielding-gas.ts'
import { transferMode } from './transfer-mode.ts'
import { waveformControl } from './waveform.ts'
import { wireSystem } from './wire-system.ts'

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
  impactTests,
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
