import { useId, useState } from 'react'
import { Link } from 'react-router-dom'
import { addressOfInputs, type Calculator } from '@shared/calculations/catalogue.ts'
import { toWrite, type Use } from '@shared/calculations/beside.ts'
import { boxText, emptyTexts, readAs, type InputTexts } from '@shared/calculations/calculator-texts.ts'
import { fromRecord, type CalculatorRecord, type FromRecord } from '@shared/calculations/from-record.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { Button } from '@/components/Button.tsx'
import { drawingOf } from '@/components/calculator/Diagram.tsx'
import { elementsOfGroup } from '@/components/calculator/element-groups.ts'
import { problemsByInput } from '@/components/calculator/figures.ts'
import { InputsForm } from '@/components/calculator/InputsForm.tsx'
import { PasteBox } from '@/components/calculator/PasteBox.tsx'
import { ResultView } from '@/components/calculator/ResultView.tsx'
import { runTexts } from '@/components/calculator/run.ts'
import { SourceLine, Working } from '@/components/calculator/Working.tsx'
import { Select } from '@/components/fields/text.tsx'
import { AnalysisEntry, readAnalysis } from './AnalysisEntry.tsx'
import { useShopPrices } from './shop-prices.ts'
import { useChemistries } from './use-chemistries.ts'

export interface WorkPanelProps {
  what: string
  calculators: readonly Calculator[]
  record: CalculatorRecord
  blockIndex: number | null
  system: UnitSystem
  of?: 'draft' | 'coupon'
  onUse?: ((use: Use, label: string) => void) | undefined
}

const textsOf = ({ taken }: FromRecord): InputTexts => Object.fromEntries(Object.entries(taken).map(([key, { text }]) => [key, text]))

/** Figures from the record, what is typed over them, the result, and the button that writes it. */
export function WorkPanel({ what, calculators, record, blockIndex, system, of = 'draft', onUse }: WorkPanelProps) {
  const base = useId()
  const [chosen, setChosen] = useState(calculators[0]?.id)
  const calculator = calculators.find(({ id }) => id === chosen) ?? calculators[0]
  // What is typed is kept for each calculator while the panel is open; the rest follows the record.
  const [typed, setTyped] = useState<Readonly<Record<string, InputTexts>>>({})
  const [analysis, setAnalysis] = useState<InputTexts>({})
  const prices = useShopPrices()
  const { variables } = record
  const { chemistries, analyses, choose } = useChemistries(variables, variables.processes[blockIndex ?? 0] ?? null, true)
  if (!calculator) return null
  const typedAnalysis = readAnalysis(analysis)
  const filled = fromRecord(calculator.id, { ...record, chemistries: typedAnalysis ? { ...chemistries, a: typedAnalysis, names: { ...chemistries.names, a: 'typed here' } } : chemistries }, blockIndex)
  const own = typed[calculator.id] ?? {}
  const texts = { ...emptyTexts(calculator), ...prices.of(calculator), ...textsOf(filled), ...own }
  const result = runTexts(calculator, texts)
  const drawing = drawingOf({ calculator, result, system })
  const use = usable(calculator, filled, own, texts, system, blockIndex)
  const change = (changes: Record<string, string>) => {
    setTyped({ ...typed, [calculator.id]: { ...own, ...changes } })
    prices.keep(calculator, changes)
  }
  const byEquivalent = ['cet', 'pcm', 'ce'].some((key) => key in calculator.inputs)
  const needsAnalysis = elementsOfGroup(calculator) || byEquivalent
  return (
    <div className="space-y-3">
      <div className="flex flex-wrap items-end gap-x-4 gap-y-2 pr-9">
        {calculators.length > 1 ? (
          <Select className="min-w-0 grow sm:max-w-96" label="Method" options={calculators.map(({ id, title }) => ({ value: id, label: title }))} value={calculator.id} onChange={(event) => setChosen(event.target.value)} />
        ) : (
          <p className="py-2 font-medium">{calculator.title}</p>
        )}
        <Link className="text-link py-2 text-sm" to={`/calculators/${calculator.id}?${addressOfInputs(calculator, texts)}`} target="_blank">
          Full page with these figures
        </Link>
      </div>
      {needsAnalysis && analyses.length > 0 && (
        <div className="grid gap-3 sm:grid-cols-3">
          {analyses.map(({ part, label, heats, chosen: heat }) => (
            <Select key={part} label={label} empty="None of these" options={heats.map(({ id, number, grade }) => ({ value: id, label: `${number} · ${grade}` }))} value={heat?.id ?? ''} onChange={(event) => choose(part, event.target.value)} />
          ))}
        </div>
      )}
      <InputsForm
        dense
        calculator={calculator}
        texts={texts}
        onChange={change}
        system={system}
        problems={problemsByInput(result)}
        idBase={base}
        noteOf={(key) => <Origin filled={filled} changed={key in own} remembered={prices.remembers(key) && !(key in own) && Boolean(texts[key])} inputKey={key} of={of} draftFigure={filled.taken[key] ? shownText(calculator, key, filled.taken[key].text, system) : null} />}
        underGroup={(group) => (
          <>
            <GroupOrigin filled={filled} keys={group.elements.map(({ key }) => key)} own={own} />
            <PasteBox group={group} onChange={change} />
          </>
        )}
      />
      {byEquivalent && <AnalysisEntry texts={analysis} onChange={(changes) => setAnalysis({ ...analysis, ...changes })} idBase={base} />}
      {filled.said.map((sentence) => (
        <p key={sentence} className="text-sm text-soft">
          {sentence}
        </p>
      ))}
      {Object.keys(own).length > 0 && (
        <Button kind="quiet" onClick={() => setTyped({ ...typed, [calculator.id]: {} })}>
          Back to the {of}’s figures
        </Button>
      )}
      <div className="border-t border-rule pt-3">
        <ResultView calculator={calculator} result={result} texts={texts} system={system} most={5} />
      </div>
      {drawing && result.figures && (
        <details>
          <summary className="cursor-pointer py-1 font-medium">{drawing.title}</summary>
          <div className="mt-1 border border-rule bg-sheet px-2 py-2">{drawing.drawn}</div>
        </details>
      )}
      {onUse && use && (
        <p className="flex flex-wrap items-center gap-x-3 gap-y-1.5">
          <Button kind="primary" onClick={() => onUse(use, `${what}: ${use.text}, ${calculator.title.charAt(0).toLowerCase()}${calculator.title.slice(1)}`)}>
            Use {use.text}
          </Button>
          <span className="text-sm text-soft">Written into the {of}; it can be taken back.</span>
        </p>
      )}
      <details>
        <summary className="cursor-pointer py-1 font-medium">Working, limits and source</summary>
        <div className="mt-1 space-y-3">
          <Working result={result} system={system} />
          <p>{calculator.validity}</p>
          <SourceLine source={calculator.source} />
        </div>
      </details>
    </div>
  )
}

