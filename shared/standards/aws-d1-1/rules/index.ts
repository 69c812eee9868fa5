/** Every rule of the standard: by test (Clause 6), then prequalified (Clause 5). */
import type { Rule } from '../../rule.ts'
import { numbered } from '../meta.ts'
import { prequalifiedRules } from '../prequalified/index.ts'
import { amperage } from './amperage.ts'
import { backing } from './backing.ts'
import { baseMetal } from './base-metal.ts'
import { combinedProcesses } from './combined-processes.ts'
import { currentType } from './current-type.ts'
import { cvnBaseGroup } from './cvn-base-group.ts'
import { cvnBrand } from './cvn-brand.ts'
import { cvnFillerClass } from './cvn-filler-class.ts'
import { cvnFlux } from './cvn-flux.ts'
import { cvnHeatInput } from './cvn-heat-input.ts'
import { cvnInterpass } from './cvn-interpass.ts'
import { cvnOscillation } from './cvn-oscillation.ts'
import { cvnPasses } from './cvn-passes.ts'
import { cvnPwht } from './cvn-pwht.ts'
import { cvnThickness } from './cvn-thickness.ts'
import { cvnVerticalUp } from './cvn-vertical-up.ts'
import { cvnWeave } from './cvn-weave.ts'
import { diameter } from './diameter.ts'
import { electrodeCount } from './electrode-count.ts'
import { fillerAdded } from './filler-added.ts'
import { fillerClassification } from './filler-classification.ts'
import { fillerDiameter } from './filler-diameter.ts'
import { fillerSpecification } from './filler-specification.ts'
import { fillerStrength } from './filler-strength.ts'
import { filletSize } from './fillet-size.ts'
import { gasFlow } from './gas-flow.ts'
import { gasInFillerSpec } from './gas-in-filler-spec.ts'
import { grooveAngle } from './groove-angle.ts'
import { grooveDepth } from './groove-depth.ts'
import { grooveType } from './groove-type.ts'
import { hotWire } from './hot-wire.ts'
import { interpassMinimum } from './interpass-minimum.ts'
import { lateralSpacing } from './lateral-spacing.ts'
import { longitudinalSpacing } from './longitudinal-spacing.ts'
import { lowHydrogen } from './low-hydrogen.ts'
import { normalAngle } from './normal-angle.ts'
import { parallelAngle } from './parallel-angle.ts'
import { position } from './position.ts'
import { powerSource } from './power-source.ts'
import { preheat } from './preheat.ts'
import { process } from './process.ts'
import { pwht } from './pwht.ts'
import { rootFace } from './root-face.ts'
import { rootOpening } from './root-opening.ts'
import { scope } from './scope.ts'
import { shieldingGas } from './shielding-gas.ts'
import { squareGroove } from './square-groove.ts'
import { supplementAlloy } from './supplement-alloy.ts'
import { supplementalAmount } from './supplemental-amount.ts'
import { supplementalFiller } from './supplemental-filler.ts'
import { thickness } from './thickness.ts'
import { transferMode } from './transfer-mode.ts'
import { travelAngle } from './travel-angle.ts'
import { travelSpeed } from './travel-speed.ts'
import { verticalProgression } from './vertical-progression.ts'
import { voltage } from './voltage.ts'
import { weldKind } from './weld-kind.ts'
import { wireFeed } from './wire-feed.ts'

export const rules: readonly Rule[] = [
  process,
  scope,
  combinedProcesses,
  weldKind,
  baseMetal,
  thickness,
  diameter,
  grooveDepth,
  filletSize,
  position,
  verticalProgression,
  fillerStrength,
  lowHydrogen,
  fillerClassification,
  fillerSpecification,
  fillerAdded,
  hotWire,
  supplementalFiller,
  supplementalAmount,
  supplementAlloy,
  fillerDiameter,
  electrodeCount,
  amperage,
  currentType,
  transferMode,
  powerSource,
  voltage,
  wireFeed,
  travelSpeed,
  shieldingGas,
  gasFlow,
  gasInFillerSpec,
  longitudinalSpacing,
  lateralSpacing,
  parallelAngle,
  travelAngle,
  normalAngle,
  grooveType,
  squareGroove,
  grooveAngle,
  rootOpening,
  rootFace,
  backing,
  preheat,
  interpassMinimum,
  pwht,
  cvnBaseGroup,
  cvnThickness,
  cvnFillerClass,
  cvnFlux,
  cvnBrand,
  cvnVerticalUp,
  cvnInterpass,
  cvnPwht,
  cvnHeatInput,
  cvnWeave,
  cvnPasses,
  cvnOscillation,
  ...prequalifiedRules,
].map(numbered)
