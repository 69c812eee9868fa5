/** A prequalified groove detail as values of a joint: as the drawing may state them, and what a fitter may then find. */
import { typedQuantity } from '../../../calculations/joint-handles.ts'
import type { Basis } from '../../../schemas/assessment.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { Joint, Process } from '../../../schemas/welding.ts'
import { interval } from '../../../units/convert.ts'
import { formatInterval } from '../../../units/format.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { details, fitUp, type Detail, type Printed, type Tolerance } from './joint-details.ts'

const millimetres = (value: number, system: UnitSystem): number => (system === 'SI' ? value : value * 25.4)
/** A range of lengths in the system's unit, inches as fractions; null leaves an end open. */
const lengths = (min: number | null, max: number | null, system: UnitSystem): Interval => ({ min: min === null ? null : typedQuantity(millimetres(min, system), 'length', system), max: max === null ? null : typedQuantity(millimetres(max, system), 'length', system), all: false })
const sized = (printed: Printed | null, system: UnitSystem): number => (printed === null ? Infinity : printed[system])

/** From the least to the largest that a drawing may state; an end without limit is left open. */
function stated(nominal: readonly [number, number], { up, down }: Tolerance, system: UnitSystem): Interval {
  const low = Math.max(0, nominal[0] - (down === null ? 0 : down[system]))
  const high = nominal[1] + sized(up, system)
  return lengths(low, Number.isFinite(high) ? high : null, system)
}

/** Root opening of a detail; null where it follows a thickness that is not given. */
function openingOf(detail: Detail, thickness: number | null, system: UnitSystem): readonly [number, number] | null {
  const { opening } = detail
  if (opening === 'T' || opening === 'T/2') {
    if (thickness === null) return null
    const value = opening === 'T' ? thickness : thickness / 2
    return [value, value]
  }
  return [opening[0][system], opening[1][system]]
}

const bothEdges = (detail: Detail): boolean => /-(v|u)$/.test(detail.groove)

/**
 * The fields of a joint as a detail draws them, with the as-detailed tolerances. Fields that it doesn't tell are emptied where they
 * would contradict it, and left out where they wouldn't.
 * @param thickness in the system's unit; null = not given
 */
export function jointOfDetail(detail: Detail, joint: Pick<Joint, 'type' | 'backing' | 'backGouging' | 'weldedFromBothSides'>, thickness: number | null, system: UnitSystem): Partial<Joint> {
  const { detailed } = detail.tolerances
  const opening = openingOf(detail, thickness, system)
  const angle = detail.angle === null ? null : interval(detail.angle + detailed.angle[1], detail.angle + detailed.angle[0], 'angle')
  const face = detail.face === null ? null : stated([detail.face[0][system], detail.face[1][system]], detailed.face, system)
  const radius = detail.radius ? lengths(detail.radius[0][system], detail.radius[0][system] + detail.radius[1][system], system) : null
  const [first] = detail.joints
  return {
    weld: 'groove',
    type: detail.joints.includes(joint.type) ? joint.type : (first ?? joint.type),
    designation: detail.code,
    penetration: detail.penetration,
    groove: detail.groove,
    includedAngle: bothEdges(detail) ? angle : null,
    bevelAngle: bothEdges(detail) ? null : angle,
    rootOpening: opening && stated(opening, detailed.opening, system),
    rootFace: detail.groove === 'square' ? null : detail.backed ? lengths(0, 0, system) : face,
    rootRadius: radius,
    grooveDepth: null,
    secondDepth: null,
    secondAngle: null,
    angleChange: null,
    backing: detail.backed ? (joint.backing !== null && joint.backing !== 'none' ? joint.backing : 'metal') : 'none',
    ...(detail.gouged ? { weldedFromBothSides: true, backGouging: joint.backGouging === 'none' ? null : joint.backGouging } : detail.bothSides ? { weldedFromBothSides: true } : {}),
  }
}

