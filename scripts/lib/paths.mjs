import path from 'node:path'
import { fileURLToPath } from 'node:url'

/** The project's folder. */
export const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '')

/**
 * Where everything is kept that is not in git: database, uploads, secrets, logs.
 * @param {NodeJS.ProcessEnv} [env] DATA_DIR, absolute or relative to the project
 * @returns {string} absolute path
 */
export const dataDir = (env = process.env) => path.resolve(root, env.DATA_DIR || '.data')
