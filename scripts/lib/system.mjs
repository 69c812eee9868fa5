import { execFileSync } from 'node:child_process'
import { accessSync, constants, existsSync, readdirSync } from 'node:fs'
import path from 'node:path'
import { Refusal } from './steps.mjs'

/**
 * @param {string} program
 * @returns {string | null} where it stands on PATH
 */
export function onPath(program) {
  for (const folder of (process.env.PATH ?? '').split(path.delimiter)) {
    const file = path.join(folder, program)
    try {
      accessSync(file, constants.X_OK)
      return file
    } catch { /* not here: look in the next folder */ }
  }
  return null
}

/** @param {string} folder */
const hasServer = (folder) => ['initdb', 'pg_ctl', 'postgres'].every((program) => existsSync(path.join(folder, program)))

/**
 * Folders with a whole PostgreSQL server (initdb, pg_ctl, postgres), in order of preference: PG_BIN, pg_config's, then Debian's, newest first.
 * @returns {string[]} best first
 */
export function postgresFolders() {
  const debian = '/usr/lib/postgresql'
  const versions = existsSync(debian) ? readdirSync(debian).map(Number).filter((version) => version > 0).sort((a, b) => b - a) : []
  let configured = ''
  try {
    configured = execFileSync('pg_config', ['--bindir'], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }).trim()
  } catch { /* no pg_config: Debian's folders follow */ }
  const folders = [process.env.PG_BIN ?? '', configured, ...versions.map((version) => `${debian}/${version}/bin`)]
  return [...new Set(folders.filter((folder) => folder && hasServer(folder)))]
}

/** @returns {string | null} the Chromium for browser tests and comparison prints: CHROMIUM, else the first on PATH */
export function findChromium() {
  if (process.env.CHROMIUM) return existsSync(process.env.CHROMIUM) ? process.env.CHROMIUM : null
  return ['chromium', 'chromium-browser', 'google-chrome'].map(onPath).find(Boolean) ?? null
}

function hasLiberation() {
  const fonts = '/usr/share/fonts'
  return existsSync(fonts) && readdirSync(fonts, { recursive: true }).some((name) => path.basename(String(name)).startsWith('LiberationSans'))
}

/**
 * Debian package → is what we want of it there?
 * @type {Record<string, () => boolean>}
 */
const present = {
  postgresql: () => postgresFolders().length > 0,
  'poppler-utils': () => Boolean(onPath('pdfsig') && onPath('pdftoppm')),
  openssl: () => Boolean(onPath('openssl')),
  chromium: () => Boolean(findChromium()),
  'fonts-liberation': hasLiberation,
}

/**
 * @param {readonly string[]} wanted Debian package names that `present` knows
 * @returns {string[]} those that are not there
 */
export const missingPackages = (wanted) => wanted.filter((name) => !present[name]?.())

/**
 * What to do about missing packages: nothing, install them, or ask the person.
 * @param {readonly string[]} missing
 * @param {{ isRoot: boolean, hasApt: boolean }} machine
 * @returns {{ act: 'nothing' } | { act: 'install', command: string } | { act: 'ask', sentence: string }}
 */
export function planPackages(missing, { isRoot, hasApt }) {
  if (missing.length === 0) return { act: 'nothing' }
  const command = `apt-get update && apt-get install -y --no-install-recommends ${missing.join(' ')}`
  if (!hasApt) return { act: 'ask', sentence: `Sidebend needs ${missing.join(', ')} (Debian's names) on this machine. Install them with your system's package manager and run this again.` }
  if (!isRoot) return { act: 'ask', sentence: `Sidebend needs ${missing.join(', ')} on this machine, and only an administrator may install packages. Run this once, then try again:\n\n  sudo sh -c '${command}'` }
  return { act: 'install', command }
}

/** Oldest Node that the locked packages run on. */
const oldest = [20, 19]

/**
 * @param {string} version as process.versions.node gives it
 * @throws {Refusal} when it is too old
 */
export function checkNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split('.').map(Number)
  const [wantMajor = 0, wantMinor = 0] = oldest
  if (major < wantMajor || (major === wantMajor && minor < wantMinor)) throw new Refusal(`This is Node ${version}; Sidebend needs ${oldest.join('.')} or later. Install a newer Node from nodejs.org or your system's packages and run this again.`)
}
