import { zodResolver } from '@hookform/resolvers/zod'
import { useCallback, useEffect, useEffectEvent, useMemo, useRef, useState } from 'react'
import { useForm, useWatch, type FieldValues, type UseFormReturn } from 'react-hook-form'
import type { z } from 'zod'
import { say } from '@/components/toast.tsx'
import { asProblem, ProblemError } from '@/lib/problem.ts'
import { dropLocalCopy, readLocalCopy, writeLocalCopy } from '@/lib/draft/local-copy.ts'
import { same } from '@/lib/draft/paths.ts'
import { retryDelay, saving as reduce, startSaving, type RecordRules, type SavedRecord, type Saving, type SavingEvent } from '@/lib/draft/saving.ts'
import { useSaveKey } from './keys.ts'

/** The sheet's fields are named by dotted paths that the catalogue holds as data, so the form is typed by path at the fields themselves. */
export type SheetForm = UseFormReturn<FieldValues>

/** A kind of record that is typed in and saves itself. All of it stands still between renderings. */
export interface DraftKind<C, R extends SavedRecord<C>> extends Pick<RecordRules<C, R>, 'isOpen'> {
  schema: z.ZodType<C>
  /** The schema of a content that may be unfinished. */
  unfinished: z.ZodType<C>
  /** The record as it comes in a refusal's `current`. */
  recordSchema: z.ZodType<R>
  read: (id: string) => Promise<R>
  save: (id: string, content: C, version: number) => Promise<R>
  /** The form's path of a field that a refusal names. */
  fieldPath: (field: string) => string
}

export interface Draft<C, R extends SavedRecord<C>> {
  form: SheetForm
  /** As typed, at this moment. */
  content: C
  saving: Saving<C, R>
  /** Saves what is typed; gives the version that then stands on the server, or null when it could not be saved. */
  saveNow: () => Promise<number | null>
  /** Drops the copy on this device: the draft is gone. */
  forget: () => void
  /** Puts a whole content into the form: a fix, its undoing, a merge. */
  replace: (content: C) => void
  /** Settles a conflict with the joined content, which is then saved. */
  merge: (content: C) => void
}

const REST = 1000
/** Says which field a draft can't be saved for, in the shape of a refusal by the server. */
const unfinished = (fields: { field: string; message: string }[]) =>
  new ProblemError({ type: 'about:blank', title: 'Not saved yet', status: 422, detail: fields[0]?.message ?? 'A field is not right yet.', errors: fields })

/** The record as the server holds it, out of a refusal's `current`; read anew where the refusal does not carry it. */
async function theirsOf<C, R extends SavedRecord<C>>(kind: DraftKind<C, R>, problem: ProblemError, id: string): Promise<R | null> {
  if (!problem.isConflict) return null
  const carried = kind.recordSchema.safeParse(problem.current)
  return carried.success ? carried.data : kind.read(id).catch(() => null)
}

/**
 * A record under somebody's hands: the form, what is saved of it, and a copy on this device until it is.
 * Saves when typing has rested a second, on Ctrl+S and when the page is left; tries again by itself when out of reach.
 * @param onStored told each time the server has taken a version
 */
