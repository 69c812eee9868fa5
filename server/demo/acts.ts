/** The demo firm's people at work: every record goes through the same services as the API, so every rule holds for it. */
import type { CouponContent, ProcedureContent } from '@shared/schemas/welding.ts'
import type { Tenant } from '../config/database.ts'
import type { Coupon } from '../models/coupon.ts'
import type { ProcedureRevision } from '../models/procedure-revision.ts'
import type { Actor } from '../policies/index.ts'
import type { Services } from '../routes/mount.ts'
import { certifyCoupon, createCoupon, rejectCoupon, saveCoupon } from '../services/coupons.ts'
import { checkFiles } from '../services/photo-files.ts'
import { addPhotos, changePhoto } from '../services/photos.ts'
import { approveRevision, returnRevision, submitRevision, withdrawRevision } from '../services/revision-decisions.ts'
import { createProcedure, reviseProcedure, saveRevision } from '../services/revisions.ts'
import { DEMO_PASSWORD, type PersonKey } from './people.ts'
import { picturesOf, type PictureSet } from './pictures.ts'

const ADDRESS = '127.0.0.1'
const signing = { password: DEMO_PASSWORD, address: ADDRESS }

export interface Firm {
  services: Services
  actors: Record<PersonKey, Actor>
  /** Runs in the firm's transaction. */
  act: <T>(work: (tenant: Tenant) => Promise<T>) => Promise<T>
}

/** A coupon by the inspector, opened against a revision when one is given, with its pictures. */
export async function weld({ act, actors, services }: Firm, by: PersonKey, content: CouponContent, pictures: PictureSet, revisionId: string | null = null): Promise<Coupon> {
  const coupon = await act(async (tenant) => {
    const opened = await createCoupon(tenant, actors[by], { revisionId, content: revisionId === null ? content : null })
    return revisionId === null ? opened : saveCoupon(tenant, actors[by], opened.id, opened.version, content)
  })
  const drawn = await picturesOf(pictures)
  const files = await checkFiles(drawn.map(({ fileName, jpeg }) => ({ name: `${coupon.number} ${fileName}`, bytes: jpeg })))
  await act(async (tenant) => {
    const photos = await addPhotos(services.storage, tenant, actors[by], coupon.id, files)
    for (const [index, photo] of photos.entries()) await changePhoto(tenant, photo.id, { caption: drawn[index]?.caption ?? '', tag: drawn[index]?.tag ?? '' })
  })
  return coupon
}

export const certify = ({ act, actors, services }: Firm, by: PersonKey, coupon: Coupon): Promise<Coupon> => act((tenant) => certifyCoupon(services, tenant, actors[by], coupon.id, coupon.version, signing))

export const reject = ({ act, actors, services }: Firm, by: PersonKey, coupon: Coupon, reason: string): Promise<Coupon> => act((tenant) => rejectCoupon(services, tenant, actors[by], coupon.id, coupon.version, { ...signing, reason }))

export const write = ({ act, actors }: Firm, by: PersonKey, content: ProcedureContent): Promise<ProcedureRevision> => act((tenant) => createProcedure(tenant, actors[by], content))

export const rest = ({ act, actors }: Firm, by: PersonKey, revision: ProcedureRevision, coupons: readonly Coupon[]): Promise<ProcedureRevision> =>
  act((tenant) => saveRevision(tenant, actors[by], revision.id, revision.version, { ...revision.content, supportingCoupons: coupons.map(({ id }) => id) }))

export const submit = ({ act, actors }: Firm, by: PersonKey, revision: ProcedureRevision): Promise<ProcedureRevision> => act((tenant) => submitRevision(tenant, actors[by], revision.id, revision.version))

export const giveBack = ({ act, actors }: Firm, by: PersonKey, revision: ProcedureRevision, comment: string): Promise<ProcedureRevision> => act((tenant) => returnRevision(tenant, actors[by], revision.id, revision.version, comment))

export const approve = ({ act, actors, services }: Firm, by: PersonKey, revision: ProcedureRevision, deviationReason: string | null = null): Promise<ProcedureRevision> =>
  act((tenant) => approveRevision(services, tenant, actors[by], revision.id, revision.version, { ...signing, deviationReason }))

export const withdraw = ({ act, actors, services }: Firm, by: PersonKey, revision: ProcedureRevision, reason: string): Promise<ProcedureRevision> => act((tenant) => withdrawRevision(services, tenant, actors[by], revision.id, revision.version, { ...signing, reason }))

/** The next revision with other content. */
export const revise = ({ act, actors }: Firm, by: PersonKey, revision: ProcedureRevision, content: (before: ProcedureContent) => ProcedureContent): Promise<ProcedureRevision> =>
  act(async (tenant) => {
    const next = await reviseProcedure(tenant, actors[by], revision.procedureId)
    return saveRevision(tenant, actors[by], next.id, next.version, content(next.content))
  })
