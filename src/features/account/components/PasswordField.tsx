import { useState, type ComponentProps } from 'react'
import { TextField } from '@/components/fields/text.tsx'

/** A password that can be looked at while typing; managers may fill it in. */
export function PasswordField(props: Omit<ComponentProps<typeof TextField>, 'type'>) {
  const [shown, setShown] = useState(false)
  return (
    <div>
      <TextField {...props} type={shown ? 'text' : 'password'} />
      <button type="button" aria-pressed={shown} className="mt-1 text-sm text-link" onClick={() => setShown(!shown)}>
        {shown ? 'Hide what I type' : 'Show what I type'}
      </button>
    </div>
  )
}
