/** QW-404.12 and QW-404.35: with toughness, the classification stays, save for designators that do not touch toughness. */
import type { Filler } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { remember } from '../../common/remember.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import { indicatorSystem } from './flux-wire-class.ts'

/** Diffusible hydrogen (H4, H8R …) and moisture resistance (R) designators at the end. */
const HYDROGEN = /(?:H(?:2|4|5|8|10|15|16)R?|(?<=\d)R)$/

/** Stainless covered electrodes: the H of `E308H-16` is the carbon grade, not hydrogen. */
const STAINLESS = /^(E\d{3,4}[A-Z]*?)-?(15|16|17)$/

/**
 * A classification with what QW-404.12 leaves free taken out: hydrogen and moisture designators, one low-hydrogen covering for
 * another (15, 16, 18; stainless 15, 16, 17) and the usability position digit of flux-cored wire. `impact` tells whether it carries
 * the suffix for better impact performance: -1 of a covered electrode, J of a flux-cored wire.
 */
export const classificationKey = remember((classification: string): { key: string; impact: boolean } => {
  const raw = classification.trim().toUpperCase().replace(/\s+/g, '')
  const stainless = /^E[2-5]\d{2}/.test(raw) && raw.includes('-') ? STAINLESS.exec(raw) : null
  if (stainless) return { key: `${stainless[1]}-15/16/17`, impact: false }
  const minusOne = /^E\d{2,3}(15|16|18)-1(?!\d)/.test(raw)
  let text = sameText(minusOne ? raw.replace(/-1(?!\d)/, '') : raw).replace(HYDROGEN, '')
  const cored = /^E\d+T\d+[CM]?J$/.test(text)
  if (cored) text = text.slice(0, -1)
  text = text.replace(/^(E\d{2})(15|16|18)(?=$|[A-Z])/, (_all, strength: string) => `${strength}15/16/18`).replace(/^(E1\d{2})(15|16|18)(?=$|[A-Z])/, (_all, strength: string) => `${strength}15/16/18`)
  text = text.replace(/^(E\d+)[01](T\d+)/, '$1X$2')
  return { key: text, impact: minusOne || cored }
})

const G_SUFFIX = /-?G(?:$|[^A-Z0-9])/i
const BETTER = ' with better impact suffix'

/** Unclassified and G-suffix fillers are known by trade name. */
function name(filler: Filler): string | null {
  const named = filler.classification ? byClassification(filler.classification) : null
  return named ?? (filler.tradeName ? `trade name ${sameText(filler.tradeName)}` : null)
}

/** Null where the classification leaves the composition open, so that only the trade name tells it. */
const byClassification = remember((text) => {
  const classification = text.trim()
  if (!classification || G_SUFFIX.test(classification)) return null
  const { key, impact } = classificationKey(classification)
  return impact ? key + BETTER : key
})

const withBetter = remember((value): readonly string[] => (value.endsWith(BETTER) || value.startsWith('trade name') || value === 'no filler' ? [value] : [value, value + BETTER]))

export const fillerClassification = namedRule({
  meta: meta('QW-404.12', 'filler-classification'),
  field: 'filler.classification',
  at: 'block',
  label: 'filler classification',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = context.block && name(context.block.filler)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : side.block ? name(side.block.filler) : null),
  // A suffix for better impact performance is covered by the plain class; the reverse is not.
  covers: withBetter,
  lacks: (_, block) => (block?.filler.classification ? ['filler.tradeName'] : []),
  kind: (name) => (name.startsWith('trade name') ? 'trade name' : 'classification'),
  because: 'Hydrogen level, moisture resistance, another low-hydrogen covering of equal strength and the position digit of flux-cored wire do not count; a better impact suffix is covered.',
})

/** Flux-wire class without its hydrogen designator, or the trade names where it is not classified. */
function fluxWire(filler: Filler): string | null {
  if (filler.fluxClassification) return sameText(filler.fluxClassification).replace(HYDROGEN, '')
  return filler.fluxTradeName ? `flux ${sameText(filler.fluxTradeName)}, wire ${sameText(filler.classification ?? filler.tradeName ?? 'not named')}` : null
}

export const fluxWireClassification = namedRule({
  meta: meta('QW-404.35', 'flux-wire-classification'),
  field: 'filler.fluxClassification',
  at: 'block',
  label: 'flux-wire classification',
  asked(context) {
    const value = context.block && fluxWire(context.block.filler)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block ? fluxWire(side.block.filler) : null),
  kind: (name) => (name.startsWith('flux ') ? 'trade name' : indicatorSystem(name)),
  because: 'The flux-wire class, or the trade name where it has none, stays; the hydrogen level alone does not count.',
})
