/** The worked cases of the calculations, every one. */
import { describe, expect, it, test } from 'vitest'
import { heatInputInstantaneous, heatInputMeter } from '../../../../shared/calculations/heat-input.ts'
import { throatOf } from '../../../../shared/calculations/fillet-geometry.ts'
import { jointGeometry, massPerMetre } from '../../../../shared/calculations/joint-geometry.ts'
import { heatByBeadSize } from '../../../../shared/calculations/arc-energy.ts'
import { bendStrain } from '../../../../shared/calculations/bend.ts'
import { currentFromWireFeed, shopSettings, wireFeedFromCurrent } from '../../../../shared/calculations/burn-off.ts'
import { carbonEquivalents } from '../../../../shared/calculations/carbon-equivalent.ts'
import { ELEMENTS, type Chemistry } from '../../../../shared/calculations/chemistry.ts'
import { coolingTime, transitionThickness } from '../../../../shared/calculations/cooling-time.ts'
import { depositionRate, DENSITIES, wireLengthPerMass } from '../../../../shared/calculations/deposition.ts'
import { ferriteAt, ferriteNumber } from '../../../../shared/calculations/ferrite-number.ts'
import { flowInCfh, tigCup } from '../../../../shared/calculations/gas-flow.ts'
import { convertHardness } from '../../../../shared/calculations/hardness-conversion.ts'
import { hazHardnessDueren, hazHardnessYurioka } from '../../../../shared/calculations/haz-hardness.ts'
import { preheatByAnnexGroup, susceptibility } from '../../../../shared/calculations/preheat-d1-1.ts'
import { combinedThickness, hydrogenScale } from '../../../../shared/calculations/preheat-method-a.ts'
import { preheatMethodB } from '../../../../shared/calculations/preheat-method-b.ts'
import { detachmentParameter, pulseFigures, sampledPower } from '../../../../shared/calculations/pulse.ts'
import { pren, stainlessEquivalents } from '../../../../shared/calculations/stainless-equivalents.ts'
import { charpySubSize, tensileStrength } from '../../../../shared/calculations/test-figures.ts'
import { beadArea, capArea, consumption, passesToFill } from '../../../../shared/calculations/weld-metal.ts'
import { classifyGas } from '../../../../shared/library/gases.ts'
import { readProcess } from '../../../../shared/library/processes.ts'
import { jointSchema } from '../../../../shared/schemas/welding.ts'
import { fromSi, interval } from '../../../../shared/units/convert.ts'
import cases from '../../../fixtures/cases/calculations.json' with { type: 'json' }

/** What a case gives: numbers, but for a few lists and words that are read by `list` and `word`. */
type Figures = Record<string, number>
type Answers = Record<string, unknown>

const STEEL = 7850
const mm = (value: number) => interval(value, undefined, 'length')
const degrees = (value: number) => interval(value, undefined, 'angle')
const groove = (type: string, given: Figures) =>
  jointGeometry({
    joint: jointSchema.parse({ groove: type, includedAngle: given.included_angle_deg === undefined ? null : degrees(given.included_angle_deg), bevelAngle: given.bevel_angle_deg === undefined ? null : degrees(given.bevel_angle_deg), rootOpening: mm(given.root_gap_mm ?? 0), rootFace: mm(given.root_face_mm ?? 0), rootRadius: given.root_radius_mm === undefined ? null : mm(given.root_radius_mm) }),
    thickness: mm(given.plate_thickness_mm ?? 0),
    density: STEEL,
    system: 'SI',
  })
const fillet = (leg: number) => jointGeometry({ joint: jointSchema.parse({ weld: 'fillet', type: 'tee', filletLeg: mm(leg) }), thickness: mm(20), density: STEEL, system: 'SI' })
const metered = (given: Figures): number => heatInputMeter({ voltage: given.voltage_v ?? NaN, current: given.current_a ?? NaN, travelSpeed: given.travel_speed_mm_min ?? NaN })
const perInch = (kjMm: number): number => fromSi(kjMm, 'heatInput', 'kJ/in')
const isoHeat = (given: Figures & { process_iso4063?: string }): Answers => {
  const k = readProcess(String(given.process_iso4063))?.row.thermal_efficiency_k ?? NaN
  return { arc_energy_kj_mm: metered(given), thermal_efficiency_k: k, heat_input_kj_mm: k * metered(given) }
}

