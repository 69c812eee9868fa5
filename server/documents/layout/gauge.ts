import type { NumericRange } from '@shared/schemas/assessment.ts'
import type { Figures } from './figures.ts'
import type { Faces } from './fonts.ts'
import { drawLines, setText, widthOf, type Style } from './text.ts'
import { COLOUR } from './tokens.ts'

export interface Gauge {
  range: NumericRange
  /** What the procedure asks, in the range's unit; null on a coupon's own sheet. */
  asked: { min: number | null; max: number | null } | null
  /** What was welded, in the range's unit. */
  tested: readonly number[]
}

export const GAUGE_HEIGHT = 35
const TICK_TEXT: Style = { face: 'text', size: 6.4, colour: COLOUR.soft, leading: 8 }

interface Scale { at: (value: number) => number; left: number; right: number }

/** The strip's scale: every figure on it with room at both ends, from zero where the figures start near it. */
function scaleOf(gauge: Gauge, left: number, width: number): Scale {
  const values = [...gauge.tested, gauge.asked?.min, gauge.asked?.max, ...gauge.range.segments.flatMap((segment) => [segment.lower, segment.upper].map((bound) => ('value' in bound ? bound.value : null)))].filter(
    (value): value is number => typeof value === 'number' && Number.isFinite(value),
  )
  const low = values.length > 0 ? Math.min(...values) : 0
  const high = values.length > 0 ? Math.max(...values) : 1
  const span = high - low || Math.abs(high) * 0.4 || 1
  const from = low - span * 0.16
  const to = high + span * 0.2
  const right = left + width
  return { left, right, at: (value) => left + ((value - from) / (to - from)) * width }
}

/** Parts of [from, to] that no qualified segment covers; an unknown end covers nothing, so it is never red. */
function uncovered(gauge: Gauge, from: number, to: number): [number, number][] {
  let parts: [number, number][] = [[from, to]]
  for (const { lower, upper } of gauge.range.segments) {
    const low = 'value' in lower ? lower.value : -Infinity
    const high = 'value' in upper ? upper.value : Infinity
    parts = parts.flatMap(([start, end]): [number, number][] => {
      if (high < start || low > end) return [[start, end]]
      return ([[start, Math.min(end, low)], [Math.max(start, high), end]] as [number, number][]).filter(([a, b]) => b > a)
    })
  }
  return parts
}

function arrow(doc: PDFKit.PDFDocument, x: number, y: number, towards: 1 | -1, colour: string, size = 4): void {
  doc.polygon([x, y], [x - towards * size * 1.4, y - size], [x - towards * size * 1.4, y + size]).fill(colour)
}

function drawSegment(doc: PDFKit.PDFDocument, scale: Scale, segment: NumericRange['segments'][number], mid: number): void {
  const { lower, upper } = segment
  const half = 5.5
  const room = scale.right - scale.left
  const known = { lower: 'value' in lower, upper: 'value' in upper }
  const start = 'value' in lower ? scale.at(lower.value) : lower.kind === 'unlimited' ? scale.left : known.upper ? Math.max(scale.left, scale.at('value' in upper ? upper.value : 0) - room * 0.22) : scale.left
  const end = 'value' in upper ? scale.at(upper.value) : upper.kind === 'unlimited' ? scale.right : known.lower ? Math.min(scale.right, scale.at('value' in lower ? lower.value : 0) + room * 0.22) : scale.right
  const width = Math.max(end - start, 1.6)
  doc.rect(start, mid - half, width, half * 2).fill(COLOUR.jadeWash)
  doc.lineWidth(0.8).strokeColor(COLOUR.jade)
  const dotted = lower.kind === 'unknown' || upper.kind === 'unknown'
  if (dotted) doc.dash(1.2, { space: 1.6 })
  doc.moveTo(start, mid - half).lineTo(start + width, mid - half).moveTo(start, mid + half).lineTo(start + width, mid + half).stroke()
  if (dotted) doc.undash()
  if (known.lower) doc.moveTo(start, mid - half).lineTo(start, mid + half).stroke()
  if (known.upper) doc.moveTo(start + width, mid - half).lineTo(start + width, mid + half).stroke()
  if (lower.kind === 'unlimited') arrow(doc, scale.left - 6, mid, -1, COLOUR.jade)
  if (upper.kind === 'unlimited') arrow(doc, scale.right + 6, mid, 1, COLOUR.jade)
}

interface Note { x: number; text: string; style: Style }

/** Sets notes in a row so that none covers another: pushed right where needed, then back inside the strip. */
function drawNotes(faces: Faces, notes: readonly Note[], top: number, left: number, right: number): void {
  const set = notes.map((note) => ({ ...note, width: widthOf(faces, note.style, note.text) })).sort((a, b) => a.x - b.x)
  const placed = set.map((note) => ({ ...note, left: Math.min(Math.max(left, note.x - note.width / 2), right - note.width) }))
  placed.forEach((note, index) => {
    const before = placed[index - 1]
    if (before) note.left = Math.max(note.left, before.left + before.width + 4)
  })
  for (let index = placed.length - 1, limit = right; index >= 0; index -= 1) {
    const note = placed[index]!
    note.left = Math.min(note.left, limit - note.width)
    limit = note.left - 4
  }
  for (const note of placed) drawLines(faces, note.style, setText(faces, note.style, note.text, note.width + 1), note.left, top)
}

