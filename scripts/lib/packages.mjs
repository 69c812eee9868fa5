import { existsSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { root } from './paths.mjs'

/** @typedef {{ packages?: Record<string, { version?: string, integrity?: string, optional?: boolean, devOptional?: boolean }> }} Lock */

/**
 * Whether what npm wrote down after its last finished install is what the lock asks for.
 * Optional packages may be absent: npm leaves out those of other systems.
 * @param {Lock} lock package-lock.json
 * @param {Lock} installed node_modules/.package-lock.json
 * @returns {boolean}
 */
export function installedMatches(lock, installed) {
  const wanted = lock.packages ?? {}
  const have = installed.packages ?? {}
  const all = Object.entries(wanted).every(([name, want]) => {
    const got = have[name]
    if (name === '') return true
    if (!got) return Boolean(want.optional ?? want.devOptional)
    return got.version === want.version && got.integrity === want.integrity
  })
  return all && Object.keys(have).every((name) => name in wanted)
}

/** @returns {boolean} whether node_modules holds what package-lock.json asks for */
export function packagesAreCurrent(folder = root) {
  const installed = path.join(folder, 'node_modules/.package-lock.json')
  if (!existsSync(installed)) return false
  /** @type {(text: string) => Lock} */
  const parse = JSON.parse
  try {
    return installedMatches(parse(readFileSync(path.join(folder, 'package-lock.json'), 'utf8')), parse(readFileSync(installed, 'utf8')))
  } catch {
    return false
  }
}
