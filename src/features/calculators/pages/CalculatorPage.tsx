import { Link2 } from 'lucide-react'
import { useId } from 'react'
import { Link, useParams } from 'react-router-dom'
import { CALCULATOR_GROUPS, calculatorById, type Calculator } from '@shared/calculations/catalogue.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { drawingOf } from '@/components/calculator/Diagram.tsx'
import { problemsByInput } from '@/components/calculator/figures.ts'
import { InputsForm } from '@/components/calculator/InputsForm.tsx'
import { PasteBox } from '@/components/calculator/PasteBox.tsx'
import { ResultView } from '@/components/calculator/ResultView.tsx'
import { runTexts } from '@/components/calculator/run.ts'
import { SourceLine, Working } from '@/components/calculator/Working.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, EmptyState, PageHead } from '@/components/states.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { say } from '@/components/toast.tsx'
import { useUnits } from '@/hooks/units.ts'
import { ExampleTable } from '../components/ExampleTable.tsx'
import { useAddressedInputs } from '../use-calculator.ts'

export function CalculatorPage() {
  const { id } = useParams()
  const calculator = calculatorById(id ?? '')
  if (calculator) return <Opened key={calculator.id} calculator={calculator} />
  return (
    <>
      <Breadcrumb trail={[{ label: 'Calculators', to: '/calculators' }, { label: 'Not there' }]} />
      <PageHead title="Calculator not found" />
      <EmptyState title="There is no calculator of that name" step={<ButtonLink to="/calculators">All calculators</ButtonLink>}>
        <p>The address may be old, or a letter may be missing. The list finds a calculator by what it is called in the shop.</p>
      </EmptyState>
    </>
  )
}

async function copyLink(address: string): Promise<void> {
  try {
    await navigator.clipboard.writeText(address)
    say('Link copied', { detail: 'It opens this calculator with these figures, for anybody who signs in.' })
  } catch {
    say('The link could not be copied', { detail: `Copy it from the browser’s address line: ${address}` })
  }
}

function Opened({ calculator }: { calculator: Calculator }) {
  const { system } = useUnits()
  const base = useId()
  const { texts, change, fillExample, address } = useAddressedInputs(calculator)
  const result = runTexts(calculator, texts)
  const problems = problemsByInput(result)
  const drawing = drawingOf({ calculator, result, system })
  const { title, purpose, group, formula, source, validity } = calculator
  const groupTitle = CALCULATOR_GROUPS.find((each) => each.id === group)?.title ?? ''
  return (
    <article>
      <Breadcrumb trail={[{ label: 'Calculators', to: '/calculators' }, { label: title }]} />
      <TitleBlock
        kind={`Calculator · ${groupTitle}`}
        number={title}
        title={purpose}
        cells={[{ label: 'Source', wide: true, children: <SourceLine brief source={source} /> }]}
      />
      <p className="no-print mt-3 flex flex-wrap gap-2">
        <Button icon={<Link2 size={15} aria-hidden="true" />} onClick={() => void copyLink(new URL(`/calculators/${calculator.id}?${address}`, window.location.origin).href)}>
          Copy link
        </Button>
        <Button onClick={fillExample}>Fill in the example</Button>
        <Button onClick={() => window.print()}>Print</Button>
      </p>
      <div className="mt-3 grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_minmax(0,24rem)]">
        <div className="min-w-0 space-y-4">
          <Sheet title="Figures">
            <div className="px-4 py-3">
              <InputsForm calculator={calculator} texts={texts} onChange={change} system={system} problems={problems} idBase={base} underGroup={(composition) => <PasteBox group={composition} onChange={change} />} />
            </div>
          </Sheet>
          <div className="lg:hidden">
            <ResultSheet {...{ calculator, result, texts, system }} />
          </div>
          {drawing && (
            <Sheet title={drawing.title}>
              <div className="px-4 py-3">{drawing.drawn}</div>
            </Sheet>
          )}
          <Sheet title="How it comes about">
            <div className="space-y-3 px-4 py-3">
              <ul className="border-l-2 border-rule pl-3 text-[0.9375rem]">
                {formula.map((line) => (
                  <li key={line}>{line}</li>
                ))}
              </ul>
              <Working result={result} system={system} />
            </div>
          </Sheet>
        </div>
        <div className="min-w-0 space-y-4 lg:sticky lg:top-4">
          <div className="max-lg:hidden">
            <ResultSheet {...{ calculator, result, texts, system }} />
          </div>
          <Sheet title="Where it holds">
            <div className="space-y-2 px-4 py-3">
              <p className="text-pretty">{validity}</p>
              {source.note && <p className="text-sm text-pretty text-soft">Source: {source.note}</p>}
            </div>
          </Sheet>
          <ExampleTable calculator={calculator} system={system} onFill={fillExample} />
          <p className="no-print">
            <Link to={`/calculators?q=${encodeURIComponent(groupTitle)}`} className="text-link">
              More of {groupTitle.toLowerCase()}
            </Link>
          </p>
        </div>
      </div>
    </article>
  )
}

function ResultSheet(props: React.ComponentProps<typeof ResultView>) {
  return (
    <Sheet title="Result" className="break-inside-avoid">
      <div className="px-4 py-3">
        <ResultView {...props} />
      </div>
    </Sheet>
  )
}
