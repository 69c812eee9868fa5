import path from 'node:path'

/** @typedef {Record<string, { branches: { total: number, covered: number } }>} Summary What the json-summary reporter writes, as far as it is read here; `total` beside the files. */

/**
 * Branches covered, by folder of `shared/standards` and in all.
 * @param {Summary} summary
 * @param {string} root of the project
 * @returns {string[]} one line a folder, then `branches of shared/standards: 96.1 % (2900 of 3018)`
 */
export function branchLines(summary, root) {
  /** @type {Map<string, { total: number, covered: number }>} */
  const folders = new Map()
  const all = { total: 0, covered: 0 }
  for (const [file, { branches }] of Object.entries(summary)) {
    const [shared, standards, folder = '', ...below] = path.relative(root, file).split(path.sep)
    if (shared !== 'shared' || standards !== 'standards') continue
    const name = below.length > 0 ? folder : 'shared by all'
    const own = folders.get(name) ?? { total: 0, covered: 0 }
    folders.set(name, { total: own.total + branches.total, covered: own.covered + branches.covered })
    all.total += branches.total
    all.covered += branches.covered
  }
  const share = (/** @type {{ total: number, covered: number }} */ { total, covered }) => `${total === 0 ? '100.0' : (Math.floor((1000 * covered) / total) / 10).toFixed(1)} % (${covered} of ${total})`
  return [...[...folders].sort(([a], [b]) => a.localeCompare(b)).map(([name, counts]) => `  ${name.padEnd(14)} ${share(counts)}`), `branches of shared/standards: ${share(all)}`]
}
