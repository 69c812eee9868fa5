import { z } from 'zod'

const flag = z.enum(['0', '1', 'true', 'false']).default('0').transform((v) => v === '1' || v === 'true')

const envSchema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('production'),
  DATABASE_URL: z.string().min(1, 'DATABASE_URL is needed: npm start provides one.'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65535).default(4400),
  /** Address that people use, for links in mail and the CSRF check behind a proxy. */
  BASE_URL: z.url().optional(),
  SESSION_SECRET: z.string().min(32, 'SESSION_SECRET wants at least 32 characters: npm start makes one.'),
  /** Opens the organization's signing certificate; generated with the other secrets. */
  SIGNING_PASSPHRASE: z.string().min(16, 'SIGNING_PASSPHRASE wants at least 16 characters: npm start makes one.'),
  DATA_DIR: z.string().default('.data'),
  /** Largest recording of volts and amperes that is taken, MB. */
  ARC_DATA_MAX_MB: z.coerce.number().min(1).max(10_000).default(1024),
  SMTP_URL: z.string().optional(),
  MAIL_FROM: z.string().default('Sidebend <no-reply@sidebend.example>'),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  DEMO: flag,
})

export type Env = z.infer<typeof envSchema>

/**
 * The environment, parsed once.
 * @throws Error that names each variable at fault and what would be right
 */
export function readEnv(source: NodeJS.ProcessEnv = process.env): Env {
  const result = envSchema.safeParse(source)
  if (result.success) return result.data
  throw new Error(`The environment is not right:\n${result.error.issues.map((i) => `  ${i.path.join('.')}: ${i.message}`).join('\n')}`)
}

/**
 * The address that links in mail begin with, without a slash at the end. Never taken from a request:
 * whoever asks for a reset must not choose where its link points.
 */
export function baseUrl(env: Pick<Env, 'BASE_URL' | 'HOST' | 'PORT'>): string {
  if (env.BASE_URL) return env.BASE_URL.replace(/\/+$/, '')
  const host = env.HOST === '0.0.0.0' || env.HOST === '::' ? 'localhost' : env.HOST
  return `http://${host.includes(':') ? `[${host}]` : host}:${env.PORT}`
}
