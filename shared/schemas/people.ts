import { z } from 'zod'
import { idSchema, unitSystemSchema } from './common.ts'

export const ROLES = ['administrator', 'engineer', 'inspector', 'supervisor', 'welder', 'auditor'] as const
export const roleSchema = z.enum(ROLES)
export type Role = z.infer<typeof roleSchema>

export const emailSchema = z.string().trim().toLowerCase().pipe(z.email('Write an e-mail address like name@example.com.').max(200))
export const nameSchema = z.string().trim().min(1, 'Write the name as it should stand on documents.').max(120)
export const newPasswordSchema = z.string().min(12, 'Use at least 12 characters; a short sentence is good.').max(200, 'Use at most 200 characters.')
export const rolesSchema = z.array(roleSchema).min(1, 'Choose at least one role.').max(ROLES.length)

export const signInSchema = z.object({ email: emailSchema, password: z.string().min(1, 'Write your password.').max(200) }).meta({ id: 'SignIn' })
export const invitePersonSchema = z.object({ name: nameSchema, email: emailSchema, roles: rolesSchema }).meta({ id: 'InvitePerson' })
export const changePersonSchema = z.object({ name: nameSchema.optional(), roles: rolesSchema.optional(), active: z.boolean().optional() }).meta({ id: 'ChangePerson' })
export const changePasswordSchema = z.object({ currentPassword: z.string().min(1, 'Write your present password.').max(200), newPassword: newPasswordSchema }).meta({ id: 'ChangePassword' })
export const changeAccountSchema = z.object({ name: nameSchema.optional(), unitSystem: unitSystemSchema.optional(), theme: z.enum(['day', 'night']).optional() }).meta({ id: 'ChangeAccount' })
export const setPasswordSchema = z.object({ password: newPasswordSchema }).meta({ id: 'SetPassword' })
export const requestResetSchema = z.object({ email: emailSchema }).meta({ id: 'RequestReset' })

export const personSchema = z
  .object({
    id: idSchema,
    name: z.string(),
    email: z.string(),
    roles: z.array(roleSchema),
    active: z.boolean(),
    /** `invited` until the invitation is accepted. */
    state: z.enum(['invited', 'active', 'inactive']),
    createdAt: z.iso.datetime(),
    lastSignInAt: z.iso.datetime().nullable(),
    version: z.number().int(),
  })
  .meta({ id: 'Person' })
export type Person = z.infer<typeof personSchema>

export const organizationSchema = z.object({ id: idSchema, name: z.string(), address: z.string(), defaultUnitSystem: unitSystemSchema, version: z.number().int() }).meta({ id: 'Organization' })
export const changeOrganizationSchema = z.object({ name: z.string().trim().min(1).max(160).optional(), address: z.string().trim().max(400).optional(), defaultUnitSystem: unitSystemSchema.optional() }).meta({ id: 'ChangeOrganization' })

export const sessionSchema = z
  .object({
    person: z
      .object({ id: idSchema, name: z.string(), email: z.string(), roles: z.array(roleSchema), unitSystem: unitSystemSchema, theme: z.enum(['day', 'night']) })
      .nullable(),
    organization: organizationSchema.nullable(),
    /** Actions that the policies allow this person; the client hides what is not among them. */
    may: z.array(z.string()),
    mailIsCaught: z.boolean(),
    demo: z.boolean(),
  })
  .meta({ id: 'Session' })
export type Session = z.infer<typeof sessionSchema>
