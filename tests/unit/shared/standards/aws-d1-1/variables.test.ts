/** Table 6.5 and 6.7 variable by variable: the rows against the reference matrix, then cases of our own. */
import { describe, expect, test } from 'vitest'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import { awsD11 } from '@shared/standards/aws-d1-1/index.ts'
import { variables } from '@shared/standards/aws-d1-1/variables.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import matrix from '../../../../fixtures/standards/aws-d1-1-variables.json' with { type: 'json' }
import { coupon, finding, first, judge, pair, problems, procedure, type Arc, type Given } from './records.ts'

describe('the matrix of variables', () => {
  test.each(matrix.map((row) => [row.process, row.item, row] as const))('%s %s has its rule with row, class and basis', (process, item, row) => {
    const known = variables[item as keyof typeof variables]
    expect(known).toMatchObject({ row: row.row })
    expect((known.processes as Record<string, string>)[process]).toBe(row.basis)
    const rule = awsD11.rules.find(({ meta }) => meta.id === `aws-d1-1/${known.file}`)
    expect(rule?.meta.classes[process as Arc]).toBe(row.table.startsWith('Table 6.5') ? 'essential' : 'supplementary')
    expect(rule?.meta).toMatchObject({ route: 'test', clause: row.table.startsWith('Table 6.5') ? `Table 6.5 row ${row.row}` : 'Table 6.7' })
  })
  test('holds nothing that the reference does not', () => {
    const told = Object.entries(variables).flatMap(([item, { processes }]) => Object.keys(processes).map((process) => `${process} ${item}`))
    expect(told.sort()).toEqual(matrix.map(({ process, item }) => `${process} ${item}`).sort())
  })
  test('every rule has words for the standard page', () => {
    for (const { meta, label } of awsD11.rules) {
      expect(meta.statement.length, meta.id).toBeGreaterThan(20)
      expect(meta.source.length).toBeGreaterThan(5)
      expect(label).not.toBe('')
    }
    expect(new Set(awsD11.rules.map(({ meta }) => meta.id)).size).toBe(awsD11.rules.length)
  })
})

type Change = (v: WeldingVariables) => void
interface Own { name: string; given?: Given; tested?: Change; asked: Change; rule: string; verdict: 'within' | 'outside' | 'cannot-tell'; says?: RegExp; edition?: string }
const W: Given = { processes: ['GMAW'] }
const S: Given = { processes: ['SAW'] }
const T: Given = { processes: ['GTAW'] }
const C: Given = { toughness: true }
const filler = (classification: string | null, more: object = {}): Change => (v) => void Object.assign(first(v).filler, { classification, specification: null, ...more })
const size = (value: number, unit = 'mm'): Change => (v) => { first(v).filler.diameters = [quantity(value, 'length', unit)] }
const steel = (a: readonly [string | null, string | null], b: readonly [string | null, string | null] = a, thick?: number): Change => (v) => {
  Object.assign(v.baseMetals.a, { specification: a[0], grade: a[1], uns: null })
  Object.assign(v.baseMetals.b, { specification: b[0], grade: b[1], uns: null })
  if (thick) v.thickness = interval(thick, undefined, 'length')
}
const A572: readonly [string, string] = ['ASTM A572', '50']
const A36: readonly [string, null] = ['ASTM A36', null]
const A514: readonly [string, string] = ['ASTM A514', 'B']
const A913: readonly [string, string] = ['ASTM A913', '65']
const tough = (change: Change): Change => change
const pipe = (diameter: number | null, wall?: number, unit = 'mm'): Change => (v) => {
  v.product = 'pipe'
  v.diameter = diameter === null ? null : interval(diameter, undefined, 'length', unit)
  if (wall) v.thickness = interval(wall, undefined, 'length', unit)
}
const joint = (more: object): Change => (v) => void Object.assign(v.joint, more)
const electrical = (more: object): Change => (v) => void Object.assign(first(v).electrical, more)
const technique = (more: object): Change => (v) => void Object.assign(first(v).technique, more)
const at = (positions: readonly string[], progression = 'up'): Change => (v) => void Object.assign(first(v), { positions: [...positions], progression })
const both = (...changes: readonly Change[]): Change => (v) => changes.forEach((change) => change(v))

