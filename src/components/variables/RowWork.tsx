import { besideJoint, besideRow, type Use } from '@shared/calculations/beside.ts'
import type { ProcessBlock } from '@shared/schemas/welding.ts'
import { WorkItOut } from '@/components/work-it-out/WorkItOut.tsx'
import { useSheet } from './context.ts'
import type { RowSpec } from './row-spec.ts'

/** The calculators that belong beside a row, where it has any. */
export function RowWork({ spec, prefix, block }: { spec: RowSpec; prefix: string; block: ProcessBlock | null }) {
  const { content, system, record = 'procedure', onUse } = useSheet()
  const calculators = besideRow(spec.path, content.variables, block)
  if (calculators.length === 0) return null
  const index = /^processes\.(\d+)\./.exec(prefix)?.[1]
  const use = onUse && (({ field, value }: Use, label: string) => onUse({ kind: 'set', label, field, value }))
  return <WorkItOut className="-mt-1 px-4 pb-3 sm:pl-[10.5rem] lg:pl-[11.25rem]" what={block?.process ? `${block.process}, ${spec.label}` : spec.label} calculators={calculators} record={content} blockIndex={index === undefined ? null : Number(index)} system={system} of={record === 'coupon' ? 'coupon' : 'draft'} onUse={use} />
}

/** Weld metal, passes, consumables, time and cost beside the joint's computed figures, while it is written. */
export function JointWork() {
  const { content, control, system, record = 'procedure', onUse } = useSheet()
  if (!control) return null
  const use = onUse && (({ field, value }: Use, label: string) => onUse({ kind: 'set', label, field, value }))
  return <WorkItOut className="border-b border-hair px-4 py-2" what="weld metal, consumables, time and cost" calculators={besideJoint(content.variables)} record={content} blockIndex={null} system={system} of={record === 'coupon' ? 'coupon' : 'draft'} onUse={use} />
}
