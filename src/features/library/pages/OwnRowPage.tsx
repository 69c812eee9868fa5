import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { z } from 'zod'
import { ownKindSchema, ownSchemas, type OwnKind, type WriteLibraryItem } from '@shared/schemas/library.ts'
import { libraryItemSchema, type LibraryItem } from '@shared/schemas/records.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, EmptyState, PageHead, RecordError, Skeleton } from '@/components/states.tsx'
import { say } from '@/components/toast.tsx'
import { useSaveKey } from '@/hooks/keys.ts'
import { useMay } from '@/hooks/session.ts'
import { useUnsaved } from '@/hooks/unsaved.ts'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { asProblem, ProblemError } from '@/lib/problem.ts'
import { query } from '@/lib/query.ts'
import { OwnRowField } from '../components/OwnRowFields.tsx'
import { KIND_NAMES } from '../columns.tsx'
import { OWN_FIELDS, startOf } from '../own-form.ts'
import { NoSuchPart } from './LibraryPage.tsx'

/** Adds a row of the organization's own (`/new`, perhaps `?from=` another row) or changes one (`/edit`). */
export function OwnRowPage() {
  const { kind, id } = useParams()
  const [search] = useSearchParams()
  const own = ownKindSchema.safeParse(kind)
  const manages = useMay('library.manage')
  if (!own.success) return <NoSuchPart />
  if (!manages) {
    return (
      <>
        <PageHead title="Not for your roles" />
        <EmptyState title="Engineers and administrators write the library" step={<ButtonLink to={`/library/${own.data}`}>Back to the list</ButtonLink>}>
          <p>Ask one of them for the row that is missing, with a paper that says its figures.</p>
        </EmptyState>
      </>
    )
  }
  const from = id ?? search.get('from')
  return from ? <From key={from} kind={own.data} id={from} changes={id !== undefined} /> : <Form kind={own.data} item={null} from={null} />
}

function From({ kind, id, changes }: { kind: OwnKind; id: string; changes: boolean }) {
  const item = useQuery(query('readLibraryItem', { params: { kind, id } }))
  if (item.isPending) return <Skeleton label="Reading the library" />
  if (item.isError) return <RecordError title="The row can’t be shown" error={item.error} onRetry={() => void item.refetch()} />
  if (changes && item.data.origin !== 'own') {
    return (
      <>
        <PageHead title={item.data.title} />
        <EmptyState title="A reference row stays as its source has it" step={<ButtonLink to={`/library/${kind}/new?from=${id}`}>Start our own from it</ButtonLink>}>
          <p>Where a figure differs in your edition, write a row of your own: it is found first, and says that it is yours.</p>
        </EmptyState>
      </>
    )
  }
  return <Form kind={kind} item={changes ? item.data : null} from={changes ? null : item.data} />
}

/** A field of the body, `content.p_no`, is `p_no` in the form. */
const ofForm = (error: unknown): ProblemError => {
  const { problem } = asProblem(error)
  return new ProblemError({ ...problem, errors: problem.errors?.map((one) => ({ ...one, field: one.field.replace(/^content\./, '') })) })
}

function Form({ kind, item, from }: { kind: OwnKind; item: LibraryItem | null; from: LibraryItem | null }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const [theirs, setTheirs] = useState<LibraryItem | null>(null)
  const form = useZodForm(ownSchemas[kind] as unknown as z.ZodType<Record<string, unknown>, Record<string, unknown>>, startOf(kind, (item ?? from)?.content ?? null, item === null))
  const { errors, isDirty } = form.formState
  const back = item ? `/library/${kind}/${item.id}` : `/library/${kind}`
  const save = useMutation({
    mutationFn: ({ content, version }: { content: Record<string, unknown>; version: number }) => {
      // Parsed by the kind's own schema just before.
      const body = { kind, content } as unknown as WriteLibraryItem
      return item ? call('saveLibraryItem', { params: { kind, id: item.id }, body, ifMatch: version }) : call('createLibraryItem', { body })
    },
    onSuccess: (stored) => {
      for (const key of ['listLibrary', 'combo']) void client.invalidateQueries({ queryKey: [key] })
      client.setQueryData(query('readLibraryItem', { params: { kind, id: stored.id } }).queryKey, stored)
      say(item ? `${stored.title} is saved` : `${stored.title} is in your library`)
      void navigate(`/library/${kind}/${stored.id}`)
    },
    onError: (error) => {
      const current = libraryItemSchema.safeParse(asProblem(error).current)
      if (current.success) setTheirs(current.data)
      else showProblem(form, ofForm(error))
    },
  })
  useUnsaved(isDirty && !save.isSuccess)
  const send = (version: number) => form.handleSubmit((content) => !save.isPending && save.mutate({ content, version }))()
  useSaveKey(() => void send(item?.version ?? 0))
  const { title, kind: called, one } = KIND_NAMES[kind]
  return (
    <>
      <Breadcrumb trail={[{ label: title, to: `/library/${kind}` }, ...(item ? [{ label: item.title, to: back }, { label: 'Change' }] : [{ label: 'Our own' }])]} />
      <PageHead title={item ? item.title : `${called} of our own`}>{item ? 'Records keep what they copied of it; only new ones take the change.' : from ? `Started from ${from.title}. Change what differs, and say where your figures come from.` : `It is found by type-ahead and copied into procedures as ${one} of the reference is, and says that it is yours.`}</PageHead>
      {theirs && (
        <div role="alert" className="mb-4 border-l-[3px] border-l-oxide bg-oxide-bg px-4 py-3">
          <p className="font-semibold">Somebody else saved {theirs.title} since you opened it</p>
          <p className="max-w-prose">Nothing of yours is lost: look at theirs, or save yours over it.</p>
          <p className="mt-2 flex flex-wrap gap-2">
            <Button onClick={() => void send(theirs.version)}>Save mine over it</Button>
            <Button
              onClick={() => {
                form.reset(startOf(kind, theirs.content, false))
                client.setQueryData(query('readLibraryItem', { params: { kind, id: theirs.id } }).queryKey, theirs)
                setTheirs(null)
              }}
            >
              Take theirs
            </Button>
          </p>
        </div>
      )}
      <form
        noValidate
        onSubmit={(event) => {
          event.preventDefault()
          void send(item?.version ?? 0)
        }}
      >
        <Sheet title={called}>
          <div className="grid gap-x-6 gap-y-4 px-4 py-4 sm:grid-cols-2 lg:grid-cols-3">
            {OWN_FIELDS[kind].map((field) => (
              <OwnRowField key={`${theirs?.version ?? ''} ${field.name}`} form={form} field={field} />
            ))}
          </div>
        </Sheet>
        <div className="mt-4 space-y-3">
          <FormError message={errors.root?.message} />
          <div className="flex flex-wrap gap-2">
            <Button kind="primary" type="submit" pending={save.isPending}>
              {item ? 'Save' : 'Add it'}
            </Button>
            <ButtonLink to={back}>Not now</ButtonLink>
          </div>
        </div>
      </form>
    </>
  )
}
