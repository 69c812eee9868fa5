/**
 * The API, told once: the server mounts it, the client calls it, the OpenAPI document and the policy tests list it.
 * `action` is what the policies decide on; `public` actions need no sign-in.
 */
import { z } from 'zod'
import { assessedCouponSchema, assessmentRequestSchema, assessmentSchema } from './assessment.ts'
import { idSchema, listQuery, pageOf, standardIdSchema, textOrNull } from './common.ts'
import { byId, endpoint, sorts } from './endpoint.ts'
import { arcDataEndpoints } from './endpoints-arc-data.ts'
import { heatEndpoints } from './endpoints-heats.ts'
import { libraryEndpoints } from './endpoints-library.ts'
import { machineEndpoints } from './endpoints-machines.ts'
import { trialEndpoints } from './endpoints-trials.ts'
import * as people from './people.ts'
import * as records from './records.ts'
import * as standards from './standards.ts'
import { couponContentSchema, procedureContentSchema, processSchema } from './welding.ts'

const byToken = z.object({ token: z.string().min(20).max(200) })
const signing = z.object({ password: z.string().min(1, 'Re-enter your password to sign.').max(200) })
const mailBody = z.object({ to: z.array(people.emailSchema).min(1, 'Name at least one recipient.').max(20), message: z.string().trim().max(4000).default('') }).meta({ id: 'SendDocument' })
const paper = z.object({ paper: z.enum(['A4', 'Letter']).default('A4'), units: z.enum(['SI', 'US', 'both']).optional() })

