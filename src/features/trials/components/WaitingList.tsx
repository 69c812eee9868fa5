import { useNavigate } from 'react-router-dom'
import { Button } from '@/components/Button.tsx'
import { heldPictures, keepNewDraft } from '../kept.ts'
import type { Waiting } from '../waiting.ts'

/** Beads that this device holds and the server does not have yet. */
export function WaitingList({ waiting, trialId, personId }: { waiting: Waiting; trialId: string; personId: string }) {
  const navigate = useNavigate()
  const { beads, failures } = waiting
  if (beads.length === 0 || (failures === 0 && beads.every(({ refusal }) => refusal === null))) return null
  const refused = beads.filter(({ refusal }) => refusal !== null)
  const waits = beads.filter(({ refusal }) => refusal === null)
  const open = (bead: (typeof beads)[number]) => {
    keepNewDraft(personId, trialId, { id: bead.id, content: bead.content, from: null, version: null, at: new Date().toISOString() })
    waiting.take(bead.id)
    void navigate(`/dial-in/${trialId}/bead`)
  }
  return (
    <div role="status" className="space-y-3 border border-straw border-l-[6px] bg-straw-bg px-4 py-3">
      {waits.length > 0 && (
        <div className="flex flex-wrap items-center justify-between gap-3">
          <p className="text-pretty"><span className="font-semibold">{waits.length === 1 ? 'One bead waits' : `${waits.length} beads wait`} on this device:</span> the server can’t be reached. {waits.some(({ id }) => heldPictures(id).length > 0) && 'Their photos wait in this window, so leave it open. '}They are sent by themselves when the network is back.</p>
          <Button className="max-sm:min-h-12" onClick={waiting.sendNow}>Try now</Button>
        </div>
      )}
      {refused.map((bead) => (
        <div key={bead.id} className="flex flex-wrap items-center justify-between gap-3">
          <p><span className="font-semibold">A bead was not taken:</span> {bead.refusal}</p>
          <Button className="max-sm:min-h-12" onClick={() => open(bead)}>Open it and mend it</Button>
        </div>
      ))}
    </div>
  )
}
