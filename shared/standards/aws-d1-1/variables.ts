/**
 * Rows of Table 6.5 (changes that need a new PQR) and Table 6.7 (more of them when CVN is specified), numbered as in 2015 and 2020.
 * For each: the processes with the basis of that entry, and the change in our own words. Percentages are of the PQR value.
 */
import type { Basis } from '../../schemas/assessment.ts'
import type { Process } from '../../schemas/welding.ts'

export interface VariableRow {
  table: 'Table 6.5' | 'Table 6.7'
  row: number
  title: string
  /** Rule that checks it: file name, or its name within a file. */
  file: string
  processes: Partial<Record<Process, Basis>>
  statement: string
}

const m = 'memory'
const s = 'secondary'
const every = (basis: Basis): Partial<Record<Process, Basis>> => ({ SMAW: basis, SAW: basis, GMAW: basis, FCAW: basis, GTAW: basis })
const row = (number: number, file: string, title: string, processes: Partial<Record<Process, Basis>>, statement: string, table: VariableRow['table'] = 'Table 6.5'): VariableRow => ({ table, row: number, title, file, processes, statement })
const cvn = (number: number, file: string, title: string, processes: Partial<Record<Process, Basis>>, statement: string): VariableRow => row(number, file, title, processes, statement, 'Table 6.7')

