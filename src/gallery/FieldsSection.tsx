import { useState } from 'react'
import { POSITIONS, type Position } from '@shared/schemas/welding.ts'
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { ConfirmSign } from '@/components/ConfirmSign.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { ComboBox, type ComboItem } from '@/components/fields/ComboBox.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { IntervalField, QuantityField } from '@/components/fields/quantity.tsx'
import { Checkbox, Select, Switch, TagPicker, TextArea, TextField } from '@/components/fields/text.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { unreachable } from '@/lib/problem.ts'
import { Group } from './Group.tsx'

const METALS: ComboItem<null>[] = [
  { id: '1', title: 'SA-516 Gr. 70', subtitle: 'plate · P-1 Gr. 2 · K02700', data: null },
  { id: '2', title: 'SB-209 6061-T6', subtitle: 'plate · P-23 · A96061', data: null },
  { id: '3', title: 'SA-240 304L', subtitle: 'plate · P-8 Gr. 1 · S30403', data: null },
]
const find = (text: string): Promise<ComboItem<null>[]> => Promise.resolve(METALS.filter(({ title }) => title.toLowerCase().includes(text.toLowerCase())))

export function FieldsSection() {
  const [positions, setPositions] = useState<Position[]>(['1G', '3G'])
  const [preheat, setPreheat] = useState<Quantity | null>(null)
  const [volts, setVolts] = useState<Interval | null>(null)
  const [metal, setMetal] = useState('SA-516 Gr. 70')
  const [dialog, setDialog] = useState<'plain' | 'sign' | null>(null)
  return (
    <>
      <Group title="Fields">
        <div className="grid gap-x-6 gap-y-5 border border-rule bg-sheet p-4 sm:grid-cols-2 lg:grid-cols-3">
          <TextField label="Trade name" optional defaultValue="" placeholder="as printed on the spool" />
          <TextField label="Heat number" description="From the mill certificate." defaultValue="83271" />
          <TextField label="E-mail" error="“larkfield” is no e-mail address. Write it like name@example.com." defaultValue="larkfield" />
          <TextField label="Number" disabled defaultValue="WPS-014" />
          <Select label="Groove" empty="Not stated" options={[{ value: 'single-v', label: 'Single V' }, { value: 'double-v', label: 'Double V' }]} />
          <Select label="Backing" error="Choose a backing, or none." empty="Not stated" options={[{ value: 'none', label: 'None' }]} />
          <QuantityField label="Preheat, minimum" dimension="temperature" system="SI" value={preheat} onChange={setPreheat} description="°C; try 200 F" />
          <QuantityField label="Root opening" dimension="length" system="SI" value={null} onChange={() => undefined} error="Root opening: give a figure, e.g. 3 mm." />
          <IntervalField label="Voltage" dimension="voltage" system="SI" value={volts} onChange={setVolts} description="V; try 18-22 in the first box" />
          <ComboBox label="Base metal" text={metal} onPick={(_item, text) => setMetal(text)} load={find} queryKey="gallery-metals" description="Grade, UNS or P-Number" allowOwn />
          <ComboBox label="Filler metal" text="" onPick={() => undefined} load={find} queryKey="gallery-fillers" error="Pick a filler metal, or say that none is added." />
          <TextArea label="Notes" optional />
          <TagPicker label="Positions" options={POSITIONS.map((value) => ({ value }))} value={positions} onChange={setPositions} />
          <TagPicker label="Roles" options={[{ value: 'engineer' }, { value: 'welder' }]} value={[]} onChange={() => undefined} error="Choose at least one role." />
          <div className="space-y-3">
            <Checkbox label="Peening is used" defaultChecked />
            <Checkbox label="Toughness is required" description="Makes supplementary essential variables essential." />
            <Checkbox label="I have seen the fracture faces" error="Confirm that the specimens were looked at." />
            <Switch label="Pulsed" defaultChecked />
            <Switch label="Waveform-controlled" />
            <Switch label="Not yours to change" disabled />
          </div>
          <div className="sm:col-span-2 lg:col-span-3">
            <FormError message="Nothing was saved: two fields need another look." />
          </div>
        </div>
      </Group>
      <Group title="Buttons, dialogs, news">
        <div className="flex flex-wrap items-center gap-3">
          <Button kind="primary">Send for review</Button>
          <Button>Print</Button>
          <Button kind="quiet">Add a pass</Button>
          <Button kind="danger">Withdraw</Button>
          <Button kind="primary" pending>
            Saving
          </Button>
          <Button disabled>Approve</Button>
          <ButtonLink to="/gallery">A link</ButtonLink>
          <Button onClick={() => setDialog('plain')}>Open a dialog</Button>
          <Button onClick={() => setDialog('sign')}>Sign…</Button>
          <Button onClick={() => say('Draft saved.', { undo: () => undefined })}>Say it</Button>
          <Button onClick={() => sayProblem(unreachable())}>Say it failed</Button>
        </div>
        <Dialog title="Discard the draft" isOpen={dialog === 'plain'} onClose={() => setDialog(null)} footer={<><Button onClick={() => setDialog(null)}>Keep it</Button><Button kind="danger" onClick={() => setDialog(null)}>Discard</Button></>}>
          <p>WPS-014 rev B was never approved. Discarding removes it for everybody; rev A stays in force.</p>
        </Dialog>
        <ConfirmSign
          isOpen={dialog === 'sign'}
          onClose={() => setDialog(null)}
          title="Approve WPS-014 rev B"
          statement="I have reviewed WPS-014 rev B and approve it for production welding."
          consequence="From then on nobody can change this revision; rev A is superseded. Until you sign, nothing happens."
          confirmLabel="Sign and approve"
          reason={{ label: 'Why the open finding is accepted', required: true, missing: 'One finding cannot be told: say why it is accepted.' }}
          onSign={() => Promise.reject(unreachable())}
        />
      </Group>
    </>
  )
}
