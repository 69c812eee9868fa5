import { randomBytes } from 'node:crypto'
import { chmodSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import util from 'node:util'
import { dataDir, root } from './paths.mjs'

/**
 * Later sources only fill what earlier ones leave unset or empty.
 * @param {readonly NodeJS.ProcessEnv[]} sources
 * @returns {NodeJS.ProcessEnv}
 */
export function mergeEnv(sources) {
  /** @type {NodeJS.ProcessEnv} */
  const merged = {}
  for (const source of sources) for (const [name, value] of Object.entries(source)) if (value !== undefined && (merged[name] ?? '') === '') merged[name] = value
  return merged
}

/**
 * @param {string} file
 * @returns {NodeJS.ProcessEnv} what it sets; a variable without a value counts as not set
 */
const readEnvFile = (file) => (existsSync(file) ? Object.fromEntries(Object.entries(util.parseEnv(readFileSync(file, 'utf8'))).filter(([, value]) => value !== '')) : {})

/** Puts the project's .env (or the file that ENV_FILE names), where there is one, behind the variables that are already set. */
export function loadDotEnv() {
  Object.assign(process.env, mergeEnv([process.env, readEnvFile(path.resolve(root, process.env.ENV_FILE || '.env'))]))
}

const secretNames = ['SESSION_SECRET', 'SIGNING_PASSPHRASE']

/**
 * The secrets of this installation: each made once, kept outside git, readable by its owner alone.
 * @param {string} [folder]
 * @returns {{ secrets: NodeJS.ProcessEnv, made: string[] }} made: the names of those that were not there
 */
export function ensureSecrets(folder = dataDir()) {
  const file = path.join(folder, 'secrets.env')
  const kept = readEnvFile(file)
  const made = secretNames.filter((name) => !kept[name])
  if (made.length === 0) return { secrets: kept, made }
  const secrets = { ...kept, ...Object.fromEntries(made.map((name) => [name, randomBytes(48).toString('base64url')])) }
  mkdirSync(folder, { recursive: true })
  const lines = [
    '# Made at the first start. Back this file up with the database and keep it to yourself.',
    '# A new SESSION_SECRET signs everybody out; without SIGNING_PASSPHRASE the signing certificate cannot be opened again.',
    ...Object.entries(secrets).map(([name, value]) => `${name}=${value}`),
  ]
  // Written aside and renamed, so that a kill in between never leaves half a file.
  writeFileSync(`${file}.new`, `${lines.join('\n')}\n`, { mode: 0o600 })
  chmodSync(`${file}.new`, 0o600)
  renameSync(`${file}.new`, file)
  return { secrets, made }
}
