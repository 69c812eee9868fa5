import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { ArcRecordingRow } from '@shared/schemas/arc-data.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { ErrorState } from '@/components/states.tsx'
import { useMay } from '@/hooks/session.ts'
import { figure, moment } from '@/lib/figures.ts'
import { query } from '@/lib/query.ts'

export interface ArcRecordingsProps {
  /** What the recordings are of: a coupon or a trial bead. */
  of: { couponId: string } | { beadId: string }
  /** No more are taken, e.g. of a certified coupon. */
  closed?: boolean
}

/** "3832 W by v·i, 20.0 % more than the meters say". */
function powerInWords({ averageInstantaneousPower, meterError }: Pick<ArcRecordingRow['figures'], 'averageInstantaneousPower' | 'meterError'>): string {
  const power = `${figure(averageInstantaneousPower, 0)} W by volts times amperes sample by sample`
  if (Math.abs(meterError) < 0.5) return `${power}; the meters agree`
  return `${power}; the meters would say ${figure(Math.abs(meterError), 1)} % ${meterError < 0 ? 'less' : 'more'}`
}

/** Recordings of volts and amperes of one coupon or bead, with the way to each and to a new one. */
export function ArcRecordings({ of, closed = false }: ArcRecordingsProps) {
  const list = useQuery(query('listArcRecordings', { query: { ...of, limit: 100 } }))
  const may = useMay('arc.record') && !closed
  const items = list.data?.items ?? []
  return (
    <Sheet id="arc-data" title="Arc data" aside={list.data ? (items.length === 0 ? 'none yet' : `${items.length} ${items.length === 1 ? 'recording' : 'recordings'}`) : undefined}>
      {list.isError && <div className="px-4 py-3"><ErrorState compact error={list.error} onRetry={() => void list.refetch()} /></div>}
      {list.data && items.length === 0 && <p className="px-4 py-3 text-soft">{may ? 'Where the waveform is controlled, meters do not give the heat input. Upload what the logger or the power source recorded, and the energy is worked out from it.' : 'No volts and amperes were recorded.'}</p>}
      {items.length > 0 && (
        <ul>
          {items.map(({ id, fileName, attachedTo, figures, uploadedAt, by }) => (
            <li key={id} className="border-b border-hair px-4 py-3 last:border-b-0">
              <p className="flex flex-wrap items-baseline gap-x-3">
                <Link to={`/arc-data/${id}`} className="text-link font-medium break-all">{fileName}</Link>
                {attachedTo && <span>{attachedTo}</span>}
              </p>
              <p className="mt-0.5">{powerInWords(figures)}.</p>
              <p className="text-sm text-soft">
                {figure(figures.arcTime, 1)} s of arc{figures.pulse ? `, pulsed at ${figure(figures.pulse.frequency, 0)} Hz` : ''} · {by.name}, {moment(uploadedAt)}
              </p>
            </li>
          ))}
        </ul>
      )}
      {may && (
        <div className="no-print border-t border-hair px-4 py-3">
          <ButtonLink to={`/arc-data/new?${new URLSearchParams(of)}`}>Upload a recording</ButtonLink>
        </div>
      )}
    </Sheet>
  )
}
