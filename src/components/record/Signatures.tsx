import type { Signature } from '@shared/schemas/records.ts'
import { Sheet } from '@/components/Sheet.tsx'
import { moment } from '@/lib/figures.ts'

const MEANING: Record<Signature['meaning'], string> = { authored: 'Sent for review', reviewed: 'Reviewed', approved: 'Approved', certified: 'Certified', withdrawn: 'Withdrawn', rejected: 'Rejected', returned: 'Returned' }

/** Who stated what, when, and over which content: each signature keeps the fingerprint of what it was given for. */
export function Signatures({ signatures }: { signatures: readonly Signature[] }) {
  if (signatures.length === 0) return null
  return (
    <Sheet id="signatures" title="Signatures">
      <ol>
        {signatures.map(({ id, person, role, meaning, statement, reason, contentSha256, signedAt }) => (
          <li key={id} className="sheet-row grid gap-x-4 gap-y-1 border-b border-hair px-4 py-3 last:border-b-0 sm:grid-cols-[10.25rem_minmax(0,1fr)]">
            <div>
              <p className="font-medium">{MEANING[meaning]}</p>
              <p className="text-xs text-soft">{moment(signedAt)}</p>
            </div>
            <div className="min-w-0">
              <p className="font-medium">
                {person.name} <span className="font-normal text-soft">{role}</span>
              </p>
              <p className="max-w-prose text-pretty">{statement}</p>
              {reason && <p className="mt-1 max-w-prose border-l-2 border-rule pl-3 whitespace-pre-line">{reason}</p>}
              <p className="mt-1 text-xs break-all text-soft">Content {contentSha256.slice(0, 16)}</p>
            </div>
          </li>
        ))}
      </ol>
    </Sheet>
  )
}
