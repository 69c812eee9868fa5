/** Prequalification (Clause 5): each condition by itself, and a draft that meets them all but for what is not confirmed. */
import { describe, expect, test } from 'vitest'
import type { Pass, WeldingVariables } from '@shared/schemas/welding.ts'
import { readDesignation, details, fitUp } from '@shared/standards/aws-d1-1/prequalified/joint-details.ts'
import { diameterLimit, minimumPreheat, minimumSize, MINIMUM_FILLET, MINIMUM_PARTIAL, plainPlaces } from '@shared/standards/aws-d1-1/prequalified/limits.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, first, judge, procedure, problems, type Given } from './records.ts'

type Change = (v: WeldingVariables) => void
const both = (...changes: readonly Change[]): Change => (v) => changes.forEach((change) => change(v))
const joint = (more: object): Change => (v) => void Object.assign(v.joint, more)
const electrical = (more: object): Change => (v) => void Object.assign(first(v).electrical, more)
const technique = (more: object): Change => (v) => void Object.assign(first(v).technique, more)
const filler = (classification: string | null, more: object = {}): Change => (v) => void Object.assign(first(v).filler, { classification, ...more })
const steel = (a: string | null, grade: string | null = null, b: string | null = a, gradeB: string | null = grade): Change => (v) => { Object.assign(v.baseMetals.a, { specification: a, grade }); Object.assign(v.baseMetals.b, { specification: b, grade: gradeB }) }
const thick = (min: number | null, max: number | null | undefined = undefined): Change => (v) => { v.thickness = interval(min, max, 'length') }
const positions = (...list: WeldingVariables['processes'][number]['positions']): Change => (v) => { first(v).positions = list }
const pass = (layer: Pass['layer'], more: Partial<Pass> = {}): Pass => ({ number: '1', layer, fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null, ...more })
const passes = (...list: Pass[]): Change => (v) => { first(v).passes = list }
const size = (...values: number[]): Change => (v) => { first(v).filler.diameters = values.map((value) => quantity(value, 'length')) }
const fillet = (leg: number | readonly [number, number] | null, run: 'single' | 'multiple' | null = 'single'): Change => both(joint({ weld: 'fillet', type: 'tee', groove: null, filletLeg: leg === null ? null : typeof leg === 'number' ? interval(leg, undefined, 'length') : interval(leg[0], leg[1], 'length') }), technique({ passesPerSide: run }), positions('2F'))
const ALL = { min: null, max: null, all: true }

interface Own { name: string; given?: Given; change: Change; rule: string; verdict: 'within' | 'outside' | 'cannot-tell'; says?: RegExp; edition?: string }
const W: Given = { processes: ['GMAW'] }
const F: Given = { processes: ['FCAW'] }
const S: Given = { processes: ['SAW'] }
const partial = (more: object = {}): Change => joint({ penetration: 'partial', groove: 'single-bevel', type: 'tee', includedAngle: null, bevelAngle: interval(45, undefined, 'angle'), rootOpening: interval(0, undefined, 'length'), rootFace: interval(3, undefined, 'length'), backing: 'none', backGouging: 'none', ...more })

const U = { designation: 'B-U6', groove: 'single-u', includedAngle: interval(45, undefined, 'angle'), rootOpening: interval(2, undefined, 'length'), rootFace: interval(3, undefined, 'length'), backing: 'none', backGouging: 'grinding' }
const SQUARE_SAW = { designation: 'B-L1-S', groove: 'square', includedAngle: null, rootOpening: interval(0, undefined, 'length'), rootFace: null, backing: 'none', backGouging: 'none' }

