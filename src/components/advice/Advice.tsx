import type { FillerAdvice } from '@shared/library/filler-advice.ts'
import type { Remark } from '@shared/library/filler-advice-facts.ts'
import { VerdictMark } from '@/components/Verdict.tsx'

const WORDS: Readonly<Record<Remark['kind'], string>> = { suits: 'Suits', unfit: 'Does not suit', 'cannot-tell': 'Cannot tell', care: 'Mind', fact: 'Note' }
const TONE: Readonly<Record<Remark['kind'], string>> = { suits: 'text-jade', unfit: 'text-oxide', 'cannot-tell': 'text-straw-deep', care: 'text-straw-deep', fact: 'text-soft' }
const SHAPE = { suits: 'within', unfit: 'outside', 'cannot-tell': 'cannot-tell' } as const
const BASIS: Readonly<Record<Remark['basis'], string>> = { read: 'read', secondary: 'secondary source', memory: 'from memory', 'common-practice': 'common practice' }

/** The kind of a remark as shape and word. */
export function RemarkWord({ kind }: { kind: Remark['kind'] }) {
  return (
    <span className={`inline-flex items-center gap-1.5 font-semibold whitespace-nowrap ${TONE[kind]}`}>
      {kind === 'care' || kind === 'fact' ? <span aria-hidden="true" className={`inline-block h-2.5 w-1 ${kind === 'care' ? 'bg-straw' : 'bg-edge'}`} /> : <VerdictMark verdict={SHAPE[kind]} />}
      {WORDS[kind]}
    </span>
  )
}

/** Advice line by line, each with what it rests on. */
export function Remarks({ remarks }: { remarks: readonly Remark[] }) {
  return (
    <ul className="divide-y divide-hair">
      {remarks.map(({ id, kind, text, source, basis }) => (
        <li key={id} className="grid items-start gap-x-4 py-2 sm:grid-cols-[7.5rem_minmax(0,1fr)]">
          <RemarkWord kind={kind} />
          <div className="min-w-0">
            <p className="max-w-prose text-pretty">{text}</p>
            <p className="text-xs text-soft">
              {source} · <span className={basis === 'memory' ? 'text-straw-deep' : ''}>{BASIS[basis]}</span>
            </p>
          </div>
        </li>
      ))}
    </ul>
  )
}

const SUMMARY: Readonly<Record<FillerAdvice['verdict'], string>> = { suits: 'Suits the metals, as far as is said here', unfit: 'Something speaks against it', 'cannot-tell': 'Whether it suits can’t be told' }

/** Advice on the filler of a draft, folded; its head says how it stands and how much there is to mind. */
export function FoldedAdvice({ advice }: { advice: FillerAdvice }) {
  const care = advice.remarks.filter(({ kind }) => kind === 'care').length
  if (advice.remarks.length === 0) return null
  return (
    <details className="w-full">
      <summary className="flex w-fit max-w-full cursor-pointer items-baseline gap-x-2 py-1 text-sm underline decoration-dotted underline-offset-2">
        <span className={`inline-flex items-center gap-1.5 ${TONE[advice.verdict]}`}>
          <VerdictMark verdict={SHAPE[advice.verdict]} className="size-2" />
          {SUMMARY[advice.verdict]}
          {care > 0 && `; ${care} ${care === 1 ? 'thing' : 'things'} to mind`}
        </span>
      </summary>
      <Remarks remarks={advice.remarks} />
      <p className="py-1 text-xs text-soft">Advice only: it passes and fails nothing.</p>
    </details>
  )
}
