import { chromium, type Page } from 'playwright-core'
import { layOutPasses } from '../../shared/calculations/bead-layout.ts'
import { jointGeometry, settingOf } from '../../shared/calculations/joint-geometry.ts'
import { jointPicture } from '../../shared/calculations/joint-picture.ts'
import { withPlan } from '../../shared/calculations/pass-sequence.ts'
import { procedureContentSchema, type ProcedureContent } from '../../shared/schemas/welding.ts'
import { interval } from '../../shared/units/convert.ts'
import { findChromium } from '../lib/system.mjs'
import { cpuSlices, median, type Figure } from './measure.ts'
import type { Caller } from './product.ts'

const FRAME_MS = 1000 / 60
const mm = (min: number, max?: number) => interval(min, max, 'length')

/** A V in 25 mm plate with a GTAW root and GMAW above it, its passes laid out. */
function draft(): ProcedureContent {
  const content = procedureContentSchema.parse({ title: 'Joint under the hands', variables: { standards: [{ standard: 'asme-ix', edition: '2023' }], thickness: mm(25), baseMetals: { a: { libraryId: 'us-a516-70' } }, joint: { groove: 'single-v', includedAngle: interval(55, 65, 'angle'), rootOpening: mm(2, 4), rootFace: mm(1, 2) }, processes: [{ id: 'root', process: 'GTAW' }, { id: 'fill', process: 'GMAW' }] } })
  const laid = layOutPasses(jointGeometry(settingOf(content.variables)), [{ processId: 'root', bead: 14, height: null }, { processId: 'fill', bead: 22, height: null }])
  if (!laid.ok) throw new Error(laid.sentence)
  return { ...content, variables: { ...content.variables, processes: withPlan(content.variables.processes, laid.passes, false) } }
}

/** What a keystroke asks of the geometry: the section, its passes, the strokes of the drawing. */
export async function measureJointGeometry(seconds: number): Promise<Figure[]> {
  const { variables } = draft()
  const count = variables.processes.flatMap(({ passes }) => passes).length
  const rounds = 50
  let turn = 0
  const { drawn } = await cpuSlices(
    {
      drawn: () => {
        let strokes = 0
        for (let round = 0; round < rounds; round += 1) {
          turn += 1
          const joint = { ...variables.joint, rootOpening: mm(2 + (turn % 40) / 10) }
          strokes += jointPicture(jointGeometry(settingOf({ ...variables, joint })), { width: 620, maxHeight: 300 }).passes.length
        }
        return strokes
      },
    },
    rounds,
    Math.min(seconds, 5),
  )
  return [{ name: 'Joint: section and strokes', value: median(drawn.cpu) / 1000, unit: 'ms', note: `per keystroke, single V with ${count} passes, processor time` }]
}

interface Times { type: number[]; drag: number[] }

/** Types into a field and drags a handle, and tells what each took until the drawing stood anew: scripts, style and layout. */
function handle(page: Page, rounds: number): Promise<Times> {
  return page.evaluate(async (turns) => {
    const drawing = (): SVGSVGElement => {
      const svg = document.querySelector<SVGSVGElement>('#joint svg[role=group]')
      if (!svg) throw new Error('The drawing is not on the page.')
      return svg
    }
    const strokes = () => [...drawing().querySelectorAll('path')].map((path) => path.getAttribute('d')).join()
    const rest = () => new Promise<void>((resolve) => requestAnimationFrame(() => setTimeout(resolve, 30)))
    const timed = async (act: () => void): Promise<number> => {
      const before = strokes()
      const begun = performance.now()
      act()
      await Promise.resolve()
      drawing().getBoundingClientRect()
      const took = performance.now() - begun
      if (strokes() === before) throw new Error('The drawing did not follow.')
      await rest()
      return took
    }
    const input = document.querySelector<HTMLInputElement>('#row-joint-rootOpening')
    const grip = document.querySelector<SVGGElement>('[data-handle="joint.includedAngle"]')
    const value = Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, 'value')
    if (!input || !grip || !value?.set) throw new Error('The designer is not on the page.')
    const type: number[] = []
    input.focus()
    for (let turn = 0; turn < turns; turn += 1) type.push(await timed(() => {
      value.set?.call(input, ['2.5', '2', '3.5', '3'][turn % 4])
      input.dispatchEvent(new Event('input', { bubbles: true }))
    }))
    input.blur()
    await rest()
    const box = grip.getBoundingClientRect()
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
    const pointer = (kind: string, at: number, target: Element) => target.dispatchEvent(new PointerEvent(kind, { bubbles: true, pointerId: 1, button: 0, clientX: at, clientY: y }))
    // A pointer that isn't a hand's can't be captured; the moves are sent to the handle itself.
    grip.setPointerCapture = () => undefined
    pointer('pointerdown', x, grip)
    const drag: number[] = []
    for (let turn = 0; turn < turns; turn += 1) drag.push(await timed(() => pointer('pointermove', x + [12, 24, 36, 24][turn % 4]!, document.querySelector('[data-handle="joint.includedAngle"]')!)))
    pointer('pointerup', x, document.querySelector('[data-handle="joint.includedAngle"]')!)
    return { type, drag }
  }, rounds)
}

const share = (times: readonly number[], part: number): number => [...times].sort((a, b) => a - b)[Math.min(times.length - 1, Math.floor(times.length * part))] ?? 0

/** Redrawing the joint on the drafting screen, in Chromium. */
export async function measureJoint(caller: Caller, baseUrl: string, seconds: number): Promise<Figure[]> {
  const executablePath = findChromium()
  if (!executablePath) throw new Error('No Chromium was found: npm run bench installs it where it may.')
  const made = await fetch(`${baseUrl}/api/procedures`, { method: 'POST', headers: { 'content-type': 'application/json', cookie: caller.cookie }, body: JSON.stringify({ content: draft() }) })
  if (!made.ok) throw new Error(`Starting a draft answered ${made.status}: ${await made.text()}`)
  const { id } = (await made.json()) as { id: string }
  const browser = await chromium.launch({ executablePath, args: ['--disable-gpu', '--disable-dev-shm-usage', '--no-first-run', ...(process.getuid?.() === 0 ? ['--no-sandbox'] : [])] })
  try {
    const context = await browser.newContext({ baseURL: baseUrl, serviceWorkers: 'block', viewport: { width: 1440, height: 900 } })
    const [name = '', value = ''] = caller.cookie.split('=', 2)
    await context.addCookies([{ name, value, url: baseUrl }])
    // The names that tsx keeps in functions sent to the page.
    await context.addInitScript({ content: 'globalThis.__name = (made) => made' })
    const page = await context.newPage()
    await page.goto(`/revisions/${id}`, { waitUntil: 'networkidle' })
    await page.locator('#joint svg[role=group]').waitFor()
    await handle(page, 10)
    const times = await handle(page, Math.max(40, Math.round(seconds * 10)))
    const told = (title: string, list: number[]): Figure => ({ name: title, value: median(list), unit: 'ms', note: `median of ${list.length} in Chromium, 95 % within ${share(list, 0.95).toFixed(1)} ms; a frame is ${FRAME_MS.toFixed(1)} ms`, details: { p95: share(list, 0.95), most: Math.max(...list) } })
    return [told('Joint redrawn at a keystroke', times.type), told('Joint redrawn in a drag', times.drag)]
  } finally {
    await browser.close()
  }
}
