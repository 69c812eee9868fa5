/** Scales and ticks of a drawn diagram. */

export interface Span { from: number; to: number }

/** Round figures in a span, at most about `most` of them. */
export function ticksOf({ from, to }: Span, most: number): number[] {
  const span = to - from
  if (!(span > 0)) return [from]
  const rough = span / Math.max(1, most)
  const power = 10 ** Math.floor(Math.log10(rough))
  const step = ([1, 2, 5, 10].find((each) => each * power >= rough) ?? 10) * power
  const first = Math.ceil(from / step - 1e-9)
  return Array.from({ length: Math.floor(to / step + 1e-9) - first + 1 }, (_, index) => Number(((first + index) * step).toPrecision(12)))
}

/** The least span that holds these figures, with room of a share at either end. */
export function spanOf(values: readonly number[], { from, to }: Span, room = 0.04): Span {
  const [least, most] = [Math.min(from, ...values), Math.max(to, ...values)]
  const pad = (most - least) * room
  return { from: least < from ? least - pad : from, to: most > to ? most + pad : to }
}
