/** Table 5.1: wide layers are split. */
import { cannotTell } from '../../common/wording.ts'
import { condition } from './meta.ts'

export const pqLayerWidth = condition({
  file: 'layer-width', title: 'Split layers', clause: 'Table 5.1', basis: 'read', field: 'technique.bead', at: 'block',
  source: 'Table 5.1 read in 2020; note g for vertical and tubular work, and the rule on depth and width of a pass, from memory',
  statement: 'Wide layers are split: GMAW and FCAW where a layer is wider than 16 mm (5/8 in.) in flat, horizontal and overhead or 25 mm (1 in.) in vertical position, and wherever the root opening is over 12 mm (1/2 in.); SAW over 16 mm (5/8 in.) with single and parallel electrodes, over 25 mm (1 in.) with multiple ones. In each pass neither depth nor greatest width exceeds the width at the surface. Records hold no layer width, so this is shown and does not decide.',
  more: { classes: { SAW: 'nonessential', GMAW: 'nonessential', FCAW: 'nonessential' } },
  applies: (context) => context.procedure.joint.weld === 'groove',
  check: (_context, block) => cannotTell(`Layers wider than ${block.process === 'SAW' ? 'the table allows for the feed of the arc' : '16 mm (5/8 in.), in vertical position 25 mm (1 in.),'} are split; the width of layers is not part of the record.`, ['width of the layers']),
})
