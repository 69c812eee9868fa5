import { Link } from 'react-router-dom'
import type { ReactNode } from 'react'
import type { Revision } from '@shared/schemas/records.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { Stamp } from '@/components/Stamp.tsx'
import { Tag, TitleBlock } from '@/components/TitleBlock.tsx'
import { day } from '@/lib/figures.ts'
import { choiceInWords, MECHANISATIONS, wordOf } from '@/components/variables/options.ts'

const SIGNED = { approved: 'Approved', withdrawn: 'Withdrawn', superseded: 'Superseded' } as const

/** The title block of a procedure, from what is typed at the moment. */
export function ProcedureTitle({ revision, content, couponNumbers, note }: { revision: Revision; content: ProcedureContent; couponNumbers: readonly { id: string; number: string }[]; note?: ReactNode }) {
  const { processes, standards } = content.variables
  const decided = revision.state in SIGNED ? [...revision.signatures].reverse().find(({ meaning }) => meaning === 'approved' || meaning === 'withdrawn') : undefined
  const names = [...new Set(processes.map((block) => [block.process === 'OTHER' ? 'Another process' : (block.process ?? 'not stated'), block.mechanisation && wordOf(MECHANISATIONS, block.mechanisation).toLowerCase()].filter(Boolean).join(', ')))]
  return (
    <TitleBlock
      kind="Welding procedure specification"
      number={revision.number}
      revision={revision.revision}
      title={content.title || 'Without a title'}
      cells={[
        { label: processes.length > 1 ? 'Processes' : 'Process', children: names.map((name) => <p key={name}>{name}</p>) },
        { label: 'Code', children: standards.map((choice) => <p key={choice.standard}>{choiceInWords(choice)}</p>) },
        {
          label: 'Supporting records',
          children:
            couponNumbers.length === 0 ? (
              <span className="text-soft">none linked</span>
            ) : (
              couponNumbers.map(({ id, number }) => (
                <Link key={id} to={`/coupons/${id}`}>
                  <Tag>{number}</Tag>
                </Link>
              ))
            ),
        },
        {
          label: 'Drafted by',
          children: (
            <>
              <p>{revision.author.name}</p>
              <p className="text-sm text-soft">{day(revision.createdAt)}</p>
            </>
          ),
        },
      ]}
      stamp={<Stamp state={revision.state} />}
      stampNote={note ?? (decided && `${decided.person.name}, ${day(decided.signedAt)}`)}
    />
  )
}
