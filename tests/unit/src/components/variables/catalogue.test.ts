import { describe, expect, it, test } from 'vitest'
import { z } from 'zod'
import { placedRows, coveredPaths, isOffered } from '@/components/variables/catalogue.ts'
import { PASS_COLUMNS, SEQUENCE_FIELDS } from '@/components/variables/pass-grid.ts'
import { labelOf, rowFor, valueInWords } from '@/components/variables/labels.ts'
import { choiceInWords, freshChoice, STANDARDS } from '@/components/variables/options.ts'
import type { RecordKind } from '@/components/variables/row-spec.ts'
import { STANDARD_IDS, type StandardId } from '@shared/schemas/common.ts'
import { passSchema, weldingVariablesSchema, type WeldingVariables } from '@shared/schemas/welding.ts'
import { quantity } from '@shared/units/convert.ts'

interface Node { type?: string; properties?: Record<string, Node>; items?: Node; anyOf?: Node[]; $ref?: string; $defs?: Record<string, Node> }
const VALUES = ['Quantity', 'Interval', 'StandardChoice', 'Pass']

/** Dotted paths of every value of a weld's variables, as the schema tells it; the first process block stands for all. */
function pathsOfSchema(): string[] {
  const root = z.toJSONSchema(weldingVariablesSchema, { io: 'output', unrepresentable: 'any' }) as Node
  const walk = (node: Node, path: string): string[] => {
    const name = node.$ref?.replace('#/$defs/', '')
    if (name && VALUES.includes(name)) return [path]
    const target = name ? (root.$defs?.[name] ?? {}) : node
    const one = target.anyOf?.find(({ type }) => type !== 'null')
    if (one) return walk(one, path)
    if (target.properties) return Object.entries(target.properties).flatMap(([key, child]) => walk(child, path === '' ? key : `${path}.${key}`))
    if (target.items) return path === 'processes' ? walk(target.items, 'processes.0') : [path]
    return [path]
  }
  return walk(root, '')
}

/** Values whose input is part of a row's own editor, or that no person types; each with the reason. */
const WITHIN: readonly (readonly [path: RegExp, why: string])[] = [
  [/^standards$/, 'StandardChoices, on the scope or the record sheet'],
  [/libraryId$/, 'copied when a row of the library is picked'],
  [/^baseMetals\.[ab]\.specification$/, 'MetalEditor: what is typed or picked'],
  [/^processes\.0\.id$/, 'given by the program'],
  [/^processes\.0\.filler\.(?:added|classification)$/, 'FillerEditor'],
  [/^processes\.0\.(?:shielding|backing|trailing|plasma)Gas\.(?:components|isoSymbol|name|flow)$/, 'GasEditor; the symbol follows from the parts'],
  [/^processes\.0\.electrical\.panel\.(?:machine|mode|caution|settings)$/, 'PanelEditor'],
]

const own = new Set(placedRows([null]).flatMap((row) => (row.spec.kind === 'pair' && row.spec.path === 'baseMetals' ? row.spec.paths : coveredPaths(row))))

describe('every value of the schema', () => {
  const paths = pathsOfSchema()
  it('has an input of its own, or a reason why not', () => {
    expect(paths.length).toBeGreaterThan(120)
    expect(paths.filter((path) => !own.has(path) && !WITHIN.some(([pattern]) => pattern.test(path)))).toEqual([])
  })
  it('and every reason is still needed', () => {
    expect(WITHIN.filter(([pattern]) => !paths.some((path) => pattern.test(path) && !own.has(path))).map(([pattern]) => String(pattern))).toEqual([])
  })
  it('and every input writes a value that the schema knows', () => {
    const parts = ['baseMetals.a', 'baseMetals.b', 'processes.0.filler', 'processes.0.shieldingGas', 'processes.0.backingGas', 'processes.0.trailingGas', 'processes.0.plasmaGas', 'processes.0.electrical.panel']
    expect([...own].filter((path) => !paths.includes(path) && !parts.includes(path))).toEqual([])
  })
  it('and every column of a pass', () => {
    expect([...PASS_COLUMNS.map(({ id }) => id), ...SEQUENCE_FIELDS].sort()).toEqual(Object.keys(passSchema.shape).sort())
  })
})

/** Paths that are offered on an empty sheet under one standard, after a change. */
function offered(standard: StandardId, record: RecordKind, change: (weld: WeldingVariables) => void = () => undefined): string[] {
  const weld = weldingVariablesSchema.parse({ standards: [freshChoice(standard)], processes: [{ id: 'p1', process: 'GMAW' }] })
  change(weld)
  return placedRows(weld.processes).filter(({ spec, path }) => isOffered(spec, weld, path.startsWith('processes.') ? (weld.processes[0] ?? null) : null, record)).flatMap(coveredPaths)
}

