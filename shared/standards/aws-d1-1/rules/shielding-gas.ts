/** Row 19: another gas, mixture, nominal percentage or no gas. */
import { gasRule } from '../gas-rule.ts'

export const shieldingGas = gasRule('shielding_gas')