export interface DetailLine { label: string; detailed: string; fitUp: string }
export interface DetailSheet { detail: Detail; lines: DetailLine[]; notes: string[]; source: string; basis: Basis }

const figure = { rootOpening: 'Root opening', rootFace: 'Root face', angle: 'Groove angle' } as const
const span = (reach: { min: number; max: number } | null, dimension: 'length' | 'angle', system: UnitSystem): string => {
  if (reach === null) return 'not told'
  if (dimension === 'angle') return formatInterval(interval(reach.min, reach.max, 'angle'), 'angle', system).text
  if (!Number.isFinite(reach.max)) return reach.min > 0 ? formatInterval(lengths(reach.min, null, system), 'length', system).text : 'not limited'
  return formatInterval(lengths(reach.min, reach.max, system), 'length', system).text
}

/**
 * What a detail states, and what may be found at assembly: fit-up tolerances stand on each end of what is stated.
 * @param thickness in the system's unit
 */
export function detailSheet(detail: Detail, thickness: number | null, system: UnitSystem): DetailSheet {
  const nominal = openingOf(detail, thickness, system)
  const ends = { opening: nominal, face: detail.face && ([detail.face[0][system], detail.face[1][system]] as const) }
  const found = (which: 'opening' | 'face', end: 0 | 1) => fitUp(detail, { opening: which === 'opening' ? (nominal?.[end] ?? null) : null, face: which === 'face' ? (ends.face?.[end] ?? null) : null, angle: null }, system)[which]
  const reach = (which: 'opening' | 'face') => {
    const [low, high] = [found(which, 0), found(which, 1)]
    return low && high ? { min: low.min, max: high.max } : null
  }
  const { detailed } = detail.tolerances
  const words = (value: Interval) => formatInterval(value, 'length', system).text
  const lines: DetailLine[] = [{ label: figure.rootOpening, detailed: nominal ? words(stated(nominal, detailed.opening, system)) : `as the thickness asks (${typeof detail.opening === 'string' ? detail.opening : ''})`, fitUp: nominal ? span(reach('opening'), 'length', system) : 'follows the thickness' }]
  if (ends.face) lines.push({ label: figure.rootFace, detailed: words(stated(ends.face, detailed.face, system)), fitUp: detail.tolerances.fitUp.face.up === null ? 'not limited' : span(reach('face'), 'length', system) })
  if (detail.angle !== null) {
    const at = fitUp(detail, { opening: null, face: null, angle: detail.angle }, system).angle
    lines.push({ label: figure.angle, detailed: span({ min: detail.angle + detailed.angle[1], max: detail.angle + detailed.angle[0] }, 'angle', system), fitUp: span(at, 'angle', system) })
  }
  const notes = [
    detail.most ? `Base metal at most ${words(lengths(detail.most[system], detail.most[system], system))}.` : '',
    detail.least ? `Base metal at least ${words(lengths(detail.least[system], detail.least[system], system))}.` : '',
    `Positions: ${detail.places.join(', ')}.`,
    detail.backed ? 'On backing.' : detail.gouged ? 'Back gouged to sound metal before the second side; choose how.' : detail.bothSides ? 'Welded from both sides.' : '',
    detail.gas === 'required' ? 'FCAW needs an external gas.' : '',
  ].filter((note) => note !== '')
  return { detail, lines, notes, source: `AWS D1.1 2020, ${detail.penetration === 'full' ? 'Fig. 5.1' : 'Fig. 5.2'}`, basis: detail.basis }
}

/** Details for a groove, narrowed by what is chosen; null leaves a choice open. */
export const detailsFor = ({ groove, type, processes }: { groove: Joint['groove'] | null; type: Joint['type'] | null; processes: readonly Process[] }): Detail[] =>
  details.filter((detail) => (groove === null || detail.groove === groove) && (type === null || detail.joints.includes(type)) && (processes.length === 0 || detail.processes.some((process) => processes.includes(process))))

/** Details that a designation names. */
export const detailsNamed = (designation: string | null | undefined): Detail[] => details.filter(({ code }) => code === designation?.trim())
