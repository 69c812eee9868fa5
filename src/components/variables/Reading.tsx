import type { Pass } from '@shared/schemas/welding.ts'
import { readPath } from '@/lib/draft/paths.ts'
import type { RowSpec } from './catalogue.ts'
import { useSheet } from './context.ts'
import { valueInWords } from './labels.ts'
import { PanelReading } from './PanelEditor.tsx'
import { PassTable } from './PassTable.tsx'

/** A row's value as text, for whoever may only read. */
export function Reading({ spec, path, prefix }: { spec: RowSpec; path: string; prefix: string }) {
  const { content, system } = useSheet()
  const words = (at: string) => valueInWords(at, readPath(content.variables, at), content, system)
  if (spec.kind === 'passes') return <PassTable passes={readPath(content.variables, path) as Pass[]} />
  if (spec.kind === 'panel') return <PanelReading path={path} />
  if (spec.kind === 'pair') {
    const both = spec.paths.map((one) => words(`${prefix}${one}`))
    // Names are read as a pair, "1 to 1"; of a figure or a yes that both share, one is enough.
    const names = spec.of.kind === 'text' || spec.of.kind === 'whole'
    return <p className="font-medium">{names ? both.join(' to ') : [...new Set(both)].join(' and ')}</p>
  }
  return <p className={spec.kind === 'paragraph' ? 'max-w-prose whitespace-pre-line' : 'font-medium'}>{words(path)}</p>
}
