import { shapeOf, type ScoreShape } from '../words.ts'

/** The shape of a score, centred on 0/0: disc good, square fair, diamond bad, ring not scored. */
export function ScoreShapeMark({ shape, size = 6 }: { shape: ScoreShape; size?: number }) {
  if (shape === 'good') return <circle r={size} className="fill-jade stroke-sheet" />
  if (shape === 'fair') return <rect x={-size * 0.9} y={-size * 0.9} width={size * 1.8} height={size * 1.8} className="fill-straw stroke-sheet" />
  if (shape === 'bad') return <path d={`M0 ${-size * 1.3}L${size * 1.3} 0L0 ${size * 1.3}L${-size * 1.3} 0Z`} className="fill-oxide stroke-sheet" />
  return <circle r={size * 0.85} className="fill-sheet stroke-soft" strokeWidth={1.6} />
}

/** A score's shape beside its figure. */
export function ScoreMark({ score }: { score: number | null }) {
  return (
    <svg viewBox="-9 -9 18 18" className="size-4 shrink-0" aria-hidden="true">
      <ScoreShapeMark shape={shapeOf(score)} />
    </svg>
  )
}