export const variables = {
  filler_strength: row(1, 'filler-strength', 'Filler strength class', { SMAW: m, GMAW: m, FCAW: m }, 'A filler metal of a higher strength class than tested; a lower class is free. The GMAW column is in doubt, so there a higher class is "cannot tell".'),
  low_hydrogen: row(2, 'low-hydrogen', 'Low-hydrogen electrode', { SMAW: m }, 'A low-hydrogen electrode replaced by one that is not.'),
  filler_classification: row(3, 'filler-classification', 'Electrode or flux-electrode class', { SAW: m, GTAW: m }, 'Another electrode or flux-electrode classification. To which processes the row belongs is not confirmed, so a change is "cannot tell".'),
  filler_specification: row(4, 'filler-specification', 'Filler specification', every(m), 'A filler metal outside the A5 specifications that the row names: A5.1 and A5.5 for SMAW, A5.17 and A5.23 for SAW, A5.18 and A5.28 for GMAW and GTAW, A5.20 and A5.29 for FCAW.'),
  filler_presence: row(5, 'filler-added', 'Filler added', { GTAW: m }, 'Filler metal added or left out.'),
  hot_wire: row(6, 'hot-wire', 'Hot or cold wire', { GTAW: m }, 'Cold wire feed changed to hot wire feed, or back.'),
  supplemental_filler: row(7, 'supplemental-filler', 'Supplemental filler', { SAW: m }, 'Supplemental powder, granules or cut wire added or left out.'),
  supplemental_amount: row(8, 'supplemental-amount', 'Amount of supplemental filler', { SAW: m }, 'More supplemental filler than tested.'),
  supplement_alloy: row(9, 'supplement-alloy', 'Alloy from the supplement', { SAW: m }, 'Where the alloy of the deposit depends on the supplement: a deposit outside the chemistry that the procedure states. It is kept in words, so other words are "cannot tell".'),
  filler_diameter: row(10, 'filler-diameter', 'Electrode diameter', { SMAW: s, SAW: m, GMAW: s, FCAW: s, GTAW: s }, 'SMAW: more than 0.8 mm (1/32 in.) larger. SAW, FCAW: any larger (SAW with alloy flux: any change). GMAW: any change. GTAW: more than 1.6 mm (1/16 in.) larger or smaller (the smaller side recalled). Sizes are compared by nominal size.'),
  electrode_count: row(11, 'electrode-count', 'Number of electrodes', { SAW: m, GMAW: m, FCAW: m }, 'Another number of electrodes.'),
  amperage: row(12, 'amperage', 'Amperage', { SMAW: m, SAW: m, GMAW: s, FCAW: s, GTAW: m }, 'SMAW: outside the range that the maker of the electrode recommends. SAW, GMAW, FCAW: more than 10 % off the PQR value for the diameter; GTAW: more than 25 %. Readings that are spread count by their middle; where several diameters were used, only what every reading allows is sure.'),
  current_polarity: row(13, 'current-type', 'Current type and polarity', every(m), 'Another type of current or polarity. For SMAW the row is not confirmed, so a change is "cannot tell".'),
  transfer_mode: row(14, 'transfer-mode', 'Mode of transfer', { GMAW: m }, 'Any other mode of metal transfer; spray and pulsed spray are different modes.'),
  power_source: row(15, 'power-source', 'Power source output', { GMAW: m, FCAW: m }, 'Constant voltage changed to constant current.'),
  voltage: row(16, 'voltage', 'Voltage', { SAW: m, GMAW: s, FCAW: s }, 'More than 7 % off the PQR value for the diameter. Readings that are spread count by their middle; where several diameters were used, only what every reading allows is sure.'),
  wire_feed_speed: row(17, 'wire-feed', 'Wire feed speed', { SAW: m, GMAW: m, FCAW: m }, 'More than 10 % off the PQR value where wire feed speed and not amperage is the control; where the procedure states both, a change is "cannot tell".'),
  travel_speed: row(18, 'travel-speed', 'Travel speed', { SAW: m, GMAW: m, FCAW: m, GTAW: m }, 'More than 15 % (SAW), 25 % (GMAW, FCAW) or 50 % (GTAW) off the PQR value. Between two fillet tests of different speed a fillet is "cannot tell", because all sizes may share the range of both.'),
  shielding_gas: row(19, 'shielding-gas', 'Shielding gas', { GMAW: s, FCAW: m, GTAW: m }, 'Another gas, mixture or nominal percentage, or no gas.'),
  gas_flow_up: row(20, 'gas-flow', 'Gas flow', { GMAW: m, FCAW: m, GTAW: m }, 'Total flow higher by 50 % or more, or lower by 20 % or more; the figure itself already counts. For 2010 the older figures (25 % and 10 %, GTAW 50 % and 25 %) may hold, so what lies between is "cannot tell".'),
  gas_flow_down: row(20, 'gas-flow', 'Gas flow', { GMAW: m, FCAW: m, GTAW: m }, 'Total flow higher by 50 % or more, or lower by 20 % or more; the figure itself already counts. For 2010 the older figures (25 % and 10 %, GTAW 50 % and 25 %) may hold, so what lies between is "cannot tell".'),
  gas_in_filler_spec: row(21, 'gas-in-filler-spec', 'Gas of the filler specification', { GMAW: m, FCAW: m }, 'A gas that the A5 specification of the filler does not cover. Those gases are not kept here, so a change of gas is "cannot tell" in this row.'),
  longitudinal_arc_spacing: row(22, 'longitudinal-spacing', 'Spacing of arcs along the joint', { SAW: m }, 'Changed by more than 10 % or 3 mm (1/8 in.), whichever is greater.'),
  lateral_arc_spacing: row(23, 'lateral-spacing', 'Spacing of arcs across the joint', { SAW: m }, 'Changed by more than 10 % or 3 mm (1/8 in.), whichever is greater.'),
  parallel_electrode_angle: row(24, 'parallel-angle', 'Angle of a parallel electrode', { SAW: m }, 'Changed by more than 10°.'),
  machine_electrode_angle: row(25, 'travel-angle', 'Electrode angle along travel', { SAW: m }, 'Mechanised or automatic: changed by more than 3°.'),
  machine_normal_angle: row(26, 'normal-angle', 'Electrode angle across travel', { SAW: m }, 'Mechanised or automatic: changed by more than 5°.'),
  position: row(27, 'position', 'Position', every(s), 'A position that the test does not qualify (Table 6.1 for plate, 10.8 for tubes). A procedure test covers fewer positions than a welder test: 1G flat, 2G flat and horizontal, 3G vertical, 4G overhead, 5G flat, vertical and overhead, 6G all. What covers a fixed pipe fillet (5F) is not confirmed.'),
  thickness_diameter: row(28, 'thickness', 'Thickness and diameter', every(m), 'Thickness outside the range that the test qualifies: plate from 3 mm (1/8 in.) to 2T, from 25 mm (1 in.) without upper limit (Table 6.2); pipe to 2T, from T/2 over 10 mm (3/8 in.) wall, from 10 mm (3/8 in.) without limit for 20 mm (3/4 in.) wall and over, standard test pipes by their own rows (10.9); partial penetration by its groove depth (6.3); fillets in every thickness (6.4).'),
  base_metal: row(29, 'base-metal', 'Base metal', every(m), 'A base metal or pair that the test does not cover: Group I to I covers itself, II to II also I; a steel of Group III or Table 6.9 joined to I or II covers that steel to the same and lower group; III, IV and Table 6.9 among themselves, and unlisted steels, only the steels tested (Table 6.8). What Group I to II or IV to a lower group covers besides itself is "cannot tell".'),
  vertical_progression: row(30, 'vertical-progression', 'Vertical progression', { SMAW: s, GMAW: s, FCAW: s, GTAW: s }, 'Vertical: any pass uphill instead of downhill, or back.'),
  groove_type: row(31, 'groove-type', 'Groove type', every(s), 'Another groove type; a complete-penetration test covers every groove detail that meets the prequalified dimensions. Where no detail kept here is met, another type is "cannot tell".'),
  square_groove: row(32, 'square-groove', 'Square groove', every(s), 'A square groove instead of another groove, or back.'),
  groove_angle: row(33, 'groove-angle', 'Groove angle', every(m), 'A groove angle more than 5° smaller than tested. The tolerance is that of fit-up in the joint figures; the clause itself could not be confirmed.'),
  root_opening: row(33, 'root-opening', 'Root opening', every(m), 'A root opening more than 2 mm (1/16 in.) smaller than tested, with a backgouged root 3 mm (1/8 in.). The tolerance is that of fit-up in the joint figures; the clause itself could not be confirmed.'),
  root_face: row(33, 'root-face', 'Root face', every(m), 'A root face more than 2 mm (1/16 in.) larger than tested; not limited where the root is backgouged. The tolerance is that of fit-up in the joint figures; the clause itself could not be confirmed.'),
  backing_backgouging: row(34, 'backing', 'Backing and backgouging', every(s), 'Backing or backgouging left out; adding it is free. One in place of the other is "cannot tell".'),
  preheat: row(35, 'preheat', 'Preheat', every(m), 'Preheat lower than tested by more than 15 °C (25 °F); GTAW 55 °C (100 °F). A relaxation for production, recalled with doubt, is not applied.'),
  interpass_min: row(36, 'interpass-minimum', 'Minimum interpass temperature', every(m), 'Interpass temperature lower than tested by more than 15 °C (25 °F); GTAW 55 °C (100 °F). The procedure\'s one minimum is compared with the lowest of the run sheet, else with the preheat of the test.'),
  pwht: row(37, 'pwht', 'Postweld heat treatment', every(m), 'Heat treatment after welding added or left out.'),
  cvn_base_group: cvn(1, 'cvn-base-group', 'Base metal group (CVN)', every(m), 'Another base metal group.'),
  cvn_min_thickness: cvn(2, 'cvn-thickness', 'Minimum thickness (CVN)', every(s), 'Thinner than the test T or 16 mm (5/8 in.), whichever is less; where T is under 6 mm (1/4 in.), thinner than 3 mm (1/8 in.).'),
  cvn_filler_class: cvn(3, 'cvn-filler-class', 'Filler class (CVN)', every(m), 'Another filler classification, or an unclassified filler.'),
  cvn_flux: cvn(4, 'cvn-flux', 'Flux (CVN)', { SAW: m }, 'Another flux-wire classification; another trade name where it is unclassified; crushed slag.'),
  cvn_brand: cvn(5, 'cvn-brand', 'Maker and brand (CVN)', { FCAW: m }, 'Another maker, brand or type of flux-cored electrode (FCAW) or metal-cored one (GMAW), compared by trade name.'),
  cvn_vertical_up: cvn(6, 'cvn-vertical-up', 'Vertical up (CVN)', { SMAW: s, GMAW: s, FCAW: s, GTAW: s }, 'Another position changed to vertical up. A vertical-up test covers the toughness of every position, not their soundness.'),
  cvn_max_interpass: cvn(7, 'cvn-interpass', 'Maximum interpass (CVN)', every(m), 'Maximum preheat or interpass temperature higher by more than 56 °C (100 °F).'),
  cvn_pwht: cvn(8, 'cvn-pwht', 'Heat treatment time and temperature (CVN)', every(m), 'Another heat treatment temperature or time; the test must have had at least 80 % of the total time in production.'),
  cvn_heat_input: cvn(9, 'cvn-heat-input', 'Heat input (CVN)', every(m), 'More heat input than tested, unless a grain-refining heat treatment follows. Voltage × amperage × 60 / travel speed, without arc efficiency; of the procedure the hottest corner counts. The volume of deposit per length is not judged.'),
  cvn_vertical_weave: cvn(10, 'cvn-weave', 'Vertical: stringer to weave (CVN)', { SMAW: s, GMAW: s, FCAW: s, GTAW: s }, 'Vertical welding with weave beads where the test had stringer beads.'),
  cvn_multi_to_single: cvn(11, 'cvn-passes', 'Passes per side (CVN)', every(m), 'Single pass per side where the test had several.'),
  cvn_oscillation: cvn(12, 'cvn-oscillation', 'Oscillation (CVN)', every(m), 'Machine oscillation changed by more than 20 %. It is kept in words, so other words are "cannot tell".'),
} as const satisfies Record<string, VariableRow>

export type Variable = keyof typeof variables