const OWN: readonly Own[] = [
  // Fillers
  { name: 'a stronger filler', asked: filler('E8018-C3'), rule: 'filler-strength', verdict: 'outside', says: /80 ksi class is not covered/ },
  { name: 'E11018-M is read as 110 ksi', tested: filler('E11018-M'), asked: filler('E10018-D2'), rule: 'filler-strength', verdict: 'within' },
  { name: 'the metric twin is of one class', asked: filler('E4918'), rule: 'filler-strength', verdict: 'within' },
  { name: 'a strength that can\'t be read', asked: filler('LF-7'), rule: 'filler-strength', verdict: 'cannot-tell' },
  { name: 'E75 is no class', asked: filler('E7518'), rule: 'filler-strength', verdict: 'cannot-tell' },
  { name: 'metal-cored wire of the same class', given: W, asked: filler('E70C-6M'), rule: 'filler-strength', verdict: 'within' },
  { name: 'FCAW of a higher class', given: { processes: ['FCAW'] }, asked: filler('E81T1-Ni1C'), rule: 'filler-strength', verdict: 'outside' },
  { name: 'a coupon without filler class', tested: filler(null), asked: () => undefined, rule: 'filler-strength', verdict: 'cannot-tell', says: /PQR-001/ },
  { name: 'away from low-hydrogen', asked: filler('E7014'), rule: 'low-hydrogen', verdict: 'outside' },
  { name: 'to low-hydrogen', tested: filler('E6010'), asked: filler('E7016'), rule: 'low-hydrogen', verdict: 'within' },
  { name: 'cellulosic after cellulosic', tested: filler('E6010'), asked: filler('E6010'), rule: 'low-hydrogen', verdict: 'within' },
  { name: 'another flux-electrode class (row in doubt)', given: S, asked: filler('EM13K', { specification: 'A5.17' }), rule: 'filler-classification', verdict: 'cannot-tell', says: /not confirmed/ },
  { name: 'another GTAW rod (row in doubt)', given: T, asked: filler('ER70S-6'), rule: 'filler-classification', verdict: 'cannot-tell' },
  { name: 'the same rod', given: T, asked: () => undefined, rule: 'filler-classification', verdict: 'within' },
  { name: 'SAW without flux class', given: S, asked: (v) => { first(v).filler.fluxClassification = null }, rule: 'filler-classification', verdict: 'cannot-tell' },
  { name: 'stainless filler is outside the named specifications', given: W, asked: filler('ER308L', { specification: 'AWS A5.9' }), rule: 'filler-specification', verdict: 'outside' },
  { name: 'the same filler outside them covers itself', given: W, tested: filler('ER308L', { specification: 'AWS A5.9' }), asked: filler('ER308L', { specification: 'AWS A5.9' }), rule: 'filler-specification', verdict: 'within' },
  { name: 'into the named specifications is free', given: W, tested: filler('ER308L', { specification: 'AWS A5.9' }), asked: () => undefined, rule: 'filler-specification', verdict: 'within' },
  { name: 'a specification by the form of the class', given: W, asked: filler('ER80S-D2'), rule: 'filler-specification', verdict: 'within' },
  { name: 'a specification that nothing tells', given: W, asked: filler('LF-1'), rule: 'filler-specification', verdict: 'cannot-tell' },
  { name: 'SAW specification by the flux class', given: S, asked: filler('EM12K', { fluxClassification: 'F8A2-ENi1-Ni1' }), rule: 'filler-specification', verdict: 'within' },
  { name: 'self-shielded wire of A5.20', given: { processes: ['FCAW'] }, asked: filler('E71T-8'), rule: 'filler-specification', verdict: 'within' },
  { name: 'GTAW without filler', given: T, asked: (v) => { first(v).filler.added = false }, rule: 'filler-added', verdict: 'outside' },
  { name: 'GTAW filler not stated', given: T, asked: (v) => { first(v).filler.added = null }, rule: 'filler-added', verdict: 'cannot-tell' },
  { name: 'hot wire after cold', given: T, tested: (v) => { first(v).mechanisation = 'machine' }, asked: both((v) => { first(v).mechanisation = 'machine' }, technique({ hotWire: true })), rule: 'hot-wire', verdict: 'outside' },
  { name: 'a wire fed by hand is cold', given: T, asked: technique({ hotWire: null }), rule: 'hot-wire', verdict: 'within' },
  { name: 'machine GTAW without a word on the wire', given: T, asked: both((v) => { first(v).mechanisation = 'machine' }, technique({ hotWire: null })), rule: 'hot-wire', verdict: 'cannot-tell' },
  { name: 'supplemental filler added', given: S, asked: (v) => { first(v).filler.supplemental = true }, rule: 'supplemental-filler', verdict: 'outside' },
  { name: 'more supplemental filler', given: S, tested: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(20, 'percent') }), asked: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(25, 'percent') }), rule: 'supplemental-amount', verdict: 'outside' },
  { name: 'less supplemental filler', given: S, tested: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(20, 'percent') }), asked: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(15, 'percent') }), rule: 'supplemental-amount', verdict: 'within' },
  { name: 'an amount that the coupon lacks', given: S, tested: (v) => { first(v).filler.supplemental = true }, asked: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(15, 'percent') }), rule: 'supplemental-amount', verdict: 'cannot-tell' },
  { name: 'an amount not stated', given: S, asked: (v) => { first(v).filler.supplemental = true }, rule: 'supplemental-amount', verdict: 'cannot-tell' },
  { name: 'alloy from the supplement in other words', given: S, tested: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalAlloyElement: true, depositComposition: '1 Ni' }), asked: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalAlloyElement: true, depositComposition: '2 Ni' }), rule: 'supplement-alloy', verdict: 'cannot-tell', says: /judged by a person/ },
  { name: 'alloy from the supplement not recorded', given: S, tested: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalAlloyElement: null }), asked: (v) => void Object.assign(first(v).filler, { supplemental: true, supplementalAlloyElement: true, depositComposition: '2 Ni' }), rule: 'supplement-alloy', verdict: 'cannot-tell' },
  // Diameters
  { name: 'SAW smaller, kind of flux not recorded', given: S, tested: (v) => { first(v).filler.fluxType = null }, asked: size(2.4), rule: 'filler-diameter', verdict: 'cannot-tell', says: /kind of flux/ },
  { name: 'SAW the same, kind of flux not recorded', given: S, tested: (v) => { first(v).filler.fluxType = null }, asked: () => undefined, rule: 'filler-diameter', verdict: 'within' },
  { name: 'a stronger GMAW wire (column in doubt)', given: W, asked: filler('ER80S-D2'), rule: 'filler-strength', verdict: 'cannot-tell', says: /not confirmed/ },
  { name: 'SMAW two sizes up', asked: size(4.8), rule: 'filler-diameter', verdict: 'outside', says: /4.8 mm is not covered/ },
  { name: 'SMAW smaller', asked: size(2.4), rule: 'filler-diameter', verdict: 'within' },
  { name: 'FCAW smaller', given: { processes: ['FCAW'] }, asked: size(1), rule: 'filler-diameter', verdict: 'within' },
  { name: 'FCAW larger', given: { processes: ['FCAW'] }, asked: size(1.6), rule: 'filler-diameter', verdict: 'outside' },
  { name: '0.045 in. and 1.2 mm are one size', given: W, tested: size(0.045, 'in'), asked: size(1.2), rule: 'filler-diameter', verdict: 'within' },
  { name: 'SAW larger', given: S, asked: size(4), rule: 'filler-diameter', verdict: 'outside' },
  { name: 'SAW smaller with alloy flux', given: S, tested: (v) => { first(v).filler.fluxType = 'alloy' }, asked: both(size(2.4), (v) => { first(v).filler.fluxType = 'alloy' }), rule: 'filler-diameter', verdict: 'outside' },
  { name: 'GTAW 1.6 mm smaller', given: T, tested: size(3.2), asked: size(1.6), rule: 'filler-diameter', verdict: 'within' },
  { name: 'GTAW far larger', given: T, asked: size(4.8), rule: 'filler-diameter', verdict: 'outside' },
  { name: 'no diameter stated', asked: (v) => { first(v).filler.diameters = [] }, rule: 'filler-diameter', verdict: 'cannot-tell' },
  { name: 'no diameter recorded', tested: (v) => { first(v).filler.diameters = [] }, asked: () => undefined, rule: 'filler-diameter', verdict: 'cannot-tell' },
  { name: 'an odd size counts as it is', given: W, tested: size(1.35), asked: size(1.35), rule: 'filler-diameter', verdict: 'within' },
  { name: 'two electrodes after one', given: S, asked: technique({ electrodeCount: 2, electrodes: 'multiple' }), rule: 'electrode-count', verdict: 'outside' },
  { name: 'several electrodes without a number', given: S, asked: technique({ electrodeCount: null, electrodes: 'multiple' }), rule: 'electrode-count', verdict: 'cannot-tell' },
  { name: 'one electrode in words', given: S, asked: technique({ electrodeCount: null, electrodes: 'single' }), rule: 'electrode-count', verdict: 'within' },
  // Electrical
  { name: 'SMAW inside the maker\'s range', asked: electrical({ current: interval(160, 240, 'current') }), rule: 'amperage', verdict: 'within', says: /maker recommends/ },
  { name: 'SMAW beyond the maker\'s range', asked: electrical({ current: interval(160, 260, 'current') }), rule: 'amperage', verdict: 'outside' },
  { name: 'SMAW without the maker\'s range', asked: electrical({ makerCurrent: null }), rule: 'amperage', verdict: 'cannot-tell', says: /maker/ },
  { name: 'SMAW with one end of it', asked: electrical({ makerCurrent: interval(100, null, 'current') }), rule: 'amperage', verdict: 'cannot-tell' },
  { name: 'SMAW without current', asked: electrical({ current: null }), rule: 'amperage', verdict: 'cannot-tell' },
  { name: 'SMAW without current nor range', asked: electrical({ current: null, makerCurrent: null }), rule: 'amperage', verdict: 'cannot-tell' },
  { name: 'SAW by 10 %', given: S, asked: electrical({ current: interval(180, 220, 'current') }), rule: 'amperage', verdict: 'within' },
  { name: 'SAW by more', given: S, asked: electrical({ current: interval(179, 220, 'current') }), rule: 'amperage', verdict: 'outside' },
  { name: 'GTAW by 25 %', given: T, asked: electrical({ current: interval(150, 250, 'current') }), rule: 'amperage', verdict: 'within' },
  { name: 'GTAW by more', given: T, asked: electrical({ current: interval(150, 251, 'current') }), rule: 'amperage', verdict: 'outside' },
  { name: 'a pass outside the block\'s range', given: W, asked: (v) => { first(v).passes = [{ number: '1', layer: 'root', fillerDiameter: null, current: interval(150, undefined, 'current'), voltage: null, wireFeed: null, travelSpeed: null }] }, rule: 'amperage', verdict: 'outside' },
  { name: 'spread readings: the middle is sure', given: W, tested: electrical({ current: interval(180, 220, 'current') }), asked: electrical({ current: interval(185, 215, 'current') }), rule: 'amperage', verdict: 'within' },
  { name: 'spread readings: what only an end supports', given: W, tested: electrical({ current: interval(180, 220, 'current') }), asked: electrical({ current: interval(185, 235, 'current') }), rule: 'amperage', verdict: 'cannot-tell', says: /spread/ },
  { name: 'spread readings: what no reading supports', given: W, tested: electrical({ current: interval(180, 220, 'current') }), asked: electrical({ current: interval(185, 245, 'current') }), rule: 'amperage', verdict: 'outside' },
  { name: 'any amperage', given: W, asked: electrical({ current: { min: null, max: null, all: true } }), rule: 'amperage', verdict: 'outside' },
  { name: 'an amperage that contradicts itself', given: W, asked: electrical({ current: interval(220, 180, 'current') }), rule: 'amperage', verdict: 'cannot-tell' },
  { name: 'a coupon with contradicting amperage', given: W, tested: electrical({ current: interval(220, 180, 'current') }), asked: () => undefined, rule: 'amperage', verdict: 'cannot-tell' },
  { name: 'another polarity', given: W, asked: electrical({ currentType: 'DCEN' }), rule: 'current-type', verdict: 'outside' },
  { name: 'SMAW polarity (column in doubt)', asked: electrical({ currentType: 'AC' }), rule: 'current-type', verdict: 'cannot-tell', says: /not confirmed/ },
  { name: 'pulsed spray after spray', given: W, asked: electrical({ transferMode: 'pulsed-spray' }), rule: 'transfer-mode', verdict: 'outside' },
  { name: 'constant current after constant voltage', given: W, asked: electrical({ powerSource: 'constant-current' }), rule: 'power-source', verdict: 'outside' },
  { name: 'constant voltage after constant current', given: W, tested: electrical({ powerSource: 'constant-current' }), asked: () => undefined, rule: 'power-source', verdict: 'within' },
  { name: 'voltage by 7 %', given: W, asked: electrical({ voltage: interval(25.11, 28.89, 'voltage') }), rule: 'voltage', verdict: 'within' },
  { name: 'wire feed alone outside', given: W, asked: electrical({ current: null, wireFeed: interval(6, 8, 'wireFeed') }), rule: 'wire-feed', verdict: 'outside' },
  { name: 'wire feed outside beside a stated amperage', given: W, asked: electrical({ wireFeed: interval(6, 8, 'wireFeed') }), rule: 'wire-feed', verdict: 'cannot-tell', says: /control/ },
  { name: 'neither wire feed nor amperage', given: W, asked: electrical({ wireFeed: null, current: null }), rule: 'wire-feed', verdict: 'cannot-tell' },
  { name: 'SAW travel speed by 15 %', given: S, asked: electrical({ travelSpeed: interval(255, 345, 'travelSpeed') }), rule: 'travel-speed', verdict: 'within' },
  { name: 'SAW travel speed by more', given: S, asked: electrical({ travelSpeed: interval(250, 345, 'travelSpeed') }), rule: 'travel-speed', verdict: 'outside' },
  { name: 'GTAW travel speed by 50 %', given: T, asked: electrical({ travelSpeed: interval(150, 450, 'travelSpeed') }), rule: 'travel-speed', verdict: 'within' },
  { name: 'several diameters: what every reading allows', given: W, tested: both(size(1.2), (v) => { first(v).filler.diameters.push(quantity(1.6, 'length')) }, electrical({ current: interval(190, 210, 'current') })), asked: electrical({ current: interval(195, 205, 'current') }), rule: 'amperage', verdict: 'within' },
  { name: 'several diameters: what the middle alone would allow', given: W, tested: both(size(1.2), (v) => { first(v).filler.diameters.push(quantity(1.6, 'length')) }, electrical({ current: interval(120, 280, 'current') })), asked: electrical({ current: interval(200, undefined, 'current') }), rule: 'amperage', verdict: 'cannot-tell' },
  { name: 'several diameters: what no reading allows', given: W, tested: both(size(1.2), (v) => { first(v).filler.diameters.push(quantity(1.6, 'length')) }, electrical({ current: interval(190, 210, 'current') })), asked: electrical({ current: interval(300, undefined, 'current') }), rule: 'amperage', verdict: 'outside' },
  { name: '2010: flow that both readings allow', given: W, edition: '2010', asked: (v) => { first(v).shieldingGas!.flow = interval(19, 24, 'gasFlow') }, rule: 'gas-flow', verdict: 'within' },
  { name: '2010: flow that one reading allows', given: W, edition: '2010', asked: (v) => { first(v).shieldingGas!.flow = interval(20, 27, 'gasFlow') }, rule: 'gas-flow', verdict: 'cannot-tell', says: /two readings/ },
  { name: '2010: flow that neither allows', given: W, edition: '2010', asked: (v) => { first(v).shieldingGas!.flow = interval(20, 31, 'gasFlow') }, rule: 'gas-flow', verdict: 'outside' },
  // Gas
  { name: 'no gas after gas', given: { processes: ['FCAW'] }, asked: (v) => void Object.assign(first(v).shieldingGas!, { components: [], name: 'none' }), rule: 'shielding-gas', verdict: 'outside', says: /no gas/i },
  { name: 'gas in one name only', given: W, asked: (v) => void Object.assign(first(v).shieldingGas!, { components: [], name: 'Larkfield mix' }), rule: 'shielding-gas', verdict: 'cannot-tell' },
  { name: 'flow just under + 50 %', given: W, asked: (v) => { first(v).shieldingGas!.flow = interval(16.01, 29.99, 'gasFlow') }, rule: 'gas-flow', verdict: 'within' },
  { name: 'flow at + 50 %', given: W, asked: (v) => { first(v).shieldingGas!.flow = interval(20, 30, 'gasFlow') }, rule: 'gas-flow', verdict: 'outside' },
  { name: 'flow at - 20 %', given: W, asked: (v) => { first(v).shieldingGas!.flow = interval(16, 20, 'gasFlow') }, rule: 'gas-flow', verdict: 'outside' },
  { name: 'any flow', given: W, asked: (v) => { first(v).shieldingGas!.flow = { min: null, max: null, all: true } }, rule: 'gas-flow', verdict: 'outside' },
  { name: 'flow that contradicts itself', given: W, asked: (v) => { first(v).shieldingGas!.flow = interval(30, 10, 'gasFlow') }, rule: 'gas-flow', verdict: 'cannot-tell' },
  { name: 'another gas and the A5 specification', given: W, asked: (v) => { first(v).shieldingGas!.components = [{ gas: 'CO2', percent: 100 }] }, rule: 'gas-in-filler-spec', verdict: 'cannot-tell', says: /A5/ },
  // SAW geometry
  { name: 'spacing by 3 mm', given: S, tested: technique({ electrodeCount: 2, electrodeSpacing: quantity(15, 'length') }), asked: technique({ electrodeCount: 2, electrodeSpacing: quantity(18, 'length') }), rule: 'longitudinal-spacing', verdict: 'within' },
  { name: 'wide spacing by 10 %', given: S, tested: technique({ electrodeCount: 2, electrodeSpacing: quantity(50, 'length') }), asked: technique({ electrodeCount: 2, electrodeSpacing: quantity(55, 'length') }), rule: 'longitudinal-spacing', verdict: 'within' },
  { name: 'spacing by more', given: S, tested: technique({ electrodes: 'multiple', electrodeSpacing: quantity(15, 'length') }), asked: technique({ electrodes: 'multiple', electrodeSpacing: quantity(19, 'length') }), rule: 'longitudinal-spacing', verdict: 'outside' },
  { name: 'spacing in inches', given: { ...S, system: 'US' }, tested: technique({ electrodeCount: 2, electrodeSpacing: quantity(0.5, 'length', 'in') }), asked: technique({ electrodeCount: 2, electrodeSpacing: quantity(0.625, 'length', 'in') }), rule: 'longitudinal-spacing', verdict: 'within' },
  { name: 'lateral spacing not recorded', given: S, tested: technique({ electrodeCount: 2 }), asked: technique({ electrodeCount: 2, lateralSpacing: quantity(5, 'length') }), rule: 'lateral-spacing', verdict: 'cannot-tell' },
  { name: 'parallel electrode by 10°', given: S, tested: technique({ electrodeCount: 2, parallelAngle: quantity(0, 'angle') }), asked: technique({ electrodeCount: 2, parallelAngle: quantity(10, 'angle') }), rule: 'parallel-angle', verdict: 'within' },
  { name: 'travel angle by more than 3°', given: S, asked: technique({ travelAngle: quantity(9, 'angle') }), rule: 'travel-angle', verdict: 'outside' },
  { name: 'normal angle not stated', given: S, asked: technique({ normalAngle: null }), rule: 'normal-angle', verdict: 'cannot-tell' },
  // Position and progression
  { name: '2G covers flat', tested: at(['2G']), asked: at(['1G']), rule: 'position', verdict: 'within' },
  { name: '6G pipe covers all', tested: at(['6G']), asked: at(['1G', '2G', '3G', '4G']), rule: 'position', verdict: 'within' },
  { name: '2G and 5G together cover all', tested: at(['2G', '5G']), asked: at(['6G']), rule: 'position', verdict: 'within' },
  { name: 'a fixed pipe fillet test covers itself', tested: at(['5F']), asked: at(['5F']), rule: 'position', verdict: 'within' },
  { name: 'a fixed pipe fillet after plate tests is not confirmed', tested: at(['2G']), asked: at(['5F']), rule: 'position', verdict: 'cannot-tell', says: /5F/ },
  { name: 'but 2G and 5G together cover it as 6G does', tested: at(['2G', '5G']), asked: at(['5F']), rule: 'position', verdict: 'within' },
  { name: 'what else it covers is not confirmed', tested: at(['5F']), asked: at(['2F']), rule: 'position', verdict: 'cannot-tell' },
  { name: 'T-, Y-, K-details only by their own test', tested: at(['6G']), asked: at(['6GR']), rule: 'position', verdict: 'outside' },
  { name: 'no position stated', asked: at([]), rule: 'position', verdict: 'cannot-tell' },
  { name: 'no position recorded', tested: at([]), asked: () => undefined, rule: 'position', verdict: 'cannot-tell' },
  { name: 'downhill after uphill', tested: at(['3G']), asked: at(['3G'], 'down'), rule: 'vertical-progression', verdict: 'outside' },
  { name: 'both directions after uphill', tested: at(['3G']), asked: at(['3G'], 'both'), rule: 'vertical-progression', verdict: 'outside' },
  { name: 'both directions after both', tested: at(['3G'], 'both'), asked: at(['3G'], 'both'), rule: 'vertical-progression', verdict: 'within' },
  { name: 'direction not stated', tested: at(['3G']), asked: (v) => void Object.assign(first(v), { positions: ['3G'], progression: null }), rule: 'vertical-progression', verdict: 'cannot-tell' },
  // Thickness and diameter
  { name: 'a plate test of 20 mm up to 40', asked: (v) => { v.thickness = interval(3, 40, 'length') }, rule: 'thickness', verdict: 'within' },
  { name: 'and not above', asked: (v) => { v.thickness = interval(3, 41, 'length') }, rule: 'thickness', verdict: 'outside', says: /2T.*20 mm test/ },
  { name: 'every thickness', asked: (v) => { v.thickness = { min: null, max: null, all: true } }, rule: 'thickness', verdict: 'outside' },
  { name: 'the second member counts', asked: (v) => { v.thicknessB = interval(50, undefined, 'length') }, rule: 'thickness', verdict: 'outside' },
  { name: 'a contradiction', asked: (v) => { v.thickness = interval(50, 5, 'length') }, rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'no thickness', asked: (v) => { v.thickness = null }, rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'a test too thin for the table', tested: (v) => { v.thickness = interval(2.5, undefined, 'length') }, asked: () => undefined, rule: 'thickness', verdict: 'cannot-tell', says: /table has no row|does not record/ },
  { name: 'a square groove without backgouging reaches to T', tested: joint({ groove: 'square', backGouging: 'none' }), asked: both(joint({ groove: 'square' }), (v) => { v.thickness = interval(3, 21, 'length') }), rule: 'thickness', verdict: 'outside', says: /without backgouging/ },
  { name: 'a square groove with backgouging', tested: joint({ groove: 'square', backGouging: 'grinding' }), asked: both(joint({ groove: 'square', backGouging: 'grinding' }), (v) => { v.thickness = interval(3, 40, 'length') }), rule: 'thickness', verdict: 'within' },
  { name: 'a square groove of which backgouging is not recorded', tested: joint({ groove: 'square', backGouging: null }), asked: both(joint({ groove: 'square' }), (v) => { v.thickness = interval(3, 40, 'length') }), rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'a pipe square groove', tested: both(pipe(324, 12), joint({ groove: 'square', backGouging: 'none' })), asked: both(pipe(324, 12), joint({ groove: 'square' })), rule: 'thickness', verdict: 'within' },
  { name: 'a coupon of two thicknesses counts by the thinner', tested: (v) => { v.thicknessB = interval(10, undefined, 'length') }, asked: (v) => { v.thickness = interval(3, 21, 'length') }, rule: 'thickness', verdict: 'outside' },
  { name: 'a second thickness that is no figure', tested: (v) => { v.thicknessB = interval(10, 12, 'length') }, asked: () => undefined, rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'thin pipe from 3 mm', tested: pipe(324, 8), asked: pipe(400, 16), rule: 'thickness', verdict: 'within' },
  { name: 'thick pipe from 10 mm', tested: pipe(324, 25), asked: pipe(400, 9), rule: 'thickness', verdict: 'outside' },
  { name: 'thick pipe without limit', tested: pipe(324, 25), asked: pipe(400, 90), rule: 'thickness', verdict: 'within' },
  { name: 'pipe too thin for the table', tested: pipe(324, 2), asked: pipe(324, 3), rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'the small standard pipe', tested: pipe(60.3, 5.54), asked: pipe(100, 20), rule: 'thickness', verdict: 'within' },
  { name: 'and its diameters', tested: pipe(60.3, 5.54), asked: pipe(20, 5), rule: 'diameter', verdict: 'within' },
  { name: 'beyond 100 mm it counts as job size', tested: pipe(60.3, 5.54), asked: pipe(200, 20), rule: 'thickness', verdict: 'outside' },
  { name: 'beyond 100 mm by its own diameter', tested: pipe(60.3, 5.54), asked: pipe(200, 11), rule: 'diameter', verdict: 'within' },
  { name: 'every diameter of the small standard pipe', tested: pipe(60.3, 5.54), asked: (v) => { v.product = 'pipe'; v.diameter = { min: null, max: null, all: true } }, rule: 'diameter', verdict: 'outside' },
  { name: 'a smaller pipe', tested: pipe(324, 12), asked: pipe(273, 12), rule: 'diameter', verdict: 'outside' },
  { name: 'large pipe covers from 600 mm', tested: pipe(762, 16), asked: pipe(610, 16), rule: 'diameter', verdict: 'within' },
  { name: 'large thin pipe only its own diameter', tested: pipe(762, 8), asked: pipe(610, 8), rule: 'diameter', verdict: 'outside' },
  { name: 'a plate test for large pipe', asked: pipe(610), rule: 'diameter', verdict: 'within' },
  { name: 'a plate test for small pipe', asked: pipe(324), rule: 'diameter', verdict: 'outside' },
  { name: 'no diameter stated', asked: pipe(null), rule: 'diameter', verdict: 'cannot-tell' },
  { name: 'a contradicting diameter', asked: (v) => { v.product = 'pipe'; v.diameter = interval(300, 200, 'length') }, rule: 'diameter', verdict: 'cannot-tell' },
  { name: 'no diameter recorded', tested: pipe(null), asked: pipe(324), rule: 'diameter', verdict: 'cannot-tell' },
  { name: 'no wall recorded', tested: both(pipe(324), (v) => { v.thickness = null }), asked: pipe(324), rule: 'diameter', verdict: 'cannot-tell' },
  { name: 'a groove test of small pipe covers fillets on every diameter', tested: pipe(324, 12), asked: both(pipe(50), joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') })), rule: 'diameter', verdict: 'within' },
  // Kinds of weld
  { name: 'complete penetration covers a fillet', asked: joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), rule: 'weld-kind', verdict: 'within' },
  { name: 'and any thickness of it', asked: both(joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), (v) => { v.thickness = interval(200, undefined, 'length') }), rule: 'thickness', verdict: 'within' },
  { name: 'and any size of it', asked: joint({ weld: 'fillet', filletLeg: interval(25, undefined, 'length') }), rule: 'fillet-size', verdict: 'within' },
  { name: 'a fillet size that contradicts itself', asked: joint({ weld: 'fillet', filletLeg: interval(25, 6, 'length') }), rule: 'fillet-size', verdict: 'cannot-tell' },
  { name: 'every fillet size', asked: joint({ weld: 'fillet', filletLeg: { min: null, max: null, all: true } }), rule: 'fillet-size', verdict: 'within' },
  { name: 'no fillet size', asked: joint({ weld: 'fillet' }), rule: 'fillet-size', verdict: 'cannot-tell' },
  { name: 'complete penetration covers partial', asked: joint({ penetration: 'partial' }), rule: 'weld-kind', verdict: 'within' },
  { name: 'and any depth', asked: joint({ penetration: 'partial' }), rule: 'groove-depth', verdict: 'within' },
  { name: 'partial does not cover complete', tested: joint({ penetration: 'partial' }), asked: () => undefined, rule: 'weld-kind', verdict: 'outside' },
  { name: 'partial covers a fillet of any thickness', tested: joint({ penetration: 'partial' }), asked: both(joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), (v) => { v.thickness = interval(200, undefined, 'length') }), rule: 'thickness', verdict: 'within' },
  { name: 'partial: deeper groove', tested: joint({ penetration: 'partial' }), asked: both(joint({ penetration: 'partial' }), (v) => { first(v).depositThickness = interval(22, undefined, 'length') }), rule: 'groove-depth', verdict: 'outside' },
  { name: 'partial: every depth', tested: joint({ penetration: 'partial' }), asked: both(joint({ penetration: 'partial' }), (v) => { first(v).depositThickness = { min: null, max: null, all: true } }), rule: 'groove-depth', verdict: 'outside' },
  { name: 'partial: contradicting depth', tested: joint({ penetration: 'partial' }), asked: both(joint({ penetration: 'partial' }), (v) => { first(v).depositThickness = interval(9, 2, 'length') }), rule: 'groove-depth', verdict: 'cannot-tell' },
  { name: 'partial: depth not recorded', tested: both(joint({ penetration: 'partial' }), (v) => { first(v).depositThickness = null }), asked: joint({ penetration: 'partial' }), rule: 'groove-depth', verdict: 'cannot-tell' },
  { name: 'partial: thickness from a deep groove is unlimited', tested: joint({ penetration: 'partial' }), asked: both(joint({ penetration: 'partial' }), (v) => { v.thickness = interval(100, undefined, 'length') }), rule: 'thickness', verdict: 'within' },
  { name: 'partial: thickness from a shallow groove is twice its depth', tested: both(joint({ penetration: 'partial' }), (v) => { first(v).depositThickness = interval(8, undefined, 'length') }), asked: both(joint({ penetration: 'partial' }), (v) => { v.thickness = interval(17, undefined, 'length') }), rule: 'thickness', verdict: 'outside' },
  { name: 'partial: a groove deeper than the table', tested: both(joint({ penetration: 'partial' }), (v) => { first(v).depositThickness = interval(30, undefined, 'length') }), asked: joint({ penetration: 'partial' }), rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'partial: no depth, no thickness range', tested: both(joint({ penetration: 'partial' }), (v) => { first(v).depositThickness = null }), asked: joint({ penetration: 'partial' }), rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'a fillet test covers no groove', tested: joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), asked: () => undefined, rule: 'weld-kind', verdict: 'outside' },
  { name: 'fillets: passes not stated', tested: joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), asked: both(joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), technique({ passesPerSide: null })), rule: 'fillet-size', verdict: 'cannot-tell' },
  { name: 'fillets: passes not recorded', tested: both(joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), technique({ passesPerSide: null })), asked: joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), rule: 'fillet-size', verdict: 'cannot-tell' },
  { name: 'fillets: size not recorded', tested: joint({ weld: 'fillet' }), asked: joint({ weld: 'fillet', filletLeg: interval(6, undefined, 'length') }), rule: 'fillet-size', verdict: 'cannot-tell' },
  // Base metals
  { name: 'A36 over 20 mm is Group II', tested: steel(A36, A36, 12), asked: steel(A36, A36, 24), rule: 'base-metal', verdict: 'outside', says: /Group II/ },
  { name: 'A36 over both groups from a Group II test', asked: both(steel(A36), (v) => { v.thickness = interval(10, 30, 'length') }), rule: 'base-metal', verdict: 'within' },
  { name: 'A36 in every thickness', asked: both(steel(A36), (v) => { v.thickness = { min: null, max: null, all: true } }), rule: 'base-metal', verdict: 'within' },
  { name: 'A36 without thickness', asked: both(steel(A36), (v) => { v.thickness = null }), rule: 'base-metal', verdict: 'cannot-tell' },
  { name: 'Group I to II from Group II', asked: steel(A36, A572, 12), rule: 'base-metal', verdict: 'within' },
  { name: 'Group I to I from I to II is in doubt', tested: steel(A36, A572, 12), asked: steel(A36, A36, 12), rule: 'base-metal', verdict: 'cannot-tell', says: /no row of its own/ },
  { name: 'Group II to II from I to II', tested: steel(A36, A572, 12), asked: steel(A572), rule: 'base-metal', verdict: 'outside' },
  { name: 'a special steel to II covers it to I', tested: steel(A514, A572), asked: steel(A514, A36, 12), rule: 'base-metal', verdict: 'within' },
  { name: 'to I does not cover to II', tested: steel(A36, A514, 12), asked: steel(A514, A572, 12), rule: 'base-metal', verdict: 'outside' },
  { name: 'Group III to itself', tested: steel(A913), asked: steel(A913), rule: 'base-metal', verdict: 'within' },
  { name: 'a mix of III and special only itself', tested: steel(A913, A514), asked: steel(A913), rule: 'base-metal', verdict: 'outside' },
  { name: 'an unlisted steel by itself', tested: steel(['EN 10025-2', 'S355J2']), asked: steel(['EN 10025-2', 'S355J2']), rule: 'base-metal', verdict: 'within' },
  { name: 'an unlisted steel to another steel of the same group', tested: steel(['EN 10025-2', 'S355J2'], A36, 12), asked: steel(['EN 10025-2', 'S355J2'], ['ASTM A53', 'B'], 12), rule: 'base-metal', verdict: 'cannot-tell' },
  { name: 'an unlisted steel to the very steel tested', tested: steel(['EN 10025-2', 'S355J2'], A36, 12), asked: steel(A36, ['EN 10025-2', 'S355J2'], 12), rule: 'base-metal', verdict: 'within' },
  { name: 'Group IV to another steel of Group I', tested: steel(['ASTM A913', '70'], A36, 12), asked: steel(['ASTM A913', '70'], ['ASTM A53', 'B'], 12), rule: 'base-metal', verdict: 'cannot-tell', says: /no row/ },
  { name: 'Group IV to the very steel tested', tested: steel(['ASTM A913', '70'], A36, 12), asked: steel(['ASTM A913', '70'], A36, 12), rule: 'base-metal', verdict: 'within' },
  { name: 'a special steel of another recorded yield strength', tested: both(steel(A514), (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) metal.minYield = quantity(690, 'stress') }), asked: both(steel(A514), (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) metal.minYield = quantity(620, 'stress') }), rule: 'base-metal', verdict: 'outside', says: /yield/ },
  { name: 'an unlisted steel from another test', asked: steel(['EN 10025-2', 'S355J2']), rule: 'base-metal', verdict: 'cannot-tell', says: /not in the list/ },
  { name: 'a steel by its recorded group', asked: (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: 'EN 10025-2', grade: 'S355J2', d11Group: 'Group 2' }) }, rule: 'base-metal', verdict: 'within' },
  { name: 'a steel by its UNS number', tested: (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: null, grade: null, uns: 'K99999' }) }, asked: (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: null, grade: null, uns: 'K99999' }) }, rule: 'base-metal', verdict: 'within' },
  { name: 'no base metal named', asked: steel([null, null]), rule: 'base-metal', verdict: 'cannot-tell' },
  { name: 'no base metal recorded', tested: steel([null, null]), asked: () => undefined, rule: 'base-metal', verdict: 'cannot-tell' },
  { name: 'SA-prefix and metric twin are the same steel', tested: steel(['ASTM A572/A572M', 'Gr 50']), asked: steel(['SA-572', 'Grade 50']), rule: 'base-metal', verdict: 'within' },
  // Groove
  { name: 'another groove that meets a prequalified detail', asked: joint({ groove: 'single-bevel', type: 'tee', bevelAngle: interval(45, undefined, 'angle'), includedAngle: null }), rule: 'groove-type', verdict: 'within', says: /TC-U4a/ },
  { name: 'another groove that meets none', asked: joint({ groove: 'single-bevel', type: 'tee', bevelAngle: interval(20, undefined, 'angle'), includedAngle: null }), rule: 'groove-type', verdict: 'cannot-tell', says: /nearest detail/ },
  { name: 'another groove with something open', asked: joint({ groove: 'single-bevel', type: 'tee', bevelAngle: null, includedAngle: null }), rule: 'groove-type', verdict: 'cannot-tell', says: /leaves open/ },
  { name: 'another groove of which no detail is kept', asked: joint({ groove: 'double-j' }), rule: 'groove-type', verdict: 'cannot-tell', says: /no detail/ },
  { name: 'another groove after partial penetration', tested: joint({ penetration: 'partial' }), asked: joint({ penetration: 'partial', groove: 'double-v' }), rule: 'groove-type', verdict: 'outside' },
  { name: 'groove not stated', asked: joint({ groove: null }), rule: 'groove-type', verdict: 'cannot-tell' },
  { name: 'to a square groove', asked: joint({ groove: 'square' }), rule: 'square-groove', verdict: 'outside' },
  { name: 'angle 5° less', asked: joint({ includedAngle: interval(40, undefined, 'angle') }), rule: 'groove-angle', verdict: 'within' },
  { name: 'angle 6° less', asked: joint({ includedAngle: interval(39, undefined, 'angle') }), rule: 'groove-angle', verdict: 'outside' },
  { name: 'any angle', asked: joint({ includedAngle: { min: null, max: null, all: true } }), rule: 'groove-angle', verdict: 'outside' },
  { name: 'a contradicting angle', asked: joint({ includedAngle: interval(50, 40, 'angle') }), rule: 'groove-angle', verdict: 'cannot-tell' },
  { name: 'bevels of a V count together', tested: joint({ includedAngle: null, bevelAngle: interval(22.5, undefined, 'angle') }), asked: () => undefined, rule: 'groove-angle', verdict: 'within' },
  { name: 'bevels of a V that are wider together', tested: joint({ includedAngle: null, bevelAngle: interval(30, undefined, 'angle') }), asked: () => undefined, rule: 'groove-angle', verdict: 'outside' },
  { name: 'a groove with one bevel has the angle of that bevel', tested: joint({ groove: 'single-bevel', includedAngle: null, bevelAngle: interval(45, undefined, 'angle') }), asked: joint({ groove: 'single-bevel', includedAngle: null, bevelAngle: interval(40, undefined, 'angle') }), rule: 'groove-angle', verdict: 'within' },
  { name: 'metal-cored wire of another brand', given: { ...W, toughness: true }, tested: filler('E70C-6M', { productForm: 'metal-cored' }), asked: filler('E70C-6M', { productForm: 'metal-cored', tradeName: 'Another Wire' }), rule: 'cvn-brand', verdict: 'outside' },
  { name: 'metal-cored wire by its class alone', given: { ...W, toughness: true }, tested: filler('E70C-6M', { productForm: null }), asked: filler('E70C-6M', { productForm: null }), rule: 'cvn-brand', verdict: 'within' },
  { name: 'angle not recorded', tested: joint({ includedAngle: null }), asked: () => undefined, rule: 'groove-angle', verdict: 'cannot-tell' },
  { name: 'a test of a square groove says nothing of the angle', tested: joint({ groove: 'square' }), asked: () => undefined, rule: 'groove-angle', verdict: 'within' },
  { name: 'opening 2 mm less', asked: joint({ rootOpening: interval(4, undefined, 'length') }), rule: 'root-opening', verdict: 'within' },
  { name: 'opening more than 2 mm less', asked: joint({ rootOpening: interval(3.5, undefined, 'length') }), rule: 'root-opening', verdict: 'outside' },
  { name: 'a backgouged root may close 3 mm', tested: joint({ backing: 'none', backGouging: 'grinding' }), asked: joint({ backing: 'none', backGouging: 'grinding', rootOpening: interval(3, undefined, 'length') }), rule: 'root-opening', verdict: 'within' },
  { name: 'face 2 mm more', asked: joint({ rootFace: interval(2, undefined, 'length') }), rule: 'root-face', verdict: 'within' },
  { name: 'face 3 mm more', asked: joint({ rootFace: interval(3, undefined, 'length') }), rule: 'root-face', verdict: 'outside' },
  { name: 'the face of a backgouged root is free', tested: joint({ backing: 'none', backGouging: 'grinding' }), asked: joint({ backing: 'none', backGouging: 'grinding', rootFace: interval(6, undefined, 'length') }), rule: 'root-face', verdict: 'within' },
  { name: 'backing added', tested: joint({ backing: 'none' }), asked: () => undefined, rule: 'backing', verdict: 'within' },
  { name: 'backgouging in place of backing', asked: joint({ backing: 'none', backGouging: 'grinding' }), rule: 'backing', verdict: 'cannot-tell', says: /instead/ },
  { name: 'backing in place of backgouging', tested: joint({ backing: 'none', backGouging: 'grinding' }), asked: () => undefined, rule: 'backing', verdict: 'cannot-tell', says: /instead/ },
  { name: 'backgouging left out', tested: joint({ backing: 'none', backGouging: 'grinding' }), asked: joint({ backing: 'none', backGouging: 'none' }), rule: 'backing', verdict: 'outside' },
  { name: 'backing not stated', asked: joint({ backing: null }), rule: 'backing', verdict: 'cannot-tell' },
  { name: 'backing not recorded', tested: joint({ backing: null, backGouging: null }), asked: joint({ backing: 'none' }), rule: 'backing', verdict: 'cannot-tell' },
  // Heat
  { name: 'preheat 15 °C lower', asked: (v) => { v.preheat.minimum = quantity(5, 'temperature') }, rule: 'preheat', verdict: 'within' },
  { name: 'preheat more than 15 °C lower', asked: (v) => { v.preheat.minimum = quantity(4, 'temperature') }, rule: 'preheat', verdict: 'outside' },
  { name: 'preheat 25 °F lower', given: { system: 'US' }, tested: (v) => { v.preheat.minimum = quantity(200, 'temperature', '°F') }, asked: (v) => { v.preheat.minimum = quantity(175, 'temperature', '°F') }, rule: 'preheat', verdict: 'within' },
  { name: 'GTAW preheat 55 °C lower', given: T, tested: (v) => { v.preheat.minimum = quantity(100, 'temperature') }, asked: (v) => { v.preheat.minimum = quantity(45, 'temperature') }, rule: 'preheat', verdict: 'within' },
  { name: 'preheat not stated', asked: (v) => { v.preheat.minimum = null }, rule: 'preheat', verdict: 'cannot-tell' },
  { name: 'preheat not recorded', tested: (v) => { v.preheat.minimum = null }, asked: () => undefined, rule: 'interpass-minimum', verdict: 'cannot-tell' },
  { name: 'heat treated after as welded', asked: (v) => { v.pwht.condition = 'below-lower-transformation' }, rule: 'pwht', verdict: 'outside' },
  { name: 'heat treatment not stated', asked: (v) => { v.pwht.condition = null }, rule: 'pwht', verdict: 'cannot-tell' },
  // Scope
  { name: 'sheet is out of scope', asked: (v) => { v.thickness = interval(2, 10, 'length') }, rule: 'scope', verdict: 'outside' },
  { name: 'every thickness is out of scope', asked: (v) => { v.thickness = { min: null, max: null, all: true } }, rule: 'scope', verdict: 'outside' },
  { name: 'a steel over 690 MPa is out of scope', asked: (v) => { v.baseMetals.a.minYield = quantity(700, 'stress') }, rule: 'scope', verdict: 'outside' },
  { name: 'a second member under 3 mm is out of scope', asked: (v) => { v.thicknessB = interval(2, undefined, 'length') }, rule: 'scope', verdict: 'outside' },
  { name: 'aluminium is out of scope', asked: (v) => { v.baseMetals.b = { ...v.baseMetals.b, specification: 'ASTM B209', grade: '6061-T6', d12MNumber: '23' } }, rule: 'scope', verdict: 'outside', says: /not carbon or low-alloy/ },
  { name: 'stainless steel is out of scope', asked: (v) => { v.baseMetals.a = { ...v.baseMetals.a, iso15608: '8.1' } }, rule: 'scope', verdict: 'outside' },
  { name: 'an unlisted steel without yield strength', asked: (v) => { v.baseMetals.a = { ...v.baseMetals.a, specification: 'EN 10025-2', grade: 'S355J2', minYield: null } }, rule: 'scope', verdict: 'cannot-tell', says: /yield strength/ },
  { name: 'build-up is not kept', asked: joint({ work: 'build-up' }), rule: 'scope', verdict: 'cannot-tell' },
  { name: 'no thickness, no scope', asked: (v) => { v.thickness = null }, rule: 'scope', verdict: 'cannot-tell' },
  // CVN
  { name: 'another group', given: C, asked: steel(A36, A36, 12), rule: 'cvn-base-group', verdict: 'outside' },
  { name: 'a special steel by its name', given: C, tested: steel(A514), asked: steel(A514), rule: 'cvn-base-group', verdict: 'within' },
  { name: 'a metal not named', given: C, asked: steel([null, null]), rule: 'cvn-base-group', verdict: 'cannot-tell' },
  { name: 'thinner than 16 mm', given: C, asked: (v) => { v.thickness = interval(15, 20, 'length') }, rule: 'cvn-thickness', verdict: 'outside' },
  { name: 'a thin test falls to 3 mm', given: C, tested: (v) => { v.thickness = interval(5, undefined, 'length') }, asked: (v) => { v.thickness = interval(3, 5, 'length') }, rule: 'cvn-thickness', verdict: 'within' },
  { name: 'every thickness with CVN', given: C, asked: (v) => { v.thickness = { min: null, max: null, all: true } }, rule: 'cvn-thickness', verdict: 'outside' },
  { name: 'CVN thickness not stated', given: C, asked: (v) => { v.thickness = null }, rule: 'cvn-thickness', verdict: 'cannot-tell' },
  { name: 'CVN thickness that contradicts itself', given: C, asked: (v) => { v.thickness = interval(20, 10, 'length') }, rule: 'cvn-thickness', verdict: 'cannot-tell' },
  { name: 'CVN thickness not recorded', given: C, tested: (v) => { v.thickness = null }, asked: () => undefined, rule: 'cvn-thickness', verdict: 'cannot-tell' },
  { name: 'another class', given: C, asked: filler('E7016'), rule: 'cvn-filler-class', verdict: 'outside' },
  { name: 'another flux', given: { ...S, toughness: true }, asked: (v) => { first(v).filler.fluxClassification = 'F7A4-EM12K' }, rule: 'cvn-flux', verdict: 'outside' },
  { name: 'crushed slag', given: { ...S, toughness: true }, asked: (v) => { first(v).filler.fluxIsRecrushedSlag = true }, rule: 'cvn-flux', verdict: 'outside' },
  { name: 'flux by its trade name', given: { ...S, toughness: true }, tested: (v) => { first(v).filler.fluxClassification = null }, asked: (v) => { first(v).filler.fluxClassification = null }, rule: 'cvn-flux', verdict: 'within' },
  { name: 'flux without any name', given: { ...S, toughness: true }, asked: (v) => void Object.assign(first(v).filler, { fluxClassification: null, fluxTradeName: null }), rule: 'cvn-flux', verdict: 'cannot-tell' },
  { name: 'crushed slag not stated', given: { ...S, toughness: true }, asked: (v) => { first(v).filler.fluxIsRecrushedSlag = null }, rule: 'cvn-flux', verdict: 'cannot-tell' },
  { name: 'another brand', given: { processes: ['FCAW'], toughness: true }, asked: (v) => { first(v).filler.tradeName = 'Another Wire' }, rule: 'cvn-brand', verdict: 'outside' },
  { name: 'brand not recorded', given: { processes: ['FCAW'], toughness: true }, tested: (v) => { first(v).filler.tradeName = null }, asked: () => undefined, rule: 'cvn-brand', verdict: 'cannot-tell' },
  { name: 'vertical up after flat', given: C, tested: tough(at(['1G'])), asked: at(['3G']), rule: 'cvn-vertical-up', verdict: 'outside' },
  { name: 'vertical up covers every position for CVN', given: C, tested: at(['3G']), asked: at(['1G']), rule: 'cvn-vertical-up', verdict: 'within' },
  { name: 'vertical down is not vertical up', given: C, tested: at(['1G']), asked: at(['3G'], 'down'), rule: 'cvn-vertical-up', verdict: 'within' },
  { name: 'vertical without direction', given: C, asked: (v) => void Object.assign(first(v), { positions: ['3G'], progression: null }), rule: 'cvn-vertical-up', verdict: 'cannot-tell' },
  { name: 'interpass 56 °C higher', given: C, asked: (v) => { v.preheat.interpassMaximum = quantity(256, 'temperature') }, rule: 'cvn-interpass', verdict: 'within' },
  { name: 'interpass more than that', given: C, asked: (v) => { v.preheat.interpassMaximum = quantity(257, 'temperature') }, rule: 'cvn-interpass', verdict: 'outside' },
  { name: 'interpass not stated', given: C, asked: (v) => { v.preheat.interpassMaximum = null }, rule: 'cvn-interpass', verdict: 'cannot-tell' },
  { name: 'interpass not recorded', given: C, tested: (v) => { v.preheat.interpassMaximum = null }, asked: () => undefined, rule: 'cvn-interpass', verdict: 'cannot-tell' },
  { name: 'heat input above the test', given: C, asked: electrical({ heatInput: interval(null, 1.6, 'heatInput') }), rule: 'cvn-heat-input', verdict: 'outside' },
  { name: 'heat input by the worst corner', given: C, tested: electrical({ heatInput: null }), asked: electrical({ heatInput: null, voltage: interval(27, 28, 'voltage') }), rule: 'cvn-heat-input', verdict: 'outside' },
  { name: 'heat input that only the hottest reading allows', given: C, tested: electrical({ heatInput: null, voltage: interval(25, 29, 'voltage') }), asked: electrical({ heatInput: null, voltage: interval(28, undefined, 'voltage') }), rule: 'cvn-heat-input', verdict: 'cannot-tell' },
  { name: 'heat input above the hottest reading', given: C, tested: electrical({ heatInput: null, voltage: interval(25, 29, 'voltage') }), asked: electrical({ heatInput: null, voltage: interval(30, undefined, 'voltage') }), rule: 'cvn-heat-input', verdict: 'outside' },
  { name: 'heat input not to be told', given: C, asked: electrical({ heatInput: null, voltage: null }), rule: 'cvn-heat-input', verdict: 'cannot-tell', says: /neither a cap/ },
  { name: 'heat input not recorded', given: C, tested: electrical({ heatInput: null, voltage: null }), asked: () => undefined, rule: 'cvn-heat-input', verdict: 'cannot-tell' },
  { name: 'a contradicting heat input', given: C, asked: electrical({ heatInput: interval(2, 1, 'heatInput') }), rule: 'cvn-heat-input', verdict: 'cannot-tell' },
  { name: 'grain refinement lifts the limit', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'above-upper-transformation' } }, asked: both(electrical({ heatInput: interval(null, 9, 'heatInput') }), (v) => { v.pwht = { ...v.pwht, condition: 'above-upper-transformation' } }), rule: 'cvn-heat-input', verdict: 'within' },
  { name: 'grain refinement of the test alone lifts nothing', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'above-upper-transformation' } }, asked: electrical({ heatInput: interval(null, 9, 'heatInput') }), rule: 'cvn-heat-input', verdict: 'outside' },
  { name: 'a hotter pass counts', given: C, asked: (v) => { first(v).electrical.heatInput = null; first(v).passes = [{ number: '1', layer: 'cap', fillerDiameter: null, current: interval(320, undefined, 'current'), voltage: null, wireFeed: null, travelSpeed: null }] }, rule: 'cvn-heat-input', verdict: 'outside' },
  { name: 'weave after stringer in vertical', given: C, tested: at(['3G']), asked: both(at(['3G']), technique({ bead: 'weave' })), rule: 'cvn-weave', verdict: 'outside' },
  { name: 'stringer after weave', given: C, tested: both(at(['3G']), technique({ bead: 'weave' })), asked: at(['3G']), rule: 'cvn-weave', verdict: 'within' },
  { name: 'bead not stated', given: C, tested: at(['3G']), asked: both(at(['3G']), technique({ bead: null })), rule: 'cvn-weave', verdict: 'cannot-tell' },
  { name: 'single pass after several', given: C, asked: technique({ passesPerSide: 'single' }), rule: 'cvn-passes', verdict: 'outside' },
  { name: 'several after a single pass', given: C, tested: technique({ passesPerSide: 'single' }), asked: () => undefined, rule: 'cvn-passes', verdict: 'within' },
  { name: 'oscillation in other words', given: { ...S, toughness: true }, asked: technique({ oscillation: '4 mm, 60 a minute' }), rule: 'cvn-oscillation', verdict: 'cannot-tell' },
  { name: 'oscillation alike', given: { ...S, toughness: true }, asked: () => undefined, rule: 'cvn-oscillation', verdict: 'within' },
  { name: 'heat treatment: 80 % of the time', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time'), temperature: interval(600, undefined, 'temperature') } }, asked: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(60, 100, 'time'), temperature: interval(590, 610, 'temperature') } }, rule: 'cvn-pwht', verdict: 'within' },
  { name: 'heat treatment: longer', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time'), temperature: interval(600, undefined, 'temperature') } }, asked: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(101, undefined, 'time'), temperature: interval(590, 610, 'temperature') } }, rule: 'cvn-pwht', verdict: 'outside' },
  { name: 'heat treatment: another temperature', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time'), temperature: interval(600, 620, 'temperature') } }, asked: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time'), temperature: interval(590, 610, 'temperature') } }, rule: 'cvn-pwht', verdict: 'outside' },
  { name: 'heat treatment: temperature missing', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time') } }, asked: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time') } }, rule: 'cvn-pwht', verdict: 'cannot-tell' },
  { name: 'heat treatment: time not recorded', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation' } }, asked: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time') } }, rule: 'cvn-pwht', verdict: 'cannot-tell' },
  { name: 'heat treatment: contradicting time', given: C, tested: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, undefined, 'time') } }, asked: (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(80, 20, 'time') } }, rule: 'cvn-pwht', verdict: 'cannot-tell' },
  // Editions
  { name: 'the clause is numbered as in the edition', edition: '2015', asked: size(4.8), rule: 'filler-diameter', verdict: 'outside' },
]

