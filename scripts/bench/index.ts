/** The benchmark itself; npm run bench prepares the machine and starts it. */
import { chmod, mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { cpus, tmpdir } from 'node:os'
import path from 'node:path'
import { ensureSecrets } from '../lib/environment.mjs'
import { dataDir, root } from '../lib/paths.mjs'
import { freePort } from '../lib/ports.mjs'
import { complain, createSteps } from '../lib/steps.mjs'
import { ensureCluster, releaseCluster } from '../postgres.ts'
import { measureArcData } from './arc-data.ts'
import { measureAssessments } from './assessments.ts'
import { measureJoint, measureJointGeometry } from './joint.ts'
import { measureLookup } from './lookup.ts'
import { median, table, type Figure } from './measure.ts'
import { measurePdf } from './pdf.ts'
import { signInAs, startProduct, type Product } from './product.ts'

const quick = process.argv.includes('--quick')
const engineOnly = process.argv.includes('--engine')
const seconds = quick ? 2 : 10
const result = path.join(dataDir(), 'bench.json')
const step = createSteps()
const figures: Figure[] = []
const failures: string[] = []
let product: Product | undefined

/** A measurement that cannot be made is told at the end; the others are made all the same. */
async function measure(title: string, work: () => Promise<Figure[]>): Promise<void> {
  try {
    figures.push(...(await step(title, work)))
  } catch (error) {
    failures.push(`${title}: ${error instanceof Error ? error.message : String(error)}`)
  }
}

async function measureStarts(folder: string): Promise<Figure[]> {
  // Without its stamp the client is built again.
  await rm(path.join(root, 'dist/client.stamp'), { force: true })
  product = await startProduct(folder, await freePort())
  const cold = product.readyAfter
  const warm: number[] = []
  for (let i = 0; i < (quick ? 1 : 3); i++) {
    await product.stop()
    product = await startProduct(folder, await freePort())
    warm.push(product.readyAfter)
  }
  return [
    { name: 'Cold start', value: cold / 1000, unit: 's', note: 'npm packages there; no database, no demo firm, no built client' },
    { name: 'Warm start', value: median(warm) / 1000, unit: 's', note: `median of ${warm.length}; all there, database stopped` },
    { name: 'Start: cold / warm', value: cold / median(warm), unit: '×', note: '' },
  ]
}

async function bench(): Promise<void> {
  const folder = await mkdtemp(path.join(tmpdir(), 'sidebend-bench-'))
  // As root the database runs under another account, which has to get to its own folder below this one.
  await chmod(folder, 0o711)
  process.env.DATA_DIR = folder
  try {
    await measure('Starts', () => measureStarts(folder))
    if (product) {
      const { baseUrl } = product
      const cluster = await ensureCluster('pg')
      const environment = { ...process.env, ...ensureSecrets(folder).secrets, DATABASE_URL: cluster.url('sidebend'), DATA_DIR: folder, LOG_LEVEL: 'silent', NODE_ENV: 'production', DEMO: '1' }
      const engineer = await signInAs(baseUrl, 'engineer')
      await measure('Look-up', async () => measureLookup(await signInAs(baseUrl, 'welder'), environment, seconds))
      await measure('PDF', () => measurePdf(engineer, baseUrl, seconds))
      await measure('Joint', () => measureJoint(engineer, baseUrl, seconds))
      const { pid } = product
      await measure('Arc data', () => measureArcData(engineer, baseUrl, pid, seconds))
    }
  } finally {
    await product?.stop()
    await releaseCluster('pg')
    await rm(folder, { recursive: true, force: true })
  }
}

try {
  await measure('Assessments', () => measureAssessments(seconds))
  await measure('Joint geometry', () => measureJointGeometry(seconds))
  if (!engineOnly) await bench()
} catch (error) {
  complain(error)
  failures.push('The run ended early.')
}
await mkdir(path.dirname(result), { recursive: true })
await writeFile(result, `${JSON.stringify({ measuredAt: new Date().toISOString(), node: process.versions.node, cores: cpus().length, processor: cpus()[0]?.model ?? null, quick, engineOnly, figures, failures }, null, 2)}\n`)
if (figures.length > 0) console.log(`\n${table(figures)}\n\nWritten to ${path.relative(root, result)}.`)
for (const failure of failures) console.error(`\nNot measured. ${failure}`)
process.exit(failures.length > 0 ? 1 : 0)