const OWN: readonly Own[] = [
  { name: 'GMAW without a transfer mode', given: W, change: electrical({ transferMode: null }), rule: 'process', verdict: 'cannot-tell' },
  { name: 'globular GMAW', given: W, change: electrical({ transferMode: 'globular' }), rule: 'process', verdict: 'within' },
  { name: 'constant current', given: W, change: electrical({ powerSource: 'constant-current' }), rule: 'power-source', verdict: 'outside' },
  { name: 'power source not stated', given: F, change: electrical({ powerSource: null }), rule: 'power-source', verdict: 'cannot-tell' },
  { name: 'constant voltage', given: F, change: () => undefined, rule: 'power-source', verdict: 'within' },
  { name: 'A514', change: steel('ASTM A514', 'B'), rule: 'base-metal', verdict: 'outside', says: /Table 6.9/ },
  { name: 'an unlisted steel', change: steel('EN 10025-2', 'S355J2'), rule: 'base-metal', verdict: 'cannot-tell', says: /not in the list/ },
  { name: 'no steel named', change: (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: null, grade: null }) }, rule: 'base-metal', verdict: 'cannot-tell' },
  { name: 'Group I was read', change: steel('ASTM A53', 'B'), rule: 'base-metal', verdict: 'within' },
  { name: 'A36 with A992', change: both(steel('ASTM A36', null, 'ASTM A992', null), thick(12)), rule: 'base-metal', verdict: 'within' },
  // Filler
  { name: 'E6013 on Group I', change: both(steel('ASTM A53', 'B'), filler('E6013')), rule: 'filler', verdict: 'within' },
  { name: 'E6010 on A36 over 20 mm', change: both(steel('ASTM A36'), thick(25), filler('E6010')), rule: 'filler', verdict: 'outside' },
  { name: 'E6010 on A36 from 10 to 30 mm', change: both(steel('ASTM A36'), thick(10, 30), filler('E6010')), rule: 'filler', verdict: 'outside' },
  { name: 'E6010 on A36 up to 20 mm', change: both(steel('ASTM A36'), thick(20), filler('E6010')), rule: 'filler', verdict: 'within' },
  { name: 'E7018 on Group II', change: () => undefined, rule: 'filler', verdict: 'within' },
  { name: 'E7014 on Group II', change: filler('E7014'), rule: 'filler', verdict: 'outside' },
  { name: 'E7048 is not among those named', change: filler('E7048'), rule: 'filler', verdict: 'outside' },
  { name: 'E7018 on Group III', change: steel('ASTM A913', '65'), rule: 'filler', verdict: 'outside' },
  { name: 'E8018-C3 on Group III', change: both(steel('ASTM A913', '65'), filler('E8018-C3')), rule: 'filler', verdict: 'within' },
  { name: 'the filler of the weaker steel', change: both(steel('ASTM A913', '65', 'ASTM A572', '50'), filler('E7018')), rule: 'filler', verdict: 'within' },
  { name: 'but low-hydrogen for the stronger', change: both(steel('ASTM A36', null, 'ASTM A572', '50'), thick(12), filler('E6010')), rule: 'filler', verdict: 'outside' },
  { name: 'filler not stated', change: filler(null), rule: 'filler', verdict: 'cannot-tell' },
  { name: 'filler that can\'t be read', change: filler('LF-1'), rule: 'filler', verdict: 'cannot-tell' },
  { name: 'filler of an unlisted steel', change: steel('EN 10025-2', 'S355J2'), rule: 'filler', verdict: 'cannot-tell' },
  { name: 'filler of A514', change: steel('ASTM A514', 'B'), rule: 'filler', verdict: 'cannot-tell' },
  { name: 'single-pass-only cored wire', given: F, change: filler('E70T-3'), rule: 'filler', verdict: 'outside', says: /single-pass/ },
  { name: 'E71T-12M is no such class', given: F, change: filler('E71T-12M'), rule: 'filler', verdict: 'within' },
  { name: 'ER70S-6 on Group II', given: W, change: () => undefined, rule: 'filler', verdict: 'within' },
  { name: 'F7A2-EM12K on Group II', given: S, change: () => undefined, rule: 'filler', verdict: 'within' },
  { name: 'F6 on Group II', given: S, change: filler('EL12', { fluxClassification: 'F6A2-EL12' }), rule: 'filler', verdict: 'outside', says: /F6A2-EL12/ },
  { name: 'E71T12-M of the newer form is no single-pass class', given: F, change: filler('E71T12-M'), rule: 'filler', verdict: 'within' },
  { name: 'E7048 is low-hydrogen and matches Group I of a mixed joint', change: both(steel('ASTM A36', null, 'ASTM A572', '50'), thick(12), filler('E7048')), rule: 'filler', verdict: 'within' },
  { name: 'words for Group I name solid and cored wire of 70 ksi', given: W, change: both(steel('ASTM A53', 'B'), filler('ER80S-D2')), rule: 'filler', verdict: 'outside', says: /needs ER70S or E70C\./ },
  { name: 'A710 class 2 over 50 mm is no longer listed', change: both(steel('ASTM A710', 'A Class 2'), thick(60), filler('E8018-C3')), rule: 'base-metal', verdict: 'cannot-tell' },
  // Preheat
  { name: 'H8 takes category D', change: both(steel('ASTM A913', '65'), filler('E8018-C3-H8'), thick(60), (v) => { v.preheat.minimum = quantity(0, 'temperature') }), rule: 'preheat', verdict: 'within', says: /category D/ },
  { name: 'without H8 it stays C', change: both(steel('ASTM A913', '65'), filler('E8018-C3'), thick(60), (v) => { v.preheat.minimum = quantity(100, 'temperature') }), rule: 'preheat', verdict: 'outside', says: /category C/ },
  { name: 'every thickness is in the last band', change: both((v) => { v.thickness = ALL }, (v) => { v.preheat.minimum = quantity(110, 'temperature') }), rule: 'preheat', verdict: 'within', says: /unlimited thickness/ },
  { name: 'preheat not stated', change: (v) => { v.preheat.minimum = null }, rule: 'preheat', verdict: 'cannot-tell', says: /at least 0 °C/ },
  { name: 'no thickness', change: (v) => { v.thickness = null }, rule: 'preheat', verdict: 'cannot-tell' },
  { name: 'other electrodes on Group II', change: filler('E7014'), rule: 'preheat', verdict: 'cannot-tell', says: /not low-hydrogen/ },
  { name: 'an electrode that can\'t be read', change: filler('LF-1'), rule: 'preheat', verdict: 'cannot-tell' },
  { name: 'Group IV other than HPS 70W', change: steel('ASTM A913', '70'), rule: 'preheat', verdict: 'cannot-tell' },
  { name: 'an unlisted steel', change: steel('EN 10025-2', 'S355J2'), rule: 'preheat', verdict: 'cannot-tell' },
  // Joint details
  { name: 'B-U2a', change: () => undefined, rule: 'joint-detail', verdict: 'within', says: /B-U2a/ },
  { name: 'B-U2a by name', change: joint({ designation: 'B-U2a' }), rule: 'joint-detail', verdict: 'within' },
  { name: 'a range within fit-up', change: joint({ designation: 'B-U2a', rootOpening: interval(4, 14, 'length'), includedAngle: interval(40, 55, 'angle') }), rule: 'joint-detail', verdict: 'within' },
  { name: 'a range beyond fit-up', change: joint({ designation: 'B-U2a', rootOpening: interval(3, 14, 'length') }), rule: 'joint-detail', verdict: 'outside', says: /root opening/ },
  { name: 'an angle beyond', change: joint({ designation: 'B-U2a', includedAngle: interval(60, undefined, 'angle') }), rule: 'joint-detail', verdict: 'outside', says: /groove angle/ },
  { name: 'a range of angle beyond', change: joint({ designation: 'B-U2a', includedAngle: interval(30, 70, 'angle') }), rule: 'joint-detail', verdict: 'outside' },
  { name: 'without name it may fit another', change: joint({ rootOpening: interval(20, undefined, 'length') }), rule: 'joint-detail', verdict: 'cannot-tell', says: /not complete/ },
  { name: 'something open', change: joint({ rootOpening: null }), rule: 'joint-detail', verdict: 'cannot-tell', says: /the root opening/ },
  { name: 'the groove open', change: joint({ groove: null }), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'backing and position open', change: both(joint({ backing: null }), positions()), rule: 'joint-detail', verdict: 'cannot-tell', says: /positions/ },
  { name: 'an unreadable name', change: joint({ designation: 'X-9' }), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'a name that the joint is not', change: joint({ designation: 'TC-U4a' }), rule: 'joint-detail', verdict: 'outside' },
  { name: 'a name of another process', given: S, change: joint({ designation: 'B-U2a-GF' }), rule: 'joint-detail', verdict: 'outside', says: /GMAW and FCAW/ },
  { name: 'an SMAW detail for GMAW', given: W, change: joint({ designation: 'B-U2a' }), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'a name of which no dimensions are kept', change: joint({ designation: 'B-U2b' }), rule: 'joint-detail', verdict: 'cannot-tell', says: /not kept/ },
  { name: 'backing where none belongs', change: joint({ designation: 'B-U2', includedAngle: interval(60, undefined, 'angle'), rootOpening: interval(0, undefined, 'length') }), rule: 'joint-detail', verdict: 'outside', says: /without backing/ },
  { name: 'backgouging missing', change: joint({ designation: 'B-U2', includedAngle: interval(60, undefined, 'angle'), rootOpening: interval(0, undefined, 'length'), backing: 'none' }), rule: 'joint-detail', verdict: 'outside', says: /backgouged/ },
  { name: 'backgouging open', change: joint({ designation: 'B-U2', includedAngle: interval(60, undefined, 'angle'), rootOpening: interval(0, undefined, 'length'), backing: 'none', backGouging: null }), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'B-U2 backgouged', change: joint({ designation: 'B-U2', includedAngle: interval(60, undefined, 'angle'), rootOpening: interval(2, undefined, 'length'), rootFace: interval(2, undefined, 'length'), backing: 'none', backGouging: 'grinding' }), rule: 'joint-detail', verdict: 'within' },
  { name: 'a square groove by its thickness', change: both(joint({ designation: 'B-L1a', groove: 'square', rootOpening: interval(6, undefined, 'length'), includedAngle: null }), thick(6)), rule: 'joint-detail', verdict: 'within' },
  { name: 'a square groove too thick', change: both(joint({ designation: 'B-L1a', groove: 'square', rootOpening: interval(8, undefined, 'length') }), thick(8)), rule: 'joint-detail', verdict: 'outside', says: /over the 6 mm/ },
  { name: 'a square groove in every thickness', change: both(joint({ designation: 'B-L1a', groove: 'square', rootOpening: interval(8, undefined, 'length') }), (v) => { v.thickness = ALL }), rule: 'joint-detail', verdict: 'outside', says: /unlimited thickness/ },
  { name: 'a square groove without thickness', change: both(joint({ designation: 'B-L1b', groove: 'square', rootOpening: interval(3, undefined, 'length'), backing: 'none', backGouging: 'grinding' }), (v) => { v.thickness = null }), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'half the thickness as opening', change: both(joint({ designation: 'B-L1b', groove: 'square', rootOpening: interval(3, undefined, 'length'), backing: 'none', backGouging: 'grinding' }), thick(6)), rule: 'joint-detail', verdict: 'within' },
  { name: 'a position that the line does not have', given: { processes: ['SAW'], positions: ['2G'] }, change: joint({ designation: 'B-L2a-S', rootOpening: interval(6, undefined, 'length'), includedAngle: interval(30, undefined, 'angle') }), rule: 'joint-detail', verdict: 'outside', says: /flat welding/ },
  { name: 'gas that the line needs', given: F, change: both(joint({ designation: 'TC-U4a-GF', type: 'tee', groove: 'single-bevel', includedAngle: interval(30, undefined, 'angle'), rootOpening: interval(5, undefined, 'length') }), (v) => { first(v).shieldingGas = { ...first(v).shieldingGas!, components: [], name: 'none' } }), rule: 'joint-detail', verdict: 'outside', says: /external shielding gas/ },
  { name: 'gas not stated where the line needs it', given: F, change: both(joint({ designation: 'TC-U4a-GF', type: 'tee', groove: 'single-bevel', includedAngle: interval(30, undefined, 'angle'), rootOpening: interval(5, undefined, 'length') }), (v) => { first(v).shieldingGas = null }), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'gas given where the line needs it', given: F, change: joint({ designation: 'TC-U4a-GF', type: 'tee', groove: 'single-bevel', includedAngle: interval(30, undefined, 'angle'), rootOpening: interval(5, undefined, 'length') }), rule: 'joint-detail', verdict: 'within' },
  { name: 'a partial-penetration detail', change: both(partial({ designation: 'BTC-P4' }), (v) => { first(v).depositThickness = interval(12, undefined, 'length') }), rule: 'joint-detail', verdict: 'within' },
  { name: 'too thin for it', given: F, change: both(partial({ designation: 'BTC-P4-GF' }), thick(5)), rule: 'joint-detail', verdict: 'outside', says: /under the 6 mm/ },
  { name: 'a detail of U groove', change: joint({ ...U, rootRadius: interval(6, undefined, 'length') }), rule: 'joint-detail', verdict: 'within' },
  { name: 'a U groove without its radius', change: joint(U), rule: 'joint-detail', verdict: 'cannot-tell', says: /radius/ },
  { name: 'a U groove of too small a radius', change: joint({ ...U, rootRadius: interval(5, undefined, 'length') }), rule: 'joint-detail', verdict: 'outside', says: /groove radius/ },
  { name: 'a root face on a detail that has none', change: joint({ designation: 'B-U2a', rootFace: interval(3, undefined, 'length') }), rule: 'joint-detail', verdict: 'outside', says: /drawn without one/ },
  { name: 'bevels of a V count together', change: joint({ designation: 'B-U2a', includedAngle: null, bevelAngle: interval(22.5, undefined, 'angle') }), rule: 'joint-detail', verdict: 'within' },
  { name: 'a square groove from both sides', given: S, change: both(joint({ ...SQUARE_SAW, weldedFromBothSides: true }), thick(10)), rule: 'joint-detail', verdict: 'within' },
  { name: 'but not from one', given: S, change: both(joint({ ...SQUARE_SAW, weldedFromBothSides: false }), thick(10)), rule: 'joint-detail', verdict: 'outside', says: /both sides/ },
  { name: 'sides not stated', given: S, change: both(joint({ ...SQUARE_SAW, weldedFromBothSides: null }), thick(10)), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'no detail is for short-circuiting', given: W, change: both(joint({ designation: 'B-U2a-GF' }), electrical({ transferMode: 'short-circuiting' })), rule: 'joint-detail', verdict: 'cannot-tell' },
  { name: 'a detail for GMAW of unknown transfer', given: W, change: both(joint({ designation: 'B-U2a-GF' }), electrical({ transferMode: null })), rule: 'joint-detail', verdict: 'cannot-tell', says: /transfer mode/ },
  { name: 'no detail for such a groove', change: joint({ groove: 'double-j' }), rule: 'joint-detail', verdict: 'cannot-tell', says: /No detail/ },
  // Sizes
  { name: 'an 8 mm electrode for a flat fillet', change: both(fillet(8), positions('1F'), size(8)), rule: 'electrode-diameter', verdict: 'within' },
  { name: 'the same in a groove', change: size(8), rule: 'electrode-diameter', verdict: 'outside' },
  { name: '6.4 mm alone may not lay the root', change: size(6.4), rule: 'electrode-diameter', verdict: 'outside', says: /root passes/ },
  { name: '3.2 and 6.4 mm without passes', change: size(3.2, 6.4), rule: 'electrode-diameter', verdict: 'cannot-tell' },
  { name: '3.2 mm root, 6.4 mm fill', change: both(size(3.2, 6.4), passes(pass('root', { fillerDiameter: quantity(3.2, 'length') }), pass('fill', { fillerDiameter: quantity(6.4, 'length') }))), rule: 'electrode-diameter', verdict: 'within' },
  { name: '6.4 mm root', change: both(size(6.4), passes(pass('root', { fillerDiameter: quantity(6.4, 'length') }))), rule: 'electrode-diameter', verdict: 'outside' },
  { name: 'a pass without layer', change: both(size(3.2), passes(pass(null, { fillerDiameter: quantity(6.4, 'length') }))), rule: 'electrode-diameter', verdict: 'cannot-tell' },
  { name: 'EXX14 overhead', given: { positions: ['4G'] }, change: both(filler('E7014'), size(4.8)), rule: 'electrode-diameter', verdict: 'outside' },
  { name: 'E6010 overhead', given: { positions: ['4G'] }, change: both(filler('E6010'), size(4.8)), rule: 'electrode-diameter', verdict: 'within' },
  { name: 'SAW groove in horizontal', given: { processes: ['SAW'], positions: ['2G'] }, change: () => undefined, rule: 'electrode-diameter', verdict: 'outside', says: /test/ },
  { name: 'SAW fillet in horizontal', given: S, change: fillet(6), rule: 'electrode-diameter', verdict: 'within' },
  { name: 'wire of 2.4 mm vertical', given: { processes: ['FCAW'], positions: ['3G'] }, change: size(2.4), rule: 'electrode-diameter', verdict: 'within' },
  { name: 'wire of 2.4 mm overhead', given: { processes: ['FCAW'], positions: ['4G'] }, change: size(2.4), rule: 'electrode-diameter', verdict: 'outside' },
  { name: 'no diameter', change: size(), rule: 'electrode-diameter', verdict: 'cannot-tell' },
  { name: 'no position', change: positions(), rule: 'electrode-diameter', verdict: 'cannot-tell' },
  { name: 'current in the maker\'s range', given: W, change: () => undefined, rule: 'current', verdict: 'within' },
  { name: 'current beyond it', given: W, change: electrical({ current: interval(140, 200, 'current') }), rule: 'current', verdict: 'outside' },
  { name: 'any current', given: W, change: electrical({ current: ALL }), rule: 'current', verdict: 'outside' },
  { name: 'a pass beyond it', given: W, change: passes(pass('cap', { current: interval(260, null, 'current') })), rule: 'current', verdict: 'outside' },
  { name: 'no maker\'s range', given: W, change: electrical({ makerCurrent: null }), rule: 'current', verdict: 'cannot-tell' },
  { name: 'no current', given: W, change: electrical({ current: null }), rule: 'current', verdict: 'cannot-tell' },
  { name: 'SAW without passes up to 600 A', given: S, change: electrical({ current: interval(600, undefined, 'current') }), rule: 'current', verdict: 'within' },
  { name: 'SAW without passes over 600 A', given: S, change: electrical({ current: interval(700, undefined, 'current') }), rule: 'current', verdict: 'cannot-tell', says: /layer/ },
  { name: 'SAW root with opening', given: S, change: passes(pass('root', { current: interval(650, undefined, 'current') })), rule: 'current', verdict: 'outside', says: /root with opening/ },
  { name: 'SAW root without opening', given: S, change: both(joint({ rootOpening: interval(0, undefined, 'length') }), passes(pass('root', { current: interval(650, undefined, 'current') }))), rule: 'current', verdict: 'outside', says: /root without opening/ },
  { name: 'SAW root of which the opening is open', given: S, change: both(joint({ rootOpening: null }), passes(pass('root', { current: interval(650, undefined, 'current') }))), rule: 'current', verdict: 'cannot-tell' },
  { name: 'SAW hot and backing passes count as fill', given: S, change: passes(pass('hot', { current: interval(600, undefined, 'current') }), pass('backing', { current: interval(600, null, 'current') }), pass(null, { current: interval(500, undefined, 'current') })), rule: 'current', verdict: 'within' },
  { name: 'SAW fillet', given: S, change: both(fillet(6), electrical({ current: interval(1000, undefined, 'current') })), rule: 'current', verdict: 'within' },
  { name: 'SAW fillet of more', given: S, change: both(fillet(6), electrical({ current: interval(1001, undefined, 'current') })), rule: 'current', verdict: 'outside' },
  { name: 'SAW several electrodes within parallel', given: S, change: both(technique({ electrodeCount: 2 }), passes(pass('fill', { current: interval(1200, undefined, 'current') }))), rule: 'current', verdict: 'within' },
  { name: 'SAW several electrodes over parallel', given: S, change: both(technique({ electrodes: 'multiple', electrodeCount: null }), passes(pass('fill', { current: interval(1300, undefined, 'current') }))), rule: 'current', verdict: 'cannot-tell', says: /parallel/ },
  { name: 'SAW feed not stated', given: S, change: technique({ electrodes: null, electrodeCount: null }), rule: 'current', verdict: 'cannot-tell' },
  { name: 'SAW current not stated', given: S, change: electrical({ current: null }), rule: 'current', verdict: 'cannot-tell' },
  { name: 'SAW fillet layer', given: S, change: passes(pass('fillet', { current: interval(900, undefined, 'current') })), rule: 'current', verdict: 'within' },
  { name: 'a fill pass of 5 mm', change: (v) => { first(v).maxPassThickness = quantity(5, 'length') }, rule: 'pass-thickness', verdict: 'within' },
  { name: 'a pass of 8 mm, root or fill', change: (v) => { first(v).maxPassThickness = quantity(8, 'length') }, rule: 'pass-thickness', verdict: 'cannot-tell' },
  { name: 'a pass of 11 mm flat', change: (v) => { first(v).maxPassThickness = quantity(11, 'length') }, rule: 'pass-thickness', verdict: 'outside' },
  { name: 'SAW several electrodes', given: S, change: both(technique({ electrodeCount: 2 }), (v) => { first(v).maxPassThickness = quantity(30, 'length') }), rule: 'pass-thickness', verdict: 'within' },
  { name: 'SAW single electrode over 6 mm', given: S, change: (v) => { first(v).maxPassThickness = quantity(8, 'length') }, rule: 'pass-thickness', verdict: 'cannot-tell', says: /of any thickness/ },
  { name: 'pass thickness not stated', change: (v) => { first(v).maxPassThickness = null }, rule: 'pass-thickness', verdict: 'cannot-tell' },
  { name: 'pass thickness without position', change: positions(), rule: 'pass-thickness', verdict: 'cannot-tell' },
  { name: 'a flat SAW fillet of any size', given: S, change: both(fillet(25), positions('1F')), rule: 'single-pass-fillet', verdict: 'within' },
  { name: 'several electrodes between', given: S, change: both(fillet(10), technique({ electrodeCount: 2 })), rule: 'single-pass-fillet', verdict: 'cannot-tell' },
  { name: 'several electrodes beyond', given: S, change: both(fillet(13), technique({ electrodeCount: 2 })), rule: 'single-pass-fillet', verdict: 'outside' },
  { name: 'passes not stated, small', change: fillet(6, null), rule: 'single-pass-fillet', verdict: 'within' },
  { name: 'passes not stated, large', change: fillet(12, null), rule: 'single-pass-fillet', verdict: 'cannot-tell' },
  { name: 'every size in one pass', change: both(fillet(6), joint({ filletLeg: ALL })), rule: 'single-pass-fillet', verdict: 'outside', says: /Every size/ },
  { name: 'no size', change: fillet(null), rule: 'single-pass-fillet', verdict: 'cannot-tell' },
  { name: 'no position for a fillet', change: both(fillet(6), positions()), rule: 'single-pass-fillet', verdict: 'cannot-tell' },
  { name: 'vertical wire fillet of 12 mm', given: W, change: both(fillet(12), positions('3F')), rule: 'single-pass-fillet', verdict: 'within' },
  { name: 'overhead fillet of 9 mm', change: both(fillet(9), positions('4F')), rule: 'single-pass-fillet', verdict: 'outside' },
  { name: 'flat wire fillet of 12 mm', given: W, change: both(fillet(12), positions('1F')), rule: 'single-pass-fillet', verdict: 'within' },
  { name: 'flat SMAW fillet of 10 mm', change: both(fillet(10), positions('1F')), rule: 'single-pass-fillet', verdict: 'within' },
  { name: 'a fillet too small', change: fillet(5), rule: 'minimum-fillet', verdict: 'outside', says: /6 mm for the thinner part of 20 mm/ },
  { name: 'a range that reaches below', change: fillet([5, 8], 'multiple'), rule: 'minimum-fillet', verdict: 'cannot-tell' },
  { name: 'every fillet size', change: both(fillet(6), joint({ filletLeg: ALL })), rule: 'minimum-fillet', verdict: 'cannot-tell' },
  { name: 'other electrodes: the thicker part', change: both(fillet(6), filler('E6010'), steel('ASTM A53', 'B'), thick(6), (v) => { v.thicknessB = interval(30, undefined, 'length') }), rule: 'minimum-fillet', verdict: 'within', says: /6 mm for the thicker part/ },
  { name: 'other electrodes in several passes', change: both(fillet(8, 'multiple'), filler('E6010'), steel('ASTM A53', 'B'), thick(25)), rule: 'minimum-fillet', verdict: 'cannot-tell', says: /single pass/ },
  { name: 'never more than the thinner part', change: both(fillet(3), thick(3)), rule: 'minimum-fillet', verdict: 'within' },
  { name: 'no thickness for the fillet', change: both(fillet(6), (v) => { v.thickness = null }), rule: 'minimum-fillet', verdict: 'cannot-tell' },
  { name: 'every thickness for the fillet', change: both(fillet(8), (v) => { v.thickness = ALL }), rule: 'minimum-fillet', verdict: 'within', says: /unlimited/ },
  { name: 'no fillet size', change: fillet(null), rule: 'minimum-fillet', verdict: 'cannot-tell' },
  { name: 'an electrode that can\'t be read', change: both(fillet(6), filler('LF-1')), rule: 'minimum-fillet', verdict: 'cannot-tell' },
  { name: 'a partial weld of 12 mm less 3 mm', change: both(partial(), (v) => { first(v).depositThickness = interval(12, undefined, 'length') }), rule: 'minimum-partial-penetration', verdict: 'within', says: /9 mm.*takes 3 mm/ },
  { name: 'a partial weld of 8 mm less 3 mm', change: both(partial(), (v) => { first(v).depositThickness = interval(8, undefined, 'length') }), rule: 'minimum-partial-penetration', verdict: 'outside', says: /5 mm is smaller than the 6 mm/ },
  { name: 'a flat wire weld keeps its depth', given: F, change: both(partial(), (v) => { first(v).depositThickness = interval(8, undefined, 'length') }), rule: 'minimum-partial-penetration', verdict: 'within' },
  { name: 'a groove too shallow', change: both(partial({ groove: 'double-j' }), (v) => { first(v).depositThickness = interval(4, undefined, 'length') }), rule: 'minimum-partial-penetration', verdict: 'outside' },
  { name: 'no detail to tell the loss', change: both(partial({ groove: 'double-j' }), (v) => { first(v).depositThickness = interval(8, undefined, 'length') }), rule: 'minimum-partial-penetration', verdict: 'cannot-tell' },
  { name: 'no depth', change: both(partial(), (v) => { first(v).depositThickness = null }), rule: 'minimum-partial-penetration', verdict: 'cannot-tell' },
  { name: 'every depth', change: both(partial(), (v) => { first(v).depositThickness = ALL }), rule: 'minimum-partial-penetration', verdict: 'cannot-tell' },
  { name: 'no thickness for the partial weld', change: both(partial(), (v) => { v.thickness = null }), rule: 'minimum-partial-penetration', verdict: 'cannot-tell' },
  { name: 'a partial weld with an electrode that can\'t be read', change: both(partial(), filler('LF-1')), rule: 'minimum-partial-penetration', verdict: 'cannot-tell' },
  // Technique
  { name: 'vertical up', given: { positions: ['3G'] }, change: () => undefined, rule: 'vertical-progression', verdict: 'within' },
  { name: 'vertical down', given: { positions: ['3G'] }, change: (v) => { first(v).progression = 'down' }, rule: 'vertical-progression', verdict: 'outside' },
  { name: 'vertical down on pipe', given: { positions: ['5G'] }, change: (v) => { first(v).progression = 'down'; v.product = 'pipe' }, rule: 'vertical-progression', verdict: 'cannot-tell' },
  { name: 'direction open', given: { positions: ['3G'] }, change: (v) => { first(v).progression = null }, rule: 'vertical-progression', verdict: 'cannot-tell' },
  { name: 'a gas is never confirmed', given: W, change: () => undefined, rule: 'gas', verdict: 'cannot-tell' },
  { name: 'self-shielded', given: F, change: (v) => void Object.assign(first(v).shieldingGas!, { components: [], name: 'none' }), rule: 'gas', verdict: 'within' },
  { name: 'GMAW without gas', given: W, change: (v) => void Object.assign(first(v).shieldingGas!, { components: [], name: 'none' }), rule: 'gas', verdict: 'outside' },
  { name: 'gas not stated', given: W, change: (v) => { first(v).shieldingGas = null }, rule: 'gas', verdict: 'cannot-tell' },
  { name: 'one gas flow', given: W, change: () => undefined, rule: 'range-gas-flow', verdict: 'within' },
  { name: 'a range of gas flow', given: W, change: (v) => { first(v).shieldingGas!.flow = interval(15, 20, 'gasFlow') }, rule: 'range-gas-flow', verdict: 'cannot-tell' },
  { name: 'any gas flow', given: W, change: (v) => { first(v).shieldingGas!.flow = ALL }, rule: 'range-gas-flow', verdict: 'cannot-tell' },
  { name: 'amperage by 10 % of its middle', given: W, change: electrical({ current: interval(180, 220, 'current') }), rule: 'range-amperage', verdict: 'within' },
  { name: 'amperage by more', given: W, change: electrical({ current: interval(170, 230, 'current') }), rule: 'range-amperage', verdict: 'outside', says: /15 %.*10 %/ },
  { name: 'several lines are judged apart', given: W, change: both(electrical({ current: null }), passes(pass('root', { current: interval(120, 130, 'current') }), pass('fill', { current: interval(220, 240, 'current') }))), rule: 'range-amperage', verdict: 'within' },
  { name: 'any amperage', given: W, change: electrical({ current: ALL }), rule: 'range-amperage', verdict: 'outside' },
  { name: 'contradicting amperage', given: W, change: electrical({ current: interval(220, 180, 'current') }), rule: 'range-amperage', verdict: 'cannot-tell' },
  { name: 'voltage by 7 %', given: W, change: electrical({ voltage: interval(26, 29, 'voltage') }), rule: 'range-voltage', verdict: 'within' },
  { name: 'voltage by 10 % is in doubt', given: W, change: electrical({ voltage: interval(25, 30.5, 'voltage') }), rule: 'range-voltage', verdict: 'cannot-tell', says: /7 or 15 %/ },
  { name: 'voltage by 10 % in 2010', given: W, edition: '2010', change: electrical({ voltage: interval(25, 30.5, 'voltage') }), rule: 'range-voltage', verdict: 'outside' },
  { name: 'voltage by 20 %', given: W, change: electrical({ voltage: interval(20, 30, 'voltage') }), rule: 'range-voltage', verdict: 'outside' },
  { name: 'no voltage', given: W, change: electrical({ voltage: null }), rule: 'range-voltage', verdict: 'cannot-tell' },
  { name: 'travel speed of SAW', given: S, change: electrical({ travelSpeed: interval(250, 350, 'travelSpeed') }), rule: 'range-travel-speed', verdict: 'outside' },
  { name: 'travel speed of GMAW', given: W, change: electrical({ travelSpeed: interval(250, 350, 'travelSpeed') }), rule: 'range-travel-speed', verdict: 'within' },
  { name: 'a speed of nothing', given: W, change: electrical({ travelSpeed: interval(0, undefined, 'travelSpeed') }), rule: 'range-travel-speed', verdict: 'within' },
  { name: 'an open end', given: W, change: electrical({ travelSpeed: interval(null, 300, 'travelSpeed') }), rule: 'range-travel-speed', verdict: 'within' },
  { name: 'position not stated', change: positions(), rule: 'states-positions', verdict: 'cannot-tell' },
  { name: 'electrodes not stated', given: W, change: technique({ electrodes: null, electrodeCount: null }), rule: 'states-electrodes', verdict: 'cannot-tell' },
  { name: 'polarity not stated', change: electrical({ currentType: null }), rule: 'states-current-type', verdict: 'cannot-tell' },
  { name: 'settings by pass', given: W, change: both(electrical({ current: null, wireFeed: null }), passes(pass('root', { wireFeed: interval(8, undefined, 'wireFeed') }))), rule: 'states-amperage', verdict: 'within' },
  { name: 'no settings', given: W, change: electrical({ current: null, wireFeed: null }), rule: 'states-amperage', verdict: 'cannot-tell' },
  { name: 'gas flow not stated', given: W, change: (v) => { first(v).shieldingGas!.flow = null }, rule: 'states-gas-flow', verdict: 'cannot-tell' },
  { name: 'no gas needs no flow', given: F, change: (v) => void Object.assign(first(v).shieldingGas!, { components: [], name: 'none', flow: null }), rule: 'states-gas-flow', verdict: 'within' },
  { name: 'heat treatment', change: (v) => { v.pwht.condition = 'below-lower-transformation' }, rule: 'pwht', verdict: 'cannot-tell' },
  { name: 'heat treatment not stated', change: (v) => { v.pwht.condition = null }, rule: 'pwht', verdict: 'cannot-tell' },
  { name: 'CVN is not shown by prequalification', given: { toughness: true }, change: () => undefined, rule: 'toughness', verdict: 'cannot-tell' },
  { name: 'layer widths are shown', given: W, change: () => undefined, rule: 'layer-width', verdict: 'cannot-tell' },
  { name: 'layer widths of SAW', given: S, change: () => undefined, rule: 'layer-width', verdict: 'cannot-tell' },
]

