/** Words and helpers of the form of a heat or lot. */
import type { WriteHeat } from '@shared/schemas/heats.ts'
import type { Option } from '@/components/fields/text.tsx'

export const HEAT_KINDS: Readonly<Record<WriteHeat['kind'], { title: string; number: string; of: string; library: 'base-metals' | 'filler-metals' }>> = {
  heat: { title: 'Heat of base metal', number: 'Heat number', of: 'Grade', library: 'base-metals' },
  lot: { title: 'Lot of filler metal', number: 'Lot number', of: 'Classification', library: 'filler-metals' },
}

export const CHEMISTRY_WORDS: Readonly<Record<NonNullable<WriteHeat['chemistryOf']>, string>> = { ladle: 'the ladle (cast)', product: 'the product', deposit: 'the deposit', wire: 'the wire or rod' }
export const chemistryOptions = (kind: WriteHeat['kind']): Option[] => (kind === 'heat' ? (['ladle', 'product'] as const) : (['deposit', 'wire'] as const)).map((value) => ({ value, label: CHEMISTRY_WORDS[value] }))

/** What each field is called where two versions are told apart. */
export const PARTS: Readonly<Record<keyof WriteHeat, string>> = { kind: 'the kind', number: 'the number', libraryId: 'the library row', grade: 'the grade', certificate: 'the certificate', certificateType: 'the type of certificate', receivedOn: 'the day of receipt', thickness: 'thickness', diameter: 'diameter', tensile: 'tensile strength', yield: 'yield', elongation: 'elongation', chemistryOf: 'what the chemistry is of', chemistry: 'the chemistry', notes: 'notes' }
