import { ArrowDown, ArrowUp, Plus, X } from 'lucide-react'
import type { ProcessBlock } from '@shared/schemas/welding.ts'
import { Button } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { BLOCK_SECTIONS, blockSectionId, type SectionSpec } from './catalogue.ts'
import { useSheet } from './context.ts'
import { gasInWords } from './labels.ts'
import { MECHANISATIONS, TRANSFER_MODES, wordOf } from './options.ts'
import { isShown, SheetField } from './SheetField.tsx'

/** A block's short name: its process with how it is handled. */
export const blockName = (block: ProcessBlock): string => [block.process === 'OTHER' ? 'Another process' : (block.process ?? 'Process not stated'), block.mechanisation && wordOf(MECHANISATIONS, block.mechanisation).toLowerCase()].filter(Boolean).join(', ')

function summary(section: string, block: ProcessBlock): string | undefined {
  switch (section) {
    case 'filler':
      return block.filler.added === false ? 'autogenous' : (block.filler.classification ?? undefined)
    case 'positions':
      return block.positions.join(', ') || undefined
    case 'gas':
      return block.shieldingGas ? gasInWords(block.shieldingGas) : undefined
    case 'electrical':
      return [block.electrical.currentType, block.electrical.transferMode && wordOf(TRANSFER_MODES, block.electrical.transferMode).toLowerCase()].filter(Boolean).join(', ') || undefined
    case 'passes':
      return block.passes.length > 0 ? `${block.passes.length} ${block.passes.length === 1 ? 'row' : 'rows'}` : undefined
    default:
      return undefined
  }
}

export interface ProcessSheetsProps {
  blocks: readonly ProcessBlock[]
  /** Absent where the sheet is only read. */
  onMove?: (index: number, by: 1 | -1) => void
  onRemove?: (index: number) => void
  onAdd?: () => void
  /** Rows that have no place on this kind of record, by their path from the block. */
  omit?: readonly string[]
}

/** One process after the other, each with its own sheets; where there are several, each opens with its number and name. */
export function ProcessSheets({ blocks, onMove, onRemove, onAdd, omit = [] }: ProcessSheetsProps) {
  const several = blocks.length > 1
  return (
    <>
      {blocks.map((block, index) => (
        <div key={`${block.id} ${index}`} className="space-y-4">
          {several && (
            <header className="flex flex-wrap items-center justify-between gap-3 border-b-2 border-ink pt-3 pb-1.5">
              <p className="font-narrow text-2xl font-semibold">
                <span className="text-soft">{index + 1}</span> {blockName(block)}
              </p>
              {onMove && onRemove && (
                <p className="no-print flex gap-1">
                  <IconButton label={`Move ${block.process ?? 'process'} up`} disabled={index === 0} onClick={() => onMove(index, -1)}>
                    <ArrowUp size={16} aria-hidden="true" />
                  </IconButton>
                  <IconButton label={`Move ${block.process ?? 'process'} down`} disabled={index === blocks.length - 1} onClick={() => onMove(index, 1)}>
                    <ArrowDown size={16} aria-hidden="true" />
                  </IconButton>
                  <IconButton label={`Remove ${block.process ?? 'process'} ${index + 1}`} onClick={() => onRemove(index)}>
                    <X size={16} aria-hidden="true" />
                  </IconButton>
                </p>
              )}
            </header>
          )}
          {BLOCK_SECTIONS.map((section) => (
            <BlockSheet key={section.id} section={{ ...section, rows: section.rows.filter(({ path }) => !omit.includes(path)) }} block={block} index={index} lead={several ? `${block.process ?? 'Process'} · ` : ''} />
          ))}
        </div>
      ))}
      {onAdd && blocks.length < 8 && (
        <p className="no-print">
          <Button icon={<Plus size={15} aria-hidden="true" />} onClick={onAdd}>
            Another process
          </Button>
        </p>
      )}
    </>
  )
}

function BlockSheet({ section, block, index, lead }: { section: SectionSpec; block: ProcessBlock; index: number; lead: string }) {
  const sheet = useSheet()
  if (!section.rows.some((spec) => isShown(spec, `processes.${index}.`, block, sheet))) return null
  return (
    <Sheet id={blockSectionId(index, section.id)} title={`${lead}${section.title}`} aside={summary(section.id, block)}>
      {section.rows.map((spec) => (
        <SheetField key={spec.path} spec={spec} prefix={`processes.${index}.`} block={block} />
      ))}
    </Sheet>
  )
}

function IconButton({ label, disabled = false, onClick, children }: { label: string; disabled?: boolean; onClick: () => void; children: React.ReactNode }) {
  return (
    <button type="button" aria-label={label} disabled={disabled} onClick={onClick} className="flex size-8 items-center justify-center rounded border border-transparent hover:border-ink disabled:opacity-35">
      {children}
    </button>
  )
}