describe('conditions of prequalification', () => {
  test.each(OWN)('$name: $rule $verdict', ({ given, change, rule, verdict, says, edition }) => {
    const found = finding(judge(procedure({ ...given, change }), [], edition ?? '2020', 'prequalified'), `prequalified-${rule}`)
    expect({ verdict: found.verdict, sentence: found.sentence }).toMatchObject({ verdict })
    if (says) expect(found.sentence).toMatch(says)
    if (verdict === 'cannot-tell') expect(found.missing.length).toBeGreaterThan(0)
  })
})

describe('a draft as a whole', () => {
  test('with covered electrodes may be prequalified without any coupon', () => {
    const assessment = judge(procedure(), [], '2020', 'prequalified')
    expect(problems(assessment)).toEqual([])
    expect(assessment.verdict).toBe('within')
    expect(assessment.ranges).toEqual([])
    expect(assessment.findings.every(({ ruleId }) => ruleId === 'aws-d1-1/scope' || ruleId.startsWith('aws-d1-1/prequalified-') || ruleId.startsWith('assessment/'))).toBe(true)
  })
  test('coupons that are linked have no say', () => {
    expect(judge(procedure(), [coupon({ certified: false, processes: ['SAW'] })], '2020', 'prequalified')).toEqual(judge(procedure(), [], '2020', 'prequalified'))
  })
  test('by test, no condition of prequalification is asked', () => {
    expect(judge(procedure(), [coupon()]).findings.some(({ ruleId }) => ruleId.includes('prequalified'))).toBe(false)
  })
  test('in inches as in millimetres', () => {
    expect(problems(judge(procedure({ system: 'US' }), [], '2020', 'prequalified'))).toEqual([])
  })
  test('gas-shielded work waits for the gas alone', () => {
    expect(problems(judge(procedure({ processes: ['FCAW'], change: (v) => { first(v).electrical.current = interval(190, 210, 'current') } }), [], '2020', 'prequalified')).map((text) => text.split(':')[0])).toEqual(['aws-d1-1/prequalified-gas'])
  })
  test('clauses are numbered by edition, and other editions only recall Table 5.1', () => {
    const of = (edition: string, rule: string) => finding(judge(procedure(), [], edition, 'prequalified'), `prequalified-${rule}`)
    expect([of('2010', 'preheat').clause, of('2015', 'preheat').clause, of('2020', 'preheat').clause]).toEqual(['Table 3.2', 'Table 3.3', 'Table 5.8'])
    expect([of('2015', 'electrode-diameter').basis, of('2020', 'electrode-diameter').basis]).toEqual(['memory', 'read'])
  })
})

