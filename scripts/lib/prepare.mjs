import { run, runQuietly } from './children.mjs'
import { loadDotEnv } from './environment.mjs'
import { packagesAreCurrent } from './packages.mjs'
import { Refusal } from './steps.mjs'
import { checkNode, missingPackages, onPath, planPackages } from './system.mjs'

/**
 * The steps that need nothing but Node: its version, Debian's packages, npm's packages.
 * @param {import('./steps.mjs').Step} step
 * @param {{ debian: () => readonly string[] }} needs Debian package names, asked for once .env is read
 * @throws {Refusal} when the person has to do something first
 */
export async function prepare(step, { debian }) {
  await step('Node', (note) => {
    checkNode()
    note(process.versions.node)
  })
  loadDotEnv()
  await step('Debian packages', async (note) => {
    const missing = missingPackages(debian())
    const plan = planPackages(missing, { isRoot: process.getuid?.() === 0, hasApt: Boolean(onPath('apt-get')) })
    if (plan.act === 'ask') throw new Refusal(plan.sentence)
    if (plan.act === 'nothing') return note('all there')
    await runQuietly(`Installing ${missing.join(', ')}`, 'apt', 'sh', ['-c', plan.command], { ...process.env, DEBIAN_FRONTEND: 'noninteractive' })
    const still = missingPackages(missing)
    if (still.length > 0) throw new Refusal(`apt-get reported success, yet ${still.join(', ')} can't be found. Look at .data/logs/apt.log.`)
    note(`installed ${missing.join(', ')}`)
  })
  await step('npm packages', async (note) => {
    if (packagesAreCurrent()) return note('up to date')
    // npm tells its scripts where it stands; without it, take the one on PATH.
    const npm = process.env.npm_execpath
    const args = ['ci', '--include=dev', '--include=optional', '--no-audit', '--no-fund']
    await (npm?.endsWith('.js') ? runQuietly('npm ci', 'npm', process.execPath, [npm, ...args]) : runQuietly('npm ci', 'npm', 'npm', args))
    note('installed from the lock')
  })
}

/** Runs one of the project's TypeScript files to its end. @param {readonly string[]} args @param {NodeJS.ProcessEnv} [env] */
export const runTypeScript = (args, env = process.env) => run(process.execPath, ['--import', 'tsx', ...args], { env })
