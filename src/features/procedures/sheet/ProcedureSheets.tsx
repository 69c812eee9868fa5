import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { SectionNav, type SectionLink } from '@/components/SectionNav.tsx'
import type { ReactNode } from 'react'
import type { Verdict } from '@shared/schemas/assessment.ts'
import { APPLICATION, BASE_METALS, BLOCK_SECTIONS, blockSectionId, PREHEAT, PWHT } from '@/components/variables/catalogue.ts'
import { useSheet } from '@/components/variables/context.ts'
import { CouponsSheet } from './CouponsSheet.tsx'
import { JointLiveProvider } from '@/components/joint/live.tsx'
import { JointSheet } from '@/components/variables/JointSheet.tsx'
import { metalInWords } from '@/components/variables/labels.ts'
import { ProcessSheets, type ProcessSheetsProps } from '@/components/variables/ProcessSheets.tsx'
import { useProcedureContent } from './procedure-content.ts'
import { ScopeSheet, Text } from './ScopeSheet.tsx'
import { isShown, SectionSheet, SheetField } from '@/components/variables/SheetField.tsx'

/** The whole procedure as ruled sheets, in document order; typed in where the context has a form, read otherwise. */
export function ProcedureSheets(acts: Omit<ProcessSheetsProps, 'blocks'>) {
  const { control } = useSheet()
  const content = useProcedureContent()
  const { baseMetals, processes } = content.variables
  const metals = [baseMetals.a, baseMetals.b].map(metalInWords).filter(Boolean)
  return (
    <JointLiveProvider>
      <JointSheet />
      <Sheet id="base-metals" title="Base metals" aside={metals.join(' to ') || undefined}>
        {BASE_METALS.rows.map((spec) => (
          <SheetField key={spec.path} spec={spec} />
        ))}
      </Sheet>
      <SectionSheet section={APPLICATION} />
      <ProcessSheets blocks={processes} {...acts} />
      <SectionSheet section={PREHEAT} />
      <SectionSheet section={PWHT} />
      <CouponsSheet />
      <ScopeSheet />
      {(control || content.notes) && (
        <Sheet id="notes" title="Notes">
          <SheetRow label="Notes" unit="printed at the end">
            {control ? <Text name="notes" label="Notes" max={4000} rows={4} /> : <p className="max-w-prose whitespace-pre-line">{content.notes}</p>}
          </SheetRow>
        </Sheet>
      )}
    </JointLiveProvider>
  )
}

/** The index of the sheets, each with the worst verdict found in it; it stays in sight, and with it what is given as children. */
export function ProcedureNav({ verdicts, children }: { verdicts: ReadonlyMap<string, Verdict>; children?: ReactNode }) {
  const sheet = useSheet()
  const { control } = sheet
  const content = useProcedureContent()
  const { processes } = content.variables
  const link = (id: string, label: string): SectionLink => ({ id, label, verdict: verdicts.get(id) ?? null })
  const sections = [
    link('joint', 'Joint'),
    link('base-metals', 'Base metals'),
    ...(APPLICATION.rows.some((spec) => isShown(spec, '', null, sheet)) ? [link('application', APPLICATION.short ?? APPLICATION.title)] : []),
    ...processes.flatMap((block, index) =>
      BLOCK_SECTIONS.filter(({ rows }) => rows.some((spec) => isShown(spec, `processes.${index}.`, block, sheet))).map(({ id, title }) => link(blockSectionId(index, id), processes.length === 1 ? title : `${index + 1} ${id === 'process' && block.process ? block.process : title}`)),
    ),
    link('preheat', PREHEAT.title),
    link('pwht', PWHT.short ?? PWHT.title),
    link('coupons', 'Coupons'),
    link('scope', 'Scope'),
    ...(!control && !content.notes ? [] : [link('notes', 'Notes')]),
  ]
  return (
    <div className="xl:sticky xl:top-4 xl:max-h-[calc(100dvh-2rem)] xl:overflow-y-auto">
      <SectionNav sections={sections} label="Sheets of the procedure" />
      {children}
    </div>
  )
}
