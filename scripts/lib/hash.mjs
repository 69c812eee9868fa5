import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs'
import path from 'node:path'

/**
 * @param {string} base
 * @param {string} name
 * @returns {string[]} every file at or below `name`, relative to `base`; nothing when it does not exist
 */
function filesBelow(base, name) {
  const full = path.join(base, name)
  if (!existsSync(full)) return []
  if (!statSync(full).isDirectory()) return [name]
  return readdirSync(full).flatMap((entry) => filesBelow(base, path.join(name, entry)))
}

/**
 * SHA-256 over names and contents, whatever order the disk lists them in.
 * @param {string} base folder
 * @param {readonly string[]} names files and folders relative to it; missing ones count as absent
 * @returns {string} hex
 */
export function hashFiles(base, names) {
  const sum = createHash('sha256')
  for (const file of names.flatMap((name) => filesBelow(base, name)).sort()) {
    const bytes = readFileSync(path.join(base, file))
    sum.update(`${file}\0${bytes.length}\0`).update(bytes)
  }
  return sum.digest('hex')
}

/**
 * Does `work` unless the stamp already holds `hash`. The stamp goes before the work begins, so that
 * work which was cut short is done again.
 * @param {string} stamp file
 * @param {string} hash
 * @param {() => void | Promise<void>} work
 * @returns {Promise<boolean>} whether the work was done
 */
export async function unlessStamped(stamp, hash, work) {
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return false
  rmSync(stamp, { force: true })
  await work()
  mkdirSync(path.dirname(stamp), { recursive: true })
  writeFileSync(stamp, hash)
  return true
}
