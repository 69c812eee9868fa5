import type { Router } from 'express'
import type { Tenant } from '../config/database.ts'
import { endpoints, type EndpointName } from '@shared/schemas/endpoints.ts'
import { filesOf, receiveFiles } from '../middleware/uploads.ts'
import type { Actor } from '../policies/index.ts'
import { checkFiles, type CheckedFile } from '../services/photo-files.ts'
import { route, type RouteContext, type Services } from './mount.ts'

type Act<N extends EndpointName> = Parameters<typeof route<N, Services>>[3]

/**
 * Mounts an endpoint told with `upload: true`: receives and checks the files, which takes its time, before a transaction is opened,
 * and hands them to `act`.
 */
export function uploadRoute<N extends EndpointName>(router: Router, services: Services, name: N, act: (context: RouteContext<N, Actor, Tenant>, files: CheckedFile[]) => ReturnType<Act<N>>): void {
  const checked = new WeakMap<object, CheckedFile[]>()
  router.post(endpoints[name].path, receiveFiles(endpoints[name].action), async (req, _res, next) => {
    checked.set(req, await checkFiles(filesOf(req)))
    next()
  })
  route<N, Services>(router, services, name, (context) => act(context, checked.get(context.req) ?? []))
}
