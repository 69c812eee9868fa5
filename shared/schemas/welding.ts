/**
 * The variables of a weld, one shape for what a procedure asks for (intervals) and for what a coupon was
 * (intervals as observed; one value has min = max). Rules, comparison, forms and documents all read this shape,
 * and a field is named everywhere by its dotted path, e.g. `processes.0.filler.fNumber`.
 * Grades and numbers are copied from the library when picked, so that a later correction never alters a signed record.
 */
import { z } from 'zod'
import { idSchema, intervalOrNull, intervalSchema, quantityOrNull, quantitySchema, standardChoiceSchema, textOrNull, unitSystemSchema } from './common.ts'

export const PROCESSES = ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW', 'PAW', 'OTHER'] as const
export const processSchema = z.enum(PROCESSES)
export type Process = z.infer<typeof processSchema>

export const POSITIONS = ['1G', '2G', '3G', '4G', '5G', '6G', '6GR', '1F', '2F', '3F', '4F', '5F'] as const
export const positionSchema = z.enum(POSITIONS)
export type Position = z.infer<typeof positionSchema>

export const GROOVE_TYPES = ['square', 'single-v', 'double-v', 'single-bevel', 'double-bevel', 'single-u', 'double-u', 'single-j', 'double-j', 'compound-v', 'flare-bevel', 'flare-v'] as const
export const BACKINGS = ['none', 'metal', 'weld-metal', 'ceramic', 'flux', 'consumable-insert'] as const
export const PWHT_CONDITIONS = ['none', 'below-lower-transformation', 'above-upper-transformation', 'above-upper-then-below-lower', 'between-transformations', 'within-range', 'solution-anneal'] as const
export const TRANSFER_MODES = ['short-circuiting', 'globular', 'spray', 'pulsed-spray'] as const
export const CURRENT_TYPES = ['DCEP', 'DCEN', 'AC', 'AC-balanced'] as const
export const GASES = ['Ar', 'He', 'CO2', 'O2', 'N2', 'H2'] as const
export const HEAT_INPUT_METHODS = ['meter', 'volume', 'instantaneous-energy', 'instantaneous-power'] as const

const bool = z.boolean().nullable().default(null)
const oneOf = <const T extends readonly [string, ...string[]]>(values: T) => z.enum(values).nullable().default(null)

export const baseMetalSchema = z
  .object({
    libraryId: z.string().max(80).nullable().default(null),
    specification: textOrNull(80),
    grade: textOrNull(80),
    uns: textOrNull(20),
    productForm: textOrNull(80),
    /** P-Number as text: 5A, 10H and 15E are P-Numbers of their own; null = unassigned or not known. */
    pNumber: textOrNull(6),
    groupNumber: z.number().int().min(1).max(9).nullable().default(null),
    iso15608: textOrNull(8),
    d11Group: textOrNull(6),
    d12MNumber: textOrNull(6),
    minTensile: quantityOrNull,
    minYield: quantityOrNull,
    minElongation: quantityOrNull,
    /** Heat-treatment condition or temper in which it is welded, e.g. `T6`, `H116`, `Q&T`. */
    condition: textOrNull(40).optional(),
    /** Whether its own standard specifies impact values. */
    impactSpecified: z.boolean().nullable().optional(),
    heatNumber: textOrNull(60),
    certificate: textOrNull(120),
  })
  .meta({ id: 'BaseMetal' })
export type BaseMetal = z.infer<typeof baseMetalSchema>

