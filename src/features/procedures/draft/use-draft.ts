import { zodResolver } from '@hookform/resolvers/zod'
import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useEffectEvent, useMemo, useRef, useState } from 'react'
import { useForm, useWatch, type FieldValues, type UseFormReturn } from 'react-hook-form'
import { revisionSchema, type Revision } from '@shared/schemas/records.ts'
import { procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'
import { say } from '@/components/toast.tsx'
import { useSaveKey } from '@/hooks/keys.ts'
import { call } from '@/lib/api.ts'
import { asProblem, ProblemError } from '@/lib/problem.ts'
import { revisionQuery } from '../api.ts'
import { dropLocalCopy, readLocalCopy, writeLocalCopy } from '@/lib/draft/local-copy.ts'
import { contentPath, same } from '@/lib/draft/paths.ts'
import { retryDelay, saving as reduce, settled, startSaving, type Saving, type SavingEvent } from '@/lib/draft/saving.ts'

/** The sheet's fields are named by dotted paths that the catalogue holds as data, so the form is typed by path at the fields themselves. */
export type SheetForm = UseFormReturn<FieldValues>

export interface Draft {
  form: SheetForm
  /** As typed, at this moment. */
  content: ProcedureContent
  saving: Saving
  /** Saves what is typed; gives the version that then stands on the server, or null when it could not be saved. */
  saveNow: () => Promise<number | null>
  /** Drops the copy on this device: the draft is gone. */
  forget: () => void
  /** Puts a whole content into the form: a fix, its undoing, a merge. */
  replace: (content: ProcedureContent) => void
  /** Settles a conflict with the joined content, which is then saved. */
  merge: (content: ProcedureContent) => void
}

const REST = 1000
/** Says which field a draft can't be saved for, in the shape of a refusal by the server. */
const unfinished = (fields: { field: string; message: string }[]) =>
  new ProblemError({ type: 'about:blank', title: 'Not saved yet', status: 422, detail: fields[0]?.message ?? 'A field is not right yet.', errors: fields })

/** The draft as the server holds it, out of a refusal's `current`; read anew where the refusal does not carry it. */
async function theirsOf(problem: ProblemError, id: string): Promise<Revision | null> {
  if (!problem.isConflict) return null
  const carried = revisionSchema.safeParse(problem.current)
  if (carried.success) return carried.data
  return call('readRevision', { params: { id } }).catch(() => null)
}

/**
 * A draft under somebody's hands: the form, what is saved of it, and a copy on this device until it is.
 * Saves when typing has rested a second, on Ctrl+S and when the page is left; tries again by itself when out of reach.
 */
export function useDraft(revision: Revision, personId: string): Draft {
  const client = useQueryClient()
  const { id } = revision
  const [copy] = useState(() => {
    const found = readLocalCopy(personId, id)
    return found && !same(settled(found.content), settled(revision.content)) ? found : null
  })
  const form: SheetForm = useForm<FieldValues>({ defaultValues: copy?.content ?? revision.content, resolver: zodResolver(procedureContentSchema) as never, mode: 'onChange' })
  const content = useWatch({ control: form.control }) as ProcedureContent
  const [state, setState] = useState(() => startSaving(revision))
  // The state as it stands this instant: a save that has just ended must be seen by the act that waited for it, before any rendering.
  const now = useRef(state)
  const dispatch = useCallback((event: SavingEvent) => {
    now.current = reduce(now.current, event)
    setState(now.current)
  }, [])
  const forgotten = useRef(false)
  const flight = useRef<Promise<number | null> | null>(null)

  const replace = useCallback((next: ProcedureContent) => form.reset(structuredClone(next), { keepDefaultValues: true }), [form])

  // What this device kept from before a crash: carried on with, or compared when somebody saved since.
  const takeUpCopy = useEffectEvent(() => {
    if (!copy) return
    if (copy.version !== revision.version) dispatch({ type: 'conflicted', theirs: revision, base: copy.base })
    else say('Carried on from the copy on this device', { detail: 'It holds changes that had not reached the server. They are saved now.', undo: () => replace(revision.content) })
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
    const parsed = procedureContentSchema.safeParse(form.getValues())
    if (!parsed.success) {
      dispatch({ type: 'failed', problem: unfinished(parsed.error.issues.map((issue) => ({ field: issue.path.join('.'), message: issue.message }))), theirs: null })
      return null
    }
    dispatch({ type: 'edited', content: parsed.data })
    if (same(parsed.data, base)) return version
    const send = async (): Promise<number | null> => {
      dispatch({ type: 'sent', content: parsed.data })
      try {
        const stored = await call('saveRevision', { params: { id }, body: { content: parsed.data }, ifMatch: version })
        dispatch({ type: 'stored', revision: stored })
        client.setQueryData(revisionQuery(id).queryKey, stored)
        void client.invalidateQueries({ queryKey: ['listProcedures'] })
        return stored.version
      } catch (error) {
        const problem = asProblem(error)
        dispatch({ type: 'failed', problem, theirs: await theirsOf(problem, id) })
        return null
      } finally {
        flight.current = null
      }
    }
    flight.current = send()
    return flight.current
  }, [client, dispatch, form, id])

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

  const follow = useEffectEvent((fresh: Revision) => {
    if (now.current.phase !== 'saved' || fresh.version <= now.current.version) return
    dispatch({ type: 'overtaken', revision: fresh })
    replace(fresh.content)
    say('Somebody else saved a change', { detail: 'This page shows it now.' })
  })
  useEffect(() => follow(revision), [revision])

  const { problem } = state
  useEffect(() => {
    for (const { field, message } of problem?.fields ?? []) form.setError(contentPath(field), { type: 'server', message })
  }, [problem, form])

  const merge = useCallback(
    (next: ProcedureContent) => {
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
