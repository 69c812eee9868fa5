import { TextArea, TextField } from '@/components/fields/text.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { WRITTEN_IN } from '@/components/variables/catalogue.ts'
import { useSheet, useSheetField } from '@/components/variables/context.ts'
import { choiceInWords } from '@/components/variables/options.ts'
import { SheetField } from '@/components/variables/SheetField.tsx'
import { StandardChoices } from '@/components/variables/StandardChoices.tsx'
import { useProcedureContent } from './procedure-content.ts'

const orNull = (text: string) => (text === '' ? null : text)

/** What the procedure is for and by which standards it is judged. */
export function ScopeSheet() {
  const { control } = useSheet()
  const content = useProcedureContent()
  const { standards } = content.variables
  return (
    <Sheet id="scope" title="Scope" aside={standards.map(choiceInWords).join('; ')}>
      <SheetRow label="Title">{control ? <Title /> : <p className="font-medium">{content.title}</p>}</SheetRow>
      {(control || content.scope) && <SheetRow label="Scope">{control ? <Text name="scope" label="Scope" max={1000} example="Groove welds in carbon steel vessels, shop and site" /> : <p className="max-w-prose whitespace-pre-line">{content.scope}</p>}</SheetRow>}
      <SheetRow label="Standards" unit="judged by each">
        {control ? <StandardChoices /> : <p className="font-medium">{standards.map(choiceInWords).join('; ')}</p>}
      </SheetRow>
      <SheetField spec={WRITTEN_IN} />
    </Sheet>
  )
}

function Title() {
  const { value, set, error, onBlur } = useSheetField<string>('title')
  return <TextField label="Title" labelHidden maxLength={160} value={value} onChange={(event) => set(event.target.value)} onBlur={onBlur} error={error} />
}

/** A text of the record itself rather than of the weld. */
export function Text({ name, label, max, example, rows = 2 }: { name: 'scope' | 'notes'; label: string; max: number; example?: string; rows?: number }) {
  const { value, set, error, onBlur } = useSheetField<string | null>(name)
  return <TextArea label={label} labelHidden rows={rows} maxLength={max} placeholder={example && `e.g. ${example}`} value={value ?? ''} onChange={(event) => set(orNull(event.target.value))} onBlur={onBlur} error={error} />
}