/** What may be written: both ends of the record's ranges while the figures that make them are the record's own, else the one result. */
function usable(calculator: Calculator, { ends }: FromRecord, own: InputTexts, texts: InputTexts, system: UnitSystem, blockIndex: number | null): Use | null {
  const untouched = ends && ![...Object.keys(ends.least), ...Object.keys(ends.most)].some((key) => key in own)
  if (untouched) {
    const both = toWrite(calculator.id, { least: runTexts(calculator, { ...texts, ...ends.least }), most: runTexts(calculator, { ...texts, ...ends.most }) }, system, blockIndex)
    if (both) return both
  }
  return toWrite(calculator.id, { single: runTexts(calculator, texts) }, system, blockIndex)
}

/** A figure of the record as the reader would write it, with its unit. */
function shownText({ inputs }: Calculator, key: string, text: string, system: UnitSystem): string {
  const input = inputs[key]
  if (!input) return text
  if (input.kind === 'choice') return input.options.find(({ value }) => value === text)?.label ?? text
  return (readAs(input, text, system) ?? `${boxText(input, text, system)}${input.unit ? ` ${input.unit}` : ''}`).replace(/^= /, '')
}

function Origin({ filled, changed, remembered, inputKey, of, draftFigure }: { filled: FromRecord; changed: boolean; remembered: boolean; inputKey: string; of: string; draftFigure: string | null }) {
  const taken = filled.taken[inputKey]
  if (changed) return <span className="text-plum">Typed here{taken && !taken.assumed && draftFigure ? `; the ${of} has ${draftFigure}` : ''}</span>
  if (taken) return <span className={taken.assumed ? 'text-straw-deep' : ''}>{taken.assumed ? `Assumed: ${taken.from}` : taken.analysis ? taken.from : `From the ${of}: ${taken.from}`}</span>
  if (remembered) return <span>Kept on this device</span>
  return filled.missing.includes(inputKey) ? <span className="text-straw-deep">Not in the {of}</span> : null
}

function GroupOrigin({ filled, keys, own }: { filled: FromRecord; keys: readonly string[]; own: InputTexts }) {
  const from = keys.map((key) => filled.taken[key]?.from).find((each) => each !== undefined)
  return <p className={`mt-1 text-sm ${from ? 'text-soft' : 'text-straw-deep'}`}>{from ? `${from}${keys.some((key) => key in own) ? ', changed here' : ''}` : 'No analysis is known here: type it from the certificate.'}</p>
}
