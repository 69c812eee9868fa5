/** The matrix of the reference, row by row, against the tables of the engine; every item of it has a rule or a named place. */
import { describe, expect, test } from 'vitest'
import matrix from '../../../../fixtures/standards/iso-15614-1-variables.json' with { type: 'json' }
import { containsInterval } from '@shared/ranges/numeric.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import { hardnessLimit } from '@shared/standards/iso-15614-1/acceptance.ts'
import { coversGroups, members } from '@shared/standards/iso-15614-1/groups.ts'
import { iso15614Part1 } from '@shared/standards/iso-15614-1/index.ts'
import { buttLevelOne, buttLevelTwo } from '@shared/standards/iso-15614-1/tables.ts'
import { quantity } from '@shared/units/convert.ts'
import { procedure } from './builders.ts'

interface Row { level: string; item: string; clause: string; threshold: Record<string, unknown>; confidence: string }
const rows = matrix as unknown as Row[]
const of = (item: string): Row[] => rows.filter((row) => row.item === item)

const joint = (a: string, b: string, name: string): NonNullable<ReturnType<typeof members>> => {
  const { variables } = procedure({ change: (v: WeldingVariables) => { Object.assign(v.baseMetals.a, { iso15608: a, grade: `${name} a`, minYield: quantity(300, 'stress') }); Object.assign(v.baseMetals.b, { iso15608: b, grade: `${name} b`, minYield: quantity(300, 'stress') }) } })
  return members(variables)!
}

describe('Table 5', () => {
  const REVIEW = ['5-4', '5-3', '5-2']
  test.each(of('material_groups').map((row) => [row.threshold.test as string, row] as const))('%s', (pair, { threshold }) => {
    const [first = '', second = ''] = pair.split('-')
    const test0 = joint(`${first}.1`, `${second}.1`, 'tested')
    const columns = threshold as unknown as { A: string[]; B: string[] }
    for (let a = 1; a <= 11; a += 1) {
      for (let b = 1; b <= a; b += 1) {
        const held = (columns.A.includes(String(a)) && columns.B.includes(String(b))) || (columns.A.includes(String(b)) && columns.B.includes(String(a)))
        const { covered } = coversGroups(test0, joint(`${a}.1`, `${b}.1`, 'asked'))
        // Of the doubtful rows only the identical pair is sure.
        if (REVIEW.includes(pair) && `${a}-${b}` !== pair) expect(covered, `${a}-${b}`).not.toBe('yes')
        else expect(covered, `${a}-${b}`).toBe(held ? 'yes' : 'no')
      }
    }
  })
})

test.each(of('hardness_limit').map(({ threshold }) => [threshold.group as string, threshold] as const))('hardness of group %s', (group, threshold) => {
  const [main, sub] = group.split('.').map(Number)
  const limit = (treated: boolean): number | null => hardnessLimit({ main: main!, sub: sub ?? null, text: group }, treated, 400)?.maybe ?? null
  expect([limit(false), limit(true)]).toEqual([threshold.HV10_max_not_heat_treated, threshold.HV10_max_heat_treated])
})

/** `0.7*t`, `max(0.5*t,3)`, `200` with the tested thickness. */
const figure = (text: string, t: number): number => {
  const product = (part: string): number => part.split('*').map((one) => (one === 't' ? t : Number(one))).reduce((a, b) => a * b, 1)
  const most = /^max\((.+),(.+)\)$/.exec(text)
  return Number((most ? Math.max(product(most[1]!), product(most[2]!)) : product(text)).toFixed(6))
}

describe('Table 7', () => {
  const inside = (row: Row): number[] => {
    const { t_gt: gt, t_le: le, t_from: from, t_to: to } = row.threshold as Record<string, number | null>
    const low = gt ?? from ?? 1
    const high = le ?? to ?? low + 50
    return [low + 0.1, (low + high) / 2, high - 0.1]
  }
  test.each(of('butt_thickness').map((row) => [`level ${row.level}`, JSON.stringify(row.threshold), row] as const))('%s %s', (_level, _text, row) => {
    for (const t of inside(row)) {
      const columns = row.level === '2' ? ([['single', row.threshold.single_run], ['multiple', row.threshold.multi_run]] as const) : ([['one', row.threshold.range]] as const)
      for (const [runs, ends] of columns) {
        const [low, high] = ends as [string | null, string | null]
        const { sure, maybe } = runs === 'one' ? buttLevelOne(t, false) : buttLevelTwo(t, runs)
        if (low === null || high === null) expect(sure.segments).toEqual([])
        else {
          expect(containsInterval(sure, { min: figure(low, t), max: figure(high, t) }), `${runs} ${t}`).toBe('within')
          expect(containsInterval(sure, { min: figure(low, t), max: figure(high, t) + 0.01 })).toBe('outside')
          expect(containsInterval(sure, { min: figure(low, t) - 0.01, max: figure(high, t) })).toBe('outside')
          expect(containsInterval(maybe, { min: figure(low, t), max: figure(high, t) })).toBe('within')
        }
      }
    }
  })
})

