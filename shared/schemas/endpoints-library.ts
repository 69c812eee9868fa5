/** The API of the organization's own rows of the library. */
import { z } from 'zod'
import { idSchema } from './common.ts'
import { endpoint } from './endpoint.ts'
import { namedBySchema } from './heats.ts'
import { ownKindSchema, writeLibraryItemSchema } from './library.ts'
import { libraryItemSchema } from './records.ts'

const own = z.object({ kind: ownKindSchema, id: idSchema })

export const libraryEndpoints = {
  listLibraryUses: endpoint({ method: 'get', path: '/library/:kind/:id/uses', action: 'library.read', tag: 'Library', summary: 'Procedures, coupons, heats and lots that name the row', params: z.object({ kind: libraryItemSchema.shape.kind, id: idSchema }), response: z.object({ items: z.array(namedBySchema) }) }),
  createLibraryItem: endpoint({ method: 'post', path: '/library', action: 'library.manage', tag: 'Library', summary: 'Add a base metal, filler metal or gas of the organization’s own', body: writeLibraryItemSchema, response: libraryItemSchema, status: 201 }),
  saveLibraryItem: endpoint({ method: 'put', path: '/library/:kind/:id', action: 'library.manage', tag: 'Library', summary: 'Change an own row; records keep what they copied of it', params: own, body: writeLibraryItemSchema, response: libraryItemSchema, ifMatch: true }),
  removeLibraryItem: endpoint({ method: 'delete', path: '/library/:kind/:id', action: 'library.manage', tag: 'Library', summary: 'Remove an own row that nothing names', params: own, ifMatch: true }),
} as const
