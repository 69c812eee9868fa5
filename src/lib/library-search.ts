import type { LibraryItem } from '@shared/schemas/records.ts'
import type { ComboItem } from '@/components/fields/ComboBox.tsx'
import { call } from './api.ts'

/** Second line of a row in a list to pick from; a row of the organization's own says so. */
export const subtitleOf = ({ origin, subtitle }: Pick<LibraryItem, 'origin' | 'subtitle'>): string => (origin === 'own' ? ['our own', subtitle].filter(Boolean).join(' · ') : subtitle)

/** Type-ahead over one kind of the library, for a ComboBox. */
export const searchLibrary =
  (kind: LibraryItem['kind']) =>
  async (text: string, signal: AbortSignal): Promise<ComboItem<Record<string, unknown>>[]> => {
    const page = await call('listLibrary', { params: { kind }, query: { q: text || undefined, limit: 20 }, signal })
    return page.items.map((item) => ({ id: item.id, title: item.title, subtitle: subtitleOf(item), data: item.content }))
  }
