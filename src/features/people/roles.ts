import { ROLES, type Role } from '@shared/schemas/people.ts'

const MAY: Record<Role, string> = {
  administrator: 'manages people, settings and the outbox',
  engineer: 'drafts procedures and sends them for review',
  inspector: 'records coupons and certifies them',
  supervisor: 'reviews and approves procedures',
  welder: 'looks up procedures for a joint',
  auditor: 'reads everything, changes nothing',
}

/** Roles as choices of a TagPicker, each with what it may do. */
export const ROLE_OPTIONS = ROLES.map((value) => ({ value, label: value, hint: MAY[value] }))
/** What the chosen roles may do, as one sentence. */
export const rolesInWords = (roles: readonly Role[]): string => (roles.length === 0 ? 'Choose at least one role.' : `${roles.map((role) => MAY[role]).join('; ')}.`.replace(/^./, (letter) => letter.toUpperCase()))
