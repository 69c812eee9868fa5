/** Which fields a rule reads: told by the rule itself, as it is run over a record that notes what is looked at. */
import { fieldPattern } from '../comparison/fields.ts'
import { weldingVariablesSchema, type WeldingVariables } from '../schemas/welding.ts'
import type { Rule, RangeContext } from '../standards/rule.ts'

function watched<T extends object>(value: T, path: string, note: (path: string) => void): T {
  return new Proxy(value, {
    get(target, key, receiver): unknown {
      const got: unknown = Reflect.get(target, key, receiver)
      if (typeof key !== 'string' || !Object.hasOwn(target, key)) return got
      const below = path === '' ? key : `${path}.${key}`
      note(fieldPattern(below))
      return typeof got === 'object' && got !== null ? watched(got, below, note) : got
    },
  })
}

/**
 * Patterns of the fields (`processes.*.electrical.voltage`) that a rule looks at to judge a process block by itself. The record is
 * asked as it is and as good as empty, since a rule that has found what it wants looks no further.
 */
export function fieldsRead(rule: Rule, variables: WeldingVariables, index: number, context: Omit<RangeContext, 'procedure' | 'block' | 'coupons' | 'system' | 'toughness'>): Set<string> {
  const read = new Set<string>()
  const own = variables.processes[index]
  if (!own) return read
  const empty = weldingVariablesSchema.parse({ standards: variables.standards, unitSystem: variables.unitSystem, joint: { weld: variables.joint.weld }, processes: [{ id: own.id, process: own.process, mechanisation: own.mechanisation }] })
  for (const [record, at] of [[variables, index], [empty, 0]] as const) {
    const procedure = watched(record, '', (path) => read.add(path))
    const block = procedure.processes[at] ?? null
    rule.check({ ...context, system: record.unitSystem, toughness: record.toughnessRequired, procedure, block, path: `processes.${at}`, coupons: [] }, [], null)
  }
  return read
}
