import { useCallback, useEffect, useEffectEvent, useState } from 'react'
import { useSearchParams } from 'react-router-dom'
import { addressOfInputs, type Calculator } from '@shared/calculations/catalogue.ts'
import { exampleTexts, textsFromAddress, type InputTexts } from '@shared/calculations/calculator-texts.ts'
import { useUnits } from '@/hooks/units.ts'

/** ms without a key before the address follows what is typed. */
const REST = 400

export interface AddressedInputs {
  texts: InputTexts
  change: (changes: Readonly<Record<string, string>>) => void
  fillExample: () => void
  /** The address of the figures as they stand, also before it is written. */
  address: string
}

/**
 * A calculator's inputs with the address kept in step: typing replaces the entry of the history that is there, never adds one,
 * and an address that comes from elsewhere (a link, the back button) fills the inputs anew.
 */
export function useAddressedInputs(calculator: Calculator): AddressedInputs {
  const { system } = useUnits()
  const [search, setSearch] = useSearchParams()
  const asked = search.toString()
  const [texts, setTexts] = useState<InputTexts>(() => textsFromAddress(calculator, search, system))
  const [seen, setSeen] = useState(asked)
  const [sent, setSent] = useState(asked)
  const [touched, setTouched] = useState(false)
  if (seen !== asked) {
    setSeen(asked)
    // The echo of our own writing must not undo newer typing.
    if (asked !== sent) {
      setTexts(textsFromAddress(calculator, search, system))
      setTouched(false)
    }
  }
  const address = addressOfInputs(calculator, texts)
  const send = useEffectEvent(() => {
    if (!touched || address === asked) return
    setSent(address)
    setSearch(address, { replace: true, preventScrollReset: true })
  })
  useEffect(() => {
    const timer = setTimeout(() => send(), REST)
    return () => clearTimeout(timer)
  }, [address])
  const put = useCallback((next: (before: InputTexts) => InputTexts) => {
    setTouched(true)
    setTexts(next)
  }, [])
  return {
    texts,
    address,
    change: useCallback((changes) => put((before) => ({ ...before, ...changes })), [put]),
    fillExample: useCallback(() => put(() => exampleTexts(calculator, system)), [put, calculator, system]),
  }
}
