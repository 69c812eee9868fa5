import path from 'node:path'
import express, { type Express } from 'express'
import { securityHeaders, requestBodies, sameOrigin } from './middleware/guards.ts'
import { httpLog } from './middleware/http-log.ts'
import { notFound, problemHandler } from './middleware/problem.ts'
import { sessions } from './middleware/session.ts'
import { clientRoutes } from './routes/client.ts'
import { docsRoutes } from './routes/docs.ts'
import { healthRoutes } from './routes/health.ts'
import { resourceRoutes } from './routes/index.ts'
import type { Services } from './routes/mount.ts'

export interface AppOptions {
  /** The built client; left out, only the API answers. */
  clientDirectory?: string
  /** True once the process has been told to stop. */
  isDraining?: () => boolean
}

export const builtClient = path.resolve(import.meta.dirname, '../dist/client')

/** The application, listening nowhere and starting nothing: tests mount it as it is. */
export function createApp(services: Services, { clientDirectory = builtClient, isDraining = () => false }: AppOptions = {}): Express {
  const app = express()
  app.disable('x-powered-by')
  // An ETag here is a record's version (If-Match); a hash of the body would only cost time.
  app.set('etag', false)
  app.set('trust proxy', 'loopback')

  app.use(httpLog(services.log))
  app.use(securityHeaders(services.env))
  healthRoutes(app, services, isDraining)

  const api = express.Router()
  const { handlers, authenticate } = sessions(services)
  api.use((_req, res, next) => {
    res.set('Cache-Control', 'no-store')
    next()
  })
  docsRoutes(api)
  api.use(sameOrigin(services.env), ...requestBodies, ...handlers)
  resourceRoutes(api, services, authenticate)
  api.use(() => {
    throw notFound('address')
  })
  app.use('/api', api)

  clientRoutes(app, clientDirectory)
  app.use(() => {
    throw notFound('page')
  })
  app.use(problemHandler)
  return app
}
