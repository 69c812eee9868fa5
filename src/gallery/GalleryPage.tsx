import { useState } from 'react'
import { Button } from '@/components/Button.tsx'
import { Responsibility } from '@/components/Caution.tsx'
import { Wordmark } from '@/components/Mark.tsx'
import { FieldsSection } from './FieldsSection.tsx'
import { GaugeSection } from './GaugeSection.tsx'
import { JointSection } from './JointSection.tsx'
import { RecordSection } from './RecordSection.tsx'
import { StatesSection } from './StatesSection.tsx'
import { TableSection } from './TableSection.tsx'

/** Every shared component in every state; for development only. */
export function GalleryPage() {
  const [night, setNight] = useState(false)
  return (
    <div className={night ? 'night bg-paper text-ink' : ''}>
      <header className="on-bar flex items-center justify-between gap-4 bg-bar px-7 py-3 text-bar-text">
        <Wordmark />
        <Button onClick={() => setNight(!night)} aria-pressed={night}>
          Night theme
        </Button>
      </header>
      <main className="mx-auto max-w-[96rem] space-y-10 px-4 py-6 sm:px-7">
        <h1 className="font-narrow text-3xl font-semibold">Gallery</h1>
        <RecordSection />
        <GaugeSection />
        <JointSection />
        <FieldsSection />
        <TableSection />
        <StatesSection />
        <Responsibility />
      </main>
    </div>
  )
}
