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
import { searchCoupons, searchTrials, useRecordingActs } from '../api.ts'

/** Says what weld the recording is of, a coupon's pass or a trial bead, and the length that was welded meanwhile. */
export function AttachDialog({ recording, onClose }: { recording: ArcRecording; onClose: () => void }) {
  const { attachment } = recording
  const { system, unitOf } = useUnits()
  const { attach } = useRecordingActs(recording)
  const [of, setOf] = useState<'coupon' | 'bead'>(attachment.beadId === null ? 'coupon' : 'bead')
  const [trial, setTrial] = useState<{ id: string | null; text: string }>({ id: null, text: '' })
  const [bead, setBead] = useState('')
  const [coupon, setCoupon] = useState<{ id: string | null; text: string }>({ id: attachment.couponId, text: attachment.couponId ? (recording.attachedTo?.split(' pass ')[0] ?? '') : '' })
  const [row, setRow] = useState(attachment.runRowId ?? '')
  const [length, setLength] = useState<Quantity | null>(attachment.weldLength === null ? null : quantity(attachment.weldLength, 'length'))
  const [unread, setUnread] = useState<string | null>(null)
  const chosen = useQuery({ ...query('readCoupon', { params: { id: coupon.id ?? '' } }), enabled: coupon.id !== null })
  const passes = coupon.id === null ? [] : (chosen.data?.content.runSheet ?? [])
  const chosenTrial = useQuery({ ...query('readTrial', { params: { id: trial.id ?? '' } }), enabled: trial.id !== null })
  const beads = trial.id === null ? [] : (chosenTrial.data?.beads ?? [])
  // Until another trial is picked, the bead that it hangs on stays.
  const staysOnBead = attachment.beadId !== null && trial.id === null && trial.text === ''
  const unchosen = of === 'bead' && trial.id !== null && bead === ''
  const problem = attach.error ? asProblem(attach.error) : null
  const at = (field: string) => problem?.fields.find((one) => one.field === field)?.message ?? null
  const save = () =>
    attach.mutate(
      of === 'coupon'
        ? { couponId: coupon.id, runRowId: coupon.id !== null && row !== '' ? row : null, beadId: null, weldLength: length?.si ?? null }
        : { couponId: null, runRowId: null, beadId: bead !== '' ? bead : staysOnBead ? attachment.beadId : null, weldLength: length?.si ?? null },
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
          <Button kind="primary" pending={attach.isPending} disabled={unread !== null || unchosen} onClick={save}>
            Save
          </Button>
        </>
      }
    >
      <Select
        label="What was welded"
        value={of}
        onChange={(event) => setOf(event.target.value === 'bead' ? 'bead' : 'coupon')}
        options={[{ value: 'coupon', label: 'A coupon' }, { value: 'bead', label: 'A trial bead' }]}
      />
      {of === 'bead' && (
        <>
          {staysOnBead && <p>It is attached to {recording.attachedTo}. Choosing another trial moves it there.</p>}
          <ComboBox
            label="Trial"
            optional
            placeholder="Number or title"
            description="Of the dial-in log. Leave it empty to keep the recording where it is."
            queryKey="trials-to-attach"
            text={trial.text}
            load={searchTrials}
            error={at('beadId')}
            onPick={(item, text) => {
              setTrial({ id: item?.id ?? null, text })
              setBead('')
            }}
          />
          {trial.id !== null && (
            <Select
              label="Bead"
              empty="Choose the bead"
              value={bead}
              onChange={(event) => setBead(event.target.value)}
              options={beads.map((one) => ({ value: one.id, label: `Bead ${one.number}${one.content.score === null ? '' : `, score ${one.content.score}`}` }))}
              description={chosenTrial.data && beads.length === 0 ? 'The trial has no bead yet.' : 'The bead that was recorded.'}
            />
          )}
        </>
      )}
      {of === 'coupon' && (
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
      )}
      {of === 'coupon' && coupon.id !== null && (
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
