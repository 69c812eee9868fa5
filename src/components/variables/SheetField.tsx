import { memo } from 'react'
import type { Finding } from '@shared/schemas/assessment.ts'
import type { ProcessBlock } from '@shared/schemas/welding.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { Margin } from '@/components/margin/Margin.tsx'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { worstVerdict } from '@/components/Verdict.tsx'
import { readPath } from '@/lib/draft/paths.ts'
import { isOffered, type RowSpec, type SectionSpec } from './catalogue.ts'
import { useSheet, type SheetValue } from './context.ts'
import { Editor } from './Editor.tsx'
import { gaugeOf, testedInWords } from './findings.ts'
import { missingInWords } from './labels.ts'
import { Reading } from './Reading.tsx'
import { RowWork } from './RowWork.tsx'

const NONE: readonly Finding[] = []

/** Whether anything is stated at a path. */
export function isStated(value: unknown): boolean {
  if (value === null || value === undefined || value === '') return false
  if (Array.isArray(value)) return value.length > 0
  if (typeof value === 'object' && 'all' in value) return Object.values(value).some((part) => part !== null && part !== false)
  if (typeof value === 'object' && 'libraryId' in value) return Object.entries(value).some(([key, part]) => key !== 'added' && key !== 'libraryId' && isStated(part))
  return true
}

/** Whether a row has a place: it arises here, or something is stated or found in it. */
export function isShown(spec: RowSpec, prefix: string, block: ProcessBlock | null, sheet: Pick<SheetValue, 'content' | 'control' | 'findings' | 'record'>): boolean {
  const { variables } = sheet.content
  const paths = spec.kind === 'pair' ? spec.paths : [spec.path]
  const stated = paths.some((path) => isStated(readPath(variables, `${prefix}${path}`)))
  if (stated && !spec.told) return true
  if (sheet.findings.get(`${prefix}${spec.path}`)?.some(({ verdict }) => verdict !== 'within')) return true
  return (sheet.control !== null || stated) && isOffered(spec, variables, block, sheet.record ?? 'procedure')
}

/** A row of the sheet as the catalogue tells it: label, input or value, gauge, and its notes in the margin. */
export const SheetField = memo(function SheetField({ spec, prefix = '', block = null }: { spec: RowSpec; prefix?: string; block?: ProcessBlock | null }) {
  const sheet = useSheet()
  const path = `${prefix}${spec.path}`
  const findings = sheet.findings.get(path) ?? NONE
  if (!isShown(spec, prefix, block, sheet)) return null
  if (spec.kind === 'passes' && sheet.control) {
    return (
      <div className="sheet-row relative">
        <div className="px-4 py-3">
          <Editor spec={spec} path={path} prefix={prefix} block={block} />
        </div>
        <Notes findings={findings} />
      </div>
    )
  }
  return (
    <SheetRow label={spec.label} unit={unitOf(spec, sheet.system)} verdict={worstVerdict(findings.map(({ verdict }) => verdict))} gauge={gauge(spec, findings, sheet)} margin={<>{sheet.control && <RowWork spec={spec} prefix={prefix} block={block} />}<Notes findings={findings} /></>}>
      {sheet.control ? <Editor spec={spec} path={path} prefix={prefix} block={block} /> : <Reading spec={spec} path={path} prefix={prefix} />}
    </SheetRow>
  )
})

/** One part of the weld as a sheet of its own; left out where none of its rows has a place. */
export function SectionSheet({ section }: { section: SectionSpec }) {
  const sheet = useSheet()
  if (!section.rows.some((spec) => isShown(spec, '', null, sheet))) return null
  return (
    <Sheet id={section.id} title={section.title}>
      {section.rows.map((spec) => (
        <SheetField key={spec.path} spec={spec} />
      ))}
    </Sheet>
  )
}

/** A row's notes; without a place of its own it stands at the right of its nearest positioned ancestor. */
export function Notes({ findings }: { findings: readonly Finding[] }) {
  const { attention, onFix, couponNumber, content } = useSheet()
  const shown = (attention ? findings.filter(({ verdict }) => verdict !== 'within') : findings).map((finding) => ({ ...finding, missing: missingInWords(finding.missing, content) }))
  return <Margin findings={shown} onFix={onFix} couponNumber={couponNumber} />
}

function unitOf(spec: RowSpec, system: 'SI' | 'US') {
  if (spec.kind === 'interval' || spec.kind === 'quantity') return spec.dimension === 'angle' ? 'degrees' : SHOWN_UNIT[system][spec.dimension]
  if (spec.kind === 'pair' && spec.of.kind === 'quantity') return `${SHOWN_UNIT[system][spec.of.dimension]}, A and B`
  if (spec.kind === 'sizes') return `${SHOWN_UNIT[system].length}, commas between`
  return spec.hint
}

/** Kinds whose input uses the row's whole width. */
const WIDE = ['text', 'paragraph', 'metal', 'filler', 'gas', 'panel', 'passes', 'positions']
const isWide = (spec: RowSpec) => (WIDE.includes(spec.kind) && !(spec.kind === 'text' && spec.max <= 20)) || (spec.kind === 'pair' && (spec.of.kind === 'flag' || (spec.of.kind === 'text' && spec.of.max > 20)))

function gauge(spec: RowSpec, findings: readonly Finding[], { system, couponNumber }: ReturnType<typeof useSheet>) {
  const drawn = gaugeOf(findings)
  if (drawn && (spec.kind === 'interval' || spec.kind === 'quantity')) return <RangeGauge label={spec.label} range={drawn.range} asked={drawn.asked} tested={drawn.tested} system={system} />
  if (isWide(spec)) return undefined
  const words = testedInWords(findings, couponNumber)
  return words ? <p className="text-soft">{words}</p> : null
}
