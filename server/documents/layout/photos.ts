import { PAD, SOFT, STRONG, type Sheet } from './sheet.ts'
import { drawLines, heightOf, setText, type Style } from './text.ts'
import { COLOUR } from './tokens.ts'

/** A picture as JPEG, with its words and the SHA-256 value of the original file. */
export interface Photograph { caption: string; tag: string; jpeg: Buffer; sha256: string }

const HASH: Style = { face: 'text', size: 5.4, colour: COLOUR.soft, leading: 7 }

/** pdfkit refuses what is not a readable JPEG or PNG; a page must not fail for one bad picture. */
function readable(sheet: Sheet, jpeg: Buffer): boolean {
  try {
    // In pdfkit's image mixin, though its types leave it out.
    ;(sheet.doc as unknown as { openImage(source: Buffer): unknown }).openImage(jpeg)
    return true
  } catch {
    return false
  }
}

/** Photographs two to a row, each with caption, tag and fingerprint. */
export function drawPhotos(sheet: Sheet, photos: readonly Photograph[]): void {
  if (photos.length === 0) return
  const gutter = 12
  const width = (sheet.width - 2 * PAD - gutter) / 2
  const height = width * 0.66
  sheet.section('Photographs', `${photos.length}`, () => {
    for (let at = 0; at < photos.length; at += 2) {
      const row = photos.slice(at, at + 2).map((photo) => ({
        photo,
        caption: setText(sheet.faces, { ...STRONG, size: 7, leading: 9.2 }, photo.caption || 'no caption', width),
        tag: setText(sheet.faces, SOFT, photo.tag || 'no tag', width),
        hash: setText(sheet.faces, HASH, `SHA-256 ${photo.sha256}`, width),
      }))
      const words = Math.max(...row.map((item) => heightOf(item.caption, { ...STRONG, size: 7, leading: 9.2 }) + heightOf(item.tag, SOFT) + heightOf(item.hash, HASH)))
      sheet.ensure(height + words + 16)
      row.forEach((item, index) => {
        const left = sheet.left + PAD + index * (width + gutter)
        const top = sheet.y + 7
        const ok = readable(sheet, item.photo.jpeg)
        sheet.artifact(() => sheet.doc.rect(left, top, width, height).fill(COLOUR.band))
        sheet.tag('Figure', () => {
          if (ok) sheet.doc.image(item.photo.jpeg, left, top, { fit: [width, height], align: 'center', valign: 'center' })
          else drawLines(sheet.faces, SOFT, setText(sheet.faces, SOFT, 'This picture could not be read. Its original is kept with the record.', width - 20), left + 10, top + height / 2 - 9)
        }, { alt: `${item.photo.tag}: ${item.photo.caption}` })
        sheet.artifact(() => sheet.doc.lineWidth(0.5).strokeColor(COLOUR.rule).rect(left, top, width, height).stroke())
        sheet.tag('Caption', () => {
          let y = top + height + 4
          for (const [lines, style] of [[item.caption, { ...STRONG, size: 7, leading: 9.2 }], [item.tag, SOFT], [item.hash, HASH]] as const) {
            drawLines(sheet.faces, style, lines, left, y)
            y += heightOf(lines, style)
          }
        })
      })
      sheet.y += height + words + 16
    }
  }, height + 60)
}
