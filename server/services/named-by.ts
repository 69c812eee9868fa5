import type { NamedBy } from '@shared/schemas/heats.ts'
import type { Tenant } from '../config/database.ts'
import { rows } from './query.ts'

/** Conditions on the variables `v` of a record's content; `$value` is what is looked for. */
export const NAMES = {
  baseMetal: "(v->'baseMetals'->'a'->>'libraryId' = $value or v->'baseMetals'->'b'->>'libraryId' = $value)",
  filler: "v->'processes' @> jsonb_build_array(jsonb_build_object('filler', jsonb_build_object('libraryId', $value::text)))",
  gas: ['shieldingGas', 'backingGas', 'trailingGas', 'plasmaGas'].map((field) => `v->'processes' @> jsonb_build_array(jsonb_build_object('${field}', jsonb_build_object('libraryId', $value::text)))`).join(' or '),
  position: "v->'processes' @> jsonb_build_array(jsonb_build_object('positions', jsonb_build_array($value::text)))",
  process: "v->'processes' @> jsonb_build_array(jsonb_build_object('process', $value::text))",
  heat: "(v->'baseMetals'->'a'->>'heatNumber' = $value or v->'baseMetals'->'b'->>'heatNumber' = $value)",
  lot: "v->'processes' @> jsonb_build_array(jsonb_build_object('filler', jsonb_build_object('lot', $value::text)))",
} as const

/** Records that are told of one by one; a page that names more would only be a list of everything. */
const MOST = 60

/** Revisions and coupons of which a condition holds, newest revision of each number first. */
export function recordsNaming({ organizationId, ...rest }: Tenant, name: keyof typeof NAMES, value: string): Promise<NamedBy[]> {
  return rows<NamedBy>(
    { organizationId, ...rest },
    `select kind, id, number, title, state from (
       select 'procedure' as kind, id, number || ' rev ' || revision as number, content->>'title' as title, state, number as series, -ordinal as place, content->'variables' as v
       from procedure_revisions where organization_id = $organizationId
       union all
       select 'coupon', id, number, content->>'title', state, number, 0, content->'variables' from coupons where organization_id = $organizationId
     ) as records
     where ${NAMES[name]} order by kind desc, series, place limit ${MOST}`,
    { organizationId, value },
  )
}
