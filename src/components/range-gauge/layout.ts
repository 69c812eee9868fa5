/** Where everything on a range gauge goes: numbers in, positions in px out. No drawing here. */
import { containsValue, isCertain } from '@shared/ranges/numeric.ts'
import type { NumericRange, Verdict } from '@shared/schemas/assessment.ts'
import { figure } from '@/lib/figures.ts'
import type { AskedInterval } from './words.ts'

export interface GaugeInput {
  range: NumericRange | null
  asked: AskedInterval | null
  tested: readonly number[]
  width: number
  /** Word before the tested figure, e.g. "coupon". */
  testedWord: string
}

export type EndKind = 'closed' | 'open' | 'arrow' | 'unknown'
export interface Block {
  x1: number
  x2: number
  lower: EndKind
  upper: EndKind
  certain: boolean
}
export interface Piece {
  x1: number
  x2: number
  /** null where the asked interval runs on without limit. */
  from: number | null
  to: number | null
  verdict: Verdict
}
export interface Label {
  /** Centre. */
  x: number
  text: string
  row: 'top' | 'bottom'
  tone: 'bound' | 'tested' | 'outside' | 'cannot-tell'
}
export interface GaugeLayout {
  blocks: Block[]
  pieces: Piece[]
  ticks: number[]
  labels: Label[]
}

/** Width of a label at 13 px, generous so that neighbours never touch. */
export const labelWidth = (text: string, bold = false): number => text.length * (bold ? 8 : 7.4) + 2
const GAP = 6
const RANK: Record<Label['tone'], number> = { outside: 0, 'cannot-tell': 1, tested: 2, bound: 1 }

/** Moves labels of one row apart and inside 0..width; drops the least important where there is no room. */
export function spread(labels: readonly Label[], width: number): Label[] {
  let kept = [...labels].sort((a, b) => a.x - b.x)
  const size = (label: Label) => labelWidth(label.text, label.tone === 'outside' || label.tone === 'cannot-tell')
  while (kept.length > 1 && kept.reduce((sum, label) => sum + size(label) + GAP, -GAP) > width) {
    const least = kept.reduce((worst, label) => (RANK[label.tone] >= RANK[worst.tone] ? label : worst))
    kept = kept.filter((label) => label !== least)
  }
  const placed = kept.map((label) => ({ ...label }))
  let free = 0
  for (const label of placed) {
    label.x = Math.max(label.x, free + size(label) / 2)
    free = label.x + size(label) / 2 + GAP
  }
  let limit = width
  for (const label of placed.reverse()) {
    label.x = Math.min(label.x, limit - size(label) / 2)
    limit = label.x - size(label) / 2 - GAP
  }
  return placed.reverse()
}

const unique = (values: readonly number[]) => [...new Set(values)].sort((a, b) => a - b)
const finite = (value: number | null | undefined): value is number => value !== null && value !== undefined && Number.isFinite(value)

function endsOf(range: NumericRange | null): number[] {
  return (range?.segments ?? []).flatMap(({ lower, upper }) => [lower, upper]).flatMap((bound) => ('value' in bound ? [bound.value] : []))
}

/** Lays a gauge out over `width` px. The scale is linear and leaves a margin at both ends for what runs on. */
export function layoutGauge({ range, asked, tested, width, testedWord }: GaugeInput): GaugeLayout {
  const bounds = endsOf(range)
  const figures = unique([...bounds, ...[asked?.min, asked?.max].filter(finite), ...tested])
  const low = figures[0] ?? 0
  const high = figures.at(-1) ?? 1
  const span = high - low || Math.abs(high) || 1
  const from = figures.length > 1 ? low : low - span / 2
  const pad = width * 0.17
  const scale = (width - 2 * pad) / (high === low ? span : high - low)
  const x = (value: number) => (high === low && figures.length <= 1 ? width / 2 + (value - low) * scale : pad + (value - from) * scale)

  const end = (bound: NumericRange['segments'][number]['lower']): EndKind => (bound.kind === 'unlimited' ? 'arrow' : bound.kind)
  const blocks: Block[] = (range?.segments ?? []).map((segment) => ({
    x1: 'value' in segment.lower ? x(segment.lower.value) : 0,
    x2: 'value' in segment.upper ? x(segment.upper.value) : width,
    lower: end(segment.lower),
    upper: end(segment.upper),
    certain: isCertain(segment),
  }))

  const pieces = asked ? splitAsked(range, asked, bounds).map((piece) => ({ ...piece, x1: piece.from === null ? 0 : x(piece.from), x2: piece.to === null ? width : x(piece.to) })) : []
  const ticks = unique(tested).map(x)

  const top: Label[] = unique(bounds).map((value) => ({ x: x(value), text: figure(value), row: 'top', tone: 'bound' }))
  const bottom: Label[] = unique(tested).map((value, index) => ({ x: x(value), text: index === 0 ? `${testedWord} ${figure(value)}` : figure(value), row: 'bottom', tone: 'tested' }))
  for (const piece of pieces) {
    if (piece.verdict === 'within') continue
    const tone = piece.verdict
    for (const value of unique([piece.from, piece.to].filter(finite))) {
      const said = bounds.includes(value) || bottom.some((label) => label.tone !== 'tested' && label.x === x(value))
      if (!said) bottom.push({ x: x(value), text: figure(value), row: 'bottom', tone })
    }
  }
  return { blocks, pieces, ticks, labels: [...spread(top, width), ...spread(bottom, width)] }
}

/** Cuts what is asked at the range's bounds and judges each piece; neighbours with one verdict are joined. */
function splitAsked(range: NumericRange | null, asked: AskedInterval, bounds: readonly number[]): Omit<Piece, 'x1' | 'x2'>[] {
  const { min, max } = asked
  const judge = (value: number): Verdict => (range ? containsValue(range, value) : 'cannot-tell')
  if (min !== null && max !== null && min >= max) return [{ from: min, to: max, verdict: min > max ? 'cannot-tell' : judge(min) }]
  const cuts = unique(bounds.filter((value) => (min === null || value > min) && (max === null || value < max)))
  const edges: (number | null)[] = [min, ...cuts, max]
  const pieces: Omit<Piece, 'x1' | 'x2'>[] = []
  for (let i = 0; i + 1 < edges.length; i += 1) {
    const from = edges[i] ?? null
    const to = edges[i + 1] ?? null
    const middle = from !== null && to !== null ? (from + to) / 2 : from !== null ? from + Math.abs(from) + 1 : to !== null ? to - Math.abs(to) - 1 : 0
    const verdict = judge(middle)
    const last = pieces.at(-1)
    if (last && last.verdict === verdict) last.to = to
    else pieces.push({ from, to, verdict })
  }
  return pieces
}
