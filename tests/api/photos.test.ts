import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import path from 'node:path'
import sharp from 'sharp'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Photo } from '../../shared/schemas/records.ts'
import { certified, match, openCoupon, signInAll, type Agents } from './content.ts'
import { PASSWORD, problem, startApp, type TestApp } from './harness.ts'

const fixture = (name: string): Buffer => readFileSync(path.join(import.meta.dirname, '../fixtures/photos', name))
const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex')
const PDF = Buffer.from('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n')

let app: TestApp
let agents: Agents
let jpeg: Buffer
let png: Buffer
beforeAll(async () => {
  app = await startApp()
  agents = await signInAll(app, await app.makeOrganization())
  const plate = sharp({ create: { width: 900, height: 500, channels: 3, background: '#777' } })
  // As a camera held upright writes it: a lying picture with a note to turn it.
  jpeg = await plate.clone().withMetadata({ orientation: 6 }).jpeg().toBuffer()
  png = await plate.png().toBuffer()
})
afterAll(() => app.close())

interface Named { name: string; bytes: Buffer }
const send = (couponId: string, files: readonly Named[], agent = agents.inspector) => files.reduce((request, { name, bytes }) => request.attach('files', bytes, name), agent.post(`/api/coupons/${couponId}/photos`))
const upload = async (couponId: string, ...files: Named[]): Promise<Photo[]> => ((await send(couponId, files).expect(201)).body as { items: Photo[] }).items

describe('uploading', () => {
  it('keeps each original untouched, with its hash, and makes thumbnails of pictures', async () => {
    const coupon = await openCoupon(agents)
    const heic = fixture('macro.heic')
    const photos = await upload(coupon.id, { name: 'Nahtfläche.jpg', bytes: jpeg }, { name: 'plate.png', bytes: png }, { name: 'macro.HEIC', bytes: heic }, { name: 'report.pdf', bytes: PDF })
    expect(photos.map(({ fileName, mediaType, hasThumbnail }) => [fileName, mediaType, hasThumbnail])).toEqual([
      ['Nahtfläche.jpg', 'image/jpeg', true],
      ['plate.png', 'image/png', true],
      ['macro.HEIC', 'image/heic', true],
      ['report.pdf', 'application/pdf', false],
    ])
    expect(photos[2]).toMatchObject({ sha256: sha256(heic), bytes: heic.length, width: 160, height: 96, takenAt: '2026-03-14T09:26:53.000Z' })
    const original = await agents.auditor.get(`/api/photos/${photos[2]?.id}/original`).buffer(true).expect(200)
    expect(sha256(original.body as Buffer)).toBe(sha256(heic))
    expect(original.headers).toMatchObject({ 'content-type': 'image/heic', 'x-content-type-options': 'nosniff' })
    expect(original.headers['content-disposition']).toContain('filename="macro.HEIC"')
    const paper = await agents.auditor.get(`/api/photos/${photos[3]?.id}/original`).expect(200)
    expect(paper.headers['content-disposition']).toMatch(/^attachment; filename="report\.pdf"/)
    await agents.auditor.get(`/api/photos/${photos[3]?.id}/thumbnail`).expect(404)
  })

  it('turns the thumbnail upright, makes it small and leaves the place out', async () => {
    const coupon = await openCoupon(agents)
    const place = fixture('macro-with-place.jpg')
    const [turned, placed] = await upload(coupon.id, { name: 'turned.jpg', bytes: jpeg }, { name: 'placed.jpg', bytes: place })
    expect(turned).toMatchObject({ width: 500, height: 900 })
    const small = await sharp((await agents.welder.get(`/api/photos/${turned?.id}/thumbnail`).expect(200)).body as Buffer).metadata()
    expect(small).toMatchObject({ format: 'jpeg', height: 640 })
    expect((await sharp(place).metadata()).exif).toBeDefined()
    const answer = await agents.welder.get(`/api/photos/${placed?.id}/thumbnail`).expect(200)
    expect((await sharp(answer.body as Buffer).metadata()).exif).toBeUndefined()
    expect(answer.headers['content-type']).toBe('image/jpeg')
    const again = await agents.welder.get(`/api/photos/${placed?.id}/thumbnail`).set('If-None-Match', String(answer.headers.etag))
    expect(again.status).toBe(304)
  })
})

