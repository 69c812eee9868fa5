import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { Coupon } from '@shared/schemas/records.ts'
import { ConflictView } from '@/components/record/ConflictView.tsx'
import { SaveState } from '@/components/record/SaveState.tsx'
import { Breadcrumb } from '@/components/states.tsx'
import { useDraft } from '@/hooks/draft.ts'
import { couponQuery } from '../api.ts'
import { couponConflict, couponKind } from '../content.ts'
import { missingOf, useQualifications } from '../judged.ts'
import { CouponActs } from './CouponActs.tsx'
import { CouponSheets } from './CouponSheets.tsx'
import { CouponTitle } from './CouponTitle.tsx'
import { MissingList } from './MissingList.tsx'

/** A coupon under somebody's hands: it saves itself, and is judged as it is typed. */
export function WorkingScreen({ coupon, personId }: { coupon: Coupon; personId: string }) {
  const client = useQueryClient()
  const draft = useDraft(couponKind, coupon, personId, (stored) => {
    client.setQueryData(couponQuery(stored.id).queryKey, stored)
    void client.invalidateQueries({ queryKey: ['listCoupons'] })
  })
  const { content, form, saving } = draft
  const qualifications = useQualifications(coupon, content)
  const missing = missingOf(qualifications)
  const [comparing, setComparing] = useState(false)
  const [seenConflict, setSeenConflict] = useState(false)
  if ((saving.phase === 'conflict') !== seenConflict) {
    setSeenConflict(saving.phase === 'conflict')
    setComparing(saving.phase === 'conflict')
  }
  const note = missing.length === 0 ? 'ready to certify' : `${missing.length} ${missing.length === 1 ? 'thing is' : 'things are'} missing`
  return (
    <>
      <Breadcrumb trail={[{ label: 'Coupons', to: '/coupons' }, { label: coupon.number }]} />
      <CouponTitle coupon={coupon} content={content} note={note} />
      <div className="mt-4">
        <CouponSheets
          coupon={coupon}
          content={content}
          control={form.control}
          qualifications={qualifications}
          head={
            <>
              <CouponActs coupon={coupon} missing={missing} saveFirst={draft.saveNow} held={saving.phase === 'conflict' || saving.phase === 'closed'} />
              <SaveState saving={saving} onSave={() => void draft.saveNow()} onCompare={() => setComparing(true)} />
              <MissingList missing={missing} content={content} typed />
            </>
          }
        />
      </div>
      {comparing && saving.theirs && (
        <ConflictView
          isOpen
          onClose={() => setComparing(false)}
          name={coupon.number}
          kind={couponConflict}
          base={saving.base}
          mine={content}
          theirs={saving.theirs}
          onMerge={(joined) => {
            draft.merge(joined)
            setComparing(false)
          }}
        />
      )}
    </>
  )
}