describe('a row is offered where its standard uses it', () => {
  test.each<[string, StandardId, RecordKind, ((weld: WeldingVariables) => void) | undefined, string[], string[]]>([
    ['ISO 15614-1', 'iso-15614-1', 'procedure', undefined, ['hardnessRequired', 'baseMetals.b.impactSpecified', 'baseMetals.a.condition', 'postHeating.used', 'processes.0.electrical.heatInputQuantity'], ['serviceTemperature', 'impactEnergy', 'pipeRotated', 'joint.work', 'processes.0.electrical.makerCurrent', 'baseMetals.a.heatNumber']],
    ['ISO 15614-1 with toughness', 'iso-15614-1', 'procedure', (weld) => { weld.toughnessRequired = true }, ['impactEnergy', 'impactTemperature'], []],
    ['ISO 15614-1, fillet on pipe with a branch', 'iso-15614-1', 'coupon', (weld) => { weld.joint.weld = 'fillet'; weld.product = 'pipe'; weld.joint.branch = 'set-on' }, ['joint.filletThroat', 'joint.branchAngle', 'diameterB', 'pipeRotated', 'baseMetals.b.heatNumber', 'baseMetals.a.minYield', 'thicknessB'], ['joint.groove']],
    ['AWS D1.1', 'aws-d1-1', 'procedure', (weld) => { weld.processes[0]!.technique.electrodes = 'multiple'; weld.product = 'pipe' }, ['joint.designation', 'processes.0.technique.electrodeCount', 'processes.0.technique.lateralSpacing', 'pipeRotated', 'processes.0.electrical.makerCurrent'], ['hardnessRequired', 'postHeating.used']],
    ['AWS D1.2', 'aws-d1-2', 'procedure', undefined, ['serviceTemperature', 'pwht.ageing', 'baseMetals.a.condition'], ['hardnessRequired', 'joint.branch']],
    ['ASME IX, a fillet', 'asme-ix', 'procedure', (weld) => { weld.joint.weld = 'fillet' }, ['joint.pressureRetaining', 'joint.work', 'processes.0.technique.thermalPreparation'], ['joint.filletThroat', 'hardnessRequired']],
    ['a metal that is in no library', 'asme-ix', 'procedure', (weld) => { weld.baseMetals.a.specification = 'Old bridge steel' }, ['baseMetals.a.grade', 'baseMetals.a.uns', 'baseMetals.b.minTensile'], []],
  ])('%s', (_name, standard, record, change, shown, hidden) => {
    const paths = offered(standard, record, change)
    expect(shown.filter((path) => !paths.includes(path))).toEqual([])
    expect(hidden.filter((path) => paths.includes(path))).toEqual([])
  })
})

describe('pairs', () => {
  const weld = weldingVariablesSchema.parse({ standards: [freshChoice('iso-15614-1')], processes: [{ id: 'p1' }] })
  it('are found by either of their two values', () => {
    const rows = placedRows(weld.processes)
    expect(rowFor('baseMetals.b.minYield', rows)?.path).toBe('baseMetals.a.minYield')
    expect(rowFor('baseMetals.b', rows)?.path).toBe('baseMetals.b')
    expect(labelOf('variables.baseMetals.b.impactSpecified', { variables: weld })).toBe('Impact values specified')
  })
  it('say their values in words', () => {
    expect(valueInWords('baseMetals.b.minYield', quantity(355, 'stress'), { variables: weld }, 'SI')).toBe('355 MPa')
    expect(valueInWords('baseMetals.a.impactSpecified', false, { variables: weld }, 'SI')).toBe('no')
    expect(valueInWords('baseMetals.a.condition', 'N', { variables: weld }, 'SI')).toBe('N')
  })
})

describe('a standard newly chosen', () => {
  it.each(STANDARD_IDS)('%s: its newest edition, judged by test', (id) => {
    const choice = freshChoice(id)
    expect(choice.edition).toBe(STANDARDS.find((one) => one.id === id)?.editions.at(-1)?.value)
    expect(choice.route).toBeUndefined()
    expect(choice.level).toBe(id === 'iso-15614-1' ? '2' : null)
  })
  it('is told with its level and route', () => {
    expect(choiceInWords({ standard: 'iso-15614-1', edition: '2017+A1:2019', level: '1' })).toBe('ISO 15614-1 2017+A1:2019, level 1')
    expect(choiceInWords({ standard: 'aws-d1-1', edition: '2020', level: null, route: 'prequalified' })).toBe('AWS D1.1 2020, prequalified')
  })
})
