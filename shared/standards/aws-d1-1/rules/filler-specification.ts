/** Row 4: a filler metal outside the A5 specifications that the row names for the process. */
import type { Process, ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { classification, specification } from '../fillers.ts'
import { meta } from '../meta.ts'

export const NAMED: Partial<Record<Process, readonly string[]>> = { SMAW: ['A5.1', 'A5.5'], SAW: ['A5.17', 'A5.23'], GMAW: ['A5.18', 'A5.28'], FCAW: ['A5.20', 'A5.29'], GTAW: ['A5.18', 'A5.28'] }

const inside = (process: Process): string => (NAMED[process] ?? []).join(' or ')

/** The named specifications as one, or the filler's own specification and class. */
function token(block: ProcessBlock | null): string | null {
  if (!block?.process) return null
  const spec = specification(block.process, block.filler)
  if (spec === null) return null
  return NAMED[block.process]?.includes(spec) ? inside(block.process) : `${spec} ${classification(block.filler) ?? ''}`.trim()
}

export const fillerSpecification = namedRule({
  meta: meta('filler_specification'),
  field: 'filler.specification',
  at: 'block',
  label: 'filler specification',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : token(side.block)),
  covers: (value, _context, side) => (side.block?.process ? [value, inside(side.block.process)] : [value]),
  because: 'A filler of the named specifications is free in this row; one outside them covers only itself.',
})
