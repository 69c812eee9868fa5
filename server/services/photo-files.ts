import { createHash } from 'node:crypto'
import { fileTypeFromBuffer } from 'file-type'
import { unprocessable } from '../middleware/problem.ts'
import type { UploadedFile } from '../middleware/uploads.ts'
import { readPicture, type Picture } from '../storage/picture.ts'

/** What a coupon keeps: kinds by what the bytes are, with the endings that such a file may have. */
const KINDS = {
  'image/jpeg': { word: 'JPEG', endings: ['jpg', 'jpeg', 'jpe', 'jfif'], ending: 'jpg' },
  'image/png': { word: 'PNG', endings: ['png'], ending: 'png' },
  'image/heic': { word: 'HEIC', endings: ['heic', 'heif', 'hif'], ending: 'heic' },
  'image/heif': { word: 'HEIC', endings: ['heic', 'heif', 'hif'], ending: 'heic' },
  'application/pdf': { word: 'PDF', endings: ['pdf'], ending: 'pdf' },
} as const
type Kind = keyof typeof KINDS
const isKind = (mime: string): mime is Kind => Object.hasOwn(KINDS, mime)

export interface CheckedFile {
  name: string
  bytes: Buffer
  mediaType: Kind
  ending: string
  sha256: string
  /** null for papers */
  picture: Picture | null
}

const endingOf = (name: string): string | null => /\.([A-Za-z0-9]{1,8})$/.exec(name)?.[1]?.toLowerCase() ?? null
const ACCEPTED = 'Photos are kept as JPEG, PNG or HEIC, papers as PDF.'

/** @returns the file with its kind and picture, or the sentence that says what is wrong with it */
async function check({ name, bytes }: UploadedFile): Promise<CheckedFile | string> {
  if (bytes.length === 0) return `${name} is empty. Choose the file again; it may not have been copied whole.`
  const found = await fileTypeFromBuffer(bytes)
  if (!found) return `${name} is not a photo or paper that can be told by its content. ${ACCEPTED}`
  const { mime } = found
  if (!isKind(mime)) return `${name} is ${found.ext.toUpperCase()} inside. ${ACCEPTED}`
  const { word, endings, ending } = KINDS[mime]
  const named = endingOf(name)
  if (named !== null && !(endings as readonly string[]).includes(named)) return `${name} is named .${named} but is ${word} inside. Rename it to .${ending}, or export it again.`
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  if (mime === 'application/pdf') return { name, bytes, mediaType: mime, ending, sha256, picture: null }
  try {
    return { name, bytes, mediaType: mime, ending, sha256, picture: await readPicture(bytes, mime) }
  } catch {
    return `${name} says that it is ${word} but cannot be read as a picture: it is damaged, cut short, or too many pixels large. Export or take it again.`
  }
}

/**
 * Checks all files of an upload by their bytes, one after the other to spare memory.
 * @throws HttpProblem 422 with a sentence for each file at fault; then none is kept
 */
export async function checkFiles(files: readonly UploadedFile[]): Promise<CheckedFile[]> {
  if (files.length === 0) throw unprocessable('No files', 'No file came with the upload. Choose at least one.', [{ field: 'files', message: 'Choose at least one file.' }])
  const checked: CheckedFile[] = []
  const errors: { field: string; message: string; value: string }[] = []
  for (const [index, file] of files.entries()) {
    const result = await check(file)
    if (typeof result === 'string') errors.push({ field: `files.${index}`, message: result, value: file.name })
    else checked.push(result)
  }
  if (errors.length > 0) throw unprocessable('Not uploaded', `${errors.map(({ message }) => message).join(' ')}${files.length > errors.length ? ' Nothing was kept; send the others again without it.' : ''}`, errors)
  return checked
}
