import { pino, type Logger } from 'pino'
import type { Env } from './env.ts'

export type Log = Logger

/** Fields that never reach the log, wherever they stand. */
const secrets = ['password', 'newPassword', 'currentPassword', 'passwordHash', 'token', 'link']

export const redacted = [
  'req.headers.cookie',
  'req.headers.authorization',
  'res.headers["set-cookie"]',
  ...secrets.flatMap((field) => [field, `*.${field}`, `*.*.${field}`]),
]

/** Structured lines on standard output. `destination` lets tests read them. */
export function openLog(env: Pick<Env, 'LOG_LEVEL'>, destination?: { write: (line: string) => void }): Log {
  const options = { level: env.LOG_LEVEL, redact: redacted, base: null }
  return destination ? pino(options, destination) : pino(options)
}

/** An address without the secret that a private link carries. */
export const withoutTokens = (url: string): string => url.replace(/\/(password-resets|reset-password|invitations?)\/[^/?#]+/g, '/$1/[hidden]')
