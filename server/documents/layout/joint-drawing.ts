import type { JointGeometry } from '@shared/calculations/joint-geometry.ts'
import { jointPicture, type JointPicture } from '@shared/calculations/joint-picture.ts'
import type { Faces } from './fonts.ts'
import { drawLines, leadingOf, setText, widthOf, type Style } from './text.ts'
import { COLOUR, PASS_COLOURS } from './tokens.ts'

export interface Frame { x: number; y: number; width: number; height: number }

/** The picture's units are those of a screen, where a figure is 14 high; on paper it is 7 points. */
const PAPER = 0.5
const FIGURE: Style = { face: 'text', size: 7, colour: COLOUR.ink, leading: 9 }
const AXIS: Style = { ...FIGURE, size: 6.5, colour: COLOUR.soft }

/** The picture as large as the frame takes it, with its dimensions. */
function pictureFor(geometry: JointGeometry, faces: Faces, frame: Frame): { picture: JointPicture; scale: number } {
  const measure = (text: string) => widthOf(faces, FIGURE, text) / PAPER
  const [width, height] = [frame.width / PAPER, frame.height / PAPER]
  let maxHeight = height - 80
  let picture = jointPicture(geometry, { width, maxHeight, measure })
  for (let turn = 0; turn < 3 && picture.height > height; turn += 1) {
    maxHeight = Math.max(40, maxHeight - (picture.height - height))
    picture = jointPicture(geometry, { width, maxHeight, measure })
  }
  return { picture, scale: PAPER * Math.min(1, height / picture.height) }
}

/** Hatching at 45° within an outline, as strokes of their own: a printed page has no patterns. */
function hatch(doc: PDFKit.PDFDocument, path: string): void {
  const points = [...path.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)].map(([, x, y]) => ({ x: Number(x), y: Number(y) }))
  const [minX, maxX] = [Math.min(...points.map(({ x }) => x)), Math.max(...points.map(({ x }) => x))]
  const [minY, maxY] = [Math.min(...points.map(({ y }) => y)), Math.max(...points.map(({ y }) => y))]
  doc.save()
  doc.path(path).clip()
  doc.lineWidth(0.7).strokeColor('#A9B0B3')
  for (let x = minX - (maxY - minY); x < maxX; x += 10) doc.moveTo(x, maxY).lineTo(x + (maxY - minY), minY)
  doc.stroke().restore()
  doc.lineWidth(1.8).strokeColor(COLOUR.ink)
  doc.path(path).stroke()
}

/** A text by its base line, in points; with a white patch so that hatching never runs through it. */
function write(doc: PDFKit.PDFDocument, faces: Faces, style: Style, words: string, x: number, baseline: number, anchor: 'start' | 'middle' | 'end', patch: boolean): void {
  const width = widthOf(faces, style, words)
  const left = x - (anchor === 'start' ? 0 : anchor === 'end' ? width : width / 2)
  const top = baseline - leadingOf(style) * 0.78
  if (patch) doc.rect(left - 1, top, width + 2, leadingOf(style)).fill(COLOUR.white)
  drawLines(faces, style, setText(faces, style, words, width + 1), left, top)
}

function drawPasses(doc: PDFKit.PDFDocument, picture: JointPicture): void {
  for (const pass of picture.passes) {
    doc.lineWidth(picture.passes.length > 12 ? 0.6 : 1.4)
    doc.path(pass.path).fillAndStroke(PASS_COLOURS[pass.heat] ?? COLOUR.plum, COLOUR.white)
  }
}

/** The joint's cross-section as vectors: hatched plates, backing, numbered passes, dimensions with their figures. */
export function drawJointSection(doc: PDFKit.PDFDocument, faces: Faces, geometry: JointGeometry, frame: Frame): void {
  const { picture, scale } = pictureFor(geometry, faces, frame)
  const place = { x: frame.x, y: frame.y + Math.max(0, (frame.height - picture.height * scale) / 2) }
  const inPicture = (draw: () => void) => {
    doc.save()
    doc.translate(place.x, place.y).scale(scale)
    draw()
    doc.restore()
  }
  inPicture(() => {
    for (const path of picture.plates) hatch(doc, path)
    if (picture.backing) doc.lineWidth(1.8).path(picture.backing).fillAndStroke(COLOUR.backing, COLOUR.ink)
    for (const path of picture.weld) {
      doc.lineWidth(1.4).dash(4.8, { space: 3.6 })
      doc.path(path).fillAndStroke(COLOUR.white, COLOUR.ink)
      doc.undash()
    }
    drawPasses(doc, picture)
    if (picture.insert) doc.lineWidth(1.4).dash(3, { space: 2 }).strokeColor(COLOUR.ink).path(picture.insert).stroke().undash()
    doc.lineWidth(0.8).strokeColor(COLOUR.soft)
    for (const { path } of picture.marks) doc.path(path).stroke()
    for (const { heads } of picture.marks) if (heads !== '') doc.path(heads).fill(COLOUR.ink)
    if (picture.axis) {
      const { left, right, y } = picture.axis
      doc.lineWidth(0.8).strokeColor(COLOUR.soft).dash(14, { space: 4 }).moveTo(left, y).lineTo(right, y).stroke().undash()
    }
  })
  // Texts are set at their own size in points.
  doc.save()
  doc.translate(place.x, place.y).scale(scale / PAPER)
  const at = (value: number) => value * PAPER
  for (const { text } of picture.marks) write(doc, faces, FIGURE, text.words, at(text.x), at(text.y), text.anchor, true)
  for (const { number, heat, label } of picture.passes) {
    if (!label) continue
    const style: Style = { face: 'headStrong', size: label.size * PAPER, colour: heat >= 2 ? COLOUR.ink : COLOUR.white, leading: label.size * PAPER }
    write(doc, faces, style, number, at(label.x), at(label.y), 'middle', false)
  }
  if (picture.axis) write(doc, faces, AXIS, picture.axis.words, at((picture.axis.left + picture.axis.right) / 2), at(picture.axis.y + 18), 'middle', false)
  doc.restore()
}
