import { useDeferredValue, useMemo, useState, type FormEvent } from 'react'
import { readJointLine } from '@shared/lookup/read-joint.ts'
import { Button } from '@/components/Button.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { useUnits } from '@/hooks/units.ts'
import { Read } from './Read.tsx'

/** One line as the trade writes it; how it is read is shown while it is written. */
export function ByLine({ line, onAsk }: { line: string; onAsk: (line: string) => void }) {
  const { system } = useUnits()
  const [text, setText] = useState(line)
  const [wrong, setWrong] = useState<string | null>(null)
  const still = useDeferredValue(text)
  const reading = useMemo(() => readJointLine(still, system), [still, system])
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (text.trim() === '') return setWrong('Write the joint, e.g. 12 mm A516-70 SMAW 3G.')
    setWrong(null)
    onAsk(text.trim())
  }
  return (
    <form noValidate onSubmit={submit} className="space-y-3">
      <div className="flex flex-wrap items-end gap-2">
        <TextField className="min-w-0 grow basis-64" label="The joint" placeholder="12 mm A516-70 to A516-70 SMAW 3G" maxLength={200} autoComplete="off" autoCapitalize="off" enterKeyHint="search" value={text} error={wrong} onChange={(event) => setText(event.target.value)} />
        <Button kind="primary" type="submit" className="min-h-12 text-lg! max-sm:w-full">
          Look up
        </Button>
      </div>
      {text.trim() !== '' && text.trim() !== line && <Read read={reading.read} notRead={reading.notRead} />}
    </form>
  )
}