export const jointSchema = z
  .object({
    weld: z.enum(['groove', 'fillet']).default('groove'),
    type: z.enum(['butt', 'tee', 'corner', 'lap', 'edge']).default('butt'),
    /** Designation of a standard joint detail, e.g. TC-U4a-GF. */
    designation: z.string().trim().max(40).nullable().optional(),
    penetration: z.enum(['full', 'partial']).default('full'),
    groove: oneOf(GROOVE_TYPES),
    includedAngle: intervalOrNull,
    bevelAngle: intervalOrNull,
    rootOpening: intervalOrNull,
    rootFace: intervalOrNull,
    rootRadius: intervalOrNull,
    /** Depth of preparation on the first side; without it all that the root face and the second side leave. */
    grooveDepth: intervalSchema.nullable().optional(),
    /** Of the second side of a double groove, where the sides differ. The angle is that of `includedAngle` or `bevelAngle`. */
    secondDepth: intervalSchema.nullable().optional(),
    secondAngle: intervalSchema.nullable().optional(),
    /** Height above the root side at which the angle of a compound groove changes. */
    angleChange: intervalSchema.nullable().optional(),
    /** Leg of the fillet that covers a groove weld in a tee joint. */
    reinforcingFillet: intervalSchema.nullable().optional(),
    /** Leg on the lying member A; on both members where `filletLegB` is not given. */
    filletLeg: intervalOrNull,
    filletLegB: intervalSchema.nullable().optional(),
    /** Angle between the members on the side of a fillet; without it they stand square. */
    memberAngle: intervalSchema.nullable().optional(),
    /** Of a butt joint between unequal thicknesses: the surfaces that are flush, and the slope of the thicker member's taper. */
    alignment: z.enum(['root-side', 'face-side', 'centred']).nullable().optional(),
    taperAngle: intervalSchema.nullable().optional(),
    /** Design throat of a fillet; of an equal-leg fillet it follows from the leg. */
    filletThroat: intervalSchema.nullable().optional(),
    /** A branch connection: member A is the branch, member B the run pipe. */
    branch: z.enum(['set-on', 'set-in', 'set-through']).nullable().optional(),
    branchAngle: intervalSchema.nullable().optional(),
    backing: oneOf(BACKINGS),
    backingMaterial: textOrNull(120),
    backingThickness: intervalSchema.nullable().optional(),
    backingWidth: intervalSchema.nullable().optional(),
    /** Of a consumable insert: across the joint, and along the thickness. */
    insertWidth: intervalSchema.nullable().optional(),
    insertHeight: intervalSchema.nullable().optional(),
    retainers: bool,
    backGouging: oneOf(['none', 'grinding', 'arc-gouging', 'machining', 'chipping']),
    backGougeDepth: intervalSchema.nullable().optional(),
    weldedFromBothSides: bool,
    /** Where the weld mends or builds up rather than joins. */
    work: z.enum(['repair', 'build-up']).nullable().optional(),
    /** Whether the weld holds pressure; asked of fillets. */
    pressureRetaining: z.boolean().nullable().optional(),
    notes: textOrNull(1000),
  })
  .meta({ id: 'Joint' })
export type Joint = z.infer<typeof jointSchema>

export const gasMixtureSchema = z
  .object({
    libraryId: z.string().max(80).nullable().default(null),
    /** Volume per cent; a classified mixture sums to 100. */
    components: z.array(z.object({ gas: z.enum(GASES), percent: z.number().min(0).max(100) })).max(6).default([]),
    isoSymbol: textOrNull(12),
    name: textOrNull(80),
    flow: intervalOrNull,
  })
  .meta({ id: 'GasMixture' })
export type GasMixture = z.infer<typeof gasMixtureSchema>

export const fillerSchema = z
  .object({
    /** null = not stated; false = autogenous */
    added: z.boolean().nullable().default(true),
    libraryId: z.string().max(80).nullable().default(null),
    specification: textOrNull(80),
    classification: textOrNull(60),
    tradeName: textOrNull(80),
    lot: textOrNull(60),
    fNumber: textOrNull(6),
    aNumber: z.number().int().min(1).max(12).nullable().default(null),
    /** Recorded instead of an A-Number where the deposit fits no row. */
    depositComposition: textOrNull(200),
    productForm: oneOf(['covered-electrode', 'solid', 'metal-cored', 'flux-cored', 'powder', 'insert']),
    diameters: z.array(z.object({ si: z.number().positive(), unit: z.string(), typed: z.string() })).max(8).default([]),
    supplemental: bool,
    supplementalAlloyElement: bool,
    /** Supplemental filler as a share of the weld metal, per cent. */
    supplementalVolume: quantitySchema.nullable().optional(),
    consumableInsert: bool,
    fluxClassification: textOrNull(80),
    fluxTradeName: textOrNull(80),
    fluxType: oneOf(['active', 'neutral', 'alloy']),
    fluxIsRecrushedSlag: bool,
    penetrationFlux: bool,
  })
  .meta({ id: 'Filler' })
export type Filler = z.infer<typeof fillerSchema>

