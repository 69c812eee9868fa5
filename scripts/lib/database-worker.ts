/**
 * The part of starting that needs TypeScript and the npm packages: start and dev ask it, one step after the other,
 * and let it go before the server runs.
 */
import { ensureCluster, ensureDatabase } from '../postgres.ts'

/** Steps, in the order in which they are asked for. */
const acts = {
  /** `user` is the process that the private cluster stays up for. */
  async database({ user }: { user: number }): Promise<{ url: string; detail: string }> {
    const given = process.env.DATABASE_URL
    if (given) {
      await ensureDatabase(given)
      return { url: given, detail: `DATABASE_URL, ${new URL(given).host}` }
    }
    const cluster = await ensureCluster('pg', { user })
    const url = cluster.url('sidebend')
    await ensureDatabase(url)
    return { url, detail: `private, port ${cluster.port}, ${cluster.started ? 'started' : 'was up'}` }
  },
  async migrate({ url }: { url: string }): Promise<{ applied: string[] }> {
    const { migrate } = await import('../../server/migrations/run.ts')
    return { applied: await migrate(url) }
  },
  async demo({ url }: { url: string }): Promise<{ signIns: { role: string; email: string; password: string }[] }> {
    const { demoSignIns, loadDemo } = await import('../../server/demo/load.ts')
    await loadDemo(url)
    return { signIns: [...demoSignIns] }
  },
}

interface Question { act: keyof typeof acts; user: number; url: string }

process.on('message', (question: Question) => {
  acts[question.act](question).then(
    (answer) => process.send?.({ answer }),
    (error: unknown) => process.send?.({ error: error instanceof Error ? (error.name === 'PostgresError' ? error.message : (error.stack ?? error.message)) : String(error) }),
  )
})
process.once('disconnect', () => process.exit(0))
