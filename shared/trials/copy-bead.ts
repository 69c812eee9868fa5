import type { BeadChanges, BeadContent } from '../schemas/trials.ts'
import { beadContentSchema } from '../schemas/trials.ts'

const nothingMeasured = beadContentSchema.parse({}).measured

/**
 * The next bead: machine, wire, gas and every setting as on the last one, with what was changed. What only looking and measuring can tell
 * (measured values, faults, score, note) starts empty. A change of a control that the bead doesn't have is left out.
 */
export function copyBead(content: BeadContent, changes: BeadChanges | null = null): BeadContent {
  const values = new Map(changes?.settings.map(({ control, value }) => [control, value]))
  return {
    ...content,
    settings: content.settings.map((setting) => ({ ...setting, value: values.get(setting.control) ?? setting.value })),
    stickOut: changes?.stickOut === undefined ? content.stickOut : changes.stickOut,
    measured: changes?.measured ?? nothingMeasured,
    faults: changes?.faults ?? [],
    score: changes?.score ?? null,
    note: changes?.note ?? null,
  }
}
