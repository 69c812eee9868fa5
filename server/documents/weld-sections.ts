/** The sections that a procedure (what is asked) and a coupon (what was observed) share. */
import type { Interval } from '@shared/schemas/common.ts'
import type { BaseMetal, GasMixture, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import type { Dimension } from '@shared/units/types.ts'
import type { Judgements } from './judgements.ts'
import { drawFacts, drawWideFact, type Fact } from './layout/facts.ts'
import type { Figures } from './layout/figures.ts'
import { drawGaugeRow } from './layout/gauge-row.ts'
import { VERDICT_WORD } from './layout/marks.ts'
import type { Sheet } from './layout/sheet.ts'
import { drawTable, type Cell, type Column } from './layout/table.ts'
import * as words from './words.ts'

export interface Context {
  sheet: Sheet
  figures: Figures
  variables: WeldingVariables
  /** null on a coupon: its ranges have a section of their own. */
  judgements: Judgements | null
}

const NOT_STATED = 'not stated'
type Given = Fact | null
/** A fact that is printed only when something is stored. */
const fact = (label: string, value: string | null | undefined, verdicts?: Fact['verdicts']): Given => (value || verdicts?.length ? { label, value: value || NOT_STATED, verdicts } : null)
/** A fact that a reader looks for: "not stated" is an answer, a blank is not. */
const always = (label: string, value: string | null | undefined, verdicts?: Fact['verdicts']): Fact => ({ label, value: value || NOT_STATED, verdicts })
const given = (facts: readonly Given[]): Fact[] => facts.filter((item): item is Fact => item !== null)

export const pathOf = (index: number, field: string): string => `processes.${index}.${field}`
const blockTitle = (context: Context, block: ProcessBlock, index: number): string => {
  const name = words.processName(block)
  const twins = context.variables.processes.filter((other) => words.processName(other) === name).length > 1
  return twins ? `${name} · ${index + 1}` : name
}

/** Runs `draw` for each process block, under a heading of its own when there are several. */
function eachProcess(context: Context, draw: (block: ProcessBlock, index: number) => void): void {
  const { processes } = context.variables
  processes.forEach((block, index) => {
    if (processes.length > 1) context.sheet.subhead(blockTitle(context, block, index), '', 50)
    draw(block, index)
  })
}

/** A numeric variable: with gauges beside it on a procedure, as a plain fact elsewhere. Nothing stored and nothing judged: null. */
interface Measure { label: string; note?: string; value: string; field: string; must?: boolean }
function drawMeasures(context: Context, measures: readonly Measure[]): void {
  const plain: Fact[] = []
  for (const measure of measures) {
    const judged = context.judgements?.gauges(measure.field) ?? []
    const marks = context.judgements?.marks(measure.field) ?? []
    if (judged.length > 0) drawGaugeRow(context.sheet, context.figures, { label: measure.label, note: measure.note, value: measure.value || NOT_STATED, judged })
    else if (measure.value || measure.must || marks.length > 0) plain.push({ label: measure.label, value: measure.value || NOT_STATED, verdicts: marks })
  }
  if (plain.length > 0) drawFacts(context.sheet, plain)
}

export function jointFacts(context: Context): Fact[] {
  const { figures, variables, judgements } = context
  const { joint } = variables
  const marks = (...fields: string[]) => judgements?.marks(...fields)
  const groove = joint.weld === 'groove'
  return given([
    always('Weld', [groove ? words.said(words.GROOVE, joint.groove) : '', joint.weld, groove ? `${joint.penetration} penetration` : ''].filter(Boolean).join(', '), marks('joint.weld', 'joint.groove', 'joint.penetration')),
    fact('Repair or build-up', words.said(words.WORK, joint.work), marks('joint.work')),
    always('Joint', words.said(words.JOINT_TYPE, joint.type), marks('joint.type')),
    fact('Joint detail', joint.designation, marks('joint.designation')),
    fact('Branch connection', [words.said(words.BRANCH, joint.branch), figures.interval(joint.branchAngle, 'angle')].filter(Boolean).join(', '), marks('joint.branch', 'joint.branchAngle')),
    fact('Groove angle', figures.interval(joint.includedAngle, 'angle'), marks('joint.includedAngle')),
    fact('Bevel angle', figures.interval(joint.bevelAngle, 'angle'), marks('joint.bevelAngle')),
    fact('Root opening', figures.interval(joint.rootOpening, 'length'), marks('joint.rootOpening')),
    fact('Root face', figures.interval(joint.rootFace, 'length'), marks('joint.rootFace')),
    fact('Root radius', figures.interval(joint.rootRadius, 'length'), marks('joint.rootRadius')),
    fact('Groove depth', figures.interval(joint.grooveDepth, 'length')),
    fact('Second side', [figures.interval(joint.secondDepth, 'length'), figures.interval(joint.secondAngle, 'angle')].filter(Boolean).join(', ')),
    fact('Angle changes at', figures.interval(joint.angleChange, 'length')),
    fact('Reinforcing fillet', figures.interval(joint.reinforcingFillet, 'length')),
    fact('Fillet leg', figures.interval(joint.filletLeg, 'length'), marks('joint.filletLeg')),
    fact('Leg on B', figures.interval(joint.filletLegB, 'length')),
    fact('Angle between members', figures.interval(joint.memberAngle, 'angle')),
    fact('Fillet throat', figures.interval(joint.filletThroat, 'length'), marks('joint.filletThroat')),
    fact('Holds pressure', words.yesNo(joint.pressureRetaining), marks('joint.pressureRetaining')),
    always('Backing', [words.said(words.BACKING, joint.backing), joint.backingMaterial].filter(Boolean).join(', '), marks('joint.backing', 'joint.backingMaterial')),
    fact('Backing size', [figures.interval(joint.backingWidth, 'length'), figures.interval(joint.backingThickness, 'length')].filter(Boolean).join(' × ')),
    fact('Insert', [figures.interval(joint.insertWidth, 'length'), figures.interval(joint.insertHeight, 'length')].filter(Boolean).join(' × ')),
    fact('Retainers', words.yesNo(joint.retainers), marks('joint.retainers')),
    fact('Back gouging', [words.said(words.BACK_GOUGING, joint.backGouging), figures.interval(joint.backGougeDepth, 'length')].filter(Boolean).join(', '), marks('joint.backGouging')),
    fact('Unequal thickness', [words.said(words.ALIGNMENT, joint.alignment), joint.taperAngle ? `taper ${figures.interval(joint.taperAngle, 'angle')}` : ''].filter(Boolean).join(', ')),
    fact('Both sides', joint.weldedFromBothSides === null ? '' : joint.weldedFromBothSides ? 'welded from both sides' : 'one side', marks('joint.weldedFromBothSides')),
  ])
}

const metalName = (metal: BaseMetal): string => [metal.specification, metal.grade].filter(Boolean).join(' ')
export const metalsLine = (variables: WeldingVariables): string => [metalName(variables.baseMetals.a), metalName(variables.baseMetals.b)].map((name) => name || NOT_STATED).join(' to ')

export function drawBaseMetals(context: Context): void {
  const { sheet, figures, variables, judgements } = context
  const { a, b } = variables.baseMetals
  sheet.section('Base metals', metalsLine(variables), () => {
    const rows: [string, (metal: BaseMetal) => string | null, string[]][] = [
      ['Specification and grade', metalName, ['specification', 'grade']],
      ['UNS number', (metal) => metal.uns, ['uns']],
      ['Product form', (metal) => metal.productForm, ['productForm']],
      ['P-Number · group', (metal) => (metal.pNumber ? `P-${metal.pNumber}${metal.groupNumber ? ` · group ${metal.groupNumber}` : ''}` : null), ['pNumber', 'groupNumber']],
      ['ISO/TR 15608 group', (metal) => metal.iso15608, ['iso15608']],
      ['AWS D1.1 group', (metal) => metal.d11Group, ['d11Group']],
      ['AWS D1.2 M-Number', (metal) => metal.d12MNumber, ['d12MNumber']],
      ['Minimum tensile strength', (metal) => figures.quantity(metal.minTensile, 'stress'), ['minTensile']],
      ['Minimum yield strength', (metal) => figures.quantity(metal.minYield, 'stress'), ['minYield']],
      ['Minimum elongation', (metal) => figures.quantity(metal.minElongation, 'percent'), ['minElongation']],
      ['Condition or temper', (metal) => metal.condition ?? null, ['condition']],
      ['Impact values specified', (metal) => words.yesNo(metal.impactSpecified), ['impactSpecified']],
      ['Heat number', (metal) => metal.heatNumber, ['heatNumber']],
      ['Certificate', (metal) => metal.certificate, ['certificate']],
    ]
    const marksOf = (names: readonly string[]) => judgements?.marks(...names.flatMap((name) => [`baseMetals.a.${name}`, `baseMetals.b.${name}`, `baseMetals.${name}`]), ...(names.includes('pNumber') ? ['baseMetals', 'baseMetals.a', 'baseMetals.b'] : [])) ?? []
    const columns: Column[] = [{ title: '', share: 20 }, { title: 'Metal A', share: 30 }, { title: 'Metal B', share: 30 }, { title: judgements ? 'Judged' : '', share: 20 }]
    const shown = rows.filter(([label, read, names]) => read(a) || read(b) || label.startsWith('Specification') || marksOf(names).length > 0)
    drawTable(sheet, columns, shown.map(([label, read, names]): Cell[] => {
      const [mark] = marksOf(names)
      return [{ text: label, soft: true }, read(a) || NOT_STATED, read(b) || NOT_STATED, mark ? { text: `${VERDICT_WORD[mark.verdict]} · ${mark.clause}`, verdict: mark.verdict } : '']
    }))
    drawMeasures(context, [
      { label: variables.joint.weld === 'fillet' ? 'Thickness, fillet' : 'Thickness, groove', note: 'base metal at the weld', value: figures.interval(variables.thickness, 'length'), field: 'thickness', must: true },
      { label: 'Thickness of metal B', value: figures.interval(variables.thicknessB, 'length'), field: 'thicknessB' },
      { label: 'Outside diameter', note: `of pipe; product: ${words.said(words.PRODUCT, variables.product)}`, value: figures.interval(variables.diameter, 'length') || (variables.product === 'plate' ? 'plate only' : ''), field: 'diameter', must: variables.product !== 'plate' },
      { label: 'Diameter of the run pipe', value: figures.interval(variables.diameterB, 'length'), field: 'diameterB' },
    ])
    drawFacts(sheet, given([fact('Pipe turns under the arc', words.yesNo(variables.pipeRotated), judgements?.marks('pipeRotated'))]))
  })
}

/** What the work asks beyond the standard; left out where nothing is stated. */
export function drawApplication(context: Context): void {
  const { sheet, figures, variables, judgements } = context
  const marks = (field: string) => judgements?.marks(field)
  const facts = given([
    fact('Toughness', variables.toughnessRequired === null ? '' : variables.toughnessRequired ? 'required' : 'not required', marks('toughnessRequired')),
    fact('Impact test', [figures.quantity(variables.impactEnergy, 'energy'), variables.impactTemperature ? `at ${figures.quantity(variables.impactTemperature, 'temperature')}` : ''].filter(Boolean).join(' '), judgements?.marks('impactEnergy', 'impactTemperature')),
    fact('Hardness', variables.hardnessRequired === null || variables.hardnessRequired === undefined ? '' : variables.hardnessRequired ? 'tests required' : 'no tests required', marks('hardnessRequired')),
    fact('Service temperature', figures.quantity(variables.serviceTemperature, 'temperature'), marks('serviceTemperature')),
  ])
  if (facts.length > 0) sheet.section('What the application asks', '', () => drawFacts(sheet, facts), 40)
}

export function drawFillers(context: Context): void {
  const { sheet, figures, judgements } = context
  sheet.section('Filler metals', context.variables.processes.map((block) => block.filler.classification ?? (block.filler.added === false ? 'no filler' : NOT_STATED)).join(' · '), () => {
    eachProcess(context, (block, index) => {
      const { filler } = block
      const marks = (...fields: string[]) => judgements?.marks(...fields.map((field) => pathOf(index, `filler.${field}`)))
      drawFacts(sheet, given([
        always('Classification', filler.added === false ? 'no filler metal added' : [filler.specification, filler.classification].filter(Boolean).join(' '), marks('classification', 'specification', 'added')),
        fact('Trade name', filler.tradeName, marks('tradeName')),
        fact('F-Number', filler.fNumber ? `F-${filler.fNumber}` : '', marks('fNumber')),
        fact(filler.aNumber === null && filler.depositComposition ? 'Deposit' : 'A-Number', filler.aNumber ? `A-${filler.aNumber}` : filler.depositComposition, marks('aNumber', 'depositComposition')),
        fact('Form', words.said(words.PRODUCT_FORM, filler.productForm), marks('productForm')),
        fact('Diameters', filler.diameters.map((diameter) => figures.quantity(diameter, 'length')).join(', '), marks('diameters')),
        fact('Lot', filler.lot), fact('Supplemental filler', [words.yesNo(filler.supplemental), figures.quantity(filler.supplementalVolume, 'percent')].filter(Boolean).join(', '), marks('supplemental', 'supplementalVolume')),
        fact('Alloy from the flux', words.yesNo(filler.supplementalAlloyElement), marks('supplementalAlloyElement')),
        fact('Consumable insert', words.yesNo(filler.consumableInsert), marks('consumableInsert')),
        fact('Flux', [filler.fluxClassification, filler.fluxTradeName, filler.fluxType].filter(Boolean).join(', '), marks('fluxClassification', 'fluxTradeName', 'fluxType')),
        fact('Recrushed slag', words.yesNo(filler.fluxIsRecrushedSlag), marks('fluxIsRecrushedSlag')),
        fact('Penetration-enhancing flux', words.yesNo(filler.penetrationFlux), marks('penetrationFlux')),
      ]))
      drawMeasures(context, [
        { label: 'Deposited thickness', note: 'weld metal of this process', value: figures.interval(block.depositThickness, 'length'), field: pathOf(index, 'depositThickness'), must: true },
        { label: 'Thickest pass', value: figures.quantity(block.maxPassThickness, 'length'), field: pathOf(index, 'maxPassThickness') },
      ])
    })
  })
}

export function drawPositions(context: Context): void {
  const { sheet, judgements } = context
  const all = [...new Set(context.variables.processes.flatMap((block) => block.positions))]
  sheet.section('Positions', all.join(', '), () => {
    eachProcess(context, (block, index) => drawFacts(sheet, given([
      always('Positions', block.positions.join(', '), judgements?.marks(pathOf(index, 'positions'))),
      fact('Vertical progression', words.said(words.PROGRESSION, block.progression), judgements?.marks(pathOf(index, 'progression'))),
    ])))
  }, 4 + 34 * Math.min(4, context.variables.processes.length))
}

export function drawHeat(context: Context): void {
  const { sheet, figures, variables, judgements } = context
  const { preheat, pwht } = variables
  sheet.section('Preheat and interpass', '', () => {
    drawMeasures(context, [
      { label: 'Preheat, minimum', value: figures.quantity(preheat.minimum, 'temperature'), field: 'preheat.minimum', must: true },
      { label: 'Interpass, maximum', value: figures.quantity(preheat.interpassMaximum, 'temperature'), field: 'preheat.interpassMaximum', must: true },
    ])
    drawFacts(sheet, given([fact('Maintenance', preheat.maintenance, judgements?.marks('preheat.maintenance')), fact('Method', preheat.method, judgements?.marks('preheat.method'))]))
    const after = variables.postHeating
    drawFacts(sheet, given([fact('Post-heating', after ? [words.yesNo(after.used), figures.interval(after.temperature, 'temperature'), figures.interval(after.time, 'time')].filter(Boolean).join(', ') : '', judgements?.marks('postHeating', 'postHeating.used', 'postHeating.temperature', 'postHeating.time'))]))
  }, 40)
  sheet.section('Postweld heat treatment', words.said(words.PWHT, pwht.condition) || NOT_STATED, () => {
    drawFacts(sheet, given([always('Condition', words.said(words.PWHT, pwht.condition), judgements?.marks('pwht', 'pwht.condition')), fact('Ageing', words.said(words.AGEING, pwht.ageing), judgements?.marks('pwht.ageing')), fact('Heating and cooling rate', pwht.heatingRate, judgements?.marks('pwht.heatingRate'))]))
    drawMeasures(context, [
      { label: 'Holding temperature', value: figures.interval(pwht.temperature, 'temperature'), field: 'pwht.temperature', must: pwht.condition !== null && pwht.condition !== 'none' },
      { label: 'Holding time', value: figures.interval(pwht.time, 'time'), field: 'pwht.time', must: pwht.condition !== null && pwht.condition !== 'none' },
    ])
    if (pwht.notes) drawWideFact(sheet, { label: 'Notes', value: pwht.notes })
  }, 40)
}

const GAS_USES = [['shieldingGas', 'Shielding'], ['backingGas', 'Backing'], ['trailingGas', 'Trailing'], ['plasmaGas', 'Plasma']] as const
const needsGas = (block: ProcessBlock): boolean => block.process === 'GMAW' || block.process === 'GTAW' || block.process === 'PAW'

export function drawGases(context: Context): void {
  const { sheet, figures, judgements, variables } = context
  const used = variables.processes.some((block, index) => GAS_USES.some(([key]) => block[key] || judgements?.marks(pathOf(index, key)).length) || needsGas(block))
  if (!used) return
  sheet.section('Gas', '', () => {
    eachProcess(context, (block, index) => {
      const described = (gas: GasMixture | null) => [words.gasName(gas), figures.interval(gas?.flow, 'gasFlow')].filter(Boolean).join(', ')
      const facts = given(GAS_USES.map(([key, label]): Given => {
        const verdicts = judgements?.marks(pathOf(index, key), pathOf(index, `${key}.components`), pathOf(index, `${key}.flow`))
        return key === 'shieldingGas' && needsGas(block) ? always(label, described(block[key]), verdicts) : fact(label, described(block[key]), verdicts)
      }))
      if (facts.length > 0) drawFacts(sheet, facts)
      else drawWideFact(sheet, { label: 'Gas', value: 'none used' })
    })
  }, 40)
}

const electricalMeasures: readonly (readonly [keyof ProcessBlock['electrical'], string, Dimension, string?])[] = [
  ['current', 'Current', 'current'], ['makerCurrent', 'Current, by the maker', 'current'], ['voltage', 'Voltage', 'voltage'], ['wireFeed', 'Wire feed speed', 'wireFeed'], ['travelSpeed', 'Travel speed', 'travelSpeed'],
  ['heatInput', 'Heat input', 'heatInput'], ['peakCurrent', 'Peak current', 'current'], ['backgroundCurrent', 'Background current', 'current'], ['backgroundVoltage', 'Background voltage', 'voltage'],
  ['pulseFrequency', 'Pulse frequency', 'frequency'], ['pulseOnTime', 'Pulse time', 'pulseTime'], ['acFrequency', 'AC frequency', 'frequency'],
]

export function drawElectrical(context: Context): void {
  const { sheet, figures, judgements } = context
  sheet.section('Electrical', [...new Set(context.variables.processes.map((block) => words.said(words.CURRENT_TYPE, block.electrical.currentType)))].filter(Boolean).join(', '), () => {
    eachProcess(context, (block, index) => {
      const { electrical } = block
      const marks = (...fields: string[]) => judgements?.marks(...fields.map((field) => pathOf(index, `electrical.${field}`)))
      const wire = block.process === 'GMAW' || block.process === 'FCAW'
      drawFacts(sheet, given([
        always('Current and polarity', words.said(words.CURRENT_TYPE, electrical.currentType), marks('currentType')),
        wire ? always('Transfer mode', words.said(words.TRANSFER, electrical.transferMode), marks('transferMode')) : fact('Transfer mode', words.said(words.TRANSFER, electrical.transferMode), marks('transferMode')),
        fact('Pulsed current', words.yesNo(electrical.pulsed), marks('pulsed')),
        fact('Waveform controlled', words.yesNo(electrical.waveformControlled), marks('waveformControlled')),
        fact('Power source', words.said(words.POWER_SOURCE, electrical.powerSource), marks('powerSource')),
        fact('Heat input taken', words.said(words.HEAT_METHOD, electrical.heatInputMethod), marks('heatInputMethod')),
        fact('The heat figure is', words.said(words.HEAT_QUANTITY, electrical.heatInputQuantity), marks('heatInputQuantity')),
        fact('Tungsten', [electrical.tungstenClassification, figures.quantity(electrical.tungstenDiameter, 'length')].filter(Boolean).join(', '), marks('tungstenClassification', 'tungstenDiameter')),
      ]))
      drawMeasures(context, electricalMeasures.map(([key, label, dimension]) => ({ label, value: figures.interval(electrical[key] as Interval | null, dimension), field: pathOf(index, `electrical.${key}`) })))
      if (electrical.panel) drawPanel(context, electrical.panel)
    })
  })
}

function drawPanel({ sheet }: Context, panel: NonNullable<ProcessBlock['electrical']['panel']>): void {
  sheet.subhead('Panel settings', [panel.machine ? `machine ${panel.machine}` : '', panel.mode].filter(Boolean).join(' · '), 60)
  const span = (setting: (typeof panel.settings)[number]) => (setting.min === null && setting.max === null ? '' : [setting.min, setting.max].map((end) => end ?? 'open').join(' to '))
  drawTable(sheet, [{ title: 'Control', share: 24 }, { title: 'Set to', share: 18 }, { title: 'Unit', share: 10 }, { title: 'Allowed', share: 18 }, { title: 'Hint', share: 30 }], panel.settings.map((setting) => [setting.control, { text: setting.value, strong: true }, { text: setting.unit, soft: true }, span(setting), { text: setting.hint ?? '', soft: true }]))
  if (panel.caution) sheet.callout('Take care at the panel', panel.caution, 'straw')
}

export function drawTechnique(context: Context): void {
  const { sheet, figures, judgements } = context
  sheet.section('Technique', '', () => {
    eachProcess(context, (block, index) => {
      const { technique } = block
      const marks = (...fields: string[]) => judgements?.marks(...fields.map((field) => pathOf(index, `technique.${field}`)))
      drawFacts(sheet, given([
        always('Bead', technique.bead === 'both' ? 'stringer or weave' : technique.bead, marks('bead')),
        fact('Oscillation', technique.oscillation, marks('oscillation')),
        fact('Initial cleaning', technique.initialCleaning, marks('initialCleaning')), fact('Interpass cleaning', technique.interpassCleaning, marks('interpassCleaning')),
        fact('Passes a side', technique.passesPerSide, marks('passesPerSide')), fact('Electrodes', technique.electrodes, marks('electrodes')),
        fact('Electrode spacing', figures.quantity(technique.electrodeSpacing, 'length'), marks('electrodeSpacing')),
        fact('Number of electrodes', technique.electrodeCount ? String(technique.electrodeCount) : '', marks('electrodeCount')),
        fact('Spacing across the joint', figures.quantity(technique.lateralSpacing, 'length'), marks('lateralSpacing')),
        fact('Angle of parallel electrode', figures.quantity(technique.parallelAngle, 'angle'), marks('parallelAngle')),
        fact('Electrode angle', [technique.travelAngle ? `${figures.quantity(technique.travelAngle, 'angle')} along` : '', technique.normalAngle ? `${figures.quantity(technique.normalAngle, 'angle')} across travel` : ''].filter(Boolean).join(', '), marks('travelAngle', 'normalAngle')),
        fact('Hot wire', words.yesNo(technique.hotWire), marks('hotWire')),
        fact('Contact tube to work', figures.interval(technique.contactTubeDistance, 'length'), marks('contactTubeDistance')),
        fact('Nozzle', technique.nozzleSize, marks('nozzleSize')), fact('Peening', technique.peening === 'used' ? 'used' : technique.peening, marks('peening')),
        fact('Closed chamber', words.yesNo(technique.closedChamber), marks('closedChamber')), fact('Melt-in or keyhole', technique.keyhole, marks('keyhole')),
        fact('Thermal preparation', words.yesNo(technique.thermalPreparation), marks('thermalPreparation')),
      ]))
      if (technique.notes) drawWideFact(sheet, { label: 'Notes', value: technique.notes })
    })
  }, 40)
}
