import type { Request, RequestHandler } from 'express'
import multer, { MulterError, type StorageEngine } from 'multer'
import { ArcDataError } from '@shared/arc-data/problem.ts'
import type { ArcChoice } from '@shared/schemas/arc-data.ts'
import { endpoints } from '@shared/schemas/endpoints.ts'
import { allows } from '../policies/index.ts'
import { actorOf, type Services } from '../routes/mount.ts'
import { keepRecording, type KeptRecording } from '../services/arc-files.ts'
import { badRequest, forbidden, HttpProblem, notSignedIn, problemOfZod, unprocessable } from './problem.ts'
import { cleanName } from './uploads.ts'

const { action, query } = endpoints.addArcRecording
const choices = new WeakMap<Request, ArcChoice>()
const kept = new WeakMap<Request, KeptRecording>()

/** The recording of a request that went through {@link receiveRecording}. */
export const recordingOf = (req: Request): KeptRecording | undefined => kept.get(req)

const tooLarge = (megabytes: number) => {
  const detail = `The recording is larger than ${megabytes} MB. Record with a lower sample rate, or split it by passes and upload each.`
  return new HttpProblem(413, 'Too large', detail, { errors: [{ field: 'files', message: detail }] })
}

/** The sentence at the row, and which field of the form would help. */
function problemOfData(error: ArcDataError, name: string): HttpProblem {
  const field = error.asks === 'samplesPerSecond' ? 'samplesPerSecond' : error.asks === 'columns' ? 'columns' : error.row === null ? 'files' : `row ${error.row}`
  return unprocessable('The recording cannot be read', `${name}: ${error.message}`, [{ field, message: error.message, ...(error.row !== null && { value: `row ${error.row}` }) }])
}

function problemOfUpload(error: unknown, req: Request, megabytes: number): unknown {
  const name = names.get(req) ?? 'The file'
  if (error instanceof ArcDataError) return problemOfData(error, name)
  if (error instanceof HttpProblem) return error
  if (error instanceof MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE') return tooLarge(megabytes)
    if (error.code === 'LIMIT_UNEXPECTED_FILE' || error.code === 'LIMIT_FILE_COUNT') return badRequest(`Send one recording at a time, in the field "files"; a file came in "${error.field ?? ''}".`)
    return badRequest(`The upload holds more than a recording: ${error.message}.`)
  }
  // What storage or network did is not the form's fault.
  const code = (error as { code?: unknown }).code
  if (typeof code === 'string' && /^E[A-Z]+$/.test(code) && code !== 'ECONNRESET') return error
  return badRequest('The upload could not be read. Send multipart/form-data with the recording in the field "files".')
}

const names = new WeakMap<Request, string>()

/** Reads a recording while it is written to storage: neither the whole file nor its samples are ever in memory. */
export function receiveRecording({ storage, env }: Pick<Services, 'storage' | 'env'>): RequestHandler {
  const megabytes = env.ARC_DATA_MAX_MB
  const engine: StorageEngine = {
    _handleFile: (req, file, done) => {
      const actor = actorOf(req)
      const name = cleanName(file.originalname)
      names.set(req, name)
      if (!actor) return done(notSignedIn())
      keepRecording(storage, actor.organizationId, { name, stream: file.stream, choice: choices.get(req) ?? {} }).then(
        (recording) => {
          kept.set(req, recording)
          done(null, { path: recording.storageKey, size: recording.bytes })
        },
        (error: unknown) => {
          file.stream.resume()
          done(error)
        },
      )
    },
    _removeFile: (req, file, done) => {
      kept.delete(req)
      storage.remove(file.path).then(() => done(null), done)
    },
  }
  const upload = multer({ storage: engine, limits: { fileSize: megabytes * 1024 * 1024, files: 1, fields: 10, fieldSize: 4096, parts: 11, headerPairs: 40 }, defParamCharset: 'utf8' }).single('files')
  return (req, res, next) => {
    const actor = actorOf(req)
    // Before a byte is taken in: nobody fills the disk who may not record.
    if (!actor) throw notSignedIn()
    if (!allows(actor, action)) throw forbidden()
    if (!req.is('multipart/form-data')) throw new HttpProblem(415, 'That could not be read', 'Send the recording as multipart/form-data, in the field "files".')
    const parsed = query.safeParse(req.query)
    if (!parsed.success) throw problemOfZod(parsed.error, req.query, 'query')
    choices.set(req, parsed.data)
    // The form around the file takes a little more.
    if (Number(req.get('content-length') ?? 0) > megabytes * 1024 * 1024 + 65_536) throw tooLarge(megabytes)
    upload(req, res, (error: unknown) => {
      if (error) return next(problemOfUpload(error, req, megabytes))
      req.body = undefined
      next()
    })
  }
}
