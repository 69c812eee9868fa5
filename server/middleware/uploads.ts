import type { Request, RequestHandler } from 'express'
import multer, { MulterError } from 'multer'
import { badRequest, forbidden, HttpProblem, notSignedIn } from './problem.ts'
import { allows } from '../policies/index.ts'
import { actorOf } from '../routes/mount.ts'

export interface UploadedFile { name: string; bytes: Buffer }

const MAX_FILES = 20
const MAX_FILE_BYTES = 25 * 1024 * 1024
/** All files of one request together: they are held in memory until they are checked. */
const MAX_REQUEST_BYTES = 120 * 1024 * 1024

const uploaded = new WeakMap<Request, UploadedFile[]>()
const receiving = new WeakMap<Request, string>()

/** The files of a request that went through {@link receiveFiles}. */
export const filesOf = (req: Request): UploadedFile[] => uploaded.get(req) ?? []

/** A name as shown and kept: no folders, no control characters, not endless. */
export function cleanName(name: string): string {
  const bare = (name.split(/[\\/]/).at(-1) ?? '').replace(/\p{Cc}|\p{Cf}/gu, '').trim()
  return bare.length > 160 ? `${bare.slice(0, 120)}…${bare.slice(-30)}` : bare || 'without a name'
}

const upload = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: MAX_FILE_BYTES, files: MAX_FILES, fields: 20, fieldSize: 4096, parts: MAX_FILES + 20, headerPairs: 40 },
  defParamCharset: 'utf8',
  fileFilter: (req, file, keep) => {
    receiving.set(req, cleanName(file.originalname))
    keep(null, true)
  },
}).array('files', MAX_FILES)

const tooLarge = (detail: string, field = 'files') => new HttpProblem(413, 'Too large', detail, { errors: [{ field, message: detail }] })

function problemOfUpload(error: unknown, req: Request): unknown {
  const name = receiving.get(req) ?? 'A file'
  if (!(error instanceof MulterError)) return error instanceof HttpProblem ? error : badRequest('The upload could not be read. Send multipart/form-data with the files in the field "files".')
  switch (error.code) {
    case 'LIMIT_FILE_SIZE':
      return tooLarge(`${name} is larger than 25 MB. Make the picture smaller, or split the paper.`)
    case 'LIMIT_FILE_COUNT':
    case 'LIMIT_PART_COUNT':
      return tooLarge(`More than ${MAX_FILES} files were sent at once; nothing was kept. Send ${name} and those after it in a second go.`)
    case 'LIMIT_UNEXPECTED_FILE':
      // Multer says this too when the field holds more files than it may.
      return error.field === 'files' ? tooLarge(`More than ${MAX_FILES} files were sent at once; nothing was kept. Send them in several goes.`) : badRequest(`${name} came in the field "${error.field ?? ''}". Send files in the field "files".`)
    default:
      return badRequest(`The upload holds more than files: ${error.message}.`)
  }
}

/** Takes the files of a multipart request into memory, within limits, from people who may send them. */
export function receiveFiles(action: string): RequestHandler {
  return (req, res, next) => {
    const actor = actorOf(req)
    // Before a byte is taken in: nobody fills the memory who may not upload.
    if (!actor) throw notSignedIn()
    if (!allows(actor, action)) throw forbidden()
    if (!req.is('multipart/form-data')) throw new HttpProblem(415, 'That could not be read', 'Send the files as multipart/form-data, in the field "files".')
    if (Number(req.get('content-length') ?? 0) > MAX_REQUEST_BYTES) throw tooLarge('The files are larger than 120 MB together. Send them in several goes.')
    upload(req, res, (error: unknown) => {
      if (error) {
        next(problemOfUpload(error, req))
        return
      }
      const files = Array.isArray(req.files) ? req.files : []
      uploaded.set(req, files.map(({ originalname, buffer }) => ({ name: cleanName(originalname), bytes: buffer })))
      req.body = undefined
      next()
    })
  }
}
