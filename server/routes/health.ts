import type { Router } from 'express'
import type { Services } from './mount.ts'

const DATABASE_PATIENCE = 2000

async function databaseAnswers({ database }: Services): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined
  const late = new Promise<false>((resolve) => {
    timer = setTimeout(() => resolve(false), DATABASE_PATIENCE)
  })
  try {
    return await Promise.race([database.owner.query('select 1').then(() => true, () => false), late])
  } finally {
    clearTimeout(timer)
  }
}

/** `/healthz`: the process answers. `/readyz`: it can also do work, and is not about to stop. */
export function healthRoutes(router: Router, services: Services, isDraining: () => boolean): void {
  router.get('/healthz', (_req, res) => {
    res.set('Cache-Control', 'no-store').json({ status: 'ok' })
  })
  router.get('/readyz', async (_req, res) => {
    const database = await databaseAnswers(services)
    const ready = database && !isDraining()
    res.status(ready ? 200 : 503).set('Cache-Control', 'no-store').json({ status: ready ? 'ready' : isDraining() ? 'stopping' : 'not ready', database: database ? 'answers' : 'does not answer' })
  })
}
