/** Fillers for steel and other metals: kind of filler, composition, strength, hydrogen. */
import { matchingSentence } from './filler-advice-d1-1.ts'
import { remark, namesOf, weakest, type Asked, type FillerFacts, type MetalFacts, type Remark } from './filler-advice-facts.ts'
import isoGroups from './data/iso-9606-filler-groups.json' with { type: 'json' }

const NOMINAL = 'Nominal compositions of the library’s rows'
const FM = 'ISO 9606-1, filler groups'
const forGroup = (group: string): string => isoGroups.groups.find((one) => one.group === group)?.for ?? group

/** Filler group that is named for a metal; null where the words of the standard leave it open. */
function groupFor({ group }: MetalFacts): string | null {
  const main = group?.split('.')[0]
  if (main === '1' || main === '11') return 'FM1'
  if (group === '5.1' || group === '5.2') return 'FM3'
  if (group === '5.3' || group === '5.4' || group === '6.4') return 'FM4'
  if (main === '7' || main === '8' || main === '10') return 'FM5'
  return main !== undefined && Number(main) >= 41 && Number(main) <= 48 ? 'FM6' : null
}

const ELEMENTS = ['Cr', 'Ni', 'Mo'] as const
/** Nominal Cr, Ni and Mo of `22Cr-5Ni-3Mo-N`; null when none is named. */
function alloyOf(composition: string | null): Record<(typeof ELEMENTS)[number], number> | null {
  const figure = (element: string): number => Number(new RegExp(`(\\d+(?:\\.\\d+)?)${element}(?![a-z])`).exec(composition ?? '')?.[1] ?? 0)
  const found = { Cr: figure('Cr'), Ni: figure('Ni'), Mo: figure('Mo') }
  return found.Cr === 0 ? null : found
}

const same = (one: string | null, other: string | null): boolean => one !== null && one === other

/** Structure of a stainless metal by its ISO 15608 group: 8 austenitic, 10 duplex, 7 ferritic or martensitic. */
const structureOfMetal = ({ group, pNumber }: MetalFacts): string | null => ({ '8': 'austenitic', '10': 'duplex', '7': 'ferritic or martensitic' })[group?.split('.')[0] ?? ''] ?? (pNumber === '8' ? 'austenitic' : pNumber === '10H' ? 'duplex' : null)

/** Structure of a stainless deposit by its nominal composition: `22Cr-9Ni-3Mo-N` duplex, `12Cr-4.5Ni-0.5Mo` of straight chromium, else austenitic. */
function structureOfFiller(composition: string | null): string | null {
  const alloy = alloyOf(composition)
  if (alloy === null) return null
  if (alloy.Ni < 7) return 'ferritic or martensitic'
  return alloy.Cr >= 22 && alloy.Ni < 11 && /-N\b/.test(composition ?? '') ? 'duplex' : 'austenitic'
}

function stainlessFit(metals: readonly MetalFacts[], filler: FillerFacts): Remark {
  const basis = weakest('common-practice', filler.basis)
  const deposit = alloyOf(filler.composition)
  const bases = metals.map(({ composition }) => alloyOf(composition))
  if (deposit === null || bases.some((base) => base === null)) return remark('alloy', 'cannot-tell', 'The nominal composition of filler or metal isn’t in the library, so their alloys can’t be compared.', NOMINAL, 'memory')
  const structure = structureOfFiller(filler.composition)
  const other = metals.find((metal) => structureOfMetal(metal) !== structure)
  if (other) return remark('alloy', 'cannot-tell', `${other.name} is ${structureOfMetal(other) ?? 'of a structure that is not stated'}, ${filler.name} is ${structure}: nothing here says whether that suits.`, NOMINAL, basis)
  const short = ELEMENTS.filter((element) => bases.some((base) => base !== null && deposit[element] < base[element]))
  if (short.length > 0) return remark('alloy', 'unfit', `${filler.name} (${filler.composition}) holds less ${short.join(' and ')} than ${namesOf(metals)} (${[...new Set(metals.map(({ composition }) => composition))].join('; ')}): the weld would be the poorer alloy.`, NOMINAL, basis)
  return remark('alloy', 'suits', `${filler.name} (${filler.composition}) holds no less Cr, Ni and Mo than ${namesOf(metals)} (${[...new Set(metals.map(({ composition }) => composition))].join('; ')}). Whether the service wants another alloy is for the engineer.`, NOMINAL, basis)
}

