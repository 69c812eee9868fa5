/** Fillers for aluminium: which of 4043 and 5356 suits, and why one setting never serves both. */
import { remark, type Asked, type FillerFacts, type MetalFacts, type Remark, type Verdict } from './filler-advice-facts.ts'

const GUIDES = 'Guides of filler makers and a trade journal'
const SHOP = 'Shop practice; no published figure'
/** °C above which fillers of about 3 % magnesium and more are open to stress corrosion. */
const HOT_SERVICE_C = 65
const SILICON: ReadonlySet<string> = new Set(['4009', '4010', '4043', '4047', '4145', '4643'])
/** About 3 % magnesium and more. */
const RICH: ReadonlySet<string> = new Set(['5356', '5183', '5556'])
const HOT_FIT: ReadonlySet<string> = new Set(['4043', '5554'])

/** Alloy of a filler: `ER5356`, `S Al 4043A (AlSi5(A))` → 5356, 4043. */
const alloyOfFiller = (classification: string): string | null => /(?:^|[^\d])([1-7]\d{3})(?!\d)/.exec(classification)?.[1] ?? null

/** Alloy of a metal: `6061-T6`, `EN AW-5083 O/H111`, `A96061` → 6061, 5083, 6061. */
function alloyOf({ record }: MetalFacts): string | null {
  const text = `${record.grade ?? ''} ${record.uns ?? ''}`.toUpperCase()
  return /(?:^|[^\d.])(?:A9)?([1-8]\d{3})A?(?!\d)/.exec(text)?.[1] ?? null
}

/** Nominal magnesium of a 5xxx metal, %: from `Al-4.4Mg-Mn`. */
const magnesiumOf = ({ composition }: MetalFacts): number | null => {
  const found = /(\d+(?:\.\d+)?)Mg/.exec(composition ?? '')?.[1]
  return found === undefined ? null : Number(found)
}

function suits(metal: MetalFacts, filler: string): { verdict: Verdict; text: string } {
  const alloy = alloyOf(metal)
  const magnesium = magnesiumOf(metal)
  if (alloy === null) return { verdict: 'cannot-tell', text: `The alloy of ${metal.name} isn’t stated.` }
  if (alloy.startsWith('5') && magnesium === null) return { verdict: 'cannot-tell', text: `The magnesium of ${metal.name} isn’t stated, and 2.5 % of it decides.` }
  if (alloy.startsWith('5') && magnesium !== null && magnesium > 2.5) {
    if (SILICON.has(filler)) return { verdict: 'unfit', text: `${filler} is not for ${metal.name}: above 2.5 % magnesium a silicon filler is never taken. Take 5356, 5183 or 5556.` }
    if (RICH.has(filler) && ['5083', '5086', '5456'].includes(alloy)) return { verdict: 'suits', text: `5356, 5183 and 5556 are usual for ${metal.name}.` }
    if (filler === '5554' && alloy === '5454') return { verdict: 'suits', text: '5554 is usual for 5454, also in hot service.' }
  }
  if ((alloy.startsWith('6') || alloy === '5052') && ['4043', '5356'].includes(filler)) return { verdict: 'suits', text: `4043 and 5356 are the two usual fillers for ${metal.name}.` }
  return { verdict: 'cannot-tell', text: `Nothing here says whether ${filler} suits ${metal.name}.` }
}

/** Whether a filler suits aluminium metals, one remark a metal. */
export function aluminiumFit({ metals, filler, serviceTemperature }: Asked): Remark[] {
  const alloy = alloyOfFiller(filler.name)
  if (alloy === null) return [remark('aluminium-alloy', 'cannot-tell', 'The alloy of the filler can’t be read from its classification.', GUIDES, 'secondary')]
  const fits = metals.filter((metal, index) => metals.findIndex(({ name }) => name === metal.name) === index).map((metal, index) => {
    const { verdict, text } = suits(metal, alloy)
    return remark(`aluminium-${index}`, verdict, text, GUIDES, 'secondary')
  })
  if (serviceTemperature === null || serviceTemperature <= HOT_SERVICE_C) return fits
  const service = `${Math.round(serviceTemperature)} °C in service`
  if (RICH.has(alloy)) return [...fits, remark('service', 'unfit', `${alloy} is not for ${service}: above ${HOT_SERVICE_C} °C (150 °F) its magnesium invites stress corrosion. Take 4043 or 5554 where the metal allows it.`, GUIDES, 'secondary')]
  return [...fits, HOT_FIT.has(alloy) ? remark('service', 'suits', `${alloy} bears ${service}.`, GUIDES, 'secondary') : remark('service', 'cannot-tell', `Whether ${alloy} bears ${service} is not known here.`, GUIDES, 'secondary')]
}

/** What to mind of an aluminium filler whatever it welds: how 4043 and 5356 differ. */
export function aluminiumCare(filler: FillerFacts): Remark[] {
  const alloy = alloyOfFiller(filler.name)
  if (alloy === null) return []
  const silicon = SILICON.has(alloy)
  const rich = RICH.has(alloy)
  const said: Remark[] = []
  if (silicon || rich) {
    said.push(
      remark('one-setting', 'care', 'Never one setting for ER4043 and ER5356: at one current they want arc voltages some 2 to 3 V apart, and ER5356 takes some 10 to 20 % more wire feed. Find each by its own trial beads.', SHOP, 'common-practice'),
      remark('f-number', 'care', 'ER4043 is F-Number 23, ER5356 is F-Number 22: to change from one to the other needs a new qualification.', 'ASME IX, QW-404.4 with QW-432', 'memory'),
    )
  }
  if (rich) said.push(remark('service-limit', 'care', `Not for long service above ${HOT_SERVICE_C} °C (150 °F): with about 3 % magnesium and more it is open to stress corrosion.`, GUIDES, 'secondary'))
  if (alloy === '4043') said.push(remark('service-limit', 'fact', `Bears service above ${HOT_SERVICE_C} °C (150 °F), where ER5356 does not.`, GUIDES, 'secondary'))
  if (alloy === '4043') said.push(remark('colour', 'care', 'Turns dark grey when anodised; ER5356 keeps the colour of the metal.', GUIDES, 'secondary'))
  if (alloy === '5356') said.push(remark('colour', 'fact', 'Keeps the colour of the metal when anodised; ER4043 turns dark grey.', GUIDES, 'secondary'))
  if (alloy.startsWith('5')) said.push(remark('burn-off', 'care', 'Part of its magnesium burns off across the arc, so the deposit holds less of it than the wire. Silicon hardly burns off at all.', 'Row of the library', filler.basis))
  if (alloy === '4043') said.push(remark('burn-off', 'fact', 'Its silicon hardly burns off across the arc; the magnesium of ER5356 does in part.', 'Row of the library', filler.basis))
  if (alloy === '5356') said.push(remark('cracks', 'care', 'More prone to cracks than ER4043 on 6xxx metals where little filler is mixed in; fill the crater.', GUIDES, 'secondary'))
  if (alloy === '4043') said.push(remark('shear', 'care', 'Lower in shear than ER5356, which carries some 50 % more in a fillet.', GUIDES, 'secondary'))
  if (silicon) said.push(remark('bend', 'care', 'For a procedure to AWS D1.2 its bend specimens are bent round 16.5 times their thickness, whatever the metal.', 'AWS D1.2, guided-bend jigs', 'secondary'))
  return said
}
