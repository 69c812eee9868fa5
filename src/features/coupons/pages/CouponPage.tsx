import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { Breadcrumb, RecordError, Skeleton } from '@/components/states.tsx'
import { useSession } from '@/hooks/session.ts'
import { couponQuery } from '../api.ts'
import { ReadingScreen } from '../components/ReadingScreen.tsx'
import { WorkingScreen } from '../components/WorkingScreen.tsx'

/** One coupon: worked on by whoever may, until it is certified or rejected; read by everybody else. */
export function CouponPage() {
  const { id = '' } = useParams()
  const coupon = useQuery(couponQuery(id))
  const me = useSession().person?.id
  if (coupon.isPending) return <Skeleton label="Reading the coupon" rows={8} />
  if (coupon.isError && !coupon.data)
    return (
      <>
        <Breadcrumb trail={[{ label: 'Coupons', to: '/coupons' }, { label: 'Coupon' }]} />
        <RecordError title="The coupon can’t be shown" error={coupon.error} onRetry={() => void coupon.refetch()} />
      </>
    )
  return me && coupon.data.may.includes('save') ? <WorkingScreen key={id} coupon={coupon.data} personId={me} /> : <ReadingScreen key={id} coupon={coupon.data} />
}
