import type { Coupon } from '@shared/schemas/records.ts'
import { isOpen } from '@shared/records/coupon-states.ts'
import { Breadcrumb } from '@/components/states.tsx'
import { missingOf, useQualifications } from '../judged.ts'
import { CouponActs } from './CouponActs.tsx'
import { CouponSheets } from './CouponSheets.tsx'
import { CouponTitle } from './CouponTitle.tsx'
import { MissingList } from './MissingList.tsx'

/** A coupon that is closed, or that this person only reads. */
export function ReadingScreen({ coupon }: { coupon: Coupon }) {
  const { content } = coupon
  const qualifications = useQualifications(coupon, content)
  const missing = missingOf(qualifications)
  const rejected = [...coupon.signatures].reverse().find(({ meaning }) => meaning === 'rejected')
  return (
    <>
      <Breadcrumb trail={[{ label: 'Coupons', to: '/coupons' }, { label: coupon.number }]} />
      <CouponTitle coupon={coupon} content={content} />
      <div className="mt-4">
        <CouponSheets
          coupon={coupon}
          content={content}
          control={null}
          qualifications={coupon.state === 'rejected' ? [] : qualifications}
          head={
            <>
              <CouponActs coupon={coupon} missing={missing} />
              {rejected && (
                <div className="border-l-[3px] border-l-oxide bg-oxide-bg px-3 py-2">
                  <p className="font-semibold">Rejected: it qualifies nothing</p>
                  {rejected.reason && <p className="mt-0.5 whitespace-pre-line">{rejected.reason}</p>}
                </div>
              )}
              {isOpen(coupon.state) && <MissingList missing={missing} content={content} typed={false} />}
            </>
          }
        />
      </div>
    </>
  )
}
