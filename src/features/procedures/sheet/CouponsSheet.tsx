import { useQueries } from '@tanstack/react-query'
import { X } from 'lucide-react'
import { Link } from 'react-router-dom'
import type { StampState } from '@/components/Stamp.tsx'
import { Stamp } from '@/components/Stamp.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { worstVerdict } from '@/components/Verdict.tsx'
import { couponQuery, searchCoupons } from '../api.ts'
import { useSheet, useSheetField, inputId } from '@/components/variables/context.ts'
import { RECORD } from '@/components/variables/findings.ts'
import { useProcedureContent } from './procedure-content.ts'
import { Notes } from '@/components/variables/SheetField.tsx'

/** The coupons that support the procedure, and the findings that concern the record as a whole. */
export function CouponsSheet() {
  const { control, findings } = useSheet()
  const content = useProcedureContent()
  const placed = findings.get(RECORD) ?? []
  const count = content.supportingCoupons.length
  return (
    <Sheet id="coupons" title="Supporting coupons" aside={count === 0 ? 'none yet' : `${count} linked`}>
      <SheetRow label="Coupons" unit="whose results carry this procedure" verdict={worstVerdict(placed.map(({ verdict }) => verdict))} margin={<Notes findings={placed} />}>
        {control ? <Edit /> : <Linked ids={content.supportingCoupons} />}
      </SheetRow>
    </Sheet>
  )
}

function Edit() {
  const { value, set, error } = useSheetField<string[]>('supportingCoupons')
  return (
    <div className="space-y-2.5">
      <Linked ids={value} onRemove={(id) => set(value.filter((one) => one !== id))} />
      {value.length < 20 && (
        <ComboBox
          id={inputId('supportingCoupons')}
          className="max-w-md"
          label="Link a coupon"
          labelHidden
          text=""
          queryKey="coupons"
          load={searchCoupons}
          placeholder="Link a coupon by number or title"
          error={error}
          onPick={(item) => item && !value.includes(item.id) && set([...value, item.id])}
        />
      )}
    </div>
  )
}

function Linked({ ids, onRemove }: { ids: readonly string[]; onRemove?: (id: string) => void }) {
  const coupons = useQueries({ queries: ids.map((id) => couponQuery(id)) })
  if (ids.length === 0) return <p className="text-soft">No coupon is linked, so nothing here is qualified yet. Link one that was welded and tested, or weld one for this procedure.</p>
  return (
    <ul className="divide-y divide-hair border-y border-hair">
      {ids.map((id, index) => {
        const { data, isError, refetch } = coupons[index] ?? {}
        return (
          <li key={id} className="flex flex-wrap items-center gap-x-3 gap-y-1 py-1.5">
            {data ? (
              <>
                <Link to={`/coupons/${id}`} className="text-link font-semibold">
                  {data.number}
                </Link>
                <span className="min-w-0 grow">{data.content.title}</span>
                <Stamp small state={data.state satisfies StampState} />
              </>
            ) : isError ? (
              <span className="grow text-oxide">
                A linked coupon could not be read.{' '}
                <button type="button" className="text-link" onClick={() => void refetch?.()}>
                  Try again
                </button>
              </span>
            ) : (
              <span className="grow text-soft">Reading…</span>
            )}
            {onRemove && (
              <button type="button" aria-label={`Unlink ${data?.number ?? 'this coupon'}`} className="flex size-7 items-center justify-center rounded text-soft hover:text-ink" onClick={() => onRemove(id)}>
                <X size={15} aria-hidden="true" />
              </button>
            )}
          </li>
        )
      })}
    </ul>
  )
}
