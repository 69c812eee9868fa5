/** A guided bend, drawn: specimen over its former, the weld in the middle of the bend in its heat tints. Decoration only. */
export function BendDrawing({ className }: { className?: string }) {
  const arc = (radius: number, from: number, to: number) => {
    const at = (angle: number) => `${(210 + radius * Math.sin(angle)).toFixed(1)} ${(170 + radius * Math.cos(angle)).toFixed(1)}`
    return { start: at(from), path: `A${radius} ${radius} 0 0 ${from < to ? 0 : 1} ${at(to)}` }
  }
  const slice = (from: number, to: number) => {
    const outer = arc(112, from, to)
    const inner = arc(76, to, from)
    return `M${outer.start}${outer.path}L${inner.start}${inner.path}Z`
  }
  return (
    <svg viewBox="0 0 420 340" className={className} aria-hidden="true" fill="none">
      <defs>
        <pattern id="bend-hatch" width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V7" className="stroke-edge" strokeWidth="0.7" />
        </pattern>
      </defs>
      <path d="M98 20V170A112 112 0 0 0 322 170V20H286V170A76 76 0 0 1 134 170V20Z" fill="url(#bend-hatch)" className="stroke-ink" strokeWidth="2" />
      <path d={slice(-0.4, -0.2)} className="fill-heat-1 stroke-sheet" strokeWidth="1.5" />
      <path d={slice(-0.2, 0)} className="fill-heat-2 stroke-sheet" strokeWidth="1.5" />
      <path d={slice(0, 0.2)} className="fill-heat-3 stroke-sheet" strokeWidth="1.5" />
      <path d={slice(0.2, 0.4)} className="fill-heat-4 stroke-sheet" strokeWidth="1.5" />
      <path d="M98 20V170A112 112 0 0 0 322 170V20H286V170A76 76 0 0 1 134 170V20Z" className="stroke-ink" strokeWidth="2" />
      <circle cx="210" cy="170" r="70" className="stroke-soft" strokeDasharray="9 4 2 4" />
      <path d="M210 84V316M120 170H300" className="stroke-soft" strokeWidth="0.8" strokeDasharray="14 4 3 4" />
      <g className="stroke-soft" strokeWidth="1">
        <path d="M98 44H60M134 44H172" />
        <path d="m98 44-9-3v6ZM134 44l9-3v6Z" className="fill-soft" />
        <path d="M210 170 257 118" />
        <path d="m257 118-8.6 4.8 4.8 4.2Z" className="fill-soft" />
        <path d="M338 170A128 128 0 0 1 296 266" />
        <path d="m296 266 3-9 5 5Z" className="fill-soft" />
      </g>
      <g className="fill-ink text-[15px] italic">
        <text x="66" y="38">t</text>
        <text x="240" y="160">R</text>
        <text x="338" y="232" className="not-italic">180°</text>
      </g>
    </svg>
  )
}

/** The same specimen before bending, from the side and from above. Decoration only. */
export function FlatDrawing({ className }: { className?: string }) {
  return (
    <svg viewBox="0 0 460 220" className={className} aria-hidden="true" fill="none">
      <defs>
        <pattern id="flat-hatch" width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V7" className="stroke-edge" strokeWidth="0.7" />
        </pattern>
      </defs>
      <path d="M20 20H440V56H20Z" fill="url(#flat-hatch)" className="stroke-ink" strokeWidth="2" />
      <path d="m219 56-6-12h34l-6 12Z" className="fill-heat-1 stroke-sheet" strokeWidth="1.5" />
      <path d="m213 44-6-12h46l-6 12Z" className="fill-heat-2 stroke-sheet" strokeWidth="1.5" />
      <path d="m207 32-6-12h29v12Z" className="fill-heat-3 stroke-sheet" strokeWidth="1.5" />
      <path d="M230 32V20h29l-6 12Z" className="fill-heat-4 stroke-sheet" strokeWidth="1.5" />
      <path d="M20 100H440V170H20Z" className="stroke-ink" strokeWidth="2" />
      <path d="M201 100V170M259 100V170" className="stroke-ink" strokeWidth="1.2" />
      {[106, 115, 124, 133, 142, 151, 160].map((y) => (
        <path key={y} d={`M203 ${y}Q230 ${y + 9} 257 ${y}`} className="stroke-edge" strokeWidth="0.8" />
      ))}
      <path d="M230 8V190M8 135H452" className="stroke-soft" strokeWidth="0.8" strokeDasharray="14 4 3 4" />
      <g className="stroke-soft" strokeWidth="1">
        <path d="M20 176V206M440 176V206M20 200H440" />
        <path d="m20 200 9-3v6ZM440 200l-9-3v6Z" className="fill-soft" />
      </g>
      <text x="246" y="216" className="fill-ink text-[15px] italic">l</text>
    </svg>
  )
}
