/** QW-404.10 and QW-404.27: where the alloy comes mainly from flux or supplemental filler, the deposit stays in the stated composition. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import type { Paragraph } from '../variables.ts'

interface Source { paragraph: Paragraph; file: string; field: string; label: string; none: string; uses: (block: ProcessBlock) => boolean | null }

function build({ paragraph, file, field, label, none, uses }: Source): Rule {
  /** Alloy from here with its composition; null when either isn't recorded. */
  const token = (block: ProcessBlock): string | null => {
    const used = uses(block)
    if (used === null) return null
    if (!used) return none
    return block.filler.depositComposition ? `deposit ${sameText(block.filler.depositComposition)}` : null
  }
  return namedRule({
    meta: meta(paragraph, file),
    field,
    at: 'block',
    label,
    asked(context) {
      const value = context.block && token(context.block)
      return value ? [value] : null
    },
    tested: (_context, side) => (side.block ? token(side.block) : null),
    lacks: (_, block) => (block && uses(block) === true ? ['filler.depositComposition'] : []),
    because: 'The main alloy elements must stay in the range that the procedure states.',
  })
}

export const alloyFlux = build({
  paragraph: 'QW-404.10',
  file: 'alloy-flux',
  field: 'filler.fluxType',
  label: 'alloy from flux (flux type and deposit composition)',
  none: 'no alloy from flux',
  uses: ({ filler }) => (filler.fluxType === null ? null : filler.fluxType === 'alloy'),
})

export const supplementalAlloy = build({
  paragraph: 'QW-404.27',
  file: 'supplemental-alloy',
  field: 'filler.supplementalAlloyElement',
  label: 'alloy from supplemental filler (and deposit composition)',
  none: 'no alloy from supplemental filler',
  uses: ({ filler }) => (filler.supplemental === false ? false : filler.supplementalAlloyElement),
})
