import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { Button } from '@/components/Button.tsx'
import { SideBySide } from '@/components/standards/SideBySide.tsx'
import { Breadcrumb, ErrorState, PageHead, Skeleton } from '@/components/states.tsx'
import { couponQuery, couponStandardsQuery } from '../api.ts'

/** What one coupon qualifies under every standard kept here, side by side, to read or to print. */
export function CouponStandardsPage() {
  const { id = '' } = useParams()
  const coupon = useQuery(couponQuery(id))
  const table = useQuery(couponStandardsQuery(id))
  const number = coupon.data?.number ?? table.data?.number ?? 'Coupon'
  return (
    <>
      <Breadcrumb trail={[{ label: 'Coupons', to: '/coupons' }, { label: number, to: `/coupons/${id}` }, { label: 'Under each standard' }]} />
      <PageHead title={`${number} under each standard`} actions={<Button onClick={() => window.print()}>Print</Button>}>
        {coupon.data?.content.title}
      </PageHead>
      {coupon.data?.state === 'rejected' && (
        <p className="mb-4 border-l-[3px] border-l-oxide bg-oxide-bg px-3 py-2">
          <strong className="font-semibold">Rejected: it qualifies nothing.</strong> What follows is only what a sound coupon like it would have given.
        </p>
      )}
      {table.isPending && <Skeleton label="Judging the coupon" rows={10} />}
      {table.isError && <ErrorState error={table.error} onRetry={() => void table.refetch()} />}
      {table.data && <SideBySide table={table.data} />}
    </>
  )
}