describe('our own cases of AWS D1.1 by test', () => {
  test.each(OWN)('$name: $rule $verdict', ({ given, tested, asked, rule, verdict, says, edition }) => {
    const assessment = pair(given ?? {}, tested ?? (() => undefined), asked, edition)
    const found = finding(assessment, rule)
    expect({ verdict: found.verdict, sentence: found.sentence }).toMatchObject({ verdict })
    if (says) expect(found.sentence).toMatch(says)
    if (verdict === 'cannot-tell') expect(found.missing.length).toBeGreaterThan(0)
    if (verdict !== 'within') expect(assessment.verdict).not.toBe('within')
    if (edition) expect(found.clause).toBe(edition === '2010' ? 'Table 4.5' : 'Table 4.5 row 10')
  })
})

describe('travel speed of fillets', () => {
  const fillet = (speed: number, passes: 'single' | 'multiple'): Change => (v) => { Object.assign(v.joint, { weld: 'fillet', type: 'tee', groove: null, filletLeg: interval(8, undefined, 'length') }); Object.assign(first(v), { positions: ['2F'] }); first(v).technique.passesPerSide = passes; first(v).electrical.travelSpeed = interval(speed, undefined, 'travelSpeed') }
  const tests = [coupon({ ...W, number: 'PQR-S', change: fillet(200, 'single') }), coupon({ ...W, number: 'PQR-M', change: fillet(400, 'multiple') })]
  const at = (speed: number, list = tests) => finding(judge(procedure({ ...W, change: fillet(speed, 'single') }), list), 'travel-speed')
  test('between two fillet tests it can\'t be told, beyond both it is outside', () => {
    expect(at(240).verdict).toBe('within')
    expect(at(350)).toMatchObject({ verdict: 'within' })
    expect(at(280)).toMatchObject({ verdict: 'cannot-tell' })
    expect(at(600).verdict).toBe('outside')
    expect(at(280, tests.slice(0, 1)).verdict).toBe('outside')
  })
})

