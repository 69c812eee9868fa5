import { Button } from '@/components/Button.tsx'
import { Caution } from '@/components/Caution.tsx'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { Breadcrumb, EmptyState, ErrorState, NothingFound, PageHead, Progress, Skeleton } from '@/components/states.tsx'
import { ProblemError, unreachable } from '@/lib/problem.ts'
import { closed, mm } from './fixtures.ts'
import { Group } from './Group.tsx'

const refused = new ProblemError({ type: 'about:blank', title: 'Not saved', status: 422, detail: 'Two fields need another look.', requestId: '7f3a-19', errors: [{ field: 'thickness', message: 'Thickness: the lower figure, 25, is above the upper, 5.' }] })

export function StatesSection() {
  return (
    <Group title="Empty, failed, waiting, take care">
      <div className="space-y-4">
        <Breadcrumb trail={[{ label: 'Procedures', to: '/gallery' }, { label: 'WPS-014 B' }]} />
        <PageHead title="Coupons" actions={<Button kind="primary">Open a coupon</Button>}>
          What was welded and tested, and what it qualifies.
        </PageHead>
        <EmptyState title="No coupons yet" step={<Button kind="primary">Open a coupon</Button>} example={<><RangeGauge label="Example: thickness" range={mm([closed(5), closed(20)])} asked={null} tested={[10]} /><p className="mt-1 text-soft">One 10 mm plate, bent and pulled, covers 5 to 20 mm under one standard.</p></>}>
          <p>A coupon is the test weld that proves a procedure. Log its passes, enter its bends and tension tests, and see at once which thicknesses, positions and metals it covers.</p>
        </EmptyState>
        <NothingFound what="procedures" onClear={() => undefined} />
        <div className="grid gap-4 lg:grid-cols-2">
          <ErrorState error={refused} onRetry={() => undefined} />
          <ErrorState error={unreachable()} compact />
          <Skeleton rows={3} />
          <div className="space-y-4">
            <Progress label="Uploading 3 photos" value={0.42} onCancel={() => undefined} />
            <Progress label="Signing the document" />
          </div>
          <Caution />
          <Caution hazards={['gas']} />
        </div>
      </div>
    </Group>
  )
}