/** How far a deposit is alloyed beyond a metal, summed over Cr, Ni and Mo in nominal per cent; 0 where either is not listed. */
export function excessAlloy(metal: string | null, filler: string | null): number {
  const [base, deposit] = [alloyOf(metal), alloyOf(filler)]
  return base && deposit ? ELEMENTS.reduce((sum, element) => sum + deposit[element] - base[element], 0) : 0
}

/** Whether the kind and alloy of a filler suit the metals. */
export function alloyFit(asked: Asked): Remark[] {
  const { metals, filler } = asked
  const said: Remark[] = []
  const families = new Set(metals.map(({ family }) => family))
  const stainlessToSteel = families.size === 2 && families.has('stainless') && families.has('steel')
  if (stainlessToSteel) {
    const usual = /309L|23 12 L/.test(filler.name)
    return [remark('dissimilar', usual ? 'suits' : 'cannot-tell', usual ? `${filler.name} is usual between stainless and carbon steel.` : `Between stainless and carbon steel a 309L type is usual; of ${filler.name} nothing is said here.`, 'Row of the library', 'memory')]
  }
  if (families.size > 1) return [remark('dissimilar', 'cannot-tell', `Nothing here says which filler joins ${namesOf(metals)}.`, 'Library', 'memory')]
  const [family] = families
  const [first] = metals
  if (!family || !first) return [remark('family', 'cannot-tell', `What kind of metal ${namesOf(metals)} is can’t be told: give its P-Number or its ISO 15608 group.`, 'Library', 'memory')]
  if (filler.family === null) return [remark('family', 'cannot-tell', `What kind of metal ${filler.name} deposits can’t be told: give its F-Number, or pick it from the library.`, 'Library', 'memory')]
  if (metals.every(({ group }) => group === '9.3')) {
    const usual = /^ENiCrMo-6/.test(filler.name)
    return [remark('nine-nickel', usual ? 'suits' : 'cannot-tell', usual ? 'ENiCrMo-6 is named for 9 % nickel steel.' : `For 9 % nickel steel ENiCrMo-6 is named; of ${filler.name} nothing is said here.`, 'Row of the library', 'memory')]
  }
  if (filler.family !== family) {
    // Nickel fillers weld steels too, stainless ones plain steel: that is not wrong by itself, only not said here.
    const odd = [filler.family, family].some((one) => ['aluminium', 'copper', 'titanium', 'zirconium'].includes(one))
    return [remark('family', odd ? 'unfit' : 'cannot-tell', odd ? `${filler.name} deposits ${filler.family}; ${namesOf(metals)} is ${family}.` : `${filler.name} deposits ${filler.family}, ${namesOf(metals)} is ${family}: nothing here says whether that suits.`, 'F-Numbers and P-Numbers', 'memory')]
  }
  if (family === 'stainless') return [stainlessFit(metals, filler)]
  if (metals.every(({ composition }) => same(composition, filler.composition))) said.push(remark('composition', 'suits', `Same nominal composition: ${filler.composition}.`, NOMINAL, weakest(filler.basis, ...metals.map(({ basis }) => basis))))
  const wanted = [...new Set(metals.map(groupFor))]
  const given = filler.row?.iso_9606_filler_group ?? null
  const [group] = wanted
  if (said.length === 0 && wanted.length === 1 && group && given === group && group === 'FM1') said.push(remark('filler-group', 'suits', `Of the filler group for ${forGroup(group)} (${group}), as the metals are.`, FM, 'memory'))
  const d11 = matchingSentence(asked)
  if (d11) said.push(d11)
  if (said.length === 0) said.push(remark('nothing', 'cannot-tell', given && group && given === group ? `${filler.name} is of the filler group for ${forGroup(group)} (${group}), but its alloy (${filler.composition ?? 'not listed'}) is another than that of ${namesOf(metals)}: whether it suits can’t be told here.` : `Nothing here says whether ${filler.name} suits ${namesOf(metals)}.`, FM, 'memory'))
  return said
}

/** L grades keep their carbon low; a filler that doesn't gives that away. */
export function lowCarbonCare({ metals, filler }: Asked): Remark[] {
  const low = metals.filter(({ record }) => /\d{3}L\b|CF3M?\b|X2Cr/.test(`${record.grade ?? ''}`))
  if (low.length === 0 || filler.family !== 'stainless' || filler.composition === null || /low C|-N$|-N\b/.test(filler.composition)) return []
  return [remark('low-carbon', 'care', `${namesOf(low)} is a low-carbon grade; ${filler.name} is not a low-carbon filler.`, NOMINAL, weakest('common-practice', filler.basis))]
}

