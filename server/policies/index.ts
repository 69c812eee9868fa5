/** Who may do what: one table of actions, then the conditions on single records. */
import type { Role } from '../../shared/schemas/people.ts'
import type { CouponState, RevisionState } from '../../shared/schemas/records.ts'

export interface Actor {
  id: string
  organizationId: string
  name: string
  email: string
  roles: readonly Role[]
}

const everyone: readonly Role[] = ['administrator', 'engineer', 'inspector', 'supervisor', 'welder', 'auditor']

/** Roles that an action is open to. `public` actions need no sign-in. The auditor only reads. */
export const POLICY: Readonly<Record<string, readonly Role[] | 'public'>> = {
  'session.read': 'public',
  'session.create': 'public',
  'session.end': 'public',
  'password.reset': 'public',
  'invitation.accept': 'public',
  'account.change': everyone,
  'people.read': everyone,
  'people.manage': ['administrator'],
  'organization.read': everyone,
  'organization.manage': ['administrator'],
  'library.read': everyone,
  'library.manage': ['administrator', 'engineer'],
  'heats.read': everyone,
  'heats.manage': ['administrator', 'engineer', 'inspector'],
  'procedures.read': everyone,
  'procedures.draft': ['engineer'],
  'procedures.submit': ['engineer'],
  'procedures.approve': ['supervisor'],
  'procedures.send': ['engineer', 'supervisor'],
  'coupons.read': everyone,
  'coupons.record': ['inspector'],
  'coupons.certify': ['inspector', 'supervisor'],
  'coupons.send': ['inspector', 'engineer', 'supervisor'],
  'arc.read': everyone,
  'arc.record': ['engineer', 'inspector', 'supervisor', 'welder'],
  'jobs.read': everyone,
  'jobs.manage': ['engineer', 'supervisor'],
  'machines.read': everyone,
  'machines.manage': ['administrator', 'engineer'],
  'trials.read': everyone,
  'trials.record': ['engineer', 'inspector', 'supervisor', 'welder'],
  'standards.read': everyone,
  'lookup.read': everyone,
  'assessments.run': everyone,
  'today.read': everyone,
  'outbox.read': ['administrator', 'supervisor', 'engineer', 'inspector'],
}

/** Whether the person's roles open an action. Throws on an action that the table does not know. */
export function allows(actor: Pick<Actor, 'roles'> | null, action: string): boolean {
  const roles = POLICY[action]
  if (roles === undefined) throw new Error(`no policy for ${action}`)
  return roles === 'public' || (actor !== null && actor.roles.some((role) => roles.includes(role)))
}

/** Every action that the person's roles open. */
export const actionsOf = (actor: Pick<Actor, 'roles'>): string[] => Object.keys(POLICY).filter((action) => allows(actor, action))

export interface RevisionFacts { state: RevisionState; authorId: string; isLatest: boolean }

/** What a person may do with one revision in its state; nobody approves their own. */
export function revisionActions(actor: Actor, revision: RevisionFacts): string[] {
  const may: string[] = []
  const { state, authorId } = revision
  if (state === 'draft' && allows(actor, 'procedures.draft')) may.push('save', 'discard')
  if (state === 'draft' && allows(actor, 'procedures.submit')) may.push('submit')
  if (state === 'in-review' && allows(actor, 'procedures.approve')) {
    may.push('return')
    if (authorId !== actor.id) may.push('approve')
  }
  if (state === 'approved' && allows(actor, 'procedures.approve')) may.push('withdraw')
  if (state === 'approved' && revision.isLatest && allows(actor, 'procedures.draft')) may.push('revise')
  if (state === 'approved' && allows(actor, 'procedures.send')) may.push('send')
  return may
}

export interface CouponFacts { state: CouponState }

/** What a person may do with one coupon in its state; a certified record is closed. */
export function couponActions(actor: Actor, coupon: CouponFacts): string[] {
  const may: string[] = []
  const open = coupon.state === 'planned' || coupon.state === 'welding' || coupon.state === 'testing'
  if (open && allows(actor, 'coupons.record')) may.push('save', 'photograph')
  if (open && allows(actor, 'coupons.certify')) may.push('certify', 'reject')
  if (coupon.state === 'certified' && allows(actor, 'coupons.send')) may.push('send')
  return may
}
