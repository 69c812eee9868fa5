import exifReader from 'exif-reader'
import sharp from 'sharp'
import { heicToJpeg } from './heic.ts'

/** Largest edge of a thumbnail, pixels. */
const EDGE = 640
/** A picture larger than this is refused before it is unpacked into memory. */
const MAX_PIXELS = 120_000_000

export interface Picture {
  /** As it is to be seen, turned by its EXIF orientation. */
  width: number
  height: number
  takenAt: Date | null
  /** JPEG without EXIF, so without the place where it was taken. */
  thumbnail: Buffer
}

/** When the camera says it was taken; cameras rarely say in which zone, so the clock's time is kept as UTC. */
function takenAt(exif: Buffer | undefined): Date | null {
  if (!exif) return null
  try {
    const { Photo: photo, Image: image } = exifReader(exif)
    const time: unknown = photo?.DateTimeOriginal ?? photo?.DateTimeDigitized ?? image?.DateTime
    return time instanceof Date && !Number.isNaN(time.getTime()) && time.getUTCFullYear() >= 1990 ? time : null
  } catch {
    return null
  }
}

const isHeic = (mediaType: string): boolean => mediaType === 'image/heic' || mediaType === 'image/heif'

/**
 * Size, time and thumbnail of a picture.
 * @param mediaType as the bytes say: image/jpeg, image/png, image/heic or image/heif
 * @throws Error when the bytes cannot be read as that, or the picture has more than {@link MAX_PIXELS}
 */
export async function readPicture(bytes: Buffer, mediaType: string): Promise<Picture> {
  const options = { limitInputPixels: MAX_PIXELS, failOn: 'truncated' } as const
  const { exif, width: stored = 0, height: storedHeight = 0 } = await sharp(bytes, options).metadata()
  if (stored * storedHeight > MAX_PIXELS) throw new Error('too many pixels')
  // The decoder turns HEIC by its own orientation already.
  const readable = isHeic(mediaType) ? await heicToJpeg(bytes) : bytes
  const turned = sharp(readable, options).rotate()
  const { data: thumbnail } = await turned.clone().resize(EDGE, EDGE, { fit: 'inside', withoutEnlargement: true }).jpeg({ quality: 78 }).toBuffer({ resolveWithObject: true })
  const { autoOrient } = await sharp(readable, options).metadata()
  return { width: autoOrient.width, height: autoOrient.height, takenAt: takenAt(exif), thumbnail }
}
