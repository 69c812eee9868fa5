import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import { ErrorState, Skeleton } from '@/components/states.tsx'
import { call } from '@/lib/api.ts'
import { query } from '@/lib/query.ts'
import { AccountSheet } from '../components/AccountSheet.tsx'
import { SetPassword } from '../components/SetPassword.tsx'

export function InvitationPage() {
  const { token = '' } = useParams()
  const invitation = useQuery(query('readInvitation', { params: { token } }))
  const who = invitation.data
  return (
    <AccountSheet
      title={who ? `Welcome, ${who.name}` : 'Invitation'}
      about={who ? <p>{who.organization} invites you to its welding procedures. You will sign in as {who.email}.</p> : <p>Invitations work once and for a limited time.</p>}
    >
      {invitation.isPending && <Skeleton rows={2} label="Reading the invitation" />}
      {invitation.isError && (
        <div className="space-y-3">
          <ErrorState error={invitation.error} compact />
          <p className="text-soft">Ask the person who invited you to send it again.</p>
          <Link to="/sign-in" className="text-link">
            Go to sign-in
          </Link>
        </div>
      )}
      {who && <SetPassword confirmLabel="Accept and set the password" done="Your account is open and the password is set." onSet={(password) => call('acceptInvitation', { params: { token }, body: { password } })} />}
    </AccountSheet>
  )
}
