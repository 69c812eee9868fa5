import { createHash, randomBytes } from 'node:crypto'
import { Op } from 'sequelize'
import type { Tenant } from '../config/database.ts'
import { HttpProblem } from '../middleware/problem.ts'
import { PersonToken } from '../models/person-token.ts'
import { Person } from '../models/person.ts'
import type { Services } from '../routes/mount.ts'
import { findTokenOwner, type TokenKind } from './directory.ts'

const HOUR = 3_600_000
export const LIFETIME: Readonly<Record<TokenKind, number>> = { reset: HOUR, invite: 7 * 24 * HOUR }

const sha256 = (token: string): Buffer => createHash('sha256').update(token).digest()

/** One answer for a link that is unknown, used or too old, so that trying links tells nothing. */
const linkGone = (kind: TokenKind): HttpProblem =>
  new HttpProblem(410, 'This link no longer works', kind === 'reset' ? 'It has been used or is older than an hour. Ask for a new one on the sign-in page.' : 'It has been used or is older than seven days. Ask an administrator to send the invitation again.')

/** Makes a link's secret; earlier links of the kind stop working. Only its hash is kept. */
export async function issueToken(tenant: Tenant, personId: string, kind: TokenKind): Promise<string> {
  const { organizationId, transaction } = tenant
  await PersonToken.update({ usedAt: new Date() }, { where: { organizationId, personId, kind, usedAt: null }, transaction })
  const token = randomBytes(32).toString('base64url')
  await PersonToken.create({ organizationId, personId, kind, tokenSha256: sha256(token), expiresAt: new Date(Date.now() + LIFETIME[kind]) }, { transaction })
  return token
}

/**
 * Finds whose link this is and acts inside their organization, with the link's row locked so that it works once.
 * @throws HttpProblem 410 when it is unknown, used or too old
 */
export async function withToken<T>({ database }: Services, kind: TokenKind, token: string, work: (tenant: Tenant, person: Person, use: () => Promise<void>) => Promise<T>): Promise<T> {
  const found = await findTokenOwner(database.owner, kind, sha256(token))
  if (!found) throw linkGone(kind)
  return database.withTenant(found.organizationId, async (tenant) => {
    const { organizationId, transaction } = tenant
    const row = await PersonToken.findOne({ where: { organizationId, id: found.tokenId, usedAt: null, expiresAt: { [Op.gt]: new Date() } }, lock: true, transaction })
    const person = row && (await Person.findOne({ where: { organizationId, id: row.personId }, lock: true, transaction }))
    if (!row || !person || person.state !== (kind === 'reset' ? 'active' : 'invited')) throw linkGone(kind)
    return work(tenant, person, async () => {
      await PersonToken.update({ usedAt: new Date() }, { where: { organizationId, personId: person.id, usedAt: null }, transaction })
    })
  })
}
