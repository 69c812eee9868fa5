import type { Tenant } from '../config/database.ts'
import { createSelfSignedP12 } from '../documents/signature.ts'
import { Organization } from '../models/organization.ts'
import type { Services } from '../routes/mount.ts'
import { rows } from './query.ts'

/**
 * The organization's certificate, made when it is first needed and closed with SIGNING_PASSPHRASE.
 * @returns PKCS #12
 */
export async function signingCertificate({ env }: Pick<Services, 'env'>, tenant: Tenant): Promise<Buffer> {
  const { organizationId, transaction } = tenant
  const stored = () => rows<{ p12: Buffer }>(tenant, 'select p12 from signing_certificates where organization_id = $organizationId', { organizationId })
  const [known] = await stored()
  if (known) return known.p12
  // Two first signatures at once must not make two certificates.
  await rows(tenant, "select pg_advisory_xact_lock(hashtextextended('signing-certificate ' || $organizationId, 0))", { organizationId })
  const [meanwhile] = await stored()
  if (meanwhile) return meanwhile.p12
  const organization = await Organization.findByPk(organizationId, { transaction, rejectOnEmpty: true })
  const { p12 } = createSelfSignedP12({ organization: organization.name, passphrase: env.SIGNING_PASSPHRASE })
  await rows(tenant, 'insert into signing_certificates (organization_id, p12) values ($organizationId, $p12) returning id', { organizationId, p12 })
  return p12
}
