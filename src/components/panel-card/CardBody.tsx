import { ErrorState, Skeleton } from '@/components/states.tsx'
import { PanelCardView } from './PanelCardView.tsx'
import type { PanelCardState } from './use-panel-card.ts'

/** The card of a choice, or what stands in its place. */
export function CardBody({ state }: { state: PanelCardState }) {
  const { card, machine, unfit, error } = state
  if (error && !card.data) return <div className="p-4"><ErrorState compact error={error} onRetry={() => void card.refetch()} /></div>
  if (unfit)
    return (
      <div role="alert" className="border-b-4 border-oxide bg-oxide-bg px-5 py-4">
        <p className="font-narrow text-3xl font-semibold text-oxide uppercase">Not on this machine</p>
        <p className="mt-1 text-pretty">{machine?.number} has no mode for this process. Choose another machine.</p>
      </div>
    )
  return card.data ? <PanelCardView card={card.data} /> : <Skeleton label="Working out the settings" rows={4} />
}
