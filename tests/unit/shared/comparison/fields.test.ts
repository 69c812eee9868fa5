import { describe, expect, it, test } from 'vitest'
import { z } from 'zod'
import { describeValue } from '../../../../shared/comparison/describe.ts'
import { FIELDS, fieldAt, fieldLabel, fieldSection } from '../../../../shared/comparison/fields.ts'
import { couponContentSchema, procedureContentSchema } from '../../../../shared/schemas/welding.ts'
import { interval, quantity } from '../../../../shared/units/convert.ts'
import { parseInterval } from '../../../../shared/units/parse.ts'

interface Node { type?: string; properties?: Record<string, Node>; items?: Node; anyOf?: Node[]; $ref?: string; $defs?: Record<string, Node> }

/** Dotted paths of everything that a content can hold, as the schema tells it, with `*` for a place in a list. */
function pathsOf(schema: z.ZodType): string[] {
  const root = z.toJSONSchema(schema, { io: 'output', unrepresentable: 'any' }) as Node
  const walk = (node: Node, path: string): string[] => {
    const target = node.$ref ? (root.$defs?.[node.$ref.replace('#/$defs/', '')] ?? {}) : node
    const one = target.anyOf?.find(({ type }) => type !== 'null') ?? target
    if (one !== target) return walk(one, path)
    if (fieldAt(path) && path !== '' && FIELDS.some((field) => field.path === path.replace(/^variables\./, ''))) return [path]
    if (target.properties) return Object.entries(target.properties).flatMap(([key, child]) => walk(child, path === '' ? key : `${path}.${key}`))
    if (target.items) return walk(target.items, `${path}.*`)
    return [path]
  }
  return walk(root, '')
}
const identities = /^(?:processes|runSheet|tension|bends|macros|toughness|hardness|ndt)\.\*\.id$/

describe('every field of the schemas has a name', () => {
  test.each([['procedure', procedureContentSchema], ['coupon', couponContentSchema]] as const)('%s', (_name, schema) => {
    const paths = pathsOf(schema).map((path) => path.replace(/^variables\./, '')).filter((path) => !identities.test(path))
    expect(paths.length).toBeGreaterThan(100)
    expect(paths.filter((path) => !FIELDS.some((field) => field.path === path))).toEqual([])
  })
  it('and every name belongs to a field of the schemas', () => {
    const known = new Set([procedureContentSchema, couponContentSchema].flatMap((schema) => pathsOf(schema)).map((path) => path.replace(/^variables\./, '')))
    expect(FIELDS.filter(({ path }) => !known.has(path)).map(({ path }) => path)).toEqual([])
  })
  it('once', () => {
    expect(new Set(FIELDS.map(({ path }) => path)).size).toBe(FIELDS.length)
  })
})

describe('labels', () => {
  test.each([
    ['processes.0.filler.fNumber', 'F-Number', 'Filler metals'],
    ['variables.processes.2.filler.fNumber', 'F-Number', 'Filler metals'],
    ['thickness', 'Base metal thickness', 'Base metals'],
    ['preheat.minimum.si', 'Preheat minimum', 'Preheat'],
    ['processes.1.passes.3.current', 'Current', 'Passes'],
    ['processes.1.filler', 'Filler metal', 'Filler metals'],
    ['baseMetals.a.pNumber', 'Base metal A P-Number', 'Base metals'],
    ['runSheet.4.arcTime', 'Arc time', 'Run sheet'],
    ['somewhere.elseEntirely', 'Else entirely', null],
  ])('%s is %s', (path, label, section) => {
    expect(fieldLabel(path)).toBe(label)
    expect(fieldSection(path)).toBe(section)
  })
})

describe('values in words', () => {
  const inches = parseInterval('3/16 - 3/4 in', 'length', 'US')
  test.each<[string, unknown, 'SI' | 'US', string]>([
    ['thickness', interval(5, 20, 'length'), 'SI', '5–20 mm'],
    ['thickness', inches.ok && inches.interval, 'US', '3/16 to 3/4 in'],
    ['thickness', inches.ok && inches.interval, 'SI', '4.8–19.1 mm'],
    ['preheat.minimum', quantity(200, 'temperature', '°F'), 'SI', '93 °C'],
    ['processes.0.electrical.voltage', interval(18, 22, 'voltage'), 'US', '18–22 V'],
    ['joint.groove', 'single-v', 'SI', 'single V'],
    ['pwht.condition', 'below-lower-transformation', 'SI', 'below lower transformation'],
    ['processes.0.electrical.currentType', 'DCEP', 'SI', 'DCEP'],
    ['toughnessRequired', false, 'SI', 'no'],
    ['processes.0.positions', ['3G', '4G'], 'SI', '3G, 4G'],
    ['processes.0.positions', [], 'SI', 'not stated'],
    ['processes.0.shieldingGas.components', [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }], 'SI', 'Ar 82 %, CO2 18 %'],
    ['processes.0.filler.diameters', [quantity(0.045, 'length', 'in'), quantity(1.6, 'length')], 'US', '0.045 in, 0.063 in'],
    ['processes.0.filler.aNumber', 8, 'SI', '8'],
    ['standards', [{ standard: 'iso-15614-1', edition: '2017', level: '2' }], 'SI', 'ISO 15614-1, 2017, level 2'],
    ['bends.0.openings', [{ size: quantity(2, 'length'), corner: true, fromInternalFlaw: null }], 'SI', '2 mm at a corner'],
    ['thickness', null, 'SI', 'not stated'],
    ['thickness', interval(null, null, 'length'), 'SI', 'not stated'],
    ['thickness', { min: null, max: null, all: true }, 'SI', 'all'],
    ['thickness', 'a wrong shape', 'SI', 'a wrong shape'],
    ['unknown.path', 7, 'SI', '7'],
  ])('%s %j reads in %s as %s', (path, value, system, text) => {
    expect(describeValue(path, value, system)).toBe(text)
  })
})
