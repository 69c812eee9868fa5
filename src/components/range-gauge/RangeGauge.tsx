import type { NumericRange } from '@shared/schemas/assessment.ts'
import { SHOWN_UNIT, fromSi, toSi } from '@shared/units/convert.ts'
import { SI_UNIT, type Dimension, type UnitSystem } from '@shared/units/types.ts'
import { useWidth } from '@/hooks/width.ts'
import { layoutGauge, type Block, type Label, type Piece } from './layout.ts'
import { gaugeInWords, type AskedInterval } from './words.ts'

export interface RangeGaugeProps {
  /** What the gauge is of, for its text: "Thickness, groove". */
  label: string
  /** What the coupons qualify; null when there is no range to compare with. */
  range: NumericRange | null
  /** What this procedure asks for, in the range's unit; a null end runs on without limit. */
  asked: AskedInterval | null
  /** What was welded, in the range's unit. */
  tested?: readonly number[]
  unit?: string
  /** Reads the gauge in this system instead of the one it was judged in. */
  system?: UnitSystem
  /** For lists: no figures, 18 px high. */
  thin?: boolean
  testedWord?: string
}

const TONE: Record<Label['tone'], string> = { bound: 'fill-soft', tested: 'fill-plum', outside: 'fill-oxide font-semibold', 'cannot-tell': 'fill-straw-deep font-semibold' }
const BAR = { within: 'fill-ink', outside: 'fill-oxide', 'cannot-tell': 'fill-straw' } as const

/**
 * The range gauge: tinted block = what the coupon qualifies, black bar = what is asked, violet tick = what was welded,
 * red oxide = what sticks out, with its figure. An unlimited end runs off in an arrow head; an unknown end is dotted.
 */
export function RangeGauge({ label, range, asked, tested = [], unit, system, thin = false, testedWord = 'coupon' }: RangeGaugeProps) {
  const [frame, width] = useWidth(thin ? 120 : 340)
  const told = inSystem({ range, asked, tested, unit: unit ?? range?.unit ?? '' }, system)
  const { blocks, pieces, ticks, labels } = layoutGauge({ range: told.range, asked: told.asked, tested: told.tested, width, testedWord })
  const height = thin ? 18 : 58
  const middle = height / 2
  const block = thin ? 12 : 20
  return (
    <div ref={frame} className="min-w-0">
      <svg width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={gaugeInWords(label, told.range, told.asked, told.tested, told.unit, pieces)} className="block max-w-full">
        <line x1={0} x2={width} y1={middle} y2={middle} className="stroke-rule" strokeWidth={2} />
        {blocks.map((one, index) => (
          <Covered key={index} block={one} middle={middle} size={block} />
        ))}
        {pieces.map((piece, index) => (
          <Asked key={index} piece={piece} middle={middle} size={thin ? 4 : 7} width={width} />
        ))}
        {ticks.map((x) => (
          <line key={x} x1={x} x2={x} y1={middle - block / 2 - (thin ? 2 : 4)} y2={middle + block / 2 + (thin ? 2 : 5)} className="stroke-plum" strokeWidth={2} />
        ))}
        {!thin &&
          labels.map((text) => (
            <text key={`${text.row} ${text.text} ${text.x}`} x={text.x} y={text.row === 'top' ? 12 : height - 3} textAnchor="middle" className={`text-[13px] ${TONE[text.tone]}`} aria-hidden="true">
              {text.text}
            </text>
          ))}
      </svg>
    </div>
  )
}

function Covered({ block, middle, size }: { block: Block; middle: number; size: number }) {
  const { x1, x2, lower, upper, certain } = block
  const top = middle - size / 2
  const bottom = middle + size / 2
  const head = Math.min(8, (x2 - x1) / 2)
  const left = lower === 'arrow' ? x1 + head : x1
  const right = upper === 'arrow' ? x2 - head : x2
  const outline = [`M${left} ${top}H${right}`, upper === 'arrow' ? `L${x2} ${middle}L${right} ${bottom}` : `V${bottom}`, `H${left}`, lower === 'arrow' ? `L${x1} ${middle}Z` : 'Z'].join('')
  if (!certain) {
    return (
      <g className="stroke-straw" strokeWidth={1.5}>
        <path d={outline} className="fill-straw-bg" stroke="none" />
        <path d={`M${left} ${top}H${right}M${left} ${bottom}H${right}`} strokeDasharray="1.5 4" strokeLinecap="round" />
        {lower !== 'unknown' && lower !== 'arrow' && <path d={`M${left} ${top}V${bottom}`} />}
        {upper !== 'unknown' && upper !== 'arrow' && <path d={`M${right} ${top}V${bottom}`} />}
      </g>
    )
  }
  const shut = (kind: Block['lower'], x: number) => (kind === 'open' ? <path d={`M${x} ${top}V${bottom}`} strokeDasharray="2.5 2.5" /> : null)
  if (lower !== 'open' && upper !== 'open') return <path d={outline} className="fill-jade-bg stroke-jade" strokeWidth={1.25} />
  return (
    <g className="stroke-jade" strokeWidth={1.25}>
      <path d={outline} className="fill-jade-bg" stroke="none" />
      <path d={`M${left} ${top}H${right}${upper === 'arrow' ? `L${x2} ${middle}L${right} ${bottom}` : upper === 'open' ? `M${right} ${bottom}` : `V${bottom}`}H${left}${lower === 'arrow' ? `L${x1} ${middle}L${left} ${top}` : lower === 'open' ? '' : `V${top}`}`} fill="none" />
      {shut(lower, left)}
      {shut(upper, right)}
    </g>
  )
}

function Asked({ piece, middle, size, width }: { piece: Piece; middle: number; size: number; width: number }) {
  const { x1, x2, from, to, verdict } = piece
  if (from !== null && from === to) {
    const half = size * 0.85
    return <path d={`M${x1} ${middle - half}L${x1 + half} ${middle}L${x1} ${middle + half}L${x1 - half} ${middle}Z`} className={BAR[verdict]} />
  }
  const wide = Math.max(x2 - x1, 2)
  const head = Math.min(size, wide)
  const left = from === null ? head : x1
  const right = to === null ? width - head : Math.max(x2, x1 + 2)
  return (
    <path
      d={`M${left} ${middle - size / 2}H${right}${to === null ? `L${width} ${middle}L${right} ${middle + size / 2}` : `V${middle + size / 2}`}H${left}${from === null ? `L0 ${middle}Z` : 'Z'}`}
      className={BAR[verdict]}
    />
  )
}

interface Told {
  range: NumericRange | null
  asked: AskedInterval | null
  tested: readonly number[]
  unit: string
}

const isDimension = (name: string): name is Dimension => name in SI_UNIT

/** Reads everything in another system's unit; unchanged when the dimension is not one of ours. */
function inSystem(told: Told, system: UnitSystem | undefined): Told {
  const { range, asked, tested, unit } = told
  if (!system || !range || !isDimension(range.dimension)) return told
  const dimension = range.dimension
  const shown = SHOWN_UNIT[system][dimension]
  if (shown === unit) return told
  const turn = (value: number) => fromSi(toSi(value, dimension, unit), dimension, shown)
  const bound = (one: NumericRange['segments'][number]['lower']) => ('value' in one ? { ...one, value: turn(one.value) } : one)
  return {
    range: { ...range, unit: shown, segments: range.segments.map(({ lower, upper }) => ({ lower: bound(lower), upper: bound(upper) })) },
    asked: asked && { min: asked.min === null ? null : turn(asked.min), max: asked.max === null ? null : turn(asked.max) },
    tested: tested.map(turn),
    unit: shown,
  }
}
