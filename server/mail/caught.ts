import type { Mailer } from './mailer.ts'

/** Stands in for a mail server where none is set: the outbox row is all there is, and people read it there. */
export const caughtMailer = (): Mailer => ({ caught: true, send: () => Promise.resolve(), close: () => undefined })
