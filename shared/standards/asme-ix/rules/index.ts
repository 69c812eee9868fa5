/** Every rule of the standard, in the order in which a weld is judged. */
import type { Rule } from '../../rule.ts'
import { alloyFlux, supplementalAlloy } from './alloy-source.ts'
import { baseMetalGroup } from './base-metal-group.ts'
import { baseMetalPNumber, baseMetalPNumberPlasma } from './base-metal-p-number.ts'
import { baseMetalThickness, baseMetalThicknessB } from './base-metal-thickness.ts'
import { closedChamber } from './closed-chamber.ts'
import { currentType } from './current-type.ts'
import { depositThickness } from './deposit-thickness.ts'
import { electrodeDiameter } from './electrode-diameter.ts'
import { electrodeNumber } from './electrode-number.ts'
import { fillerANumber } from './filler-a-number.ts'
import { fillerAdded } from './filler-added.ts'
import { fillerClassification, fluxWireClassification } from './filler-classification.ts'
import { fillerFNumber } from './filler-f-number.ts'
import { fillerProductForm } from './filler-product-form.ts'
import { fluxType } from './flux-type.ts'
import { fluxWireClass } from './flux-wire-class.ts'
import { heatInput } from './heat-input.ts'
import { interpass } from './interpass.ts'
import { jointFilled } from './joint-filled.ts'
import { keyhole } from './keyhole.ts'
import { mustBeStated } from './must-be-stated.ts'
import { passesPerSide } from './passes-per-side.ts'
import { passThickness } from './pass-thickness.ts'
import { preheat } from './preheat.ts'
import { process } from './process.ts'
import { pwhtCondition } from './pwht-condition.ts'
import { pwhtTime } from './pwht-time.ts'
import { recrushedSlag } from './recrushed-slag.ts'
import { orificeGas, plasmaShieldingGas, shieldingGas } from './shielding-gas.ts'
import { shortCircuitDeposit } from './short-circuit-deposit.ts'
import { shortCircuitThickness } from './short-circuit-thickness.ts'
import { backingGasSpecial, trailingGasSpecial } from './special-metal-gas.ts'
import { supplementalFiller } from './supplemental-filler.ts'
import { thermalPreparation } from './thermal-preparation.ts'
import { toughnessTests } from './toughness-tests.ts'
import { toughnessThickness, toughnessThicknessB } from './toughness-thickness.ts'
import { transferMode } from './transfer-mode.ts'
import { verticalUphill } from './vertical-uphill.ts'
import { weldKind } from './weld-kind.ts'

export const rules: readonly Rule[] = [
  process,
  weldKind,
  baseMetalPNumber,
  baseMetalPNumberPlasma,
  baseMetalThickness,
  baseMetalThicknessB,
  passThickness,
  shortCircuitThickness,
  depositThickness,
  jointFilled,
  shortCircuitDeposit,
  fillerFNumber,
  fillerANumber,
  fillerAdded,
  fillerProductForm,
  supplementalFiller,
  supplementalAlloy,
  fluxWireClass,
  alloyFlux,
  fluxType,
  recrushedSlag,
  preheat,
  pwhtCondition,
  shieldingGas,
  plasmaShieldingGas,
  orificeGas,
  backingGasSpecial,
  trailingGasSpecial,
  transferMode,
  closedChamber,
  keyhole,
  thermalPreparation,
  toughnessTests,
  baseMetalGroup,
  toughnessThickness,
  toughnessThicknessB,
  electrodeDiameter,
  fillerClassification,
  fluxWireClassification,
  verticalUphill,
  interpass,
  pwhtTime,
  heatInput,
  currentType,
  passesPerSide,
  electrodeNumber,
  ...mustBeStated,
]
