/**
 * Every variable of tables QW-253 (SMAW), QW-254 (SAW), QW-255 (GMAW and FCAW), QW-256 (GTAW) and QW-257 (PAW), by paragraph:
 * class letter for each process with its basis, and the change that the variable is about, in our own words with its basis.
 * `until` is the last edition in which it stands in the tables. Base line: the 2021 edition.
 */
import type { Basis } from '../../schemas/assessment.ts'
import type { Process } from '../../schemas/welding.ts'
import type { RuleClass } from '../rule.ts'

export interface VariableRow {
  title: string
  group: 'joints' | 'base metals' | 'filler metals' | 'positions' | 'preheat' | 'PWHT' | 'gas' | 'electrical' | 'technique'
  classes: Partial<Record<Process, RuleClass>>
  classBasis: Partial<Record<Process, Basis>>
  basis: Basis
  until?: '2017' | '2019'
  statement: string
}

export const variables = {
  'QW-402.1': {
    title: 'Groove type', group: 'joints', basis: 'read',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another type of groove (V, U, single-bevel, double-bevel and so on).',
  },
  'QW-402.4': {
    title: 'Backing removed', group: 'joints', basis: 'read',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Backing taken away from a single-welded groove weld (a groove welded from both sides counts as welded with backing).',
  },
  'QW-402.5': {
    title: 'Backing added or its composition', group: 'joints', basis: 'read',
    classes: { GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { GTAW: 'secondary', PAW: 'memory' },
    statement: 'Backing added, or its nominal composition changed.',
  },
  'QW-402.10': {
    title: 'Root spacing', group: 'joints', basis: 'read',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another specified root spacing.',
  },
  'QW-402.11': {
    title: 'Retainers', group: 'joints', basis: 'read',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Non-metallic or non-fusing metal retainers added or taken away.',
  },
  'QW-403.5': {
    title: 'Group Number', group: 'base metals', basis: 'read',
    classes: { SMAW: 'supplementary', SAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'A P-No./Group No. combination (nonferrous: P-No./UNS No.) not covered by a coupon; two records equal in every essential and supplementary variable and differing only in Group No. within one P-No. also cover the combination; one coupon of two Groups covers each to itself and to the other. Not applied when HAZ toughness testing is not required.',
  },
  'QW-403.6': {
    title: 'Minimum T with toughness', group: 'base metals', basis: 'secondary',
    classes: { SMAW: 'supplementary', SAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Base metal thinner than the lesser of coupon T and 16 mm (5/8 in.); when T is below 6 mm (1/4 in.) the floor is T/2. Not applied after a PWHT above the upper transformation temperature, nor when austenitic or P-No. 10H metal is solution annealed after welding.',
  },
  'QW-403.8': {
    title: 'T qualified', group: 'base metals', basis: 'secondary',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Base metal thickness outside the QW-451 range, save where QW-202.2, .3 or .4 lifts a limit.',
  },
  'QW-403.9': {
    title: 'Pass thicker than 13 mm (1/2 in.)', group: 'base metals', basis: 'secondary',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'When any pass of the coupon was thicker than 13 mm (1/2 in.): base metal thicker than 1.1 T. A WPS that wants the normal range has to limit its passes to 13 mm.',
  },
  'QW-403.10': {
    title: 'T limit, short-circuiting', group: 'base metals', basis: 'secondary', until: '2019',
    classes: { GMAW: 'essential', FCAW: 'essential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Short-circuiting transfer, coupon under 13 mm (1/2 in.): base metal over 1.1 T.',
  },
  'QW-403.11': {
    title: 'P-Number', group: 'base metals', basis: 'secondary',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary' },
    statement: 'Base metals (or a combination) not covered by the coupon under QW-424.',
  },
  'QW-403.12': {
    title: 'P-Number (PAW)', group: 'base metals', basis: 'memory',
    classes: { PAW: 'essential' }, classBasis: { PAW: 'memory' },
    statement: 'Another P-Number or P-Number combination; with melt-in technique a coupon of P-No. 1, 3, 4 or 5A also covers that P-Number to each lower one.',
  },
  'QW-404.3': {
    title: 'Filler size', group: 'filler metals', basis: 'memory',
    classes: { GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another filler metal size.',
  },
  'QW-404.4': {
    title: 'F-Number', group: 'filler metals', basis: 'secondary',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another F-Number of QW-432, or a filler metal not listed there.',
  },
  'QW-404.5': {
    title: 'A-Number', group: 'filler metals', basis: 'secondary',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Ferrous only: deposit of another A-Number of QW-442 (A-1 and A-2 cover each other); a deposit with no A-Number is held to its own nominal composition.',
  },
  'QW-404.6': {
    title: 'Electrode diameter', group: 'filler metals', basis: 'memory',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Another nominal electrode or wire size.',
  },
  'QW-404.7': {
    title: 'Diameter over 6 mm', group: 'filler metals', basis: 'memory',
    classes: { SMAW: 'supplementary' }, classBasis: { SMAW: 'secondary' },
    statement: 'Electrode diameter raised above 6 mm (1/4 in.). Same PWHT/solution-anneal exemption as QW-403.6.',
  },
  'QW-404.9': {
    title: 'Flux-wire class (SAW)', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'essential' }, classBasis: { SAW: 'secondary' },
    statement: 'Another minimum-tensile indicator of the flux-wire class; trade name of flux or wire when neither is classified; flux trade name when only the wire is classified; flux trade name for A-No. 8 deposits.',
  },
  'QW-404.10': {
    title: 'Alloy flux (SAW)', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'essential' }, classBasis: { SAW: 'secondary' },
    statement: 'Where alloy comes mainly from the flux: any change that takes the main alloy elements outside the range stated in the WPS.',
  },
  'QW-404.12': {
    title: 'Classification (toughness)', group: 'filler metals', basis: 'memory',
    classes: { SMAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' }, classBasis: { SMAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another SFA classification, or another trade name for an unclassified or G-suffix filler. No requalification for: moisture-resistance designator; hydrogen level; one low-hydrogen covering for another (15/16/18, or 15/16/17 stainless) at equal minimum tensile and nominal composition; usability position digit of flux-cored wire; a suffix showing equal or better impact performance; another class of the same SFA specification when the weld metal is exempt from toughness testing.',
  },
  'QW-404.14': {
    title: 'Filler added or removed', group: 'filler metals', basis: 'secondary',
    classes: { GTAW: 'essential', PAW: 'essential' }, classBasis: { GTAW: 'secondary', PAW: 'memory' },
    statement: 'Filler metal added or taken away.',
  },
  'QW-404.22': {
    title: 'Consumable insert', group: 'filler metals', basis: 'memory',
    classes: { GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { GTAW: 'secondary', PAW: 'memory' },
    statement: 'Consumable insert added or left out.',
  },
  'QW-404.23': {
    title: 'Product form', group: 'filler metals', basis: 'secondary',
    classes: { GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Change between the forms: bare (solid or metal cored) / flux cored / flux coated / powder.',
  },
  'QW-404.24': {
    title: 'Supplemental filler', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'essential', GMAW: 'essential', FCAW: 'essential' }, classBasis: { SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Supplemental filler added, removed, or its volume changed by more than 10 %.',
  },
  'QW-404.27': {
    title: 'Alloy from supplemental filler', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'essential', GMAW: 'essential', FCAW: 'essential', PAW: 'essential' }, classBasis: { SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', PAW: 'memory' },
    statement: 'Where alloy comes mainly from supplemental filler: any change that takes the main alloy elements outside the range stated in the WPS.',
  },
  'QW-404.29': {
    title: 'Flux name and designation', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'nonessential' }, classBasis: { SAW: 'secondary' },
    statement: 'Another flux trade name and designation.',
  },
  'QW-404.30': {
    title: 'Deposit thickness t', group: 'filler metals', basis: 'secondary',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Deposited weld metal thicker than the t limit of QW-451 for that process or filler.',
  },
  'QW-404.32': {
    title: 't limit, short-circuiting', group: 'filler metals', basis: 'secondary', until: '2019',
    classes: { GMAW: 'essential', FCAW: 'essential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Short-circuiting transfer, deposit under 13 mm (1/2 in.): deposit over 1.1 t.',
  },
  'QW-404.33': {
    title: 'Classification', group: 'filler metals', basis: 'memory',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another SFA classification (or trade name if unclassified). If the WPS states optional designators, only filler carrying them may be used.',
  },
  'QW-404.34': {
    title: 'Flux type (SAW)', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'essential' }, classBasis: { SAW: 'secondary' },
    statement: 'Neutral to active flux or the reverse, for multilayer deposits in P-No. 1.',
  },
  'QW-404.35': {
    title: 'Flux-wire class (toughness)', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'dual' }, classBasis: { SAW: 'secondary' },
    statement: 'Another flux-wire classification, or trade name if unclassified; a change of hydrogen level alone does not count; not applied when the weld metal is exempt from toughness testing.',
  },
  'QW-404.36': {
    title: 'Recrushed slag (SAW)', group: 'filler metals', basis: 'memory',
    classes: { SAW: 'essential' }, classBasis: { SAW: 'secondary' },
    statement: 'Recrushed-slag flux used without batch testing to Section II Part C or qualification as an unclassified flux under QW-404.9.',
  },
  'QW-404.50': {
    title: 'Penetration flux (GTAW)', group: 'filler metals', basis: 'memory',
    classes: { GTAW: 'nonessential' }, classBasis: { GTAW: 'secondary' },
    statement: 'Flux added to or removed from the joint face to influence penetration.',
  },
  'QW-405.1': {
    title: 'Position added', group: 'positions', basis: 'secondary',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'A position beyond those already qualified.',
  },
  'QW-405.2': {
    title: 'Vertical uphill', group: 'positions', basis: 'secondary', until: '2017',
    classes: { SMAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' }, classBasis: { SMAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'secondary' },
    statement: 'Any position to vertical uphill; in uphill, stringer to weave. Vertical uphill covers all positions.',
  },
  'QW-405.3': {
    title: 'Vertical progression', group: 'positions', basis: 'secondary',
    classes: { SMAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Up to down or down to up for any pass of a vertical weld; cover or wash pass either way; root either way if removed to sound metal from the second side.',
  },
  'QW-406.1': {
    title: 'Preheat decrease', group: 'preheat', basis: 'secondary',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Preheat lowered by more than 55 °C (100 °F) below the qualified value (older editions print 56 °C). The WPS states the minimum.',
  },
  'QW-406.2': {
    title: 'Preheat maintenance', group: 'preheat', basis: 'memory',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Another rule for keeping or lowering preheat after welding and before any PWHT.',
  },
  'QW-406.3': {
    title: 'Interpass increase', group: 'preheat', basis: 'secondary',
    classes: { SMAW: 'supplementary', SAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Maximum interpass temperature raised by more than 55 °C (100 °F) above the PQR value. Same PWHT/solution-anneal exemption as QW-403.6.',
  },
  'QW-407.1': {
    title: 'PWHT condition', group: 'PWHT', basis: 'read',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another PWHT condition. P-No. 1-6 and 9-15: none / below lower transformation / above upper / above upper then below lower / between. Other metals: none / within a specified range.',
  },
  'QW-407.2': {
    title: 'PWHT temperature and time', group: 'PWHT', basis: 'secondary',
    classes: { SMAW: 'supplementary', SAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another temperature and time range; the coupon must have had at least 80 % of the production aggregate time at temperature (may be one cycle).',
  },
  'QW-408.1': {
    title: 'Trailing gas', group: 'gas', basis: 'memory',
    classes: { GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Trailing shielding gas added, removed or of another composition.',
  },
  'QW-408.2': {
    title: 'Shielding gas', group: 'gas', basis: 'memory',
    classes: { GMAW: 'essential', FCAW: 'essential', GTAW: 'essential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary' },
    statement: 'One single gas to another; single to mixture or the reverse; another specified percentage composition; shielding gas added or left out.',
  },
  'QW-408.3': {
    title: 'Flow rate', group: 'gas', basis: 'memory',
    classes: { GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary' },
    statement: 'Another specified shielding gas flow range.',
  },
  'QW-408.4': {
    title: 'Orifice or shielding gas composition (PAW)', group: 'gas', basis: 'memory',
    classes: { PAW: 'essential' }, classBasis: { PAW: 'memory' },
    statement: 'Another composition of orifice or shielding gas.',
  },
  'QW-408.5': {
    title: 'Backing gas', group: 'gas', basis: 'memory',
    classes: { GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Backing gas added or removed, or its composition or flow range changed.',
  },
  'QW-408.9': {
    title: 'Backing gas, special metals', group: 'gas', basis: 'memory',
    classes: { GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Groove welds of P-No. 41-49 and all welds of P-No. 10I, 10J, 10K, 51-53, 61, 62: backing gas deleted, or inert backing gas changed to one with non-inert gas.',
  },
  'QW-408.10': {
    title: 'Trailing gas, special metals', group: 'gas', basis: 'memory',
    classes: { GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'P-No. 10I, 10J, 10K, 51-53, 61, 62: trailing gas deleted, changed from inert to one with non-inert gas, or its flow cut by 10 % or more.',
  },
  'QW-408.21': {
    title: 'Orifice or shielding gas flow (PAW)', group: 'gas', basis: 'memory',
    classes: { PAW: 'nonessential' }, classBasis: { PAW: 'memory' },
    statement: 'Another flow rate of orifice or shielding gas.',
  },
  'QW-409.1': {
    title: 'Heat input', group: 'electrical', basis: 'secondary',
    classes: { SMAW: 'supplementary', SAW: 'supplementary', GMAW: 'supplementary', FCAW: 'supplementary', GTAW: 'supplementary', PAW: 'supplementary' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Heat input, or weld metal volume per unit length, above the PQR value for that process (methods a, b, c). Same PWHT/solution-anneal exemption as QW-403.6.',
  },
  'QW-409.2': {
    title: 'Transfer mode', group: 'electrical', basis: 'memory',
    classes: { GMAW: 'essential', FCAW: 'essential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Spray, globular or pulsed spray to short-circuiting, or the reverse.',
  },
  'QW-409.3': {
    title: 'Pulsing', group: 'electrical', basis: 'secondary',
    classes: { GTAW: 'nonessential' }, classBasis: { GTAW: 'secondary' },
    statement: 'Pulsed current added to or removed from a DC source.',
  },
  'QW-409.4': {
    title: 'Current type or polarity', group: 'electrical', basis: 'secondary',
    classes: { SMAW: 'dual', SAW: 'dual', GMAW: 'dual', FCAW: 'dual', GTAW: 'dual', PAW: 'dual' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'AC to DC or the reverse; in DC, electrode negative to positive or the reverse.',
  },
  'QW-409.8': {
    title: 'Current and voltage range', group: 'electrical', basis: 'memory',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another amperage range, or (not for SMAW, GTAW or waveform control) another voltage range; wire feed speed may stand for amperage.',
  },
  'QW-409.12': {
    title: 'Tungsten electrode', group: 'electrical', basis: 'secondary',
    classes: { GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another type or size of tungsten electrode.',
  },
  'QW-410.1': {
    title: 'Stringer or weave', group: 'technique', basis: 'secondary',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Manual or semiautomatic: stringer to weave or the reverse.',
  },
  'QW-410.3': {
    title: 'Orifice, cup or nozzle size', group: 'technique', basis: 'secondary',
    classes: { GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another orifice, cup or nozzle size.',
  },
  'QW-410.5': {
    title: 'Cleaning method', group: 'technique', basis: 'secondary',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another initial or interpass cleaning method.',
  },
  'QW-410.6': {
    title: 'Back gouging method', group: 'technique', basis: 'secondary',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Another back gouging method.',
  },
  'QW-410.7': {
    title: 'Oscillation', group: 'technique', basis: 'secondary',
    classes: { SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Machine or automatic: another oscillation width, frequency or dwell.',
  },
  'QW-410.8': {
    title: 'Contact tube distance', group: 'technique', basis: 'secondary',
    classes: { SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential' }, classBasis: { SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary' },
    statement: 'Another contact tube to work distance.',
  },
  'QW-410.9': {
    title: 'Multi to single pass per side', group: 'technique', basis: 'secondary',
    classes: { SMAW: 'dual', SAW: 'dual', GMAW: 'dual', FCAW: 'dual', GTAW: 'dual', PAW: 'dual' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Several passes per side to one pass per side. As a supplementary variable: same exemption as QW-403.6.',
  },
  'QW-410.10': {
    title: 'Single to multiple electrodes', group: 'technique', basis: 'secondary',
    classes: { SAW: 'dual', GMAW: 'dual', FCAW: 'dual', GTAW: 'dual', PAW: 'dual' }, classBasis: { SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Machine or automatic only: single electrode to multiple or the reverse. As a supplementary variable: same exemption as QW-403.6.',
  },
  'QW-410.11': {
    title: 'Closed chamber', group: 'technique', basis: 'secondary',
    classes: { GTAW: 'essential', PAW: 'essential' }, classBasis: { GTAW: 'secondary', PAW: 'memory' },
    statement: 'P-No. 51-53: closed chamber to out-of-chamber torch welding (not the reverse).',
  },
  'QW-410.12': {
    title: 'Melt-in or keyhole (PAW)', group: 'technique', basis: 'memory',
    classes: { PAW: 'essential' }, classBasis: { PAW: 'memory' },
    statement: 'Melt-in technique to keyhole or the reverse; a record that used both counts for both only in that combination.',
  },
  'QW-410.15': {
    title: 'Electrode spacing', group: 'technique', basis: 'secondary',
    classes: { SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Machine or automatic: another spacing of multiple electrodes.',
  },
  'QW-410.25': {
    title: 'Manual or automatic', group: 'technique', basis: 'secondary',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary' },
    statement: 'Manual or semiautomatic to machine or automatic, or the reverse.',
  },
  'QW-410.26': {
    title: 'Peening', group: 'technique', basis: 'secondary',
    classes: { SMAW: 'nonessential', SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential', GTAW: 'nonessential', PAW: 'nonessential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'Peening added or removed.',
  },
  'QW-410.64': {
    title: 'Thermal preparation, P-No. 11', group: 'technique', basis: 'memory',
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' }, classBasis: { SMAW: 'secondary', SAW: 'secondary', GMAW: 'secondary', FCAW: 'secondary', GTAW: 'secondary', PAW: 'memory' },
    statement: 'P-No. 11A and 11B vessels: grooves in metal under 16 mm (5/8 in.) prepared, back gouged or repaired by thermal processes when the coupon was not.',
  },
} as const satisfies Record<string, VariableRow>

export type Paragraph = keyof typeof variables
