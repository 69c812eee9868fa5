import { useState } from 'react'
import type { Interval } from '@shared/schemas/common.ts'
import { interval } from '@shared/units/convert.ts'
import { Button } from '@/components/Button.tsx'
import { IntervalField } from '@/components/fields/quantity.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { Margin } from '@/components/margin/Margin.tsx'
import { MarginLayout } from '@/components/margin/MarginLayout.tsx'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { SectionNav } from '@/components/SectionNav.tsx'
import { Sheet, SheetRow } from '@/components/Sheet.tsx'
import { Stamp, STAMP_STATES } from '@/components/Stamp.tsx'
import { Tag, TitleBlock } from '@/components/TitleBlock.tsx'
import { VerdictTally, VerdictWord } from '@/components/Verdict.tsx'
import { closed, findings, mm, unlimited } from './fixtures.ts'
import { Group } from './Group.tsx'

export function RecordSection() {
  const [thickness, setThickness] = useState<Interval | null>(interval(5, 25, 'length'))
  const [fixed, setFixed] = useState('')
  const note = { onFix: (fix: { label: string }) => setFixed(fix.label), couponNumber: () => 'PQR-009' }
  return (
    <>
      <Group title="Title block, stamps">
        <div className="space-y-4">
          <TitleBlock
            kind="Welding procedure specification"
            number="WPS-014"
            revision="B"
            title="Pulsed groove weld, 6061-T6 plate"
            cells={[
              { label: 'Process', children: 'GMAW-P, semiautomatic' },
              { label: 'Code', children: 'ASME BPVC.IX · 2021' },
              { label: 'Supporting records', children: <><Tag>PQR-009</Tag><Tag>PQR-011</Tag></> },
              { label: 'Drafted by', children: 'E. Nilsen · 18 Nov 2026' },
            ]}
            stamp={<Stamp state="draft" />}
            stampNote="1 finding blocks review"
          />
          <TitleBlock kind="Job" number="J-2231" cells={[{ label: 'Customer', children: 'Harbour authority, invented' }]} />
          <div className="flex flex-wrap items-center gap-3">
            {STAMP_STATES.map((state) => (
              <Stamp key={state} state={state} />
            ))}
          </div>
          <div className="flex flex-wrap items-center gap-3">
            {STAMP_STATES.map((state) => (
              <Stamp key={state} state={state} small />
            ))}
          </div>
        </div>
      </Group>
      <Group title="Sheets, margin, section index">
        <MarginLayout
          nav={
            <SectionNav
              label="Sections of the example"
              sections={[
                { id: 'g-metals', label: 'Base metals', verdict: 'outside' },
                { id: 'g-electrical', label: 'Electrical', verdict: 'cannot-tell' },
                { id: 'g-technique', label: 'Technique', verdict: 'within' },
                { id: 'g-passes', label: 'Passes' },
              ]}
            />
          }
          head={
            <>
              <VerdictTally counts={{ outside: 1, cannotTell: 1, within: 27 }} />
              <div className="flex gap-2">
                <Button kind="primary">Send for review</Button>
                <Button>Print</Button>
              </div>
              {fixed && <p role="status">Fix chosen: {fixed}</p>}
            </>
          }
        >
          <Sheet id="g-metals" title="Base metals" aside="6061-T6 to 6061-T6">
            <SheetRow label="P-Number" unit="ASME IX QW-422" htmlFor="g-p" gauge="PQR-009 tested 23 to 23" margin={<Margin findings={[findings.within, findings.withinToo]} {...note} />}>
              <TextField id="g-p" label="P-Number" labelHidden defaultValue="23" />
            </SheetRow>
            <SheetRow
              label="Thickness, groove"
              unit="mm"
              verdict="outside"
              htmlFor="g-t"
              gauge={<RangeGauge label="Thickness, groove" range={mm([closed(5), closed(20)])} asked={{ min: thickness?.min?.si ?? null, max: thickness?.max?.si ?? null }} tested={[10]} />}
              margin={<Margin findings={[findings.outside]} {...note} />}
            >
              <IntervalField id="g-t" label="Thickness, groove" labelHidden dimension="length" system="SI" value={thickness} onChange={setThickness} />
            </SheetRow>
            <SheetRow label="Diameter" unit="pipe, mm" htmlFor="g-d" gauge={<RangeGauge label="Diameter" range={mm([unlimited, unlimited])} asked={{ min: null, max: null }} />}>
              <IntervalField id="g-d" label="Diameter" labelHidden dimension="length" system="SI" allowAll allMeans="plate and pipe" value={{ min: null, max: null, all: true }} onChange={() => undefined} />
            </SheetRow>
          </Sheet>
          <Sheet id="g-electrical" title="Electrical" aside="square-wave pulse, 5 settings">
            <SheetRow label="Heat input, instantaneous" unit="kJ/mm" verdict="cannot-tell" htmlFor="g-h" margin={<Margin findings={[findings.cannotTell]} {...note} />}>
              <TextField id="g-h" label="Heat input" labelHidden placeholder="0.38-0.52" />
            </SheetRow>
          </Sheet>
          <Sheet id="g-technique" title="Technique">
            <SheetRow label="Bead">stringer</SheetRow>
          </Sheet>
          <Sheet id="g-passes" title="Passes" aside={<Button kind="quiet">Add a pass</Button>}>
            <div className="flex gap-6 px-4 py-3">
              <VerdictWord verdict="within" />
              <VerdictWord verdict="outside" />
              <VerdictWord verdict="cannot-tell" />
            </div>
          </Sheet>
        </MarginLayout>
      </Group>
    </>
  )
}
