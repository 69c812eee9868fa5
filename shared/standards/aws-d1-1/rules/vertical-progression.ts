/** Row 30: vertical welding uphill or downhill; any pass counts. */
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import { askedPlaces } from '../positions.ts'

const isVertical = (block: ProcessBlock | null): boolean => askedPlaces(block?.positions ?? []).some((place) => place === 'vertical' || place === '5F')
const directions = (block: ProcessBlock | null): string[] | null => (block?.progression === 'both' ? ['uphill', 'downhill'] : block?.progression ? [block.progression === 'up' ? 'uphill' : 'downhill'] : null)
const tokenOf = (block: ProcessBlock): string | null => directions(block)?.join(' and ') ?? null

/** A pipe that turns under the arc is welded flat. */
const turns = (variables: WeldingVariables): boolean => variables.pipeRotated === true

export const verticalProgression = namedRule({
  meta: meta('vertical_progression'),
  field: 'progression',
  at: 'block',
  label: 'vertical progression',
  applies: (context) => isVertical(context.block) && !turns(context.procedure),
  asked: (context) => directions(context.block),
  tested: (_context, side) => (side.block && isVertical(side.block) ? tokenOf(side.block) : undefined),
  covers: (_value, _context, side) => directions(side.block) ?? [],
  because: 'Uphill and downhill are qualified apart.',
  setValue: (name) => (name === 'uphill' ? 'up' : 'down'),
})
