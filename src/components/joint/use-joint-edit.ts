import { useController, useWatch, type Control, type FieldValues } from 'react-hook-form'
import { useCallback, useEffect, useMemo, useRef } from 'react'
import type { Interval } from '@shared/schemas/common.ts'
import type { Joint, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { jointGeometry, settingOf, type JointGeometry, type JointSetting } from '@shared/calculations/joint-geometry.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { useJointLive, useJointStore } from './live.tsx'

/** ms after the last move of a key until it is written. */
const REST = 400

/** A weld's variables with what is being typed or dragged. */
function withPreview(variables: WeldingVariables, preview: ReadonlyMap<string, { value: Interval | null }>): WeldingVariables {
  if (preview.size === 0) return variables
  let next = variables
  for (const [field, { value }] of preview) {
    const key = field.startsWith('joint.') ? field.slice(6) : null
    if (key) next = { ...next, joint: { ...next.joint, [key]: value } }
    else if (field === 'thickness' || field === 'thicknessB' || field === 'diameter') next = { ...next, [field]: value }
  }
  return next
}

const NONE: ReadonlyMap<string, { value: Interval | null; from: 'field' | 'drawing' }> = new Map()

export interface JointEdit {
  /** As typed or dragged at this moment. */
  variables: WeldingVariables
  setting: JointSetting
  geometry: JointGeometry
  /** What a field holds in the form. */
  kept: (field: string) => Interval | null
  /** Shows a value in the drawing and its field; it is written when the hand rests. False where the joint could not be drawn with it. */
  show: (field: string, value: Interval | null) => boolean
  /** Writes what is shown. */
  settle: () => void
  /** Takes back what is shown. */
  cancel: (field: string) => void
  /** Writes a value at once. */
  write: (field: string, value: Interval | null) => void
  setJoint: (change: Partial<Joint>) => void
  changeBlocks: (change: (blocks: ProcessBlock[]) => ProcessBlock[]) => void
}

/** The joint of a form, drawn at every keystroke and move of the hand. */
export function useJointEdit(control: Control<FieldValues>, system: UnitSystem): JointEdit {
  const store = useJointStore()
  const typed = useWatch({ control, name: 'variables' }) as WeldingVariables
  const joint = useController({ control, name: 'variables.joint' }).field
  const thickness = useController({ control, name: 'variables.thickness' }).field
  const thicknessB = useController({ control, name: 'variables.thicknessB' }).field
  const processes = useController({ control, name: 'variables.processes' }).field
  const preview = useJointLive((live) => (live.preview.size === 0 ? NONE : live.preview))
  const variables = useMemo(() => withPreview(typed, preview), [typed, preview])
  const setting = useMemo(() => settingOf(variables, system), [variables, system])
  const geometry = useMemo(() => jointGeometry(setting), [setting])

  const { problems } = geometry
  useEffect(() => store.setProblems(new Map(problems.filter(({ lacking }) => !lacking).map(({ path, sentence }) => [path, sentence]))), [store, problems])

  const kept = (field: string): Interval | null => {
    if (field === 'thickness') return typed.thickness
    if (field === 'thicknessB') return typed.thicknessB
    return (typed.joint[field.slice(6) as keyof Joint] ?? null) as Interval | null
  }
  const writeAll = (values: readonly (readonly [string, Interval | null])[]) => {
    const ofJoint = values.filter(([field]) => field.startsWith('joint.')).map(([field, value]) => [field.slice(6), value] as const)
    if (ofJoint.length > 0) joint.onChange({ ...(joint.value as Joint), ...Object.fromEntries(ofJoint) })
    for (const [field, value] of values) {
      if (field === 'thickness') thickness.onChange(value)
      else if (field === 'thicknessB') thicknessB.onChange(value)
    }
  }
  const writeBlocks = processes.onChange
  // Two quick changes build on one another, also before the first is drawn.
  const blocks = useRef(typed.processes)
  useEffect(() => {
    blocks.current = typed.processes
  }, [typed.processes])
  const changeBlocks = useCallback((change: (blocks: ProcessBlock[]) => ProcessBlock[]) => {
    blocks.current = change(blocks.current)
    writeBlocks(blocks.current)
  }, [writeBlocks])
  const timer = useRef<ReturnType<typeof setTimeout> | null>(null)
  const settle = () => {
    if (timer.current) clearTimeout(timer.current)
    timer.current = null
    const moved = [...store.read().preview].filter(([, { from }]) => from === 'drawing')
    if (moved.length === 0) return
    writeAll(moved.map(([field, { value }]) => [field, value] as const))
    for (const [field] of moved) store.clear(field)
  }
  const settleNow = useRef(settle)
  useEffect(() => {
    settleNow.current = settle
  })
  useEffect(
    () => () => {
      if (timer.current) clearTimeout(timer.current)
    },
    [],
  )
  const show = (field: string, value: Interval | null): boolean => {
    const candidate = settingOf(withPreview(variables, new Map([[field, { value }]])), system)
    if (jointGeometry({ ...candidate, blocks: [] }).problems.length > 0) return false
    store.show(field, value, 'drawing')
    if (timer.current) clearTimeout(timer.current)
    timer.current = setTimeout(() => settleNow.current(), REST)
    return true
  }
  return {
    variables, setting, geometry, kept, show, settle,
    cancel: (field) => store.clear(field),
    write: (field, value) => {
      store.clear(field)
      writeAll([[field, value]])
    },
    setJoint: (change) => joint.onChange({ ...(joint.value as Joint), ...change }),
    changeBlocks,
  }
}
