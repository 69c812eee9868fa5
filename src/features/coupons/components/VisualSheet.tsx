import { Plus } from 'lucide-react'
import { visualTestSchema, type CouponContent } from '@shared/schemas/welding.ts'
import { Button } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { inputId, useSheet, useSheetField } from '@/components/variables/context.ts'
import { useCouponContent } from './coupon-sheet.ts'
import { visualFields } from './test-fields.ts'
import { TestRow } from './TestRow.tsx'
import { showsVisual } from './visual.ts'

type Visual = NonNullable<CouponContent['visual']>
const MARK = 'VT'

/** Visual examination of the finished test weld, as one result. */
export function VisualSheet() {
  const { control } = useSheet()
  const content = useCouponContent()
  if (!showsVisual(content, control !== null)) return null
  return (
    <Sheet id="visual" title="Visual examination" aside={content.visual ? 'recorded' : 'none recorded'}>
      {control ? <Typed /> : content.visual && <TestRow path="visual" fields={visualFields(content.variables)} test={{ id: 'visual', ...content.visual }} mark={MARK} />}
    </Sheet>
  )
}

function Typed() {
  const { variables } = useCouponContent()
  const { value, set, error } = useSheetField<Visual | null>('visual')
  if (!value) {
    return (
      <div id={inputId('visual')} tabIndex={-1} className="no-print flex flex-wrap items-center gap-2 px-4 py-3 max-sm:[&_button]:min-h-12">
        <Button icon={<Plus size={15} aria-hidden="true" />} onClick={() => set(visualTestSchema.parse({}))}>
          Visual examination
        </Button>
        <p className="max-w-prose text-sm text-soft">Of the finished weld, before anything is cut: cracks, craters, root, undercut, height.</p>
      </div>
    )
  }
  return (
    <>
      <TestRow path="visual" fields={visualFields(variables)} test={{ id: 'visual', ...value }} mark={MARK} onChange={(part) => set({ ...value, ...part })} onRemove={() => set(null)} />
      {error && (
        <p role="alert" className="px-4 py-2 text-sm font-medium text-oxide">
          {error}
        </p>
      )}
    </>
  )
}
