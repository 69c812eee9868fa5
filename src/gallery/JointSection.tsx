import { jointGeometry, type JointGeometry } from '@shared/calculations/joint-geometry.ts'
import { jointSchema, passSchema, type Joint } from '@shared/schemas/welding.ts'
import { interval } from '@shared/units/convert.ts'
import { JointDrawing } from '@/components/joint/JointDrawing.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Group } from './Group.tsx'

const mm = (from: number, to?: number) => interval(from, to, 'length')
const degrees = (from: number, to?: number) => interval(from, to, 'angle')
const passes = (layers: readonly ('root' | 'fill' | 'cap' | 'fillet')[]) => layers.map((layer, index) => passSchema.parse({ number: String(index + 1), layer }))
const draw = (joint: Partial<Joint>, thickness: number, layers: Parameters<typeof passes>[0], second?: number): JointGeometry =>
  jointGeometry({ joint: jointSchema.parse(joint), thickness: mm(thickness), thicknessB: second === undefined ? null : mm(second), blocks: [{ id: 'a', passes: passes(layers) }], density: null, system: 'SI' })

const CASES: [string, JointGeometry][] = [
  ['Single V, backing', draw({ groove: 'single-v', includedAngle: degrees(55, 65), rootOpening: mm(0, 4), rootFace: mm(0), backing: 'metal' }, 10, ['root', 'fill', 'cap', 'cap'])],
  ['Single V, root face', draw({ groove: 'single-v', includedAngle: degrees(60), bevelAngle: degrees(30), rootOpening: mm(3), rootFace: mm(2) }, 16, ['root', 'fill', 'fill', 'fill', 'fill', 'cap', 'cap', 'cap'])],
  ['Double V', draw({ groove: 'double-v', includedAngle: degrees(60), rootOpening: mm(2), rootFace: mm(2), weldedFromBothSides: true }, 25, ['root', 'fill', 'cap', 'root', 'fill', 'cap'])],
  ['Single U', draw({ groove: 'single-u', includedAngle: degrees(20), rootOpening: mm(2), rootFace: mm(3), rootRadius: mm(6) }, 25, ['root', 'fill', 'fill', 'fill', 'cap', 'cap'])],
  ['Single bevel, tee', draw({ type: 'tee', groove: 'single-bevel', bevelAngle: degrees(45), rootOpening: mm(3), rootFace: mm(1) }, 12, ['root', 'fill', 'cap'])],
  ['Square, no passes', draw({ groove: 'square', rootOpening: mm(1.5) }, 3, [])],
  ['Fillet', draw({ weld: 'fillet', type: 'tee', filletLeg: mm(8) }, 10, ['fillet', 'fillet', 'fillet'], 12)],
  ['Double V, unequal, gouged', draw({ groove: 'double-v', includedAngle: degrees(50), secondAngle: degrees(60), rootOpening: mm(0, 3), rootFace: mm(2), secondDepth: mm(8), backGouging: 'arc-gouging', backGougeDepth: mm(11) }, 28, ['root', 'fill', 'cap', 'root', 'fill', 'cap'])],
  ['Unequal plates, insert', draw({ groove: 'single-v', includedAngle: degrees(75), rootOpening: mm(3), rootFace: mm(1.5), backing: 'consumable-insert', insertWidth: mm(3), insertHeight: mm(3), taperAngle: degrees(14), alignment: 'root-side' }, 8, ['root', 'fill', 'cap'], 12)],
  ['Compound V', draw({ groove: 'compound-v', includedAngle: degrees(75), bevelAngle: degrees(10), rootOpening: mm(3), rootFace: mm(1.5), angleChange: mm(19) }, 40, ['root', 'fill', 'fill', 'fill', 'fill', 'cap', 'cap'])],
  ['Tee, both sides, fillets over', draw({ type: 'tee', groove: 'double-bevel', bevelAngle: degrees(45), rootOpening: mm(2), rootFace: mm(2), reinforcingFillet: mm(6) }, 25, ['root', 'fill', 'cap', 'root', 'fill', 'cap', 'fillet', 'fillet'], 15)],
  ['Skewed fillet', draw({ weld: 'fillet', type: 'tee', filletLeg: mm(8), filletLegB: mm(11), memberAngle: degrees(70) }, 12, ['fillet', 'fillet', 'fillet'], 10)],
  ['Edge', draw({ type: 'edge', groove: 'single-v', includedAngle: degrees(60), rootOpening: mm(0), grooveDepth: mm(8) }, 10, ['root', 'cap'], 12)],
  ['Flare bevel', draw({ type: 'corner', groove: 'flare-bevel', rootOpening: mm(0), rootRadius: mm(12) }, 6, ['root', 'cap'])],
  ['Ceramic backing', draw({ groove: 'single-v', includedAngle: degrees(50), rootOpening: mm(4, 6), rootFace: mm(0, 1), backing: 'ceramic' }, 14, ['root', 'fill', 'cap', 'cap'])],
  ['Nothing to draw from', draw({ groove: 'single-v' }, 0, [])],
]

export function JointSection() {
  return (
    <Group title="Joint drawing">
      <div className="grid gap-4 lg:grid-cols-2">
        {CASES.map(([name, geometry]) => (
          <Sheet key={name} title={name}>
            <JointDrawing geometry={geometry} />
          </Sheet>
        ))}
      </div>
    </Group>
  )
}
