/**
 * The only questions asked of the database before an organization is known: who is signing in, whose session or link this is,
 * and how often somebody has tried. They run on the owner's connections, past row-level security, so each asks for exactly
 * one person and gives back ids; everything after that runs inside `withTenant`. Add nothing here that could run there.
 */
import type pg from 'pg'
import type { Actor } from '../policies/index.ts'

/** A person as the session knows them; the epoch ends sessions that began before it was raised. */
export interface SignedIn extends Actor {
  sessionEpoch: number
}

export interface Credentials extends SignedIn {
  passwordHash: string | null
  active: boolean
}

interface PersonRow {
  id: string
  organization_id: string
  name: string
  email: string
  roles: Actor['roles']
  session_epoch: number
  password_hash: string | null
  state: string
}

const columns = 'id, organization_id, name, email, roles, session_epoch, password_hash, state'

const credentialsOf = (row: PersonRow): Credentials => ({
  id: row.id,
  organizationId: row.organization_id,
  name: row.name,
  email: row.email,
  roles: row.roles,
  sessionEpoch: row.session_epoch,
  passwordHash: row.password_hash,
  active: row.state === 'active',
})

/** The account with an e-mail address, in whichever organization; null when there is none. */
export async function findByEmail(owner: pg.Pool, email: string): Promise<Credentials | null> {
  const { rows } = await owner.query<PersonRow>(`select ${columns} from people where lower(email) = lower($1)`, [email])
  return rows[0] ? credentialsOf(rows[0]) : null
}

/** The person whom a session names, as they are now; null when they may no longer come in or the session's epoch has ended. */
export async function findSignedIn(owner: pg.Pool, session: { id: string; organizationId: string; sessionEpoch: number }): Promise<SignedIn | null> {
  const { rows } = await owner.query<PersonRow>(`select ${columns} from people where id = $1 and organization_id = $2 and session_epoch = $3 and state = 'active'`, [session.id, session.organizationId, session.sessionEpoch])
  if (!rows[0]) return null
  const { id, organizationId, name, email, roles, sessionEpoch } = credentialsOf(rows[0])
  return { id, organizationId, name, email, roles, sessionEpoch }
}

export type TokenKind = 'invite' | 'reset'

/** Whose private link has this hash, used or not; null when no such link was ever sent. */
export async function findTokenOwner(owner: pg.Pool, kind: TokenKind, sha256: Buffer): Promise<{ organizationId: string; tokenId: string } | null> {
  const { rows } = await owner.query<{ organization_id: string; id: string }>('select organization_id, id from person_tokens where kind = $1 and token_sha256 = $2', [kind, sha256])
  return rows[0] ? { organizationId: rows[0].organization_id, tokenId: rows[0].id } : null
}

export type AttemptKind = 'sign-in' | 'reset' | 'confirm'
export interface Attempt {
  kind: AttemptKind
  email: string
  address: string
}

/**
 * Notes a try as failed before its outcome is known, so that tries made at the same time all count. Tries with one e-mail
 * address are noted one after the other: whoever has the higher id sees all the lower ones. Returns the id.
 */
export async function noteAttempt(owner: pg.Pool, { kind, email, address }: Attempt): Promise<string> {
  const { rows } = await owner.query<{ id: string }>(
    `with turn as materialized (select pg_advisory_xact_lock(hashtextextended($2, 7461)))
     insert into sign_in_attempts (kind, email, address, organization_id)
     select $1, $2, $3, (select organization_id from people where lower(people.email) = lower($2)) from turn returning id`,
    [kind, email, address],
  )
  return rows[0]?.id ?? ''
}

/** A try that was right no longer counts against anyone. */
export async function noteSuccess(owner: pg.Pool, attemptId: string): Promise<void> {
  await owner.query('update sign_in_attempts set succeeded = true where id = $1', [attemptId])
}

/** Failed tries before this one within the window, and seconds until the oldest of the last `limit` of them leaves it. */
export async function countAttempts(owner: pg.Pool, by: 'email' | 'address', attempt: Attempt, before: string, windowSeconds: number, limit: number): Promise<{ failed: number; retryAfter: number }> {
  const { rows } = await owner.query<{ failed: number; retry_after: number | null }>(
    `select count(*)::int as failed, ceil(extract(epoch from min(at) + make_interval(secs => $4) - now()))::int as retry_after from (
       select at from sign_in_attempts where kind = $1 and ${by} = $2 and id < $3 and not succeeded and at > now() - make_interval(secs => $4) order by id desc limit $5
     ) recent`,
    [attempt.kind, by === 'email' ? attempt.email : attempt.address, before, windowSeconds, limit],
  )
  return { failed: rows[0]?.failed ?? 0, retryAfter: Math.max(1, rows[0]?.retry_after ?? windowSeconds) }
}

/** Forgets tries that no window reaches any more. */
export async function forgetAttempts(owner: pg.Pool): Promise<void> {
  await owner.query("delete from sign_in_attempts where at < now() - interval '1 day'")
}
