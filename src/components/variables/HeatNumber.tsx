import { useQuery } from '@tanstack/react-query'
import { useId } from 'react'
import { Link } from 'react-router-dom'
import type { BaseMetal, Filler } from '@shared/schemas/welding.ts'
import { TextField } from '@/components/fields/text.tsx'
import { readPath } from '@/lib/draft/paths.ts'
import { query } from '@/lib/query.ts'
import { inputId, useSheet, useSheetField } from './context.ts'

/** Number of a heat or lot: the recorded ones of that grade are offered; one that is recorded leads to its page. */
export function HeatNumberEditor({ path, label, max }: { path: string; label: string; max: number }) {
  const id = useId()
  const { content } = useSheet()
  const { value, set, error, onBlur } = useSheetField<string | null>(`variables.${path}`)
  const kind = path.endsWith('.lot') ? 'lot' : 'heat'
  const owner = readPath(content.variables, path.slice(0, path.lastIndexOf('.'))) as BaseMetal | Filler | null
  const libraryId = owner?.libraryId ?? null
  const recorded = useQuery({ ...query('listHeats', { query: { kind, libraryId: libraryId ?? '', limit: 200, sort: '-updatedAt' } }), enabled: libraryId !== null, staleTime: 60_000 })
  const heats = libraryId === null ? [] : (recorded.data?.items ?? [])
  const named = heats.find(({ number }) => number === value)
  return (
    <>
      <TextField
        id={inputId(path)}
        label={label}
        labelHidden
        list={heats.length > 0 ? id : undefined}
        autoComplete="off"
        maxLength={max}
        value={value ?? ''}
        onBlur={onBlur}
        error={error}
        description={named && <Link to={`/library/heats/${named.id}`} className="text-link">Recorded{named.certificate ? `, certificate ${named.certificate}` : ''}</Link>}
        onChange={(event) => set(event.target.value === '' ? null : event.target.value)}
      />
      {heats.length > 0 && (
        <datalist id={id}>
          {heats.map(({ id: key, number, certificate }) => (
            <option key={key} value={number} label={certificate ? `${number}, certificate ${certificate}` : number} />
          ))}
        </datalist>
      )}
    </>
  )
}