export const electricalSchema = z
  .object({
    currentType: oneOf(CURRENT_TYPES),
    transferMode: oneOf(TRANSFER_MODES),
    pulsed: bool,
    waveformControlled: bool,
    powerSource: oneOf(['constant-voltage', 'constant-current']),
    current: intervalOrNull,
    /** What the maker of the electrode recommends for its size. */
    makerCurrent: intervalSchema.nullable().optional(),
    voltage: intervalOrNull,
    wireFeed: intervalOrNull,
    travelSpeed: intervalOrNull,
    heatInput: intervalOrNull,
    heatInputMethod: oneOf(HEAT_INPUT_METHODS),
    /** What the stated figure is: arc energy U·I/v, or heat input with the process factor k. */
    heatInputQuantity: z.enum(['arc-energy', 'heat-input']).nullable().optional(),
    tungstenClassification: textOrNull(40),
    tungstenDiameter: quantityOrNull,
    pulseFrequency: intervalOrNull,
    pulseOnTime: intervalOrNull,
    backgroundCurrent: intervalOrNull,
    backgroundVoltage: intervalOrNull,
    peakCurrent: intervalOrNull,
    acFrequency: intervalOrNull,
    /** The settings of one machine's panel, in the words on that panel. */
    panel: z
      .object({
        machine: textOrNull(40),
        mode: textOrNull(60),
        caution: textOrNull(400),
        settings: z.array(z.object({ control: z.string().trim().min(1).max(60), hint: textOrNull(80), value: z.string().trim().min(1).max(40), unit: z.string().max(16), scaleMin: z.number().nullable().default(null), scaleMax: z.number().nullable().default(null), min: z.number().nullable().default(null), max: z.number().nullable().default(null) })).max(16).default([]),
      })
      .nullable()
      .default(null),
  })
  .meta({ id: 'Electrical' })
export type Electrical = z.infer<typeof electricalSchema>

export const techniqueSchema = z
  .object({
    bead: oneOf(['stringer', 'weave', 'both']),
    oscillation: textOrNull(120),
    initialCleaning: textOrNull(200),
    interpassCleaning: textOrNull(200),
    passesPerSide: oneOf(['single', 'multiple']),
    electrodes: oneOf(['single', 'multiple']),
    electrodeSpacing: quantityOrNull,
    /** How many electrodes where there are several. */
    electrodeCount: z.number().int().min(1).max(12).nullable().optional(),
    /** Across the joint; `electrodeSpacing` is along it. */
    lateralSpacing: quantitySchema.nullable().optional(),
    /** Of a parallel electrode; of the electrode along travel; of the electrode across travel. */
    parallelAngle: quantitySchema.nullable().optional(),
    travelAngle: quantitySchema.nullable().optional(),
    normalAngle: quantitySchema.nullable().optional(),
    hotWire: z.boolean().nullable().optional(),
    contactTubeDistance: intervalOrNull,
    nozzleSize: textOrNull(40),
    peening: oneOf(['none', 'used']),
    closedChamber: bool,
    keyhole: oneOf(['melt-in', 'keyhole']),
    thermalPreparation: bool,
    notes: textOrNull(1000),
  })
  .meta({ id: 'Technique' })
export type Technique = z.infer<typeof techniqueSchema>

/** A bead or layer in the build-up, with the settings asked for. */
export const passSchema = z
  .object({
    number: z.string().trim().min(1).max(12),
    layer: oneOf(['root', 'hot', 'fill', 'cap', 'backing', 'fillet']),
    fillerDiameter: quantityOrNull,
    current: intervalOrNull,
    voltage: intervalOrNull,
    wireFeed: intervalOrNull,
    travelSpeed: intervalOrNull,
    /** Section of the bead. */
    beadArea: quantitySchema.nullable().optional(),
    /** Side of a joint welded from both, where it does not follow from the layers. */
    side: z.enum(['first', 'second']).nullable().optional(),
    /** Place among the passes of all processes; without it they follow the blocks. */
    order: z.number().int().min(1).max(1600).nullable().optional(),
  })
  .meta({ id: 'Pass' })
export type Pass = z.infer<typeof passSchema>

/** One process with one set of essential variables: the unit that is qualified and judged. */
export const processBlockSchema = z
  .object({
    id: z.string().min(1).max(40),
    process: processSchema.nullable().default(null),
    mechanisation: oneOf(['manual', 'semiautomatic', 'machine', 'automatic']),
    /** Deposited weld metal of this process, reinforcement excluded. */
    depositThickness: intervalOrNull,
    maxPassThickness: quantityOrNull,
    filler: fillerSchema.prefault({}),
    positions: z.array(positionSchema).max(12).default([]),
    progression: oneOf(['up', 'down', 'both']),
    shieldingGas: gasMixtureSchema.nullable().default(null),
    backingGas: gasMixtureSchema.nullable().default(null),
    trailingGas: gasMixtureSchema.nullable().default(null),
    plasmaGas: gasMixtureSchema.nullable().default(null),
    electrical: electricalSchema.prefault({}),
    technique: techniqueSchema.prefault({}),
    passes: z.array(passSchema).max(200).default([]),
  })
  .meta({ id: 'ProcessBlock' })
