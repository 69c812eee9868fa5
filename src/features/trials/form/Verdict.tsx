import { BEAD_FAULTS, type BeadContent } from '@shared/schemas/trials.ts'
import { FAULT_WORDS, PULSE_REMEDY, SCORE_WORDS, SEVERITY_WORDS } from '@shared/trials/faults.ts'

/** Faults as chips: each tap makes it worse by one, the fourth takes it off. */
export function FaultChips({ value, onChange, pulsed }: { value: BeadContent['faults']; onChange: (faults: BeadContent['faults']) => void; pulsed: boolean }) {
  const tap = (fault: (typeof BEAD_FAULTS)[number], severity: number) => {
    const rest = value.filter((one) => one.fault !== fault)
    onChange(severity >= 3 ? rest : [...rest, { fault, severity: severity + 1 }])
  }
  const remedies = pulsed ? value.flatMap(({ fault }) => PULSE_REMEDY[fault] ?? []) : []
  return (
    <div role="group" aria-label="Faults">
      <p className="font-medium">Faults</p>
      <p className="mb-2 text-sm text-soft">Tap once for a little, twice for clear, three times for bad; once more takes it off.</p>
      <div className="flex flex-wrap gap-2">
        {BEAD_FAULTS.map((fault) => {
          const severity = value.find((one) => one.fault === fault)?.severity ?? 0
          return (
            <button key={fault} type="button" aria-pressed={severity > 0} aria-label={severity > 0 ? `${FAULT_WORDS[fault]}, ${SEVERITY_WORDS[severity] ?? ''}` : FAULT_WORDS[fault]} onClick={() => tap(fault, severity)} className={`inline-flex min-h-12 items-center gap-2 rounded border px-3 font-medium ${severity > 0 ? 'border-oxide bg-oxide-bg text-ink' : 'border-edge bg-sheet text-ink'}`}>
              {FAULT_WORDS[fault]}
              <span aria-hidden="true" className="flex gap-0.5">
                {[1, 2, 3].map((step) => (
                  <span key={step} className={`h-4 w-1.5 ${step <= severity ? 'bg-oxide' : 'bg-rule'}`} />
                ))}
              </span>
            </button>
          )
        })}
      </div>
      {remedies.length > 0 && (
        <ul className="mt-2 space-y-1 text-sm text-soft">
          {remedies.map((remedy) => (
            <li key={remedy}>{remedy} <span className="whitespace-nowrap">(common practice)</span></li>
          ))}
        </ul>
      )}
    </div>
  )
}

/** 1 to 5; a second tap on the same takes it back. */
export function ScoreKeys({ value, onChange }: { value: number | null; onChange: (score: number | null) => void }) {
  return (
    <div role="group" aria-label="Score">
      <p className="mb-2 font-medium">Score <span className="font-normal text-soft">{value === null ? 'not scored' : `${value}: ${SCORE_WORDS[value] ?? ''}`}</span></p>
      <div className="grid grid-cols-5 gap-2">
        {[1, 2, 3, 4, 5].map((score) => (
          <button key={score} type="button" aria-pressed={value === score} aria-label={`Score ${score}, ${SCORE_WORDS[score] ?? ''}`} onClick={() => onChange(value === score ? null : score)} className={`min-h-14 rounded border font-narrow text-2xl font-semibold ${value === score ? 'border-figure bg-figure text-paper' : 'border-edge bg-sheet'}`}>
            {score}
          </button>
        ))}
      </div>
      <p className="mt-1 flex justify-between text-sm text-soft" aria-hidden="true"><span>{SCORE_WORDS[1]}</span><span>{SCORE_WORDS[5]}</span></p>
    </div>
  )
}
