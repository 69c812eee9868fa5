import { useQuery } from '@tanstack/react-query'
import { Download } from 'lucide-react'
import { useParams } from 'react-router-dom'
import { buttonClass } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Stamp } from '@/components/Stamp.tsx'
import { Breadcrumb, RecordError, Skeleton } from '@/components/states.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { hrefOf } from '@/lib/api.ts'
import { fileSize, moment } from '@/lib/figures.ts'
import { query } from '@/lib/query.ts'
import { linkParts } from '../links.ts'

export function MailPage() {
  const { id = '' } = useParams()
  const { data: mail, error, refetch } = useQuery(query('readMail', { params: { id } }))
  if (error) return <RecordError title="The mail can’t be shown" error={error} onRetry={() => void refetch()} />
  if (!mail) return <Skeleton label="Reading the mail" />
  return (
    <div className="mx-auto max-w-4xl">
      <Breadcrumb trail={[{ label: 'Outbox', to: '/outbox' }, { label: mail.subject }]} />
      <TitleBlock
        kind="Mail"
        number={mail.subject}
        cells={[
          { label: 'To', children: mail.to.join(', '), wide: true },
          { label: 'Written', children: moment(mail.createdAt) },
          { label: 'Sent', children: mail.state === 'caught' ? 'caught, not sent' : mail.sentAt ? moment(mail.sentAt) : 'not yet' },
        ]}
        stamp={<Stamp state={mail.state} />}
        stampNote={mail.attempts > 1 ? `${mail.attempts} tries` : undefined}
      />
      <div className="mt-4 space-y-4">
        {mail.error && (
          <p role="alert" className="border-l-[3px] border-l-oxide bg-oxide-bg px-3 py-2">
            The last try failed: {mail.error}
          </p>
        )}
        <Sheet title="Text">
          <div className="max-w-prose px-4 py-4 text-lg break-words whitespace-pre-wrap">
            {linkParts(mail.text).map((part, index) =>
              part.href ? (
                <a key={index} href={part.href} className="text-link break-all">
                  {part.text}
                </a>
              ) : (
                part.text
              ),
            )}
          </div>
        </Sheet>
        {mail.attachments.length > 0 && (
          <Sheet title="Attached">
            <ul>
              {mail.attachments.map(({ name, bytes }, index) => (
                <li key={`${index} ${name}`} className="flex flex-wrap items-center justify-between gap-3 border-b border-hair px-4 py-2.5 last:border-b-0">
                  <span className="min-w-0 break-words">
                    <span className="font-medium">{name}</span> <span className="text-soft">{fileSize(bytes)}</span>
                  </span>
                  <a href={hrefOf('readMailAttachment', { id: mail.id, index })} download={name} className={buttonClass('secondary')}>
                    <Download size={16} aria-hidden="true" />
                    Download
                  </a>
                </li>
              ))}
            </ul>
          </Sheet>
        )}
      </div>
    </div>
  )
}
