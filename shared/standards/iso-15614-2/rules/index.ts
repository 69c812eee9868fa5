/** Every rule of the standard, in the order in which a weld is judged. */
import { wpsContents } from '../../common/iso-15609.ts'
import type { Rule } from '../../rule.ts'
import { editionIds } from '../editions.ts'
import { PROCESSES } from '../meta.ts'
import { ageing } from './ageing.ts'
import { backingAndSides } from './backing-and-sides.ts'
import { backingGas } from './backing-gas.ts'
import { currentType } from './current-type.ts'
import { depositThickness } from './deposit-thickness.ts'
import { diameter } from './diameter.ts'
import { fillerTypeRule } from './filler-type.ts'
import { filletThroat } from './fillet-throat.ts'
import { interpass } from './interpass.ts'
import { jointType } from './joint-type.ts'
import { materialGroupTwo } from './material-group.ts'
import { mechanisation } from './mechanisation.ts'
import { parentThickness } from './parent-thickness.ts'
import { parentThicknessSecond } from './parent-thickness-second.ts'
import { plasmaGas } from './plasma-gas.ts'
import { position } from './position.ts'
import { preheat } from './preheat.ts'
import { process } from './process.ts'
import { pwhtCondition } from './pwht.ts'
import { runCount } from './run-count.ts'
import { shieldingGas } from './shielding-gas.ts'
import { temper } from './temper.ts'
import { transferMode } from './transfer-mode.ts'
import { wireSystem } from './wire-system.ts'

export const rules: readonly Rule[] = [
  process,
  materialGroupTwo,
  parentThickness,
  parentThicknessSecond,
  depositThickness,
  filletThroat,
  diameter,
  position,
  fillerTypeRule,
  preheat,
  interpass,
  jointType,
  backingAndSides,
  runCount,
  mechanisation,
  currentType,
  transferMode,
  wireSystem,
  shieldingGas,
  backingGas,
  plasmaGas,
  pwhtCondition,
  ageing,
  temper,
  ...wpsContents('iso-15614-2', editionIds, PROCESSES),
]
