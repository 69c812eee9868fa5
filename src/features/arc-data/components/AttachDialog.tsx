import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { ArcRecording } from '@shared/schemas/arc-data.ts'
import type { Quantity } from '@shared/schemas/common.ts'
import { quantity } from '@shared/units/convert.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { QuantityField } from '@/components/fields/quantity.tsx'
import { Select } from '@/components/fields/text.tsx'
import { say } from '@/components/toast.tsx'
import { useUnits } from '@/hooks/units.ts'
import { asProblem } from '@/lib/problem.ts'
import { query } from '@/lib/query.ts'
import { searchCoupons, useRecordingActs } from '../api.ts'

/** Says what weld the recording is of: a coupon and its pass, and the length that was welded meanwhile. */
export function AttachDialog({ recording, onClose }: { recording: ArcRecording; onClose: () => void }) {
  const { attachment } = recording
  const { system, unitOf } = useUnits()
  const { attach } = useRecordingActs(recording)
  const [coupon, setCoupon] = useState<{ id: string | null; text: string }>({ id: attachment.couponId, text: attachment.couponId ? (recording.attachedTo?.split(' pass ')[0] ?? '') : '' })
  const [row, setRow] = useState(attachment.runRowId ?? '')
  const [length, setLength] = useState<Quantity | null>(attachment.weldLength === null ? null : quantity(attachment.weldLength, 'length'))
  const [unread, setUnread] = useState<string | null>(null)
  const chosen = useQuery({ ...query('readCoupon', { params: { id: coupon.id ?? '' } }), enabled: coupon.id !== null })
  const passes = coupon.id === null ? [] : (chosen.data?.content.runSheet ?? [])
  const onBead = attachment.beadId !== null && coupon.id === null
  const problem = attach.error ? asProblem(attach.error) : null
  const at = (field: string) => problem?.fields.find((one) => one.field === field)?.message ?? null
  const save = () =>
    attach.mutate(
      { couponId: coupon.id, runRowId: coupon.id !== null && row !== '' ? row : null, beadId: onBead ? attachment.beadId : null, weldLength: length?.si ?? null },
      {
        onSuccess: ({ attachedTo }) => {
          say(attachedTo ? `Attached to ${attachedTo}` : 'Saved')
          onClose()
        },
      },
    )
  return (
    <Dialog
      title="Attach the recording"
      isOpen
      onClose={onClose}
      footer={
        <>
          <Button onClick={onClose}>Not now</Button>
          <Button kind="primary" pending={attach.isPending} disabled={unread !== null} onClick={save}>
            Save
          </Button>
        </>
      }
    >
      {onBead && <p>It is attached to {recording.attachedTo}. Choosing a coupon moves it there.</p>}
      <ComboBox
        label="Coupon"
        optional
        placeholder="Number or title"
        description="Coupons that are not closed. Leave it empty to take the recording off."
        queryKey="open-coupons"
        text={coupon.text}
        load={searchCoupons}
        error={at('couponId')}
        onPick={(item, text) => {
          setCoupon({ id: item?.id ?? null, text })
          setRow('')
        }}
      />
      {coupon.id !== null && (
        <Select
          label="Pass"
          empty="The whole coupon"
          value={row}
          onChange={(event) => setRow(event.target.value)}
          options={passes.map((pass) => ({ value: pass.id, label: `Pass ${pass.pass}${pass.layer ? `, ${pass.layer}` : ''}` }))}
          description={chosen.data && passes.length === 0 ? 'Its run sheet has no pass yet.' : 'The pass of the run sheet that was recorded.'}
          error={at('runRowId')}
        />
      )}
      <QuantityField label={`Length welded meanwhile, ${unitOf('length')}`} optional dimension="length" system={system} value={length} onChange={setLength} onUnread={setUnread} description="For the heat input: the energy is divided by it. Without it the length or travel speed of the pass or bead counts." error={at('weldLength')} />
      {problem && problem.fields.length === 0 && <FormError message={problem.message} />}
    </Dialog>
  )
}