export type ProcessBlock = z.infer<typeof processBlockSchema>

export const weldingVariablesSchema = z
  .object({
    standards: z.array(standardChoiceSchema).min(1).max(5),
    unitSystem: unitSystemSchema.default('SI'),
    toughnessRequired: bool,
    /** Impact test temperature and mean energy that the application asks for. */
    impactTemperature: quantitySchema.nullable().optional(),
    impactEnergy: quantitySchema.nullable().optional(),
    hardnessRequired: z.boolean().nullable().optional(),
    /** Highest temperature in service where it is high for the metal. */
    serviceTemperature: quantitySchema.nullable().optional(),
    product: z.enum(['plate', 'pipe', 'plate-and-pipe']).default('plate'),
    joint: jointSchema.prefault({}),
    baseMetals: z.object({ a: baseMetalSchema.prefault({}), b: baseMetalSchema.prefault({}) }).prefault({}),
    /** Base metal thickness at the weld. On a coupon min = max = T. */
    thickness: intervalOrNull,
    /** Thickness of the second member where it differs. */
    thicknessB: intervalOrNull,
    /** Outside diameter of pipe; `all` covers plate and pipe. */
    diameter: intervalOrNull,
    /** Outside diameter of member B where it differs: the run pipe of a branch. */
    diameterB: intervalSchema.nullable().optional(),
    /** Whether the pipe turns under the arc. */
    pipeRotated: z.boolean().nullable().optional(),
    preheat: z.object({ minimum: quantityOrNull, interpassMaximum: quantityOrNull, maintenance: textOrNull(200), method: textOrNull(120) }).prefault({}),
    /** Heating after welding, before the joint cools, that lets hydrogen out. */
    postHeating: z.object({ used: bool, temperature: intervalOrNull, time: intervalOrNull }).nullable().optional(),
    pwht: z.object({ condition: oneOf(PWHT_CONDITIONS), ageing: z.enum(['natural', 'artificial']).nullable().optional(), temperature: intervalOrNull, time: intervalOrNull, heatingRate: textOrNull(80), notes: textOrNull(400) }).prefault({}),
    processes: z.array(processBlockSchema).min(1).max(8),
  })
  .meta({ id: 'WeldingVariables' })
export type WeldingVariables = z.infer<typeof weldingVariablesSchema>

export const emptyInterval = intervalSchema.parse({})

/** What a procedure revision holds: its variables and the coupons that support it. */
export const procedureContentSchema = z
  .object({
    title: z.string().trim().min(1, 'Give the procedure a title, e.g. "Groove weld, carbon steel plate".').max(160),
    scope: textOrNull(1000),
    variables: weldingVariablesSchema,
    supportingCoupons: z.array(idSchema).max(20).default([]),
    notes: textOrNull(4000),
  })
  .meta({ id: 'ProcedureContent' })
export type ProcedureContent = z.infer<typeof procedureContentSchema>

/** A run-sheet row: one bead or layer as welded. Heat input is computed, never typed. */
export const runRowSchema = z
  .object({
    id: z.string().min(1).max(40),
    processId: z.string().min(1).max(40),
    pass: z.string().trim().min(1, 'Number the pass, e.g. 1.').max(12),
    layer: passSchema.shape.layer,
    fillerDiameter: quantityOrNull,
    current: intervalOrNull,
    voltage: intervalOrNull,
    wireFeed: intervalOrNull,
    travelSpeed: intervalOrNull,
    length: quantityOrNull,
    arcTime: quantityOrNull,
    /** J over the bead length, from the power source, where the waveform is controlled. */
    instantaneousEnergy: quantityOrNull,
    interpass: quantityOrNull,
    note: textOrNull(400),
  })
  .meta({ id: 'RunRow' })
export type RunRow = z.infer<typeof runRowSchema>

export const tensionTestSchema = z
  .object({
    id: z.string().min(1).max(40),
    specimen: z.string().trim().min(1, 'Mark the specimen, e.g. T1.').max(20),
    kind: z.enum(['reduced-section', 'turned', 'full-section']).default('reduced-section'),
    width: quantityOrNull,
    thickness: quantityOrNull,
    diameter: quantityOrNull,
    load: quantityOrNull,
    /** As the laboratory reports it; the program recomputes it from load and area. */
    reportedStrength: quantityOrNull,
    fracture: z.enum(['weld', 'fusion-line', 'heat-affected-zone', 'base-metal']).nullable().default(null),
    fractureType: oneOf(['ductile', 'brittle']),
  })
  .meta({ id: 'TensionTest' })