const list = (given: Figures, key: string): number[] => (given as unknown as Record<string, number[]>)[key] ?? []
const word = (given: Figures, key: string): string => String((given as unknown as Record<string, string>)[key])
const chemistry = (given: Figures): Chemistry => Object.fromEntries(ELEMENTS.flatMap((element) => (given[`${element}_wt_pct`] === undefined ? [] : [[element, given[`${element}_wt_pct`]]])))
const pulse = (given: Figures, more = 0) => pulseFigures({ peakCurrent: given.peak_current_a ?? 400, backgroundCurrent: given.background_current_a ?? 50, frequency: (given.pulse_frequency_hz ?? NaN) + more, onTime: given.pulse_on_time_ms ?? 2, wireFeed: given.wire_feed_m_min ?? null, wireDiameter: given.wire_diameter_mm ?? null, peakVoltage: given.peak_voltage_v ?? null, backgroundVoltage: given.background_voltage_v ?? null }).figures
const wire = (given: Figures) => ({ material: 'carbon-steel' as const, diameter: given.wire_diameter_mm ?? NaN, extension: given.electrode_extension_mm ?? NaN, constants: { alpha: given.alpha_mm_per_a_s ?? NaN, beta: given.beta_per_a2_s ?? NaN } })
const cooling = (given: Figures): Answers => {
  const figures = coolingTime({ heatInput: given.heat_input_kj_mm ?? NaN, preheat: given.preheat_c ?? NaN, thickness: given.plate_thickness_mm ?? NaN, f2: given.f2 ?? NaN, f3: given.f3 ?? NaN }).figures
  return { t85_2d_s: figures?.twoDimensional, t85_3d_s: figures?.threeDimensional, t85_s: figures?.t85, regime: figures?.regime }
}
const methodB = (given: Figures) => preheatMethodB({ cet: given.cet ?? NaN, thickness: given.plate_thickness_mm ?? NaN, hydrogen: given.diffusible_hydrogen_ml_100g ?? NaN, heatInput: given.heat_input_kj_mm ?? NaN })
const equivalents = (given: Figures): Answers => {
  const figures = carbonEquivalents(chemistry(given)).figures
  return { ce_iiw: figures?.ceIiw, cet: figures?.cet, pcm: figures?.pcm, cen: figures?.cen, accommodation_factor: figures?.accommodationFactor }
}
const haz = (of: typeof hazHardnessDueren) => (given: Figures): Answers => {
  const figures = of({ chemistry: chemistry(given), t85: given.t85_s ?? NaN }).figures
  return { hv_martensite: figures?.martensite, hv_bainite: figures?.bainite, hv: figures?.hardness, advisory: figures?.advisory }
}

