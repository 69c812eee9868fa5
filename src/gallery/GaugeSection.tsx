import { RangeGauge, type RangeGaugeProps } from '@/components/range-gauge/RangeGauge.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { closed, mm, open, unknown, unlimited } from './fixtures.ts'
import { Group } from './Group.tsx'

type Case = Omit<RangeGaugeProps, 'label'> & { name: string }
const CASES: Case[] = [
  { name: 'Within', range: mm([closed(5), closed(20)]), asked: { min: 6, max: 18 }, tested: [10] },
  { name: 'Above', range: mm([closed(5), closed(20)]), asked: { min: 5, max: 25 }, tested: [10] },
  { name: 'Below and above', range: mm([closed(5), closed(20)]), asked: { min: 3, max: 25 }, tested: [10] },
  { name: 'Just above', range: mm([closed(5), closed(20)]), asked: { min: 5, max: 20.5 }, tested: [19] },
  { name: 'Wholly outside', range: mm([closed(1.5), closed(6)]), asked: { min: 12, max: 14 }, tested: [3] },
  { name: 'A gap between two coupons', range: mm([closed(5), closed(12)], [closed(20), closed(40)]), asked: { min: 8, max: 30 }, tested: [6, 20] },
  { name: 'No upper limit', range: mm([closed(5), unlimited]), asked: { min: 10, max: 60 }, tested: [38] },
  { name: 'No limit, all asked', range: mm([unlimited, unlimited]), asked: { min: null, max: null } },
  { name: 'Nothing asked', range: mm([closed(3), closed(24)]), asked: null, tested: [12] },
  { name: 'At least asked', range: mm([closed(10), unlimited]), asked: { min: 50, max: null }, tested: [60] },
  { name: 'Open end', range: mm([closed(5), open(20)]), asked: { min: 8, max: 20 }, tested: [10] },
  { name: 'An end not known', range: mm([closed(5), unknown]), asked: { min: 8, max: 30 }, tested: [10] },
  { name: 'Range not known', range: mm([unknown, unknown]), asked: { min: 8, max: 30 } },
  { name: 'No coupon', range: null, asked: { min: 8, max: 30 }, unit: 'mm' },
  { name: 'One value asked', range: mm([closed(5), closed(20)]), asked: { min: 12, max: 12 }, tested: [10] },
  { name: 'Many coupons close together', range: mm([closed(5), closed(5.2)], [closed(5.4), closed(20)]), asked: { min: 5, max: 21 }, tested: [9.5, 10, 10.5, 11] },
  { name: 'Read in inches', range: mm([closed(4.76), closed(25.4)]), asked: { min: 6.35, max: 19.05 }, tested: [12.7], system: 'US' },
]

export function GaugeSection() {
  return (
    <Group title="Range gauge">
      <div className="grid gap-4 xl:grid-cols-2">
        {[CASES.slice(0, 9), CASES.slice(9)].map((half, index) => (
          <Sheet key={index} title={index === 0 ? 'What is covered' : 'Ends and odd cases'} aside="full, and thin for lists">
            {half.map(({ name, ...gauge }) => (
              <SheetRow key={name} label={name} gauge={<RangeGauge label={name} {...gauge} />}>
                <RangeGauge label={`${name}, thin`} thin {...gauge} />
              </SheetRow>
            ))}
          </Sheet>
        ))}
      </div>
    </Group>
  )
}
