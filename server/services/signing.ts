import { createHash } from 'node:crypto'
import type { Role } from '@shared/schemas/people.ts'
import { canonicalJson } from '@shared/schemas/canonical.ts'
import type { Signature as SignatureRecord } from '@shared/schemas/records.ts'
import { statementOf } from '@shared/records/statements.ts'
import type { Tenant } from '../config/database.ts'
import { unprocessable } from '../middleware/problem.ts'
import { Person } from '../models/person.ts'
import { Signature } from '../models/signature.ts'
import { POLICY, type Actor } from '../policies/index.ts'
import type { Services } from '../routes/mount.ts'
import { verifyPassword } from './passwords.ts'
import { countTry } from './throttle.ts'

/** SHA-256 of a record's content in its canonical form, hex: what a signature holds. */
export const contentHash = (content: unknown): string => createHash('sha256').update(canonicalJson(content)).digest('hex')

/** The role under which somebody acts: the first of theirs that the action is open to. */
export function actingRole(actor: Pick<Actor, 'roles'>, action: string): Role {
  const open = POLICY[action]
  const role = actor.roles.find((one) => open !== 'public' && open?.includes(one))
  if (!role) throw new Error(`no role of the actor opens ${action}`)
  return role
}

/**
 * The password entered again is what makes a signature the person's own.
 * @param address network address, for the count of tries
 * @throws HttpProblem 422 when it is wrong, 429 after too many wrong ones
 */
export async function confirmPassword({ database }: Pick<Services, 'database'>, tenant: Tenant, actor: Actor, address: string, password: string): Promise<void> {
  const right = await countTry(database.owner, { kind: 'confirm', email: actor.email, address })
  const person = await Person.findOne({ where: { organizationId: tenant.organizationId, id: actor.id }, attributes: ['passwordHash'], transaction: tenant.transaction })
  if (!(await verifyPassword(person?.passwordHash ?? null, password))) {
    throw unprocessable('Not signed', 'The password is not the one of your account, so nothing was signed. Type it again.', [{ field: 'password', message: 'This is not the password of your account.' }])
  }
  await right()
}

export interface Act {
  actor: Actor
  role: Role
  meaning: SignatureRecord['meaning']
  /** The record's name in the statement, e.g. "WPS-004 revision B". */
  record: string
  of: { revisionId: string } | { couponId: string }
  contentSha256: string
  reason?: string | null
  deviations?: number
}

/** Adds a signature row with the exact sentence that was agreed to. */
export function addSignature({ organizationId, transaction }: Tenant, { actor, role, meaning, record, of, contentSha256, reason = null, deviations }: Act): Promise<Signature> {
  const statement = statementOf({ meaning, record, name: actor.name, role, deviations })
  return Signature.create(
    { organizationId, revisionId: null, couponId: null, ...of, personId: actor.id, personName: actor.name, role, meaning, statement, reason, contentSha256 },
    { transaction },
  )
}

/** Signatures of a record, oldest first. */
export const signaturesOf = ({ organizationId, transaction }: Tenant, of: { revisionId: string } | { couponId: string }): Promise<Signature[]> =>
  Signature.findAll({ where: { organizationId, ...of }, order: [['signedAt', 'ASC'], ['id', 'ASC']], transaction })
