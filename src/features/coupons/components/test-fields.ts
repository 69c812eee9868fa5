/** The fields of each kind of test, as data: typed, read and named from one place. */
import { fieldLabel } from '@shared/comparison/fields.ts'
import type { Quantity } from '@shared/schemas/common.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import type { Dimension } from '@shared/units/types.ts'
import type { Option } from '@/components/fields/text.tsx'

export type TestList = 'tension' | 'bends' | 'macros' | 'toughness' | 'hardness' | 'ndt'
interface Common {
  key: string
  label: string
  when?: (test: Readonly<Record<string, unknown>>) => boolean
}
export type TestField = Common & ({ kind: 'quantity'; dimension: Dimension } | { kind: 'choice'; options: readonly Option[]; always?: boolean } | { kind: 'flag' } | { kind: 'tick' } | { kind: 'text'; max: number } | { kind: 'quantities'; dimension: Dimension; most: number } | { kind: 'numbers'; unit: string; most: number })

const options = (words: Readonly<Record<string, string>>): readonly Option[] => Object.entries(words).map(([value, label]) => ({ value, label }))
const PLACES = options({ weld: 'Weld', 'heat-affected-zone': 'Heat-affected zone' })

export const BEND_KINDS = options({ face: 'Face', root: 'Root', side: 'Side', 'longitudinal-face': 'Longitudinal face', 'longitudinal-root': 'Longitudinal root' })

type Own<K extends TestField['kind']> = Omit<Extract<TestField, { kind: K }>, 'label' | 'key' | 'kind'>
const of =
  (part: string) =>
  <K extends TestField['kind']>(key: string, kind: K, more: Own<K>, label?: string): TestField =>
    ({ key, kind, label: label ?? fieldLabel(`${part}.${key}`), ...more }) as unknown as TestField

const tension = of('tension.0')
const bend = of('bends.0')
const macro = of('macros.0')
const tough = of('toughness.0')
const hard = of('hardness.0')
const ndt = of('ndt.0')
const seen = of('visual')
const round = (test: Readonly<Record<string, unknown>>) => test.kind !== 'reduced-section'
const flat = (test: Readonly<Record<string, unknown>>) => test.kind !== 'turned'

/** What a visual examination of such a weld says: of a fillet its profile, of a groove its height, of complete penetration its root. */
export function visualFields({ joint }: WeldingVariables): readonly TestField[] {
  const groove = joint.weld === 'groove'
  const root = groove && joint.penetration === 'full'
  const concave = (test: Readonly<Record<string, unknown>>) => ((test.rootConcavity as Quantity | null)?.si ?? 0) > 0
  return [
    seen('cracks', 'flag', {}),
    seen('cratersFull', 'flag', {}),
    ...(root ? [seen('rootSound', 'flag', {})] : []),
    seen('profileAccepted', 'flag', {}),
    seen('undercut', 'quantity', { dimension: 'length' }),
    ...(groove ? [seen('reinforcement', 'quantity', { dimension: 'length' })] : []),
    ...(root ? [seen('rootConcavity', 'quantity', { dimension: 'length' }), seen('meltThrough', 'quantity', { dimension: 'length' }), seen('weldThickness', 'quantity', { dimension: 'length', when: concave }, 'Weld thickness there')] : []),
  ]
}

/** The methods in words, as the buttons and the rows call them. */
export const NDT_METHODS = options({ VT: 'Visual', RT: 'Radiography', UT: 'Ultrasonics', PT: 'Penetrant', MT: 'Magnetic particle' })

export const TEST_FIELDS: Readonly<Record<TestList, readonly TestField[]>> = {
  tension: [
    tension('specimen', 'text', { max: 20 }),
    tension('kind', 'choice', { options: options({ 'reduced-section': 'Reduced section', turned: 'Turned', 'full-section': 'Full section' }), always: true }, 'Kind'),
    tension('width', 'quantity', { dimension: 'length', when: flat }),
    tension('thickness', 'quantity', { dimension: 'length', when: flat }),
    tension('diameter', 'quantity', { dimension: 'length', when: round }),
    tension('load', 'quantity', { dimension: 'force' }),
    tension('reportedStrength', 'quantity', { dimension: 'stress' }, 'As reported'),
    tension('fracture', 'choice', { options: options({ weld: 'Weld', 'fusion-line': 'Fusion line', 'heat-affected-zone': 'Heat-affected zone', 'base-metal': 'Base metal' }) }, 'Broke in'),
    tension('fractureType', 'choice', { options: options({ ductile: 'Ductile', brittle: 'Brittle' }) }, 'Fracture'),
  ],
  bends: [
    bend('specimen', 'text', { max: 20 }),
    bend('kind', 'choice', { options: BEND_KINDS, always: true }),
    bend('thickness', 'quantity', { dimension: 'length' }, 'Thickness'),
    bend('formerDiameter', 'quantity', { dimension: 'length' }, 'Former'),
    bend('angle', 'quantity', { dimension: 'angle' }, 'Angle'),
    bend('inspected', 'tick', {}, 'Face inspected'),
    bend('broke', 'tick', {}, 'Broke'),
  ],
  macros: [macro('specimen', 'text', { max: 20 }), macro('fusionComplete', 'flag', {}), macro('cracks', 'flag', {}), macro('leg1', 'quantity', { dimension: 'length' }), macro('leg2', 'quantity', { dimension: 'length' })],
  toughness: [
    tough('place', 'choice', { options: PLACES, always: true }),
    tough('temperature', 'quantity', { dimension: 'temperature' }, 'Temperature'),
    tough('size', 'text', { max: 20 }, 'Size, e.g. 10 × 10'),
    tough('values', 'quantities', { dimension: 'energy', most: 6 }),
    tough('lateralExpansion', 'quantities', { dimension: 'length', most: 6 }),
  ],
  hardness: [hard('place', 'choice', { options: options({ weld: 'Weld', 'heat-affected-zone': 'Heat-affected zone', 'base-metal': 'Base metal' }), always: true }), hard('scale', 'choice', { options: options({ HV5: 'HV 5', HV10: 'HV 10' }), always: true }), hard('values', 'numbers', { unit: 'HV', most: 60 })],
  ndt: [ndt('method', 'choice', { options: NDT_METHODS, always: true }), ndt('wholeLength', 'flag', {}), ndt('accepted', 'flag', {}), ndt('reportNumber', 'text', { max: 80 }), ndt('note', 'text', { max: 400 })],
}
