import { readFileSync } from 'node:fs'
import path from 'node:path'
import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { heicToJpeg } from '../../../../server/storage/heic.ts'
import { readPicture } from '../../../../server/storage/picture.ts'

const fixture = (name: string): Buffer => readFileSync(path.join(import.meta.dirname, '../../../fixtures/photos', name))
const blank = sharp({ create: { width: 40, height: 20, channels: 3, background: '#777' } })

describe('pictures', () => {
  it('reads a HEIC picture: size, time taken and a thumbnail without EXIF', async () => {
    const { width, height, takenAt, thumbnail } = await readPicture(fixture('macro.heic'), 'image/heic')
    expect([width, height, takenAt?.toISOString()]).toEqual([160, 96, '2026-03-14T09:26:53.000Z'])
    const small = await sharp(thumbnail).metadata()
    expect(small).toMatchObject({ format: 'jpeg', width: 160, height: 96 })
    expect(small.exif).toBeUndefined()
  })

  it.each([[1, 40, 20], [3, 40, 20], [6, 20, 40], [8, 20, 40]])('turns orientation %i upright', async (orientation, width, height) => {
    const picture = await readPicture(await blank.clone().withMetadata({ orientation }).jpeg().toBuffer(), 'image/jpeg')
    expect([picture.width, picture.height]).toEqual([width, height])
    expect(await sharp(picture.thumbnail).metadata()).toMatchObject({ width, height })
  })

  it('knows no time where the camera gave none', async () => {
    expect((await readPicture(await blank.clone().png().toBuffer(), 'image/png')).takenAt).toBeNull()
  })

  it('gives up on a HEIC picture that is broken', async () => {
    const heic = fixture('macro.heic')
    await expect(heicToJpeg(Buffer.from('not a picture at all'))).rejects.toThrow()
    await expect(readPicture(heic.subarray(0, 400), 'image/heic')).rejects.toThrow()
  })
})
