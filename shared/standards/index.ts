/** The standards that the program knows. To add one is to add its folder and a line here. */
import type { StandardId } from '../schemas/common.ts'
import { asmeIx } from './asme-ix/index.ts'
import { awsD11 } from './aws-d1-1/index.ts'
import { awsD12 } from './aws-d1-2/index.ts'
import { iso15614Part1 } from './iso-15614-1/index.ts'
import { iso15614Part2 } from './iso-15614-2/index.ts'
import type { Standard } from './rule.ts'

export const standards: readonly Standard[] = [asmeIx, awsD11, awsD12, iso15614Part1, iso15614Part2]

/** The standard, or null when its rules are not in the program yet. */
export const getStandard = (id: StandardId): Standard | null => standards.find((standard) => standard.id === id) ?? null
