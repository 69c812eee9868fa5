import type { ReactNode } from 'react'
import { APPLICATION, BASE_METALS, PREHEAT, PWHT, WRITTEN_IN } from '@/components/variables/catalogue.ts'
import { inputId, useSheet, useSheetField } from '@/components/variables/context.ts'
import { JointLiveProvider } from '@/components/joint/live.tsx'
import { JointSheet } from '@/components/variables/JointSheet.tsx'
import { metalInWords } from '@/components/variables/labels.ts'
import { choiceInWords } from '@/components/variables/options.ts'
import { ProcessSheets } from '@/components/variables/ProcessSheets.tsx'
import { SectionSheet, SheetField } from '@/components/variables/SheetField.tsx'
import { StandardChoices } from '@/components/variables/StandardChoices.tsx'
import { TextArea, TextField } from '@/components/fields/text.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { day } from '@/lib/figures.ts'
import { useCouponContent } from './coupon-sheet.ts'

type Name = 'title' | 'weldedOn' | 'welder' | 'welderStamp' | 'witness' | 'machine' | 'laboratory' | 'reportNumber' | 'testedOn' | 'notes'
interface Row {
  name: Name
  label: string
  hint?: string
  kind?: 'date' | 'paragraph'
  max?: number
  example?: string
}

const RECORD: readonly Row[] = [
  { name: 'title', label: 'Title', max: 160 },
  { name: 'weldedOn', label: 'Welded on', kind: 'date' },
  { name: 'welder', label: 'Welder', max: 120 },
  { name: 'welderStamp', label: 'Stamp', max: 20, example: 'L11' },
  { name: 'witness', label: 'Witness', max: 120 },
  { name: 'machine', label: 'Machine', max: 120, example: 'M-03' },
]
const LABORATORY: readonly Row[] = [
  { name: 'laboratory', label: 'Laboratory', max: 160 },
  { name: 'reportNumber', label: 'Report number', max: 80 },
  { name: 'testedOn', label: 'Tested on', kind: 'date' },
]

/** What stands in the run sheet, or is asked of a procedure alone. */
const OMIT = ['passes', 'electrical.panel', 'electrical.current', 'electrical.voltage', 'electrical.wireFeed', 'electrical.travelSpeed']

/** The coupon as it was welded: the record, the metals, the joint, each process, heat. */
export function WeldedSheets() {
  const sheet = useSheet()
  const content = useCouponContent()
  const { standards, baseMetals, processes } = content.variables
  const metals = [baseMetals.a, baseMetals.b].map(metalInWords).filter(Boolean)
  return (
    <JointLiveProvider>
      <Sheet id="record" title="As welded" aside={standards.map(choiceInWords).join('; ')}>
        <Rows rows={RECORD} />
        <SheetRow label="Standards" unit="tested to each">
          {sheet.control ? <StandardChoices /> : <p className="font-medium">{standards.map(choiceInWords).join('; ')}</p>}
        </SheetRow>
        <SheetField spec={WRITTEN_IN} />
      </Sheet>
      <Sheet id="base-metals" title="Base metals" aside={[...new Set(metals)].join(' to ') || undefined}>
        {BASE_METALS.rows.map((spec) => (
          <SheetField key={spec.path} spec={spec} />
        ))}
      </Sheet>
      <SectionSheet section={APPLICATION} />
      <JointSheet />
      <ProcessSheets blocks={processes} omit={OMIT} />
      <SectionSheet section={PREHEAT} />
      <SectionSheet section={PWHT} />
    </JointLiveProvider>
  )
}

export function LaboratorySheet() {
  return (
    <Sheet id="laboratory" title="Laboratory">
      <Rows rows={LABORATORY} />
    </Sheet>
  )
}

export function NotesSheet() {
  const { control } = useSheet()
  const { notes } = useCouponContent()
  if (!control && !notes) return null
  return (
    <Sheet id="notes" title="Notes">
      <Rows rows={[{ name: 'notes', label: 'Notes', hint: 'printed with the record', kind: 'paragraph', max: 4000 }]} />
    </Sheet>
  )
}

function Rows({ rows }: { rows: readonly Row[] }) {
  const { control } = useSheet()
  const content = useCouponContent()
  return rows.map((row) => {
    const value = content[row.name]
    return (
      <SheetRow key={row.name} label={row.label} unit={row.hint}>
        {control ? <Typed row={row} /> : <Read>{value ? (row.kind === 'date' ? day(value) : value) : <span className="font-normal text-soft">not stated</span>}</Read>}
      </SheetRow>
    )
  })
}

const Read = ({ children }: { children: ReactNode }) => <p className="max-w-prose font-medium whitespace-pre-line">{children}</p>

function Typed({ row: { name, label, kind, max, example } }: { row: Row }) {
  const { value, set, error, onBlur } = useSheetField<string | null>(name)
  const shared = { id: inputId(name), label, labelHidden: true, maxLength: max, placeholder: example && `e.g. ${example}`, value: value ?? '', error, onBlur }
  const keep = (text: string) => set(text === '' && name !== 'title' ? null : text)
  if (kind === 'paragraph') return <TextArea {...shared} rows={4} onChange={(event) => keep(event.target.value)} />
  return <TextField {...shared} type={kind === 'date' ? 'date' : 'text'} className={kind === 'date' ? 'max-w-52' : ''} onChange={(event) => keep(event.target.value)} />
}
