/** Every rule of the standard, in the order in which a weld is judged. */
import type { Rule } from '../../rule.ts'
import { baseMetal, fillerChoice, fillerNumber } from './metals.ts'
import { process } from './process.ts'
import { amperage, diameter, gasFlow, preheat, thickness, travelSpeed, voltage } from './unconfirmed.ts'
import { backing, cleaning, currentType, highestTemperature, layers, position, progression, pwht, shieldingGas, weldKind } from './weld.ts'

export const rules: readonly Rule[] = [process, weldKind, baseMetal, fillerNumber, fillerChoice, thickness, diameter, position, progression, shieldingGas, gasFlow, currentType, amperage, voltage, travelSpeed, backing, layers, cleaning, preheat, highestTemperature, pwht]
