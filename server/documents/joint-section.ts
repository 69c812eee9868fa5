import { drawFacts } from './layout/facts.ts'
import { jointFacts, type Context } from './weld-sections.ts'

export function drawJoint(context: Context): void {
  context.sheet.section('Joint', '', () => drawFacts(context.sheet, jointFacts(context)))
}