export function useDraft<C extends object, R extends SavedRecord<C> & { id: string }>(kind: DraftKind<C, R>, record: R, personId: string, onStored: (record: R) => void): Draft<C, R> {
  const { id } = record
  const [rules] = useState<RecordRules<C, R>>(() => ({
    isOpen: kind.isOpen,
    settle: (content) => {
      const parsed = kind.schema.safeParse(content)
      return parsed.success ? parsed.data : content
    },
  }))
  const { settle } = rules
  const tell = useRef(onStored)
  useEffect(() => {
    tell.current = onStored
  })
  const [copy] = useState(() => {
    const found = readLocalCopy(kind.unfinished, personId, id)
    return found && !same(settle(found.content), settle(record.content)) ? found : null
  })
  const form: SheetForm = useForm<FieldValues>({ defaultValues: copy?.content ?? record.content, resolver: zodResolver(kind.schema as never) as never, mode: 'onChange' })
  const content = useWatch({ control: form.control }) as C
  const [state, setState] = useState(() => startSaving<C, R>(record, rules))
  // The state as it stands this instant: a save that has just ended must be seen by the act that waited for it, before any rendering.
  const now = useRef(state)
  const dispatch = useCallback((event: SavingEvent<C, R>) => {
    now.current = reduce(now.current, event, rules)
    setState(now.current)
  }, [rules])
  const forgotten = useRef(false)
  const flight = useRef<Promise<number | null> | null>(null)

  const replace = useCallback((next: C) => form.reset(structuredClone(next), { keepDefaultValues: true }), [form])

  // What this device kept from before a crash: carried on with, or compared when somebody saved since.
  const takeUpCopy = useEffectEvent(() => {
    if (!copy) return
    if (copy.version !== record.version) dispatch({ type: 'conflicted', theirs: record, base: copy.base })
    else say('Carried on from the copy on this device', { detail: 'It holds changes that had not reached the server. They are saved now.', undo: () => replace(record.content) })
  })
  useEffect(() => takeUpCopy(), [])

  useEffect(() => dispatch({ type: 'edited', content }), [dispatch, content])

  const keepCopy = useEffectEvent(() => {
    if (state.phase === 'saved') dropLocalCopy(personId, id)
    else writeLocalCopy(personId, id, { version: state.version, base: state.base, content, at: new Date().toISOString() })
  })
  useEffect(() => keepCopy(), [content, state])

  const saveNow = useCallback(async (): Promise<number | null> => {
    while (flight.current) await flight.current
    const { phase: before, base, version } = now.current
    if (before === 'conflict' || before === 'closed') return null
    const parsed = kind.schema.safeParse(form.getValues())
    if (!parsed.success) {
      dispatch({ type: 'failed', problem: unfinished(parsed.error.issues.map((issue) => ({ field: issue.path.join('.'), message: issue.message }))), theirs: null })
      return null
    }
    dispatch({ type: 'edited', content: parsed.data })
    if (same(parsed.data, base)) return version
    const send = async (): Promise<number | null> => {
      dispatch({ type: 'sent', content: parsed.data })
      try {
        const answer = await kind.save(id, parsed.data, version)
        dispatch({ type: 'stored', record: answer })
        tell.current(answer)
        return answer.version
      } catch (error) {
        const problem = asProblem(error)
        dispatch({ type: 'failed', problem, theirs: await theirsOf(kind, problem, id) })
        return null
      } finally {
        flight.current = null
      }
    }
    flight.current = send()
    return flight.current
  }, [dispatch, form, id, kind])

  const { phase, failures } = state
  const restartsWith = phase === 'changed' ? content : null
  useEffect(() => {
    if (phase !== 'changed' && phase !== 'unreachable') return
    const timer = setTimeout(() => void saveNow(), phase === 'changed' ? REST : retryDelay(failures))
    const online = () => void saveNow()
    window.addEventListener('online', online)
    return () => {
      clearTimeout(timer)
      window.removeEventListener('online', online)
    }
    // `content` restarts the second while somebody types; out of reach, the clock of the retry stands.
  }, [phase, failures, saveNow, restartsWith])

  useSaveKey(() => void saveNow())

  useEffect(() => {
    if (phase === 'saved') return
    const hold = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', hold)
    return () => window.removeEventListener('beforeunload', hold)
  }, [phase])

  // Leaving the page inside the program saves what the second had not yet reached; the copy on this device covers a failure.
  const leave = useEffectEvent(() => {
    if (now.current.phase === 'changed' && !forgotten.current) void saveNow()
  })
  useEffect(() => () => leave(), [])

  const follow = useEffectEvent((fresh: R) => {
    if (now.current.phase !== 'saved' || fresh.version <= now.current.version) return
    dispatch({ type: 'overtaken', record: fresh })
    replace(fresh.content)
    say('Somebody else saved a change', { detail: 'This page shows it now.' })
  })
  useEffect(() => follow(record), [record])

  const { problem } = state
  useEffect(() => {
    for (const { field, message } of problem?.fields ?? []) form.setError(kind.fieldPath(field), { type: 'server', message })
  }, [problem, form, kind])

  const merge = useCallback(
    (next: C) => {
      dispatch({ type: 'merged', content: next })
      replace(next)
    },
    [dispatch, replace],
  )
  const forget = useCallback(() => {
    forgotten.current = true
    dropLocalCopy(personId, id)
  }, [personId, id])
  return useMemo(() => ({ form, content, saving: state, saveNow, forget, replace, merge }), [form, content, state, saveNow, forget, replace, merge])
}
