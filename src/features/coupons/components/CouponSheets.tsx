import { useMemo, type ReactNode } from 'react'
import type { Control, FieldValues } from 'react-hook-form'
import type { CouponQualification, Verdict } from '@shared/schemas/assessment.ts'
import { isOpen } from '@shared/records/coupon-states.ts'
import type { Coupon } from '@shared/schemas/records.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { ArcRecordings } from '@/components/arc/ArcRecordings.tsx'
import { MarginLayout } from '@/components/margin/MarginLayout.tsx'
import { Signatures } from '@/components/record/Signatures.tsx'
import { SectionNav, type SectionLink } from '@/components/SectionNav.tsx'
import { blockSectionId } from '@/components/variables/catalogue.ts'
import { SheetContext } from '@/components/variables/context.ts'
import { worstVerdict } from '@/components/Verdict.tsx'
import { useUnits } from '@/hooks/units.ts'
import { missingNotes, VERDICT_OF, verdictsOn } from '../judged.ts'
import { PhotosSheet } from './PhotosSheet.tsx'
import { QualifiesSheet } from './QualifiesSheet.tsx'
import { RunSheet } from './RunSheet.tsx'
import type { TestList } from './test-fields.ts'
import { JudgedContext } from './TestRow.tsx'
import { SpecimensSheet, TestSheets } from './TestSheets.tsx'
import { showsVisual } from './visual.ts'
import { LaboratorySheet, NotesSheet, WeldedSheets } from './WeldedSheets.tsx'

interface CouponSheetsProps {
  coupon: Coupon
  content: CouponContent
  /** null: the record is only read. */
  control: Control<FieldValues> | null
  qualifications: readonly CouponQualification[]
  head: ReactNode
}

const NONE = new Map<string, never>()

/** The whole record as ruled sheets, in the order in which a coupon comes about. */
export function CouponSheets({ coupon, content, control, qualifications, head }: CouponSheetsProps) {
  const { system } = useUnits()
  const first = qualifications[0]
  const findings = useMemo(() => (first && control ? missingNotes(first, content) : NONE), [first, control, content])
  const sheet = useMemo(() => ({ content, system, control, findings, record: 'coupon' as const, attention: false, couponNumber: (id: string) => (id === coupon.id ? coupon.number : undefined) }), [content, system, control, findings, coupon.id, coupon.number])
  return (
    <SheetContext value={sheet}>
      <JudgedContext value={qualifications}>
        <MarginLayout nav={<Index coupon={coupon} content={content} typed={control !== null} qualifications={qualifications} />} head={head}>
          <WeldedSheets />
          <RunSheet />
          <ArcRecordings of={{ couponId: coupon.id }} closed={!isOpen(coupon.state)} />
          <SpecimensSheet />
          <LaboratorySheet />
          <TestSheets />
          <PhotosSheet coupon={coupon} />
          <QualifiesSheet qualifications={qualifications} certified={coupon.state === 'certified'} />
          <NotesSheet />
          <Signatures signatures={coupon.signatures} />
        </MarginLayout>
      </JudgedContext>
    </SheetContext>
  )
}

const TESTS: readonly (readonly [TestList, string])[] = [['tension', 'Tension'], ['bends', 'Bends'], ['macros', 'Macro'], ['toughness', 'Toughness'], ['hardness', 'Hardness']]
/** Examined before specimens are cut. */
const EXAMINED: readonly (readonly [TestList, string])[] = [['ndt', 'NDT']]

function Index({ coupon, content, typed, qualifications }: { coupon: Coupon; content: CouponContent; typed: boolean; qualifications: readonly CouponQualification[] }) {
  const { processes } = content.variables
  const specimens = qualifications.flatMap((one) => one.specimens)
  const ofTests = (list: TestList): Verdict | null => worstVerdict((content[list] ?? []).flatMap(({ id }) => verdictsOn(qualifications, id).map(({ verdict }) => VERDICT_OF[verdict])))
  const sections: SectionLink[] = [
    { id: 'record', label: 'As welded' },
    { id: 'base-metals', label: 'Base metals' },
    { id: 'joint', label: 'Joint' },
    ...processes.map(({ process }, index) => ({ id: blockSectionId(index, 'process'), label: process ?? 'Process' })),
    { id: 'preheat', label: 'Preheat' },
    { id: 'run-sheet', label: 'Run sheet' },
    { id: 'arc-data', label: 'Arc data' },
    { id: 'specimens', label: 'Specimens', verdict: specimens.length === 0 ? null : specimens.every(({ recorded, required }) => recorded >= required) ? 'within' : 'cannot-tell' },
    { id: 'laboratory', label: 'Laboratory' },
    ...(showsVisual(content, typed) ? [{ id: 'visual', label: 'Visual', verdict: worstVerdict(verdictsOn(qualifications, 'visual').map(({ verdict }) => VERDICT_OF[verdict])) }] : []),
    ...[...EXAMINED, ...TESTS].filter(([list]) => typed || (content[list] ?? []).length > 0).map(([list, label]) => ({ id: list, label, verdict: ofTests(list) })),
    { id: 'photos', label: 'Photos' },
    { id: 'qualifies', label: 'Qualifies' },
    ...(typed || content.notes ? [{ id: 'notes', label: 'Notes' }] : []),
    ...(coupon.signatures.length > 0 ? [{ id: 'signatures', label: 'Signatures' }] : []),
  ]
  return <SectionNav sections={sections} label="Sheets of the coupon" />
}
