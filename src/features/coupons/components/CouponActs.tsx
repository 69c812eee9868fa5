import { useState } from 'react'
import { Link } from 'react-router-dom'
import { statementOf } from '@shared/records/statements.ts'
import type { Coupon } from '@shared/schemas/records.ts'
import { Button, buttonClass } from '@/components/Button.tsx'
import { ConfirmSign } from '@/components/ConfirmSign.tsx'
import { MailDialog } from '@/components/record/MailDialog.tsx'
import { say } from '@/components/toast.tsx'
import { useSession } from '@/hooks/session.ts'
import { hrefOf } from '@/lib/api.ts'
import { useCouponActs } from '../api.ts'
import type { Missing } from '../judged.ts'

interface CouponActsProps {
  coupon: Coupon
  missing: readonly Missing[]
  /** Saves what is typed before something is signed; the version that then stands, or null. */
  saveFirst?: () => Promise<number | null>
  /** Nothing may be signed now: a conflict is open. */
  held?: boolean
}

/** Certify, reject, PDF, e-mail: what this person may do with the coupon in its state. */
export function CouponActs({ coupon, missing, saveFirst, held = false }: CouponActsProps) {
  const { person, mailIsCaught } = useSession()
  const acts = useCouponActs(coupon.id)
  const [open, setOpen] = useState<'certify' | 'reject' | 'mail' | null>(null)
  const may = (action: string) => coupon.may.includes(action)
  const name = person?.name ?? ''
  const role = person?.roles.includes('supervisor') ? 'supervisor' : 'inspector'
  const version = async (): Promise<number> => {
    const saved = saveFirst ? await saveFirst() : coupon.version
    if (saved === null) throw new Error('What is typed could not be saved first, so nothing was signed. See beside the sheet what stands in the way.')
    return saved
  }
  const close = () => setOpen(null)
  return (
    <div className="no-print flex flex-wrap items-center gap-2">
      {may('certify') && (
        <Button kind="primary" disabled={held || missing.length > 0} title={missing.length > 0 ? 'First record what is missing' : undefined} onClick={() => setOpen('certify')}>
          Certify
        </Button>
      )}
      <a className={buttonClass('secondary')} href={hrefOf('printCoupon', { id: coupon.id })} download={`${coupon.number}.pdf`}>
        PDF
      </a>
      <Link className={buttonClass('secondary')} to={`/coupons/${coupon.id}/standards`}>
        Under each standard
      </Link>
      {may('send') && <Button onClick={() => setOpen('mail')}>E-mail</Button>}
      {may('reject') && (
        <Button kind="quiet" disabled={held} onClick={() => setOpen('reject')}>
          Reject
        </Button>
      )}
      <ConfirmSign
        isOpen={open === 'certify'}
        onClose={close}
        title={`Certify ${coupon.number}`}
        statement={statementOf({ meaning: 'certified', record: coupon.number, name, role })}
        consequence="The record is closed from then on: nothing in it changes, and procedures may be supported by it. This can’t be taken back."
        confirmLabel={`Certify ${coupon.number}`}
        onSign={async ({ password }) => {
          await acts.certify.mutateAsync({ version: await version(), password })
          close()
          say(`${coupon.number} is certified`)
        }}
      />
      <ConfirmSign
        isOpen={open === 'reject'}
        onClose={close}
        title={`Reject ${coupon.number}`}
        statement={statementOf({ meaning: 'rejected', record: coupon.number, name, role })}
        consequence="The record is closed and kept with the reason; it qualifies nothing. This can’t be taken back; another coupon can be welded."
        confirmLabel={`Reject ${coupon.number}`}
        tone="danger"
        reason={{ label: 'Why it is rejected', required: true, missing: 'Say why it is rejected.' }}
        onSign={async ({ password, reason }) => {
          await acts.reject.mutateAsync({ version: await version(), password, reason })
          close()
          say(`${coupon.number} was rejected`)
        }}
      />
      {open === 'mail' && (
        <MailDialog
          isOpen
          onClose={close}
          title="E-mail the record"
          name={coupon.number}
          caught={mailIsCaught}
          onSend={async (mail) => {
            await acts.mail.mutateAsync(mail)
            close()
            say(`${coupon.number} is on its way`, { detail: `To ${mail.to.join(', ')}` })
          }}
        />
      )}
    </div>
  )
}
