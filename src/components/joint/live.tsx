/**
 * What the drawing of a joint and the fields around it tell one another: which figure is pointed at, what is being typed or dragged
 * before it is written, and what of it can't be. Outside React's tree, so that a keystroke redraws the drawing and one field, nothing else.
 */
import { createContext, useCallback, useContext, useState, useSyncExternalStore, type ReactNode } from 'react'
import type { Interval } from '@shared/schemas/common.ts'

export interface JointLive {
  /** Field that is pointed at or being written. */
  hot: string | null
  /** Values on their way, by their field; they are drawn, and shown in the field when the drawing is what changes them. */
  preview: ReadonlyMap<string, { value: Interval | null; from: 'field' | 'drawing' }>
  /** What can't be, by its field. */
  problems: ReadonlyMap<string, string>
}
export interface JointStore {
  read: () => JointLive
  subscribe: (listener: () => void) => () => void
  setHot: (field: string | null) => void
  show: (field: string, value: Interval | null, from: 'field' | 'drawing') => void
  clear: (field: string) => void
  setProblems: (problems: ReadonlyMap<string, string>) => void
}

const NOTHING: JointLive = { hot: null, preview: new Map(), problems: new Map() }

function createJointStore(): JointStore {
  let live = NOTHING
  const listeners = new Set<() => void>()
  const put = (next: Partial<JointLive>) => {
    live = { ...live, ...next }
    for (const listener of listeners) listener()
  }
  return {
    read: () => live,
    subscribe: (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    setHot: (hot) => hot !== live.hot && put({ hot }),
    show: (field, value, from) => put({ preview: new Map(live.preview).set(field, { value, from }) }),
    clear: (field) => {
      if (!live.preview.has(field)) return
      const preview = new Map(live.preview)
      preview.delete(field)
      put({ preview })
    },
    setProblems: (problems) => {
      const same = problems.size === live.problems.size && [...problems].every(([field, sentence]) => live.problems.get(field) === sentence)
      if (!same) put({ problems })
    },
  }
}

const Context = createContext<JointStore | null>(null)
const silent = createJointStore()

/** Joins the drawing and the fields of one record. */
export function JointLiveProvider({ children }: { children: ReactNode }) {
  const [store] = useState(createJointStore)
  return <Context value={store}>{children}</Context>
}

/** The store of the record around; one that nobody hears where there is none. */
export const useJointStore = (): JointStore => useContext(Context) ?? silent

export function useJointLive<T>(pick: (live: JointLive) => T): T {
  const store = useJointStore()
  return useSyncExternalStore(store.subscribe, () => pick(store.read()))
}

/** A field's part in it: whether the drawing points at it, what the drawing is making of it, what can't be of it. */
export function useJointField(field: string): { hot: boolean; dragged: { value: Interval | null } | null; problem: string | null; typing: (value: Interval | null) => void; enter: () => void; leave: () => void } {
  const store = useJointStore()
  const hot = useJointLive((live) => live.hot === field)
  const preview = useJointLive((live) => live.preview.get(field))
  const problem = useJointLive((live) => live.problems.get(field) ?? null)
  const typing = useCallback((value: Interval | null) => store.show(field, value, 'field'), [store, field])
  const enter = useCallback(() => store.setHot(field), [store, field])
  const leave = useCallback(() => {
    store.clear(field)
    store.setHot(null)
  }, [store, field])
  return { hot, dragged: preview?.from === 'drawing' ? preview : null, problem, typing, enter, leave }
}