describe('coupons together', () => {
  const flat = coupon({ number: 'PQR-F', thickness: 10, positions: ['1G'] })
  const vertical = coupon({ number: 'PQR-V', thickness: 25, positions: ['3G'] })
  test('each position is judged by the coupon that covers it', () => {
    const at30 = (positions: readonly ('1G' | '3G')[]) => judge(procedure({ positions, thickness: 30 }), [flat, vertical])
    expect(problems(at30(['3G']))).toEqual([])
    expect(at30(['1G']).verdict).toBe('outside')
    const mixed = at30(['1G', '3G'])
    expect(finding(mixed, 'position').verdict).toBe('within')
    expect(finding(mixed, 'thickness')).toMatchObject({ verdict: 'outside' })
    expect(finding(mixed, 'thickness').sentence).toContain('flat position')
    expect(judge(procedure({ positions: ['1G', '3G'], thickness: [3, 20] }), [flat, vertical]).verdict).toBe('within')
    expect(finding(judge(procedure({ positions: ['2G', '4G'], thickness: 30 }), [flat, vertical]), 'thickness').verdict).toBe('within')
  })
  test('two processes of one test stay together', () => {
    const mixed = coupon({ processes: ['GTAW', 'SMAW'] })
    expect(problems(judge(procedure({ processes: ['GTAW', 'SMAW'] }), [mixed]))).toEqual([])
    const alone = judge(procedure({ processes: ['SMAW'] }), [mixed])
    expect(finding(alone, 'combined-processes')).toMatchObject({ verdict: 'cannot-tell' })
    expect(finding(judge(procedure({ processes: ['SMAW', 'GTAW'] }), [mixed]), 'combined-processes').verdict).toBe('cannot-tell')
    expect(judge(procedure({ processes: ['SMAW'] }), [mixed, coupon({ number: 'PQR-002' })]).verdict).toBe('within')
  })
  test('a process that no coupon has', () => {
    expect(finding(judge(procedure({ processes: ['SAW'] }), [flat]), 'process')).toMatchObject({ verdict: 'outside', tested: ['SMAW'] })
    expect(finding(judge(procedure({ processes: ['SAW'] }), [flat, vertical]), 'process').sentence).toContain('were welded')
    expect(finding(judge(procedure(), []), 'process').verdict).toBe('cannot-tell')
    expect(finding(judge(procedure({ processes: ['SAW'] }), [coupon({ change: (v) => { first(v).process = null } })]), 'process').verdict).toBe('cannot-tell')
  })
  test('what the standard does not know can\'t be told', () => {
    const assessment = judge(procedure({ change: (v) => { first(v).process = 'OTHER' } }), [flat])
    expect(assessment.verdict).toBe('cannot-tell')
    expect(judge(procedure({ change: (v) => { first(v).process = 'PAW' } }), [flat]).verdict).toBe('cannot-tell')
  })
  test('a coupon with CVN results alone adds them to a mechanical one', () => {
    const mechanical = coupon({ number: 'PQR-M' })
    const cvn = coupon({ number: 'PQR-C', toughness: true, content: (c) => { c.tension = []; c.bends = []; c.macros = [] } })
    expect(problems(judge(procedure({ toughness: true, thickness: [16, 40] }), [mechanical, cvn]))).toEqual([])
  })
  test('readings of the run sheet stand for a block without them', () => {
    const row = (amps: number): object => ({ id: `r${amps}`, processId: 'GMAW', pass: '1', layer: null, fillerDiameter: null, current: interval(amps, undefined, 'current'), voltage: interval(27, undefined, 'voltage'), wireFeed: null, travelSpeed: interval(300, undefined, 'travelSpeed'), length: null, arcTime: null, instantaneousEnergy: null, interpass: quantity(amps / 2, 'temperature'), note: null })
    const tested = coupon({ processes: ['GMAW'], toughness: true, content: (c) => { first(c.variables).electrical.current = null; first(c.variables).electrical.heatInput = null; c.runSheet = [row(195), row(205)] as typeof c.runSheet } })
    const assessment = judge(procedure({ processes: ['GMAW'], toughness: true, change: (v) => { first(v).electrical.heatInput = interval(null, 1.1, 'heatInput'); v.preheat.minimum = quantity(90, 'temperature') } }), [tested])
    expect(finding(assessment, 'amperage')).toMatchObject({ verdict: 'within', tested: [200] })
    expect(finding(assessment, 'cvn-heat-input').verdict).toBe('within')
    expect(finding(assessment, 'interpass-minimum')).toMatchObject({ verdict: 'within', tested: [97.5] })
    const unrecorded = coupon({ toughness: true, content: (c) => { c.variables.preheat.interpassMaximum = null; c.runSheet = [row(250), row(300)].map((one) => ({ ...one, processId: 'SMAW' })) as typeof c.runSheet } })
    expect(finding(judge(procedure({ toughness: true }), [unrecorded]), 'cvn-interpass')).toMatchObject({ verdict: 'within', tested: [150] })
  })
})