/** Where each item of the matrix is judged: a rule, a test or acceptance, or the list of what is not checked. */
const PLACE: Record<string, string> = {
  level_default: 'level', legacy_records: 'note', independence: 'runner', manufacturer: 'scope', nonstandard_geometry: 'scope', test_piece_thickness_equal: 'parent-thickness',
  extent_butt: 'qualify', extent_T_butt_and_branch: 'qualify', extent_fillet: 'qualify', UT_restriction: 'qualify', branch_volumetric_small: 'qualify', impact_trigger: 'qualify', hardness_trigger: 'qualify', hardness_method: 'scope', hardness_limit: 'qualify',
  tensile_acceptance: 'qualify', bend_specimens: 'qualify', bend_former: 'qualify', bend_acceptance: 'qualify', impact_method: 'qualify', impact_acceptance: 'qualify', imperfection_level: 'qualify', retest_ndt: 'qualify', retest_dt: 'qualify', retest_impact: 'qualify', retest_hardness: 'qualify',
  material_groups: 'material-group', material_footnote_a: 'material-group', material_footnote_b: 'material-group', material_footnote_c: 'material-group', permanent_backing: 'backing-material', ungrouped_material: 'material-group', nickel_groups: 'material-group',
  butt_thickness: 'parent-thickness', deposit_thickness: 'deposit-thickness', deposit_thickness_thick: 'deposit-thickness', impact_thickness_cap: 'parent-thickness', dissimilar_thickness: 'parent-thickness-second', fillet_material_thickness: 'parent-thickness', fillet_throat_single: 'fillet-throat', fillet_throat_multi: 'fillet-throat', fillet_throat_thick: 'fillet-throat', fillet_from_butt: 'fillet-throat', fillet_thickness: 'parent-thickness',
  pipe_diameter: 'diameter', plate_covers_pipe: 'diameter', branch_angle: 'branch-angle', process: 'process', multi_process: 'process-order', position: 'position', position_no_toughness_no_hardness: 'position', position_with_toughness_or_hardness: 'position', joint_type: 'joint-type', backing_sides: 'backing-and-sides', run_count: 'run-count',
  filler_designation: 'filler-designation', filler_make: 'filler-make', filler_group: 'filler-designation', filler_size: 'contents-filler-size', current: 'current-type', heat_input_upper: 'heat-input-maximum', heat_input_lower: 'heat-input-minimum', heat_input_two_levels: 'heat-input-maximum', heat_input_none: 'heat-input-minimum', energy_quantity: 'heat-input-maximum',
  preheat_lower: 'preheat', interpass_upper: 'interpass', hydrogen_release: 'post-heating', PWHT_presence: 'pwht', PWHT_temperature: 'pwht-temperature', PWHT: 'pwht', initial_heat_treatment: 'initial-heat-treatment',
  SAW_variant: 'process', SAW_flux: 'flux', gas_13: 'shielding-gas', gas_13_CO2: 'carbon-dioxide', gas_not_listed: 'shielding-gas', wire_system: 'wire-system', transfer_mode: 'transfer-mode', gas_14: 'shielding-gas', TIG_filler: 'process', plasma_gas: 'plasma-gas', waveform: 'waveform', record_range_sheet: 'qualify',
}

test('every item of the matrix has its place', () => {
  expect([...new Set(rows.map(({ item }) => item))].filter((item) => !(item in PLACE))).toEqual([])
  const ids = new Set(iso15614Part1.rules.map(({ meta }) => meta.id))
  expect(Object.values(PLACE).filter((place) => !['note', 'runner', 'scope', 'qualify'].includes(place) && !ids.has(`iso-15614-1/${place}`))).toEqual([])
})
