import type { JointPicture } from '@shared/calculations/joint-picture.ts'
import type { MarkKind } from '@shared/calculations/joint-marks.ts'

const HEATS = ['fill-heat-1', 'fill-heat-2', 'fill-heat-3', 'fill-heat-4'] as const

/** The strokes of a joint's section, inside an SVG. A dimension or pass that is pointed at elsewhere stands out. */
export function JointSvg({ picture, hatch, hot = null, hotPass = null, onMark }: { picture: JointPicture; hatch: string; hot?: string | null; hotPass?: number | null; onMark?: (field: string, kind: MarkKind) => void }) {
  const { plates, backing, insert, weld, passes, marks, axis } = picture
  return (
    <>
      <defs>
        <pattern id={hatch} width="9" height="9" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V9" className="stroke-edge" strokeWidth="0.8" />
        </pattern>
      </defs>
      {plates.map((path, index) => (
        <path key={index} d={path} fill={`url(#${hatch})`} className="stroke-ink" strokeWidth="1.75" strokeLinejoin="round" />
      ))}
      {backing && <path d={backing} className="fill-hair stroke-ink" strokeWidth="1.5" />}
      {weld.map((path, index) => (
        <path key={index} d={path} className="fill-paper stroke-soft" strokeDasharray="5 3" />
      ))}
      {passes.map((pass) => (
        <path key={pass.order} d={pass.path} data-pass={pass.order} className={`${HEATS[pass.heat] ?? HEATS[3]} ${pass.order === hotPass ? 'stroke-ink' : 'stroke-sheet'}`} strokeWidth={pass.order === hotPass ? 3 : 1.25} strokeLinejoin="round" />
      ))}
      {insert && <path d={insert} className="stroke-ink" strokeWidth="1.5" strokeDasharray="3 2" />}
      {passes.map(
        ({ order, heat, number, label }) =>
          label && (
            <text key={order} x={label.x} y={label.y} fontSize={label.size} textAnchor="middle" aria-hidden="true" className={`font-narrow font-semibold ${heat >= 2 ? 'fill-[#1b2226]' : 'fill-[#ffffff]'}`}>
              {number}
            </text>
          ),
      )}
      {axis && (
        <g aria-hidden="true">
          <path d={`M${axis.left} ${axis.y}H${axis.right}`} className="stroke-soft" strokeDasharray="14 4 3 4" />
          <text x={(axis.left + axis.right) / 2} y={axis.y + 18} textAnchor="middle" className="fill-soft text-[13px]">
            {axis.words}
          </text>
        </g>
      )}
      {marks.map(({ kind, field, path, heads, text }) => (
        <g key={kind} aria-hidden="true" data-mark={field} onClick={onMark && (() => onMark(field, kind))} className={onMark && 'cursor-pointer'}>
          <path d={path} className={field === hot ? 'stroke-steel' : 'stroke-soft'} strokeWidth={field === hot ? 2 : 1} />
          <path d={heads} className={field === hot ? 'fill-steel' : 'fill-soft'} />
          <text x={text.x} y={text.y} textAnchor={text.anchor} className={`stroke-sheet text-[14px] ${field === hot ? 'fill-steel font-bold' : 'fill-ink font-medium'}`} strokeWidth="4" paintOrder="stroke" strokeLinejoin="round">
            {text.words}
          </text>
        </g>
      ))}
    </>
  )
}
