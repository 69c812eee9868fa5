import { Cylinder, Flame, Sun, Wind, Zap } from 'lucide-react'

const HAZARDS = {
  fume: [Wind, 'Fume: ventilate or extract, and keep your head out of the plume.'],
  arc: [Sun, 'Arc: shade the eyes, cover the skin, screen others.'],
  shock: [Zap, 'Shock: dry gloves, sound leads, nothing live touched bare.'],
  'hot-work': [Flame, 'Hot work: clear what burns, permit in hand, watch afterwards.'],
  gas: [Cylinder, 'Gas: shielding gas displaces air; never let it fill a closed space.'],
} as const

export type Hazard = keyof typeof HAZARDS
export const HAZARD_LIST = Object.keys(HAZARDS) as Hazard[]

/** The dangers of the work at hand, one line each. General reminders; the workplace's own rules come first. */
export function Caution({ hazards = HAZARD_LIST }: { hazards?: readonly Hazard[] }) {
  return (
    <div role="note" aria-label="Take care" className="border-2 border-straw px-3.5 py-2.5 text-straw-deep">
      <ul className="space-y-1">
        {hazards.map((hazard) => {
          const [Icon, text] = HAZARDS[hazard]
          return (
            <li key={hazard} className="flex items-start gap-2.5">
              <Icon size={18} aria-hidden="true" className="mt-px shrink-0" />
              {text}
            </li>
          )
        })}
      </ul>
    </div>
  )
}

/** At the foot of every page and card that could be taken for a decision. */
export function Responsibility() {
  return <p className="text-xs text-soft">Sidebend assists. The governing code edition, the contract and a qualified person decide.</p>
}
