import type { CouponContent, ProcedureContent, ProcessBlock, WeldingVariables } from '../schemas/welding.ts'

const only = <T>(values: readonly T[]): T[] => (values.length === 1 ? [...values] : [])

function blockOf(block: ProcessBlock): ProcessBlock {
  const { electrical, technique } = block
  const withoutFlow = (gas: ProcessBlock['shieldingGas']) => (gas ? { ...gas, flow: null } : null)
  return {
    ...block,
    depositThickness: null,
    maxPassThickness: null,
    // A coupon has one position and one diameter; where the procedure allows several, the inspector says which it was.
    positions: only(block.positions),
    progression: block.progression === 'both' ? null : block.progression,
    filler: { ...block.filler, diameters: only(block.filler.diameters), lot: null, tradeName: null, fluxTradeName: null },
    shieldingGas: withoutFlow(block.shieldingGas),
    backingGas: withoutFlow(block.backingGas),
    trailingGas: withoutFlow(block.trailingGas),
    plasmaGas: withoutFlow(block.plasmaGas),
    electrical: {
      ...electrical,
      current: null, voltage: null, wireFeed: null, travelSpeed: null, heatInput: null,
      pulseFrequency: null, pulseOnTime: null, backgroundCurrent: null, backgroundVoltage: null, peakCurrent: null, acFrequency: null,
      panel: null,
    },
    technique: { ...technique, bead: technique.bead === 'both' ? null : technique.bead, electrodeSpacing: null, contactTubeDistance: null, ...(technique.lateralSpacing && { lateralSpacing: null }) },
    passes: [],
  }
}

/** Variables of a coupon about to be welded: what the procedure names is kept, what has to be measured is left open. */
function variablesOf(asked: WeldingVariables): WeldingVariables {
  return {
    ...asked,
    // A coupon is a test, by whatever route the procedure goes.
    standards: asked.standards.map(({ route: _route, ...choice }) => choice),
    product: asked.product === 'plate-and-pipe' ? 'plate' : asked.product,
    joint: { ...asked.joint, includedAngle: null, bevelAngle: null, rootOpening: null, rootFace: null, rootRadius: null, filletLeg: null, ...(asked.joint.filletThroat && { filletThroat: null }), ...(asked.joint.branchAngle && { branchAngle: null }) },
    thickness: null,
    thicknessB: null,
    diameter: null,
    ...(asked.diameterB && { diameterB: null }),
    ...(asked.postHeating && { postHeating: { ...asked.postHeating, temperature: null, time: null } }),
    preheat: { ...asked.preheat, minimum: null, interpassMaximum: null },
    pwht: { ...asked.pwht, temperature: null, time: null },
    processes: asked.processes.map(blockOf),
  }
}

/** A coupon's starting content, taken from the procedure that it is to support. */
export const couponFromProcedure = (procedure: ProcedureContent, number: string): CouponContent => ({
  title: `Coupon for ${number}`,
  variables: variablesOf(procedure.variables),
  weldedOn: null, welder: null, welderStamp: null, witness: null, machine: null,
  runSheet: [], tension: [], bends: [], macros: [], toughness: [], hardness: [],
  laboratory: null, reportNumber: null, testedOn: null, notes: null,
})
