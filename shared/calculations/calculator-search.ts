/** Finding a calculator by what people call it in the shop. */
import { CALCULATOR_GROUPS, calculators, type Calculator } from './catalogue.ts'

/** Other names and abbreviations, by calculator. */
export const CALCULATOR_WORDS: Readonly<Record<string, string>> = {
  'heat-input-meter': 'kJ/mm kJ/in joules energy volts amps V×A QW-409.1(a)',
  'heat-input-power': 'waveform AIP instantaneous watts QW-409.1(c)',
  'heat-input-energy': 'waveform AIE joules QW-409.1(c)',
  'heat-input-volume': 'bead width QW-409.1(b) volume of weld metal',
  'heat-input-electrode-length': 'ROL run-out stick SMAW QW-409.1(b)',
  'heat-input-iso': 'EN 1011-1 ISO/TR 18491 arc energy k thermal efficiency kJ/mm',
  'heat-input-iso-power': 'waveform ISO/TR 18491 arc energy k watts',
  'travel-speed': 'welding speed mm/min in/min',
  pulse: 'GMAW-P MIG pulse peak background RMS mean duty droplet one drop per pulse',
  'pulse-detachment': 'peak time droplet Ip tp',
  'spray-transition': 'globular spray arc transfer mode',
  'wire-feed-from-current': 'WFS wire feed speed burn-off amps',
  'current-from-wire-feed': 'WFS wire feed speed burn-off amps',
  'shop-settings': 'starting settings MIG short circuit thickness amps one amp per thou',
  'deposition-rate': 'kg/h lb/h melt-off',
  'wire-length': 'spool reel metres per kilo',
  'stub-efficiency': 'stick electrode SMAW stub loss recovery',
  'carbon-equivalents': 'CE CEV CEIIW IIW Pcm CET CEN weldability',
  'a-number': 'QW-442 deposit analysis ASME IX',
  'ferrite-number': 'FN WRC-1992 Schaeffler DeLong stainless austenitic',
  'ferrite-dilution': 'FN WRC-1992 Schaeffler dissimilar stainless 309L buttering diagram',
  'stainless-equivalents': 'Creq Nieq Schaeffler DeLong WRC Hammar Svensson',
  pren: 'PREN PRE pitting corrosion duplex super duplex 2205',
  'ferrite-regression': 'FN stainless second opinion',
  'preheat-method-b': 'preheat cold cracking CET EN 1011-2 hydrogen cracking Tp',
  'cet-to-use': 'preheat method B weld metal',
  'preheat-method-a': 'preheat cold cracking CE IIW EN 1011-2 hydrogen scale',
  'combined-thickness': 'preheat method A t1 t2 t3',
  'preheat-d1-1-table': 'preheat interpass AWS D1.1 table 3.3 5.8 prequalified category structural',
  'preheat-d1-1-annex': 'preheat AWS D1.1 annex susceptibility index restraint hydrogen control Pcm',
  'hardness-control-d1-1': 'preheat AWS D1.1 annex cooling rate fillet',
  'preheat-ito-bessyo': 'preheat Pc Pcm Ito Bessyo',
  'preheat-seferian': 'preheat Seferian',
  'cooling-time': 't8/5 t85 dt8/5 cooling rate 800 500 two dimensional three dimensional',
  'heat-input-for-cooling-time': 't8/5 t85 cooling rate',
  'haz-hardness-yurioka': 'HAZ HV heat-affected zone max hardness martensite',
  'haz-hardness-dueren': 'HAZ HV heat-affected zone max hardness Duren martensite',
  'groove-weld': 'weld volume area V bevel U J weight kg/m',
  'fillet-throat': 'fillet size a z leg throat',
  'fillet-leg': 'fillet size a z leg throat',
  passes: 'beads runs layers',
  consumption: 'wire needed kilos arc time gas consumption',
  cost: 'price money labour quote estimate',
  'bend-strain': 'bend test mandrel former elongation',
  'bend-former': 'bend test mandrel 4t QW-466 ISO 5173',
  'hardness-conversion': 'HV HB HRC Rm tensile Vickers Brinell Rockwell',
  'charpy-sub-size': 'CVN impact toughness subsize 7.5 5',
  'tensile-flat': 'tension test strength UTS reduced section load',
  'tensile-round': 'tension test strength UTS turned load',
  'tig-cup': 'nozzle cup size GTAW argon',
  'gas-flow': 'L/min CFH cubic feet conversion',
  'wire-gas-flow': 'shielding gas L/min CFH nozzle MIG',
  'gas-per-metre': 'gas consumption litres per metre weld',
  'gas-class': 'ISO 14175 M21 C1 I1 mixture shielding',
}

/** In lower case, joined by what people leave out: `t8/5` → `t85`, `D1.1` → `d11`. */
const squeezed = (text: string): string => text.normalize('NFD').replace(/[\u0300-\u036f]/g, '').toLowerCase().replace(/[./()×+'’–-]/g, '')
const wordsOf = (text: string): string[] => text.split(/[\s,;:]+/).flatMap((word) => [squeezed(word), ...word.split(/[/–-]/).map(squeezed)]).filter((word) => word !== '')

interface Found { title: string[]; known: string[]; about: string[] }
const index = new Map<string, Found>(
  calculators.map(({ id, title, purpose, group, inputs, source }) => [
    id,
    {
      title: wordsOf(title),
      known: wordsOf(`${CALCULATOR_WORDS[id] ?? ''} ${CALCULATOR_GROUPS.find((each) => each.id === group)?.title ?? ''}`),
      about: wordsOf([purpose, source.standard, source.clause, ...Object.values(inputs).map(({ label }) => label)].join(' ')),
    },
  ]),
)

const holds = (words: readonly string[], asked: string): boolean => words.some((word) => word.startsWith(asked))
function rank(id: string, asked: readonly string[]): number | null {
  const found = index.get(id)
  if (!found) return null
  const ranks = asked.map((word) => (holds(found.title, word) ? 0 : holds(found.known, word) ? 1 : holds(found.about, word) ? 2 : null))
  return ranks.includes(null) ? null : ranks.reduce<number>((sum, each) => sum + (each ?? 0), 0)
}

/**
 * Calculators whose names, other names or inputs begin with every word asked for, those named so first.
 * @returns every calculator for an empty question
 */
export function findCalculators(question: string): Calculator[] {
  const asked = question.trim().split(/[\s,;]+/).map(squeezed).filter((word) => word !== '')
  if (asked.length === 0) return [...calculators]
  return calculators
    .flatMap((calculator) => {
      const ranked = rank(calculator.id, asked)
      return ranked === null ? [] : [{ calculator, ranked }]
    })
    .sort((one, other) => one.ranked - other.ranked)
    .map(({ calculator }) => calculator)
}
