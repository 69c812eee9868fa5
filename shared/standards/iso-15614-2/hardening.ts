/** Heat-treatable alloys: groups 23 to 26. */
import { materialGroup, secondMember } from '../common/iso-names.ts'
import type { WeldingVariables } from '../../schemas/welding.ts'

export const isHardening = (variables: WeldingVariables): boolean => [variables.baseMetals.a, secondMember(variables)].some((metal) => [23, 24, 25, 26].includes(materialGroup(metal)?.main ?? 0))
