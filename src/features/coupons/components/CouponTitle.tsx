import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import type { Coupon } from '@shared/schemas/records.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { formatInterval } from '@shared/units/format.ts'
import { Stamp } from '@/components/Stamp.tsx'
import { Tag, TitleBlock } from '@/components/TitleBlock.tsx'
import { metalInWords } from '@/components/variables/labels.ts'
import { choiceInWords } from '@/components/variables/options.ts'
import { useUnits } from '@/hooks/units.ts'
import { day } from '@/lib/figures.ts'

/** The title block of a coupon, from what is typed at the moment. */
export function CouponTitle({ coupon, content, note }: { coupon: Coupon; content: CouponContent; note?: ReactNode }) {
  const { system } = useUnits()
  const { processes, baseMetals, thickness, standards } = content.variables
  const metals = [...new Set([baseMetals.a, baseMetals.b].map(metalInWords).filter(Boolean))].join(' to ')
  const decided = [...coupon.signatures].reverse().find(({ meaning }) => meaning === 'certified' || meaning === 'rejected')
  const soft = (text: string) => <span className="text-soft">{text}</span>
  return (
    <TitleBlock
      kind="Procedure qualification record"
      number={coupon.number}
      title={content.title || 'Without a title'}
      cells={[
        { label: processes.length > 1 ? 'Processes' : 'Process', children: processes.map(({ process }) => process ?? 'not stated').join(' + ') },
        { label: 'Code', children: standards.map((choice) => <p key={choice.standard}>{choiceInWords(choice)}</p>) },
        {
          label: 'Coupon',
          children: (
            <>
              <p>{metals || soft('metals not stated')}</p>
              <p className="text-sm text-soft">{[thickness && formatInterval(thickness, 'length', system).text, processes.flatMap(({ positions }) => positions).filter((one, at, all) => all.indexOf(one) === at).join(', ')].filter(Boolean).join(' · ')}</p>
            </>
          ),
        },
        {
          label: 'For',
          children: coupon.procedureNumber && coupon.revisionId ? (
            <Link to={`/revisions/${coupon.revisionId}`}>
              <Tag>{coupon.procedureNumber}</Tag>
            </Link>
          ) : (
            soft('by itself')
          ),
        },
        {
          label: 'Welded',
          children: (
            <>
              <p>{[content.welder, content.welderStamp].filter(Boolean).join(' · ') || soft('not yet')}</p>
              {content.weldedOn && <p className="text-sm text-soft">{day(content.weldedOn)}</p>}
            </>
          ),
        },
      ]}
      stamp={<Stamp state={coupon.state} />}
      stampNote={decided ? `${decided.person.name}, ${day(decided.signedAt)}` : note}
    />
  )
}