/** Strength of the deposit against the metals, by their specified minimum tensile strengths in MPa. */
export function strengthMatch({ metals, filler }: Asked): Remark {
  const known = metals.flatMap(({ tensile }) => (tensile === null ? [] : [tensile]))
  const source = 'Specified minimum tensile strengths'
  const basis = weakest(filler.propertiesBasis, ...metals.map(({ propertiesBasis }) => propertiesBasis))
  if (filler.tensile === null) return remark('strength', 'cannot-tell', filler.row && /No strength requirement/i.test(filler.row.notes ?? '') ? `The specification of ${filler.name} sets no strength of the weld metal: the tension test of the coupon decides.` : `No strength of ${filler.name} is listed.`, source, filler.propertiesBasis)
  if (known.length < metals.length) return remark('strength', 'cannot-tell', `No minimum strength of ${namesOf(metals.filter(({ tensile }) => tensile === null))} is listed.`, source, basis)
  const [low, high] = [Math.min(...known), Math.max(...known)]
  const told = low === high ? `${high} MPa` : `${low} and ${high} MPa`
  const heated = /after PWHT/i.test(filler.row?.notes ?? '') ? ' The filler’s figure is after heat treatment.' : ''
  if (filler.tensile >= high) return remark('strength', 'suits', `Weld metal of at least ${filler.tensile} MPa on metal of at least ${told}: matching.${heated}`, source, basis)
  if (filler.tensile >= low) return remark('strength', 'care', `Weld metal of at least ${filler.tensile} MPa matches the weaker metal only (${told}).${heated}`, source, basis)
  return remark('undermatching', 'care', `Weld metal of at least ${filler.tensile} MPa is below the metal’s ${told}: undermatching, for which code and design must allow.${heated}`, source, basis)
}

/** Hydrogen scale of method A by diffusible hydrogen, mL in 100 g. */
const scaleOf = (hydrogen: number): string => (hydrogen > 15 ? 'A' : hydrogen > 10 ? 'B' : hydrogen > 5 ? 'C' : hydrogen > 3 ? 'D' : 'E')

/** Hydrogen of the deposit by its designator; null for metals where it does not matter. */
export function hydrogenLevel({ filler, process }: Pick<Asked, 'filler' | 'process'>): Remark | null {
  if (filler.family !== 'steel') return null
  const inherent = /^H(\d{1,2})\b/.exec(filler.row?.hydrogen_designator ?? '')?.[1]
  const written = /[\s-]?H(2|4|5|8|10|15|16)R?$/i.exec(filler.name.trim())?.[1] ?? inherent
  const scale = 'EN 1011-2 / ISO/TR 17671-2, method A, hydrogen scales'
  if (written !== undefined) return remark('hydrogen', 'fact', `Designator H${written}: at most ${written} mL of diffusible hydrogen in 100 g of weld metal, scale ${scaleOf(Number(written))} of the preheat method A.`, scale, 'secondary')
  if (/cellulos/i.test(`${filler.composition ?? ''} ${filler.row?.notes ?? ''}`)) return remark('hydrogen', 'care', 'Cellulose covering: high in hydrogen, scale A of the preheat method A. Preheat accordingly.', scale, 'secondary')
  if (process === 'SMAW' && /rutile|iron oxide/i.test(filler.composition ?? '') && !/low hydrogen/i.test(filler.row?.notes ?? '')) return remark('hydrogen', 'care', 'Not a low-hydrogen electrode: scale A of the preheat method A.', scale, 'secondary')
  if (process === 'GTAW') return remark('hydrogen', 'fact', 'TIG usually stands in scale D of the preheat method A, 3 to 5 mL in 100 g.', scale, 'secondary')
  if (process === 'GMAW' && filler.record.productForm === 'solid') return remark('hydrogen', 'fact', 'A gas-shielded solid wire usually stands in scale C of the preheat method A, a clean one in D.', scale, 'secondary')
  const offered = filler.row?.hydrogen_designator
  return remark('hydrogen', 'cannot-tell', offered ? `No hydrogen designator is stated; the specification offers ${offered.replace(/^optional /, '')}. Read it on the packet and write it after the classification.` : 'No hydrogen designator is stated.', 'Row of the library', filler.basis)
}
