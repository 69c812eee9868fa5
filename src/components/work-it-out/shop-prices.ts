import type { Calculator } from '@shared/calculations/catalogue.ts'
import type { InputTexts } from '@shared/calculations/calculator-texts.ts'
import { useRemembered } from '@/hooks/remembered.ts'

/** The shop's own: the same from weld to weld, so they are typed once a device. */
const OWN = ['fillerPrice', 'gasPrice', 'labourRate', 'operatorFactor'] as const

const isTexts = (value: unknown): value is InputTexts => typeof value === 'object' && value !== null && Object.values(value).every((each) => typeof each === 'string')

export interface ShopPrices {
  /** Kept texts of those inputs that the calculator has. */
  of: (calculator: Calculator) => InputTexts
  keep: (calculator: Calculator, changes: InputTexts) => void
  remembers: (key: string) => boolean
}

/** Prices and rates that somebody typed before, kept on this device and never sent. */
export function useShopPrices(): ShopPrices {
  const [kept, setKept] = useRemembered<InputTexts>('shop-prices', {}, isTexts)
  return {
    of: ({ inputs }) => Object.fromEntries(OWN.flatMap((key) => (key in inputs && kept[key] ? [[key, kept[key]]] : []))),
    keep: ({ inputs }, changes) => {
      const own = Object.entries(changes).filter(([key]) => key in inputs && OWN.some((each) => each === key))
      if (own.length > 0) setKept({ ...kept, ...Object.fromEntries(own) })
    },
    remembers: (key) => key in kept,
  }
}
