import { useParams } from 'react-router-dom'
import { call } from '@/lib/api.ts'
import { AccountSheet } from '../components/AccountSheet.tsx'
import { SetPassword } from '../components/SetPassword.tsx'

export function ResetPasswordPage() {
  const { token = '' } = useParams()
  return (
    <AccountSheet title="New password" about={<p>This link works once. Setting a new password signs you out on every device.</p>}>
      <SetPassword confirmLabel="Set the password" done="The new password is set." onSet={(password) => call('resetPassword', { params: { token }, body: { password } })} />
    </AccountSheet>
  )
}