export const endpoints = {
  readSession: endpoint({ method: 'get', path: '/session', action: 'session.read', public: true, tag: 'Session', summary: 'Who is signed in, and what they may do', response: people.sessionSchema }),
  signIn: endpoint({ method: 'post', path: '/session', action: 'session.create', public: true, tag: 'Session', summary: 'Sign in', body: people.signInSchema, response: people.sessionSchema }),
  signOut: endpoint({ method: 'delete', path: '/session', action: 'session.end', public: true, tag: 'Session', summary: 'Sign out here' }),
  signOutEverywhere: endpoint({ method: 'delete', path: '/sessions', action: 'account.change', tag: 'Session', summary: 'Sign out on every device' }),
  requestReset: endpoint({ method: 'post', path: '/password-resets', action: 'password.reset', public: true, tag: 'Session', summary: 'Ask for a single-use reset link by e-mail', body: people.requestResetSchema, status: 202 }),
  resetPassword: endpoint({ method: 'put', path: '/password-resets/:token', action: 'password.reset', public: true, tag: 'Session', summary: 'Set a new password with a reset link', params: byToken, body: people.setPasswordSchema }),
  readInvitation: endpoint({ method: 'get', path: '/invitations/:token', action: 'invitation.accept', public: true, tag: 'Session', summary: 'Whose invitation this is', params: byToken, response: z.object({ name: z.string(), email: z.string(), organization: z.string() }) }),
  acceptInvitation: endpoint({ method: 'put', path: '/invitations/:token', action: 'invitation.accept', public: true, tag: 'Session', summary: 'Accept an invitation and set a password', params: byToken, body: people.setPasswordSchema }),
  changePassword: endpoint({ method: 'put', path: '/account/password', action: 'account.change', tag: 'Account', summary: 'Change your own password', body: people.changePasswordSchema }),
  changeAccount: endpoint({ method: 'patch', path: '/account', action: 'account.change', tag: 'Account', summary: 'Change your own name, units and theme', body: people.changeAccountSchema, response: people.sessionSchema }),

  listPeople: endpoint({ method: 'get', path: '/people', action: 'people.read', tag: 'People', summary: 'People of the organization', query: z.object({ ...listQuery, role: people.roleSchema.optional(), sort: sorts(['name', '-name', 'createdAt', '-createdAt']) }), response: pageOf(people.personSchema) }),
  invitePerson: endpoint({ method: 'post', path: '/people', action: 'people.manage', tag: 'People', summary: 'Invite a person by e-mail', body: people.invitePersonSchema, response: people.personSchema, status: 201 }),
  readPerson: endpoint({ method: 'get', path: '/people/:id', action: 'people.read', tag: 'People', summary: 'One person', params: byId, response: people.personSchema }),
  changePerson: endpoint({ method: 'patch', path: '/people/:id', action: 'people.manage', tag: 'People', summary: 'Change name, roles or access', params: byId, body: people.changePersonSchema, response: people.personSchema, ifMatch: true }),
  resendInvitation: endpoint({ method: 'post', path: '/people/:id/invitations', action: 'people.manage', tag: 'People', summary: 'Send the invitation again', params: byId, status: 202 }),
  readOrganization: endpoint({ method: 'get', path: '/organization', action: 'organization.read', tag: 'People', summary: 'The organization', response: people.organizationSchema }),
  changeOrganization: endpoint({ method: 'patch', path: '/organization', action: 'organization.manage', tag: 'People', summary: 'Change the organization', body: people.changeOrganizationSchema, response: people.organizationSchema, ifMatch: true }),

  listLibrary: endpoint({ method: 'get', path: '/library/:kind', action: 'library.read', tag: 'Library', summary: 'Search base metals, filler metals, gases, positions or processes by any of their names', params: z.object({ kind: records.libraryItemSchema.shape.kind }), query: z.object({ ...listQuery, process: processSchema.optional(), pNumber: z.string().max(6).optional(), fNumber: z.string().max(6).optional() }), response: pageOf(records.libraryItemSchema) }),
  readLibraryItem: endpoint({ method: 'get', path: '/library/:kind/:id', action: 'library.read', tag: 'Library', summary: 'One library row', params: z.object({ kind: records.libraryItemSchema.shape.kind, id: idSchema }), response: records.libraryItemSchema }),

  listProcedures: endpoint({ method: 'get', path: '/procedures', action: 'procedures.read', tag: 'Procedures', summary: 'Procedures, newest revision of each', query: z.object({ ...listQuery, state: records.revisionStateSchema.optional(), process: processSchema.optional(), standard: z.string().max(20).optional(), sort: sorts(['number', '-number', 'updatedAt', '-updatedAt', 'title', '-title']) }), response: pageOf(records.procedureRowSchema) }),
  createProcedure: endpoint({ method: 'post', path: '/procedures', action: 'procedures.draft', tag: 'Procedures', summary: 'Start a procedure, empty or from content', body: z.object({ content: procedureContentSchema }).meta({ id: 'CreateProcedure' }), response: records.revisionSchema, status: 201 }),
  readProcedure: endpoint({ method: 'get', path: '/procedures/:id', action: 'procedures.read', tag: 'Procedures', summary: 'A procedure and its revisions', params: byId, response: records.procedureSchema }),
  reviseProcedure: endpoint({ method: 'post', path: '/procedures/:id/revisions', action: 'procedures.draft', tag: 'Procedures', summary: 'Open the next revision from the approved one', params: byId, response: records.revisionSchema, status: 201 }),
  readRevision: endpoint({ method: 'get', path: '/revisions/:id', action: 'procedures.read', tag: 'Procedures', summary: 'One revision, whole', params: byId, response: records.revisionSchema }),
  saveRevision: endpoint({ method: 'put', path: '/revisions/:id', action: 'procedures.draft', tag: 'Procedures', summary: 'Save a draft; 409 with both versions when somebody else saved first', params: byId, body: z.object({ content: procedureContentSchema }).meta({ id: 'SaveRevision' }), response: records.revisionSchema, ifMatch: true }),
  discardRevision: endpoint({ method: 'delete', path: '/revisions/:id', action: 'procedures.draft', tag: 'Procedures', summary: 'Discard a draft that was never approved', params: byId, ifMatch: true }),
  assessRevision: endpoint({ method: 'get', path: '/revisions/:id/assessment', action: 'procedures.read', tag: 'Procedures', summary: 'The revision judged by its coupons, under each of its standards', params: byId, response: records.revisionAssessmentSchema }),
  compareRevision: endpoint({ method: 'get', path: '/revisions/:id/comparison', action: 'procedures.read', tag: 'Procedures', summary: 'What changed since the approved revision, or since `against`', params: byId, query: z.object({ against: idSchema.optional() }), response: records.comparisonSchema }),
  impactOfRevision: endpoint({ method: 'get', path: '/revisions/:id/impact', action: 'procedures.read', tag: 'Procedures', summary: 'Each change since the approved revision, or since `against`: its class, and whether the coupons still cover it', params: byId, query: z.object({ against: idSchema.optional() }), response: standards.revisionImpactsSchema }),
  submitRevision: endpoint({ method: 'post', path: '/revisions/:id/submission', action: 'procedures.submit', tag: 'Procedures', summary: 'Send a draft for review', params: byId, response: records.revisionSchema, ifMatch: true }),
  returnRevision: endpoint({ method: 'post', path: '/revisions/:id/return', action: 'procedures.approve', tag: 'Procedures', summary: 'Return to the author with a comment', params: byId, body: z.object({ comment: z.string().trim().min(1, 'Say what should change.').max(4000) }).meta({ id: 'ReturnRevision' }), response: records.revisionSchema, ifMatch: true }),
  approveRevision: endpoint({ method: 'post', path: '/revisions/:id/approval', action: 'procedures.approve', tag: 'Procedures', summary: 'Approve by signature; a reason is needed where findings are outside or cannot be told', params: byId, body: signing.extend({ deviationReason: textOrNull(2000) }).meta({ id: 'ApproveRevision' }), response: records.revisionSchema, ifMatch: true }),
  withdrawRevision: endpoint({ method: 'post', path: '/revisions/:id/withdrawal', action: 'procedures.approve', tag: 'Procedures', summary: 'Withdraw an approved revision by signature', params: byId, body: signing.extend({ reason: z.string().trim().min(1, 'Say why it is withdrawn.').max(2000) }).meta({ id: 'WithdrawRevision' }), response: records.revisionSchema, ifMatch: true }),
  printRevision: endpoint({ method: 'get', path: '/revisions/:id/document', action: 'procedures.read', tag: 'Procedures', summary: 'The procedure as PDF; signed once approved', params: byId, query: paper, binary: 'application/pdf', status: 200 }),
  mailRevision: endpoint({ method: 'post', path: '/revisions/:id/mails', action: 'procedures.send', tag: 'Procedures', summary: 'E-mail the signed PDF', params: byId, body: mailBody, response: records.outboxRowSchema, status: 202 }),

  listCoupons: endpoint({ method: 'get', path: '/coupons', action: 'coupons.read', tag: 'Coupons', summary: 'Coupons and qualification records', query: z.object({ ...listQuery, state: records.couponStateSchema.optional(), process: processSchema.optional(), sort: sorts(['number', '-number', 'updatedAt', '-updatedAt']) }), response: pageOf(records.couponRowSchema) }),
  createCoupon: endpoint({ method: 'post', path: '/coupons', action: 'coupons.record', tag: 'Coupons', summary: 'Open a coupon, against a draft or by itself', body: z.object({ revisionId: idSchema.nullable().default(null), content: couponContentSchema.nullable().default(null) }).meta({ id: 'CreateCoupon' }), response: records.couponSchema, status: 201 }),
  readCoupon: endpoint({ method: 'get', path: '/coupons/:id', action: 'coupons.read', tag: 'Coupons', summary: 'One coupon, whole', params: byId, response: records.couponSchema }),
  saveCoupon: endpoint({ method: 'put', path: '/coupons/:id', action: 'coupons.record', tag: 'Coupons', summary: 'Save a coupon; 409 with both versions when somebody else saved first', params: byId, body: z.object({ content: couponContentSchema }).meta({ id: 'SaveCoupon' }), response: records.couponSchema, ifMatch: true }),
  qualifyCoupon: endpoint({ method: 'get', path: '/coupons/:id/qualification', action: 'coupons.read', tag: 'Coupons', summary: 'Specimens asked for, results judged, what is missing, what it qualifies', params: byId, response: records.couponQualificationsSchema }),
  qualifyUnderAllStandards: endpoint({ method: 'get', path: '/coupons/:id/standards', action: 'coupons.read', tag: 'Coupons', summary: 'What the coupon qualifies under every standard kept here, side by side', params: byId, response: standards.sideBySideSchema }),
  listCertifiedCoupons: endpoint({ method: 'get', path: '/certified-coupons', action: 'coupons.read', tag: 'Coupons', summary: 'Certified coupons of a process, newest first, whole, to judge a procedure by', query: z.object({ process: processSchema, limit: z.coerce.number().int().min(1).max(50).default(50) }), response: z.object({ items: z.array(assessedCouponSchema) }) }),
  certifyCoupon: endpoint({ method: 'post', path: '/coupons/:id/certification', action: 'coupons.certify', tag: 'Coupons', summary: 'Certify the record by signature', params: byId, body: signing.meta({ id: 'CertifyCoupon' }), response: records.couponSchema, ifMatch: true }),
  rejectCoupon: endpoint({ method: 'post', path: '/coupons/:id/rejection', action: 'coupons.certify', tag: 'Coupons', summary: 'Reject the coupon by signature, with the reason', params: byId, body: signing.extend({ reason: z.string().trim().min(1, 'Say why it is rejected.').max(2000) }).meta({ id: 'RejectCoupon' }), response: records.couponSchema, ifMatch: true }),
  printCoupon: endpoint({ method: 'get', path: '/coupons/:id/document', action: 'coupons.read', tag: 'Coupons', summary: 'The qualification record as PDF; signed once certified', params: byId, query: paper, binary: 'application/pdf', status: 200 }),
  mailCoupon: endpoint({ method: 'post', path: '/coupons/:id/mails', action: 'coupons.send', tag: 'Coupons', summary: 'E-mail the signed record', params: byId, body: mailBody, response: records.outboxRowSchema, status: 202 }),
  listPhotos: endpoint({ method: 'get', path: '/coupons/:id/photos', action: 'coupons.read', tag: 'Photos', summary: 'Photos and papers of a coupon', params: byId, response: z.object({ items: z.array(records.photoSchema) }) }),
  addPhotos: endpoint({ method: 'post', path: '/coupons/:id/photos', action: 'coupons.record', tag: 'Photos', summary: 'Upload JPEG, PNG, HEIC or PDF files', params: byId, upload: true, response: z.object({ items: z.array(records.photoSchema) }), status: 201 }),
  changePhoto: endpoint({ method: 'patch', path: '/photos/:id', action: 'coupons.record', tag: 'Photos', summary: 'Change caption or tag', params: byId, body: z.object({ caption: z.string().trim().max(400).optional(), tag: z.string().trim().max(80).optional() }).meta({ id: 'ChangePhoto' }), response: records.photoSchema }),
  removePhoto: endpoint({ method: 'delete', path: '/photos/:id', action: 'coupons.record', tag: 'Photos', summary: 'Remove a photo from a coupon that is not certified', params: byId }),
  readPhoto: endpoint({ method: 'get', path: '/photos/:id/original', action: 'coupons.read', tag: 'Photos', summary: 'The file as uploaded', params: byId, binary: 'application/octet-stream', status: 200 }),
  readThumbnail: endpoint({ method: 'get', path: '/photos/:id/thumbnail', action: 'coupons.read', tag: 'Photos', summary: 'A small picture without location data', params: byId, binary: 'image/jpeg', status: 200 }),

  listJobs: endpoint({ method: 'get', path: '/jobs', action: 'jobs.read', tag: 'Jobs', summary: 'Jobs', query: z.object({ ...listQuery, sort: sorts(['number', '-number', 'updatedAt', '-updatedAt']) }), response: pageOf(records.jobRowSchema) }),
  createJob: endpoint({ method: 'post', path: '/jobs', action: 'jobs.manage', tag: 'Jobs', summary: 'Open a job', body: records.writeJobSchema, response: records.jobSchema, status: 201 }),
  readJob: endpoint({ method: 'get', path: '/jobs/:id', action: 'jobs.read', tag: 'Jobs', summary: 'A job and its joints', params: byId, response: records.jobSchema }),
  saveJob: endpoint({ method: 'put', path: '/jobs/:id', action: 'jobs.manage', tag: 'Jobs', summary: 'Save a job and its joints', params: byId, body: records.writeJobSchema, response: records.jobSchema, ifMatch: true }),

  ...libraryEndpoints,

  ...heatEndpoints,

  ...machineEndpoints,

  ...arcDataEndpoints,

  ...trialEndpoints,

  listStandards: endpoint({ method: 'get', path: '/standards', action: 'standards.read', tag: 'Standards', summary: 'Standards whose rules are kept here', response: z.object({ items: z.array(standards.standardRowSchema) }) }),
  readStandard: endpoint({ method: 'get', path: '/standards/:id', action: 'standards.read', tag: 'Standards', summary: 'Every rule of a standard, and what is out of its scope here', params: z.object({ id: standardIdSchema }), response: standards.standardDetailSchema }),

  lookUp: endpoint({ method: 'get', path: '/lookup', action: 'lookup.read', tag: 'Look-up', summary: 'Approved procedures for a joint, best first, with reasons', query: records.lookupQuerySchema, response: records.lookupResultSchema }),
  assess: endpoint({ method: 'post', path: '/assessments', action: 'assessments.run', tag: 'Assessments', summary: 'Judge a procedure by its coupons under a standard, storing nothing', body: assessmentRequestSchema, response: assessmentSchema }),
  readToday: endpoint({ method: 'get', path: '/today', action: 'today.read', tag: 'Today', summary: 'What waits for the person who asks', response: records.todaySchema }),
  listOutbox: endpoint({ method: 'get', path: '/outbox', action: 'outbox.read', tag: 'Outbox', summary: 'Mail sent, queued or caught', query: z.object({ ...listQuery }), response: pageOf(records.outboxRowSchema) }),
  readMail: endpoint({ method: 'get', path: '/outbox/:id', action: 'outbox.read', tag: 'Outbox', summary: 'One mail', params: byId, response: records.outboxMailSchema }),
  readMailAttachment: endpoint({ method: 'get', path: '/outbox/:id/attachments/:index', action: 'outbox.read', tag: 'Outbox', summary: 'An attachment of a mail', params: z.object({ id: idSchema, index: z.coerce.number().int().min(0).max(50) }), binary: 'application/octet-stream', status: 200 }),
} as const

export type EndpointName = keyof typeof endpoints
export type ParamsOf<N extends EndpointName> = z.input<(typeof endpoints)[N]['params']>
export type QueryOf<N extends EndpointName> = z.input<(typeof endpoints)[N]['query']>
export type BodyOf<N extends EndpointName> = z.input<(typeof endpoints)[N]['body']>
export type ResponseOf<N extends EndpointName> = z.output<(typeof endpoints)[N]['response']>
