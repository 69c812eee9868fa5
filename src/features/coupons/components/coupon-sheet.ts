import type { CouponContent } from '@shared/schemas/welding.ts'
import { useSheet, useSheetField } from '@/components/variables/context.ts'

/** The content of the sheet that this feature shows: always a whole coupon. */
export const useCouponContent = (): CouponContent => useSheet().content as CouponContent

type List = 'runSheet' | 'tension' | 'bends' | 'macros' | 'toughness' | 'hardness' | 'ndt'
export type Listed<K extends List> = NonNullable<CouponContent[K]>

/** A list of the coupon while it is typed in. Every change builds on the list as it stands that instant. */
export function useList<K extends List>(name: K): { items: Listed<K>; error: string | null; put: (next: Listed<K>) => void; change: (index: number, part: Partial<Listed<K>[number]>) => void; remove: (index: number) => void } {
  const { value: kept, set, error } = useSheetField<Listed<K> | null>(name)
  const value = kept ?? []
  return {
    items: value,
    error,
    put: set,
    change: (index, part) => set(value.map((one, at) => (at === index ? { ...one, ...part } : one)) as Listed<K>),
    remove: (index) => set(value.filter((_one, at) => at !== index) as Listed<K>),
  }
}