describe('tables', () => {
  test('band edges belong to the lower band', () => {
    expect([20, 20.1, 38, 38.1, 65, 65.1].map((T) => minimumPreheat('A', T, 'SI'))).toEqual([0, 65, 65, 110, 110, 150])
    expect([0.75, 0.76, 1.5, 1.51, 2.5, 2.51].map((T) => minimumPreheat('B', T, 'US'))).toEqual([32, 50, 50, 150, 150, 225])
    expect([6, 6.1, 12, 12.1, 20, 20.1].map((T) => minimumSize(MINIMUM_FILLET, T, 'SI'))).toEqual([3, 5, 5, 6, 6, 8])
    expect([5, 6, 12, 20, 38, 57, 150, 151].map((T) => minimumSize(MINIMUM_PARTIAL, T, 'SI'))).toEqual([2, 3, 5, 6, 8, 10, 12, 16])
    expect([0.25, 2.25, 6.1].map((T) => minimumSize(MINIMUM_PARTIAL, T, 'US'))).toEqual([1 / 8, 3 / 8, 5 / 8])
  })
  test('what has no row has no limit', () => {
    expect(diameterLimit('GTAW', 'groove', 'flat', false, false)).toBeNull()
    expect(plainPlaces(['flat', '5F', 'T-, Y- or K-connection'])).toEqual(['flat'])
  })
  test.each([['B-U4b-GF', ['butt'], 'single-bevel', ['GMAW', 'FCAW']], ['TC-U5a', ['tee', 'corner'], 'double-bevel', ['SMAW']], ['B-P10-S', ['butt'], 'flare-bevel', ['SAW']], ['C-L11-F', ['corner'], 'flare-v', ['FCAW']]] as const)('reads %s', (text, joints, groove, processes) => {
    expect(readDesignation(text)).toMatchObject({ joints, groove, processes })
  })
  test.each(['', 'B-U', 'B-X2', 'BU2a', 'B-U12', 'B-U2a-T'])('does not read %j', (text) => expect(readDesignation(text)).toBeNull())
  test('fit-up of what is not stated is not told', () => {
    expect(fitUp(details[0]!, { opening: null, face: null, angle: null }, 'SI')).toEqual({ opening: null, face: null, angle: null })
  })
})
