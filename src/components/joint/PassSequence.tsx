import { ArrowDown, ArrowUp, Plus, X } from 'lucide-react'
import { memo, useId, useState } from 'react'
import type { Quantity } from '@shared/schemas/common.ts'
import { layOutPasses, passEstimate } from '@shared/calculations/bead-layout.ts'
import type { JointGeometry } from '@shared/calculations/joint-geometry.ts'
import { drawnValue } from '@shared/calculations/joint-figures.ts'
import { heatOf } from '@shared/calculations/joint-picture.ts'
import { sequenceOf } from '@shared/calculations/pass-layout.ts'
import { beadFromSettings, changedPass, movedPass, passToProcess, withoutPass, withPass, withPlan } from '@shared/calculations/pass-sequence.ts'
import type { Pass, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { fromSi, SHOWN_UNIT } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { Button } from '@/components/Button.tsx'
import { QuantityField } from '@/components/fields/quantity.tsx'
import { say } from '@/components/toast.tsx'
import { LAYERS } from '@/components/variables/options.ts'
import { figure } from '@/lib/figures.ts'

const HEATS = ['bg-heat-1', 'bg-heat-2', 'bg-heat-3', 'bg-heat-4'] as const
const MOST = 200

export interface PassSequenceProps {
  variables: WeldingVariables
  geometry: JointGeometry
  system: UnitSystem
  onChange: (change: (blocks: ProcessBlock[]) => ProcessBlock[]) => void
  /** The pass that is pointed at, by its place. */
  onHot: (order: number | null) => void
}

const nameOf = (blocks: readonly ProcessBlock[], block: ProcessBlock, index: number): string => {
  const name = block.process === 'OTHER' ? 'Another process' : (block.process ?? 'Process')
  return blocks.filter(({ process }) => process === block.process).length > 1 ? `${name} ${index + 1}` : name
}

/** The passes of all processes in the order in which they are welded: moved, given to another process, or laid out from bead sizes. */
export const PassSequence = memo(function PassSequence({ variables, geometry, system, onChange, onHot }: PassSequenceProps) {
  const blocks = variables.processes
  const head = useId()
  const steps = sequenceOf(blocks)
  const twoSides = (geometry.groove?.regions.length ?? 0) > 1 || (geometry.groove === null && geometry.fillets.length > 1)
  const move = (at: number, by: 1 | -1) => {
    onChange((now) => movedPass(now, at, at + by))
    requestAnimationFrame(() => document.getElementById(`${head}-${at + by}-${by === 1 ? 'down' : 'up'}`)?.focus())
  }
  const planned = (next: ProcessBlock[]) => {
    const before = blocks
    onChange((now) => now.map((block) => ({ ...block, passes: next.find(({ id }) => id === block.id)?.passes ?? block.passes })))
    say('Passes laid out from the bead sizes', { undo: () => onChange((now) => now.map((block) => ({ ...block, passes: before.find(({ id }) => id === block.id)?.passes ?? block.passes }))) })
  }
  return (
    <section aria-labelledby={head} className="no-print border-b border-rule px-4 py-3">
      <h3 id={head} className="cell-label">
        Pass sequence
      </h3>
      <LayOut {...{ variables, geometry, system, twoSides }} onPlan={planned} />
      {steps.length > 0 && (
        <ol className="mt-3 border-t border-hair">
          {steps.map(({ block, pass }, order) => (
            <li key={order} className="flex flex-wrap items-center gap-x-2 gap-y-1 border-b border-hair py-1" onPointerEnter={() => onHot(order)} onPointerLeave={() => onHot(null)} onFocus={() => onHot(order)} onBlur={() => onHot(null)}>
              <span aria-hidden="true" className={`h-8 w-1.5 shrink-0 ${HEATS[heatOf(order, steps.length)] ?? HEATS[3]}`} />
              <span className="w-8 shrink-0 font-narrow text-lg font-semibold">{pass.number}</span>
              <Choice label={`Place ${order + 1}, process`} value={blocks[block]?.id ?? ''} options={blocks.map((one, index) => ({ value: one.id, label: nameOf(blocks, one, index) }))} onChange={(id) => onChange((now) => passToProcess(now, order, id))} wide />
              <Choice label={`Place ${order + 1}, layer`} value={pass.layer ?? ''} empty="Layer" options={LAYERS} onChange={(layer) => onChange((now) => changedPass(now, order, { layer: (layer || null) as Pass['layer'] }))} />
              {twoSides && <Choice label={`Place ${order + 1}, side`} value={pass.side ?? ''} empty="Side" options={[{ value: 'first', label: 'Side 1' }, { value: 'second', label: 'Side 2' }]} onChange={(side) => onChange((now) => changedPass(now, order, { side: (side || null) as Pass['side'] }))} />}
              <span className="min-w-20 grow text-right text-sm text-soft">{pass.beadArea ? `${figure(fromSi(pass.beadArea.si, 'area', SHOWN_UNIT[system].area), system === 'SI' ? 1 : 3)} ${SHOWN_UNIT[system].area}` : ''}</span>
              <span className="flex shrink-0">
                <Icon id={`${head}-${order}-up`} label={`Move place ${order + 1} earlier`} disabled={order === 0} onClick={() => move(order, -1)}>
                  <ArrowUp size={15} aria-hidden="true" />
                </Icon>
                <Icon id={`${head}-${order}-down`} label={`Move place ${order + 1} later`} disabled={order === steps.length - 1} onClick={() => move(order, 1)}>
                  <ArrowDown size={15} aria-hidden="true" />
                </Icon>
                <Icon id={`${head}-${order}-out`} label={`Take out place ${order + 1}`} disabled={false} onClick={() => onChange((now) => withoutPass(now, order))}>
                  <X size={15} aria-hidden="true" />
                </Icon>
              </span>
            </li>
          ))}
        </ol>
      )}
      {steps.length < MOST && blocks.length > 0 && (
        <p className="mt-2">
          <Button kind="quiet" icon={<Plus size={14} aria-hidden="true" />} onClick={() => onChange((now) => withPass(now))}>
            Add to the sequence
          </Button>
        </p>
      )}
    </section>
  )
})

/** Bead sections of each process, and the passes that they make. */
function LayOut({ variables, geometry, system, twoSides, onPlan }: { variables: WeldingVariables; geometry: JointGeometry; system: UnitSystem; twoSides: boolean; onPlan: (blocks: ProcessBlock[]) => void }) {
  const blocks = variables.processes
  const [beads, setBeads] = useState<Readonly<Record<string, Quantity | null>>>({})
  const [problem, setProblem] = useState<string | null>(null)
  const beadOf = (block: ProcessBlock): Quantity | null => (block.id in beads ? (beads[block.id] ?? null) : (block.passes.find(({ beadArea }) => beadArea)?.beadArea ?? null))
  const layOut = () => {
    const plan = layOutPasses(geometry, blocks.map((block) => ({ processId: block.id, bead: beadOf(block)?.si ?? 0, height: blocks.length > 1 ? drawnValue(block.depositThickness) : null })))
    if (!plan.ok) return setProblem(plan.sentence)
    setProblem(null)
    onPlan(withPlan(blocks, plan.passes, twoSides))
  }
  const last = blocks.at(-1)
  const bead = last ? (beadOf(last)?.si ?? null) : null
  const count = bead === null ? null : passEstimate(geometry, bead)
  return (
    <div className="mt-1.5">
      <div className="flex flex-wrap items-end gap-3">
        {blocks.map((block, index) => {
          const before = beadFromSettings(block)
          const unit = SHOWN_UNIT[system].area
          return <QuantityField key={block.id} className="w-40" label={`Bead, ${nameOf(blocks, block, index)}, ${unit}`} dimension="area" system={system} value={beadOf(block)} onChange={(value) => setBeads({ ...beads, [block.id]: value })} description={before === null ? undefined : `settings give ${figure(fromSi(before, 'area', unit), system === 'SI' ? 1 : 3)} ${unit} before losses`} />
        })}
        <Button onClick={layOut}>Lay out from bead size</Button>
        {count !== null && (
          <p className="py-2 text-sm text-soft">
            about {count} {count === 1 ? 'pass' : 'passes'} of that size
          </p>
        )}
      </div>
      {problem && (
        <p role="alert" className="mt-1 text-sm font-medium text-oxide">
          {problem}
        </p>
      )}
    </div>
  )
}

function Choice({ label, value, options, empty, wide = false, onChange }: { label: string; value: string; options: readonly { value: string; label: string }[]; empty?: string; wide?: boolean; onChange: (value: string) => void }) {
  return (
    <select aria-label={label} className={`box w-auto! ${wide ? 'min-w-26' : 'min-w-22'}`} value={value} onChange={(event) => onChange(event.target.value)}>
      {empty !== undefined && <option value="">{empty}</option>}
      {options.map((option) => (
        <option key={option.value} value={option.value}>
          {option.label}
        </option>
      ))}
    </select>
  )
}

function Icon({ id, label, disabled, onClick, children }: { id: string; label: string; disabled: boolean; onClick: () => void; children: React.ReactNode }) {
  return (
    <button id={id} type="button" aria-label={label} disabled={disabled} onClick={onClick} className="flex size-9 items-center justify-center rounded text-soft hover:text-ink disabled:opacity-35">
      {children}
    </button>
  )
}