describe('refusals name the file and keep nothing', () => {
  const zip = Buffer.from('504b0304140000000000000021000000000000000000000000000000', 'hex')
  it.each<[string, () => Named, RegExp]>([
    ['empty', () => ({ name: 'blank.jpg', bytes: Buffer.alloc(0) }), /^blank\.jpg is empty\./],
    ['of a wrong kind', () => ({ name: 'results.zip', bytes: zip }), /^results\.zip is ZIP inside\. Photos are kept as JPEG, PNG or HEIC/],
    ['plain text', () => ({ name: 'notes.jpg', bytes: Buffer.from('just words') }), /^notes\.jpg is not a photo or paper that can be told by its content/],
    ['not what its name says', () => ({ name: 'macro.png', bytes: jpeg }), /^macro\.png is named \.png but is JPEG inside\. Rename it to \.jpg/],
    ['cut short', () => ({ name: 'cut.jpg', bytes: jpeg.subarray(0, Math.floor(jpeg.length / 2)) }), /^cut\.jpg says that it is JPEG but cannot be read as a picture/],
    ['a web page named as a picture', () => ({ name: 'x.jpg', bytes: Buffer.from('<html><script>alert(1)</script></html>') }), /^x\.jpg is /],
  ])('a file that is %s', async (_what, file, sentence) => {
    const coupon = await openCoupon(agents)
    const said = problem(await send(coupon.id, [{ name: 'good.png', bytes: png }, file()]).expect(422))
    expect(said.errors).toHaveLength(1)
    expect(said.errors?.[0]).toMatchObject({ field: 'files.1' })
    expect(said.errors?.[0]?.message).toMatch(sentence)
    const body: unknown = (await agents.inspector.get(`/api/coupons/${coupon.id}/photos`).expect(200)).body
    expect(body).toEqual({ items: [] })
  })

  it('a file that is too large', async () => {
    const coupon = await openCoupon(agents)
    const said = problem(await send(coupon.id, [{ name: 'huge.jpg', bytes: Buffer.alloc(25 * 1024 * 1024 + 1) }]).expect(413))
    expect(said.detail).toBe('huge.jpg is larger than 25 MB. Make the picture smaller, or split the paper.')
  })

  it('too many files at once', async () => {
    const coupon = await openCoupon(agents)
    const said = problem(await send(coupon.id, Array.from({ length: 21 }, (_, index) => ({ name: `p${index}.pdf`, bytes: PDF }))).expect(413))
    expect(said.detail).toContain('More than 20 files')
  })

  it('no file, another field, or no form at all', async () => {
    const coupon = await openCoupon(agents)
    const to = `/api/coupons/${coupon.id}/photos`
    expect(problem(await agents.inspector.post(to).field('note', 'x').expect(422)).detail).toContain('Choose at least one')
    expect(problem(await agents.inspector.post(to).attach('photo', png, 'a.png').expect(400)).detail).toBe('A file came in the field "photo". Send files in the field "files".')
    expect(problem(await agents.inspector.post(to).set('Content-Type', 'multipart/form-data').send('broken').expect(400)).detail).toContain('could not be read')
    expect(problem(await agents.inspector.post(to).send({}).expect(415)).detail).toContain('multipart/form-data')
  })

  it('people who may not upload, before a byte is taken in', async () => {
    const coupon = await openCoupon(agents)
    await send(coupon.id, [{ name: 'a.png', bytes: png }], agents.engineer).expect(403)
    await send(coupon.id, [{ name: 'a.png', bytes: png }], app.anonymous()).expect(401)
  })
})

describe('a name from outside', () => {
  it('loses folders and control characters', async () => {
    const coupon = await openCoupon(agents)
    const [photo] = await upload(coupon.id, { name: '../../etc/pass\u202ewd.png', bytes: png })
    expect(photo?.fileName).toBe('passwd.png')
  })
})

describe('changing and removing', () => {
  it('captions and tags, then removes with its files', async () => {
    const coupon = await openCoupon(agents)
    const [photo] = await upload(coupon.id, { name: 'a.png', bytes: png })
    const body: unknown = (await agents.inspector.patch(`/api/photos/${photo?.id}`).send({ caption: 'Face after the cap', tag: 'face' }).expect(200)).body
    expect(body).toMatchObject({ caption: 'Face after the cap', tag: 'face', fileName: 'a.png' })
    const { rows } = await app.services.database.owner.query<{ storage_key: string }>('select storage_key from photos where id = $1', [photo?.id])
    const key = rows[0]?.storage_key ?? ''
    expect(await app.services.storage.get(key)).toEqual(png)
    await agents.inspector.delete(`/api/photos/${photo?.id}`).expect(204)
    await app.drain()
    await expect(app.services.storage.get(key)).rejects.toThrow('nothing is stored')
    await agents.inspector.get(`/api/photos/${photo?.id}/original`).expect(404)
  })

  it('is closed with the record', async () => {
    const open = await openCoupon(agents)
    const [photo] = await upload(open.id, { name: 'a.png', bytes: png })
    await agents.inspector.post(`/api/coupons/${open.id}/certification`).set('If-Match', match(open)).send({ password: PASSWORD }).expect(200)
    await agents.inspector.patch(`/api/photos/${photo?.id}`).send({ caption: 'x' }).expect(409)
    await agents.inspector.delete(`/api/photos/${photo?.id}`).expect(409)
    const said = problem(await send(open.id, [{ name: 'late.png', bytes: png }]).expect(409))
    expect(said.detail).toContain('its photos are part of the record')
    await expect(app.inTenant({ id: ((await agents.inspector.get('/api/organization')).body as { id: string }).id }, ({ transaction }) => app.services.database.sequelize.query('update photos set caption = :c where id = :id', { replacements: { c: 'x', id: photo?.id }, transaction }))).rejects.toMatchObject({ original: { code: 'SB001' } })
    await expect(app.services.database.owner.query('delete from photos where id = $1', [photo?.id])).rejects.toMatchObject({ code: 'SB001' })
  })

  it('answers 404 across organizations', async () => {
    const coupon = await certified(agents)
    expect(coupon.state).toBe('certified')
    const open = await openCoupon(agents)
    const [photo] = await upload(open.id, { name: 'a.png', bytes: png })
    const others = await signInAll(app, await app.makeOrganization())
    for (const address of [`/api/coupons/${open.id}/photos`, `/api/photos/${photo?.id}/original`, `/api/photos/${photo?.id}/thumbnail`]) await others.inspector.get(address).expect(404)
    await send(open.id, [{ name: 'a.png', bytes: png }], others.inspector).expect(404)
    await others.inspector.patch(`/api/photos/${photo?.id}`).send({ caption: 'x' }).expect(404)
    await others.inspector.delete(`/api/photos/${photo?.id}`).expect(404)
  })
})
