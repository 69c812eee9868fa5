import type { Interval } from '@shared/schemas/common.ts'
import type { Joint } from '@shared/schemas/welding.ts'
import { drawnValue } from '@shared/calculations/joint-figures.ts'
import { detailSheet, detailsNamed, type DetailSheet } from '@shared/standards/aws-d1-1/prequalified/detail-values.ts'
import { fromSi } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'

const BASIS: Record<DetailSheet['basis'], string> = { read: 'read in the standard', secondary: 'from a secondary source', memory: 'from memory: confirm in your edition', 'common-practice': 'common practice' }
export const sourceInWords = ({ source, basis }: DetailSheet): string => `${source}, ${BASIS[basis]}`
/** A thickness in the unit of a system; null where none is given. */
export const thicknessIn = (thickness: Interval | null, system: UnitSystem): number | null => {
  const mm = drawnValue(thickness)
  return mm === null ? null : fromSi(mm, 'length', system === 'SI' ? 'mm' : 'in')
}

/** What may be found at fit-up of the standard detail that the joint names. */
export function DetailNote({ joint, thickness, system }: { joint: Joint; thickness: Interval | null; system: UnitSystem }) {
  const named = detailsNamed(joint.designation)
  if (named.length === 0) return null
  const angle = drawnValue(joint.bevelAngle ?? joint.includedAngle)
  // One designation may have several openings with their angles: the one whose angle is nearest is meant.
  const [detail] = [...named].sort((one, other) => Math.abs((one.angle ?? 0) - (angle ?? 0)) - Math.abs((other.angle ?? 0) - (angle ?? 0)))
  if (!detail) return null
  const sheet = detailSheet(detail, thicknessIn(thickness, system), system)
  return (
    <div className="border-b border-rule px-4 py-2 text-sm">
      <p className="font-medium">{detail.code}, at fit-up</p>
      <p>{sheet.lines.map(({ label, fitUp }) => `${label} ${fitUp}`).join(' · ')}</p>
      <p className="text-soft">{sourceInWords(sheet)}</p>
    </div>
  )
}
