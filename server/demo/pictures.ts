/** Drawn pictures for the demo coupons: a macro section, a bend specimen and the welded plate. Nothing photographed. */
import sharp from 'sharp'

type Tone = 'steel' | 'stainless' | 'aluminium'
export interface DemoPicture { fileName: string; caption: string; tag: string; jpeg: Buffer }

const WIDTH = 960
const HEIGHT = 640
/** Drawn smaller than laid out: grain is slow to draw, and a thumbnail is all that most people see. */
const SCALE = 0.75
const METAL: Readonly<Record<Tone, { base: string; weld: string; zone: string; bench: string }>> = {
  steel: { base: '#8d9196', weld: '#b3b7bb', zone: '#6d7176', bench: '#2e3236' },
  stainless: { base: '#b9bec2', weld: '#d9dddf', zone: '#a08f6d', bench: '#33373b' },
  aluminium: { base: '#c9ced1', weld: '#e3e7e9', zone: '#b4bbc0', bench: '#2c3135' },
}

/** Grain over metal; the seed makes each picture its own and every run the same. */
const grain = (id: string, seed: number, frequency: string, strength: number) => `
  <filter id="${id}" x="0" y="0" width="100%" height="100%">
    <feTurbulence type="fractalNoise" baseFrequency="${frequency}" numOctaves="2" seed="${seed}" result="noise"/>
    <feColorMatrix in="noise" type="matrix" values="0 0 0 0 0  0 0 0 0 0  0 0 0 0 0  ${strength} 0 0 0 -0.2" result="dark"/>
    <feComposite in="dark" in2="SourceAlpha" operator="in" result="cut"/>
    <feMerge><feMergeNode in="SourceGraphic"/><feMergeNode in="cut"/></feMerge>
  </filter>`

/** A rule along the lower edge, a tick every 40 pixels; figures would need a font. */
const rule = () => `<g><rect x="0" y="588" width="${WIDTH}" height="52" fill="#d8c98a"/>${Array.from({ length: 25 }, (_, index) => `<rect x="${index * 40}" y="588" width="2" height="${index % 5 === 0 ? 26 : 14}" fill="#3a3526"/>`).join('')}</g>`

const draw = (body: string, defs: string): Promise<Buffer> =>
  sharp(Buffer.from(`<svg xmlns="http://www.w3.org/2000/svg" width="${WIDTH * SCALE}" height="${HEIGHT * SCALE}" viewBox="0 0 ${WIDTH} ${HEIGHT}"><defs>${defs}</defs>${body}</svg>`)).flatten({ background: '#202326' }).jpeg({ quality: 82, chromaSubsampling: '4:4:4' }).toBuffer()

/** Ground and etched section through a V weld in `layers` layers. */
function macro(tone: Tone, seed: number, layers: number): Promise<Buffer> {
  const { base, weld, zone, bench } = METAL[tone]
  const [top, bottom] = [200, 440]
  const layerLines = Array.from({ length: layers - 1 }, (_, index) => {
    const y = bottom - ((bottom - top) * (index + 1)) / layers
    const half = 34 + ((bottom - y) / (bottom - top)) * 130
    return `<path d="M${480 - half} ${y} Q480 ${y + 34} ${480 + half} ${y}" fill="none" stroke="${zone}" stroke-width="3" opacity="0.8"/>`
  }).join('')
  return draw(
    `<rect width="${WIDTH}" height="${HEIGHT}" fill="${bench}"/>
     <rect x="60" y="${top}" width="840" height="${bottom - top}" fill="${base}" filter="url(#grain)"/>
     <path d="M286 ${top} L424 ${bottom} L536 ${bottom} L674 ${top} Z" fill="${zone}" opacity="0.55"/>
     <path d="M312 ${top} Q480 ${top - 58} 648 ${top} L518 ${bottom} Q480 ${bottom + 34} 442 ${bottom} Z" fill="${weld}" filter="url(#weld)"/>
     ${layerLines}${rule()}`,
    grain('grain', seed, '0.9', 0.55) + grain('weld', seed + 7, '0.05 0.4', 0.5),
  )
}

/** A bend specimen after the former, convex face to the viewer; `open` draws an opening on it. */
function bend(tone: Tone, seed: number, open: boolean): Promise<Buffer> {
  const { base, weld, zone, bench } = METAL[tone]
  return draw(
    `<rect width="${WIDTH}" height="${HEIGHT}" fill="${bench}"/>
     <path d="M180 560 L180 330 A300 260 0 0 1 780 330 L780 560 L690 560 L690 340 A210 180 0 0 0 270 340 L270 560 Z" fill="${base}" filter="url(#grain)"/>
     <path d="M408 82 Q480 66 552 82 L532 172 Q480 160 428 172 Z" fill="${weld}" filter="url(#grain)"/>
     <path d="M396 86 L416 176 M564 86 L544 176" stroke="${zone}" stroke-width="6"/>
     ${open ? '<path d="M452 92 q22 10 44 2 q-20 22 -44 -2 Z" fill="#191a1b"/>' : ''}${rule()}`,
    grain('grain', seed, '0.7 0.2', 0.5),
  )
}

/** The welded plate from above: two members, the cap's ripples between them, tape at one end for the mark. */
function plate(tone: Tone, seed: number): Promise<Buffer> {
  const { base, weld, zone, bench } = METAL[tone]
  const ripples = Array.from({ length: 44 }, (_, index) => `<path d="M${90 + index * 18} 262 q16 34 0 68" fill="none" stroke="${zone}" stroke-width="4" opacity="0.75"/>`).join('')
  return draw(
    `<rect width="${WIDTH}" height="${HEIGHT}" fill="${bench}"/>
     <rect x="70" y="70" width="820" height="200" fill="${base}" filter="url(#grain)"/>
     <rect x="70" y="322" width="820" height="200" fill="${base}" filter="url(#grain)"/>
     <rect x="70" y="236" width="820" height="120" fill="${zone}" opacity="0.45"/>
     <rect x="70" y="260" width="820" height="72" rx="10" fill="${weld}" filter="url(#grain)"/>${ripples}
     <rect x="700" y="390" width="150" height="64" fill="#d9dbd4"/>${rule()}`,
    grain('grain', seed, '0.02 0.8', 0.5),
  )
}

export interface PictureSet { tone: Tone; seed: number; layers: number; tested: boolean; open?: boolean }

/** Pictures of one coupon: the plate always, bend and section once it was tested. */
export async function picturesOf({ tone, seed, layers, tested, open = false }: PictureSet): Promise<DemoPicture[]> {
  const first = { fileName: 'plate.jpg', caption: 'As welded, cap side', tag: 'plate', jpeg: await plate(tone, seed) }
  if (!tested) return [first]
  return [
    first,
    { fileName: 'macro.jpg', caption: `Section, ${layers} layers, etched`, tag: 'macro', jpeg: await macro(tone, seed + 20, layers) },
    { fileName: 'bend.jpg', caption: open ? 'Bend specimen S3, opened' : 'Bend specimen, no opening', tag: 'bend', jpeg: await bend(tone, seed + 40, open) },
  ]
}