/**
 * A range gauge in a strip of GAUGE_HEIGHT: tinted block = qualified, black bar = asked, violet tick = welded,
 * red hatched bar = outside. An end without limit runs off with an arrow head; an unknown end is dotted.
 */
export function drawGauge(doc: PDFKit.PDFDocument, faces: Faces, figures: Figures, gauge: Gauge, x: number, y: number, width: number): void {
  const left = x + 9
  const room = width - 18
  const scale = scaleOf(gauge, left, room)
  const mid = y + GAUGE_HEIGHT / 2
  doc.lineWidth(0.9).strokeColor(COLOUR.rule).moveTo(left, mid).lineTo(left + room, mid).stroke()
  for (const segment of gauge.range.segments) drawSegment(doc, scale, segment, mid)

  const above: Note[] = []
  for (const { lower, upper } of gauge.range.segments) {
    const same = 'value' in lower && 'value' in upper && lower.value === upper.value
    if ('value' in lower) above.push({ x: scale.at(lower.value), text: `${lower.kind === 'open' && !same ? 'over ' : ''}${figures.ofRange(lower.value, gauge.range, true)}`, style: TICK_TEXT })
    if ('value' in upper && !same) above.push({ x: scale.at(upper.value), text: `${upper.kind === 'open' ? 'under ' : ''}${figures.ofRange(upper.value, gauge.range, true)}`, style: TICK_TEXT })
    if (lower.kind === 'unknown') above.push({ x: scale.left, text: 'not known', style: { ...TICK_TEXT, colour: COLOUR.straw } })
    if (upper.kind === 'unknown') above.push({ x: scale.right, text: 'not known', style: { ...TICK_TEXT, colour: COLOUR.straw } })
  }

  const below: Note[] = []
  const { asked } = gauge
  if (asked) {
    const bar = (from: number, to: number) => ({ start: Math.max(scale.left, Math.min(from, to - 2.4)), end: Math.min(scale.right, Math.max(to, from + 2.4)) })
    const whole = bar(asked.min === null ? scale.left : scale.at(asked.min), asked.max === null ? scale.right : scale.at(asked.max))
    doc.rect(whole.start, mid - 2.2, whole.end - whole.start, 4.4).fill(COLOUR.ink)
    if (asked.min === null && asked.max === null) {
      arrow(doc, scale.left - 3, mid, -1, COLOUR.ink, 3)
      arrow(doc, scale.right + 3, mid, 1, COLOUR.ink, 3)
    }
    const from = asked.min ?? asked.max ?? 0
    const to = asked.max ?? asked.min ?? 0
    const out = asked.min === null && asked.max === null ? [] : from === to ? (uncovered(gauge, from - 1e-9, to + 1e-9).some(([a, b]) => b - a > 1.9e-9) ? [[from, to] as [number, number]] : []) : uncovered(gauge, from, to)
    for (const [a, b] of out) {
      const part = bar(scale.at(a), scale.at(b))
      doc.rect(part.start, mid - 2.2, part.end - part.start, 4.4).fill(COLOUR.oxide)
      doc.save().rect(part.start, mid - 2.2, part.end - part.start, 4.4).clip().lineWidth(0.9).strokeColor(COLOUR.white)
      for (let stripe = part.start; stripe < part.end + 6; stripe += 3.4) doc.moveTo(stripe, mid - 3).lineTo(stripe - 4, mid + 3)
      doc.stroke().restore()
      const strong: Style = { ...TICK_TEXT, face: 'strong', colour: COLOUR.oxide }
      const figure = a === asked.min && b !== asked.max ? a : b
      below.push({ x: scale.at(figure), text: `${figures.ofRange(figure, gauge.range, true)} outside`, style: strong })
    }
  }
  const ticks = [...new Set(gauge.tested)].slice(0, 4)
  for (const value of ticks) {
    doc.lineWidth(1.4).strokeColor(COLOUR.plum).moveTo(scale.at(value), mid - 8).lineTo(scale.at(value), mid + 8).stroke()
    below.push({ x: scale.at(value), text: `welded ${figures.ofRange(value, gauge.range, true)}`, style: { ...TICK_TEXT, colour: COLOUR.plum } })
  }
  drawNotes(faces, above, y + 0.5, x, x + width)
  drawNotes(faces, below, y + GAUGE_HEIGHT - 8.5, x, x + width)
}

/** The gauge in words, for a reader who can't see it. */
export function gaugeInWords(figures: Figures, label: string, gauge: Gauge): string {
  const { asked, range } = gauge
  const given = (value: number | null) => (value === null ? 'open' : figures.ofRange(value, range))
  return [
    `Range gauge, ${label}: qualified ${figures.range(range)}.`,
    asked ? `Asked ${given(asked.min)} to ${given(asked.max)}.` : '',
    gauge.tested.length > 0 ? `Welded ${gauge.tested.map((value) => figures.ofRange(value, range)).join(', ')}.` : '',
  ].filter(Boolean).join(' ')
}