export type TensionTest = z.infer<typeof tensionTestSchema>

export const bendTestSchema = z
  .object({
    id: z.string().min(1).max(40),
    specimen: z.string().trim().min(1, 'Mark the specimen, e.g. B1.').max(20),
    kind: z.enum(['face', 'root', 'side', 'longitudinal-face', 'longitudinal-root']),
    thickness: quantityOrNull,
    formerDiameter: quantityOrNull,
    angle: quantityOrNull,
    /** Each open discontinuity on the convex face; none = empty and `inspected`. */
    openings: z.array(z.object({ size: z.object({ si: z.number().min(0), unit: z.string(), typed: z.string() }), corner: z.boolean().default(false), fromInternalFlaw: z.boolean().nullable().default(null) })).max(40).default([]),
    inspected: z.boolean().default(false),
    broke: z.boolean().default(false),
  })
  .meta({ id: 'BendTest' })
export type BendTest = z.infer<typeof bendTestSchema>

export const macroTestSchema = z
  .object({
    id: z.string().min(1).max(40),
    specimen: z.string().trim().min(1).max(20),
    fusionComplete: bool,
    cracks: bool,
    leg1: quantityOrNull,
    leg2: quantityOrNull,
  })
  .meta({ id: 'MacroTest' })

export const toughnessTestSchema = z
  .object({
    id: z.string().min(1).max(40),
    place: z.enum(['weld', 'heat-affected-zone']),
    temperature: quantityOrNull,
    size: textOrNull(20),
    values: z.array(z.object({ si: z.number().min(0), unit: z.string(), typed: z.string() })).max(6).default([]),
    lateralExpansion: z.array(z.object({ si: z.number().min(0), unit: z.string(), typed: z.string() })).max(6).default([]),
  })
  .meta({ id: 'ToughnessTest' })

export const hardnessTestSchema = z
  .object({ id: z.string().min(1).max(40), scale: z.enum(['HV5', 'HV10']), place: z.enum(['base-metal', 'heat-affected-zone', 'weld']), values: z.array(z.number().positive()).max(60) })
  .meta({ id: 'HardnessTest' })

/** Visual examination of the finished test weld. */
export const visualTestSchema = z
  .object({
    cracks: bool,
    cratersFull: bool,
    /** Root free of incomplete fusion and inadequate penetration. */
    rootSound: bool,
    profileAccepted: bool,
    reinforcement: quantityOrNull,
    undercut: quantityOrNull,
    rootConcavity: quantityOrNull,
    meltThrough: quantityOrNull,
    /** Weld thickness where the root is concave. */
    weldThickness: quantityOrNull,
  })
  .meta({ id: 'VisualTest' })

/** A non-destructive examination of the test piece. */
export const ndtTestSchema = z
  .object({ id: z.string().min(1).max(40), method: z.enum(['VT', 'RT', 'UT', 'PT', 'MT']), wholeLength: z.boolean().nullable().optional(), accepted: bool, reportNumber: textOrNull(80), note: textOrNull(400) })
  .meta({ id: 'NdtTest' })
export type NdtTest = z.infer<typeof ndtTestSchema>

/** What a coupon holds: the variables as welded, the run sheet and the test results. */
export const couponContentSchema = z
  .object({
    title: z.string().trim().min(1, 'Give the coupon a title, e.g. "12 mm plate, 3G".').max(160),
    variables: weldingVariablesSchema,
    weldedOn: z.iso.date().nullable().default(null),
    welder: textOrNull(120),
    welderStamp: textOrNull(20),
    witness: textOrNull(120),
    machine: textOrNull(120),
    runSheet: z.array(runRowSchema).max(400).default([]),
    tension: z.array(tensionTestSchema).max(40).default([]),
    bends: z.array(bendTestSchema).max(40).default([]),
    macros: z.array(macroTestSchema).max(20).default([]),
    toughness: z.array(toughnessTestSchema).max(40).default([]),
    hardness: z.array(hardnessTestSchema).max(40).default([]),
    ndt: z.array(ndtTestSchema).max(40).optional(),
    visual: visualTestSchema.nullable().optional(),
    laboratory: textOrNull(160),
    reportNumber: textOrNull(80),
    testedOn: z.iso.date().nullable().default(null),
    notes: textOrNull(4000),
  })
  .meta({ id: 'CouponContent' })
export type CouponContent = z.infer<typeof couponContentSchema>