const covered: Record<string, (given: Figures) => Answers> = {
  'calc-g-hi-01': (given) => ({ heat_input_j_mm: metered(given) * 1000, heat_input_kj_mm: metered(given), heat_input_kj_in: perInch(metered(given)) }),
  'calc-g-hi-02': isoHeat,
  'calc-g-hi-03': (given) => {
    const value = heatInputInstantaneous({ power: given.instantaneous_power_w ?? NaN, arcTime: given.arc_time_s ?? NaN, length: given.weld_length_mm ?? NaN })
    return { heat_input_j_mm: value * 1000, heat_input_kj_in: perInch(value) }
  },
  'calc-g-hi-04': (given) => {
    const value = heatInputInstantaneous({ energy: given.instantaneous_energy_j ?? NaN, length: given.weld_length_mm ?? NaN })
    return { heat_input_j_mm: value * 1000, heat_input_kj_in: perInch(value) }
  },
  'calc-g-hi-05': ({ energy_kj_mm: value = NaN }) => ({ energy_kj_in: perInch(value), energy_kj_cm: fromSi(value, 'heatInput', 'kJ/cm'), energy_j_cm: fromSi(value, 'heatInput', 'kJ/cm') * 1000, energy_j_mm: fromSi(value, 'heatInput', 'J/mm') }),
  'calc-g-hi-06': isoHeat,
  'calc-g-jt-01': (given) => {
    const { areaMm2 } = groove('single-v', given)
    return { area_mm2: areaMm2, volume_cm3_m: areaMm2, published_volume_cm3_m: areaMm2 }
  },
  'calc-g-jt-02': (given) => {
    const { areaMm2, weldMetalKgPerM } = groove('single-bevel', given)
    return { area_mm2: areaMm2, mass_kg_m: weldMetalKgPerM }
  },
  'calc-g-jt-03': (given) => ({ area_mm2: groove('single-u', given).areaMm2 }),
  'calc-g-jt-04': ({ leg_mm: leg = NaN }) => ({ throat_mm: throatOf(leg), area_mm2: fillet(leg).areaMm2, mass_kg_m: fillet(leg).weldMetalKgPerM }),
  'calc-g-jt-05': ({ leg_mm: leg = NaN }) => {
    const mass = fillet(leg).weldMetalKgPerM ?? NaN
    return { mass_kg_m: mass, mass_lb_ft: fromSi(mass, 'mass', 'lb') * 0.3048 }
  },
  'calc-g-jt-06': (given) => {
    const result = consumption({ weldMetalKgPerM: given.weld_metal_kg_m ?? NaN, lengthM: given.weld_length_m ?? NaN, efficiency: given.deposition_efficiency ?? NaN, depositionRate: given.deposition_rate_kg_h ?? NaN, operatorFactor: given.operator_factor ?? NaN, gasFlow: given.gas_flow_l_min ?? NaN })
    return { filler_kg: result.fillerKg, arc_time_h: result.arcTimeH, total_time_h: result.totalTimeH, gas_l: result.gasL }
  },
  'calc-g-jt-07': (given) => ({ mass_kg_m: massPerMetre(capArea(given.reinforcement_width_mm ?? NaN, given.reinforcement_height_mm ?? NaN), STEEL) }),
  'calc-g-jt-08': (given) => {
    const bead = beadArea({ wireDiameter: given.wire_diameter_mm ?? NaN, wireFeed: given.wire_feed_m_min ?? NaN, efficiency: given.deposition_efficiency ?? NaN, travelSpeed: given.travel_speed_mm_min ?? NaN })
    return { bead_area_mm2: bead, passes: passesToFill(given.groove_area_mm2 ?? NaN, bead) }
  },
  'calc-g-gs-01': ({ co2_pct: co2 = NaN }) => {
    const { symbol, designation } = classifyGas([{ gas: 'Ar', percent: 100 - co2 }, { gas: 'CO2', percent: co2 }])
    return { group: symbol, designation }
  },
  'calc-g-hi-07': (given) => {
    const figures = heatByBeadSize({ qualifiedWidth: given.pqr_bead_width_mm ?? NaN, qualifiedThickness: given.pqr_bead_thickness_mm ?? NaN, width: given.production_bead_width_mm ?? NaN, thickness: given.production_bead_thickness_mm ?? NaN }).figures
    return { pqr_bead_area_mm2: figures?.qualified, production_bead_area_mm2: figures?.production, increase: figures?.increase }
  },
  'calc-g-pu-01': (given) => ({ duty: pulse(given)?.duty, mean_current_a: pulse(given)?.meanCurrent, rms_current_a: pulse(given)?.rmsCurrent, mean_voltage_v: pulse(given)?.meanVoltage }),
  'calc-g-pu-02': (given) => ({ average_instantaneous_power_w: pulse(given)?.power, mean_v_times_mean_a_w: pulse(given)?.meterPower, covariance_w: pulse(given)?.missedPower, ratio_true_to_product: pulse(given)?.powerRatio }),
  'calc-g-pu-03': (given) => {
    const figures = sampledPower({ voltages: list(given, 'voltage_samples_v'), currents: list(given, 'current_samples_a') }).figures
    return { average_instantaneous_power_w: figures?.power, mean_voltage_v: figures?.meanVoltage, mean_current_a: figures?.meanCurrent, mean_v_times_mean_a_w: figures?.meterPower }
  },
  'calc-g-pu-04': (given) => ({ droplet_volume_mm3: pulse(given)?.dropletVolume, droplet_diameter_mm: pulse(given)?.dropletDiameter }),
  'calc-g-pu-05': (given) => ({ detachment_parameter_a2s: detachmentParameter({ peakCurrent: given.peak_current_a ?? NaN, onTime: given.pulse_on_time_ms ?? NaN, exponent: given.exponent_n ?? NaN }).value }),
  'calc-g-pu-06': (given) => {
    const [before = NaN, after = NaN] = [pulse(given)?.meanCurrent, pulse(given, given.frequency_change_hz)?.meanCurrent]
    return { mean_current_change_a: after - before, new_mean_current_a: after }
  },
  'calc-g-wf-01': (given) => {
    const value = wireFeedFromCurrent({ ...wire(given), current: given.current_a ?? NaN }).value ?? NaN
    return { wire_feed_mm_s: value / 0.06, wire_feed_m_min: value }
  },
  'calc-g-wf-02': (given) => ({ current_a: currentFromWireFeed({ ...wire(given), wireFeed: given.wire_feed_m_min ?? NaN }).value }),
  'calc-g-wf-03': (given) => {
    const figures = shopSettings({ thickness: given.base_metal_thickness_mm ?? NaN, wire: 0.9 }).figures
    return { current_a: figures?.current, wire_feed_in_min: figures?.wireFeedInPerMin, wire_feed_m_min: figures?.wireFeed }
  },
  'calc-g-wf-04': (given) => ({ deposition_rate_kg_h: depositionRate({ wireDiameter: given.wire_diameter_mm ?? NaN, wireFeed: given.wire_feed_m_min ?? NaN, density: given.density_g_cm3 ?? NaN, efficiency: given.deposition_efficiency ?? NaN }).value }),
  'calc-g-wf-05': (given) => {
    const figures = wireLengthPerMass({ wireDiameter: given.wire_diameter_mm ?? NaN, density: DENSITIES['carbon-steel'] }).figures
    return { wire_length_in_per_lb: figures?.inchesPerLb, wire_length_m_per_kg: figures?.metresPerKg }
  },
  'calc-g-ce-01': equivalents,
  'calc-g-ce-02': equivalents,
  'calc-g-ss-01': (given) => {
    const figures = ferriteNumber(chemistry(given)).figures
    return { cr_eq: figures?.crEq, ni_eq: figures?.niEq, fn: figures?.ferriteNumber }
  },
  'calc-g-ss-02': (given) => ({ fn: ferriteAt({ crEq: given.cr_eq ?? NaN, niEq: given.ni_eq ?? NaN }).value }),
  'calc-g-ss-03': (given) => ({ fn: ferriteAt({ crEq: given.cr_eq ?? NaN, niEq: given.ni_eq ?? NaN }).value }),
  'calc-g-ss-04': (given) => ({ pren: pren(chemistry(given)).value }),
  'calc-g-ss-05': (given) => ({ cr_eq: stainlessEquivalents('schaeffler', chemistry(given)).figures?.crEq, ni_eq_schaeffler: stainlessEquivalents('schaeffler', chemistry(given)).figures?.niEq, ni_eq_delong: stainlessEquivalents('delong', chemistry(given)).figures?.niEq }),
  'calc-g-ph-01': (given) => ({ preheat_c: methodB(given).value, in_range: methodB(given).validity.inside }),
  'calc-g-ph-02': (given) => ({ preheat_formula_c: methodB(given).figures?.formula, preheat_required: methodB(given).figures?.required }),
  'calc-g-ph-03': (given) => ({ scale: list(given, 'diffusible_hydrogen_ml_100g').map(hydrogenScale) }),
  'calc-g-ph-04': (given) => ({ combined_thickness_mm: combinedThickness({ joint: word(given, 'joint') === 'T fillet' ? 'tee' : 'butt', thickness: given.base_plate_mm ?? NaN, thicknessB: given.stem_plate_mm ?? NaN }).value }),
  'calc-g-ph-05': (given) => {
    const figures = susceptibility({ pcm: given.pcm ?? NaN, hydrogen: given.hydrogen_ml_100g ?? NaN }).figures
    return { susceptibility_index: figures?.index, group: figures?.group }
  },
  'calc-g-ph-06': (given) => {
    const figures = preheatByAnnexGroup({ restraint: word(given, 'restraint') as 'medium', thickness: given.thickness_mm ?? NaN, group: word(given, 'group') as 'D' }).figures
    return { preheat_f: figures?.fahrenheit, preheat_c: figures?.preheat }
  },
  'calc-g-t8-01': cooling,
  'calc-g-t8-02': cooling,
  'calc-g-t8-03': (given) => ({ transition_thickness_mm: transitionThickness({ heatInput: given.heat_input_kj_mm ?? NaN, preheat: given.preheat_c ?? NaN, f2: given.f2 ?? NaN, f3: given.f3 ?? NaN }).value }),
  'calc-g-hz-01': haz(hazHardnessYurioka),
  'calc-g-hz-02': haz(hazHardnessDueren),
  'calc-g-hd-01': ({ hv = NaN }) => ({ ...convertHardness({ scale: 'hv', figure: hv }).figures, rm_mpa: convertHardness({ scale: 'hv', figure: hv }).figures?.rm }),
  'calc-g-hd-02': (given) => {
    const figures = charpySubSize({ requirement: given.full_size_requirement_j ?? NaN, width: given.specimen_width_mm ?? NaN }).figures
    return { required_ftlbf: figures?.requiredFtLbf, required_j: figures?.required }
  },
  'calc-g-hd-03': (given) => {
    const figures = tensileStrength({ shape: 'flat', load: (given.max_load_n ?? NaN) / 1000, width: given.width_mm ?? NaN, thickness: given.thickness_mm ?? NaN }).figures
    return { area_mm2: figures?.area, uts_mpa: figures?.strength }
  },
  'calc-g-hd-04': (given) => ({ elongation_percent: bendStrain({ former: given.mandrel_diameter_mm ?? NaN, thickness: given.specimen_thickness_mm ?? NaN }).value }),
  'calc-g-gs-02': (given) => ({ cup_inside_diameter_mm: tigCup({ cup: given.cup_number ?? NaN }).value, flow_cfh: flowInCfh({ flow: given.flow_l_min ?? NaN }).value }),
}

interface Expected { tolerance?: Record<string, { abs?: number; rel?: number }>; [name: string]: unknown }

describe('worked cases', () => {
  test.each(cases.filter(({ id }) => id in covered).map((each) => [each.id, each.title, each] as const))('%s %s', (id, _title, { given, expect: stated }) => {
    const { tolerance, ...expected } = stated as unknown as Expected
    const answers = covered[id]?.(given as unknown as Figures) ?? {}
    for (const [name, value] of Object.entries(expected)) {
      if (typeof value !== 'number') expect(answers[name], name).toEqual(value)
      else {
        const { abs = name.startsWith('published') ? 0.5 : 1e-3, rel } = tolerance?.[name] ?? {}
        expect(Math.abs(Number(answers[name]) - value), `${name}: ${String(answers[name])} against ${value}`).toBeLessThanOrEqual(rel === undefined ? abs : Math.abs(value) * rel)
      }
    }
  })
  it('covers every case', () => {
    expect(Object.keys(covered).sort()).toEqual(cases.map(({ id }) => id).sort())
  })
})

