import { PANEL_QUANTITY } from '@shared/machines/panel-quantities.ts'
import type { Machine, MachineMode } from '@shared/schemas/machines.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { day } from '@/lib/figures.ts'
import { GUN_WORDS, HAS_KEYS, HAS_WORDS, MODE_WORDS, scaleOf, WHEN_WORDS } from '../words.ts'
import { FilesSheet } from './FilesSheet.tsx'
import { MachineTitle } from './MachineTitle.tsx'
import { PointsPlot } from './PointsPlot.tsx'

const orNot = (text: string | null | false) => text || <span className="text-soft">not stated</span>

function Facts({ facts }: { facts: readonly (readonly [label: string, value: React.ReactNode])[] }) {
  return (
    <dl className="grid gap-x-6 gap-y-3 px-4 py-4 sm:grid-cols-2 lg:grid-cols-3">
      {facts.map(([label, value]) => (
        <div key={label} className="min-w-0">
          <dt className="cell-label">{label}</dt>
          <dd className="break-words whitespace-pre-line">{value}</dd>
        </div>
      ))}
    </dl>
  )
}

/** A machine for whoever only uses it. */
export function MachineReading({ machine }: { machine: Machine }) {
  const { content } = machine
  const { calibration, dutyCycle } = content
  const accuracy = ([['amps', calibration.accuracy.current], ['volts', calibration.accuracy.voltage], ['wire feed', calibration.accuracy.wireFeed]] as const).filter(([, percent]) => percent !== null).map(([of, percent]) => `${of} ± ${percent} %`)
  return (
    <>
      <MachineTitle machine={machine} content={content} />
      <div className="no-print mt-3">
        <ButtonLink kind="primary" to={`/machines/${machine.id}/card`}>
          Panel card
        </ButtonLink>
      </div>
      <Sheet title="The machine" className="mt-4">
        <Facts facts={[['Guns and torches', orNot(content.gunTypes.map((gun) => GUN_WORDS[gun]).join(', '))], ['Duty cycle', orNot(dutyCycle && `${dutyCycle.current} A at ${dutyCycle.percent} %`)], ['Data output', content.dataOutput ? 'yes' : 'no'], ['Notes', orNot(content.notes)]]} />
      </Sheet>
      <Sheet id="calibration" title="Calibration" className="mt-4">
        <Facts facts={[['Certificate', orNot(calibration.certificate)], ['Done on', orNot(calibration.doneOn && day(calibration.doneOn))], ['Due on', orNot(calibration.dueOn && day(calibration.dueOn))], ['True to', orNot(accuracy.join(', '))], ['Remark', orNot(calibration.accuracyNote)]]} />
        <FilesSheet machineId={machine.id} manages={false} />
      </Sheet>
      {content.modes.map((mode) => (
        <ModeReading key={mode.key} mode={mode} />
      ))}
    </>
  )
}

function ModeReading({ mode }: { mode: MachineMode }) {
  const has = HAS_KEYS.filter((key) => mode.has[key]).map((key) => HAS_WORDS[key].toLowerCase())
  return (
    <Sheet title={mode.name} className="mt-4" aside={MODE_WORDS[mode.kind]}>
      <Facts facts={[['For', mode.processes.join(', ')], ['Transfer', orNot(mode.transferModes.join(', '))], ['Polarity', orNot(mode.polarities.join(' or '))], ['It has', has.join(', ') || 'no crater fill, hot start, ramp or gas times'], ['It shows', mode.displays.map(({ quantity, when }) => `${PANEL_QUANTITY[quantity].label.toLowerCase()} ${WHEN_WORDS[when]}`).join('; ') || 'nothing besides its controls']]} />
      {mode.controls.length > 0 && (
        <div className="overflow-x-auto border-t border-hair px-4 py-2" tabIndex={0} role="group" aria-label={`Controls of ${mode.name}`}>
          <table className="w-full text-left">
            <thead>
              <tr className="border-b border-rule">
                {['Control', 'Sets', 'Scale'].map((head) => (
                  <th key={head} scope="col" className="cell-label py-1.5 pr-4 font-normal">
                    {head}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {mode.controls.map((control) => (
                <tr key={control.key} className="border-b border-hair align-top last:border-b-0">
                  <th scope="row" className="py-1.5 pr-4 font-medium">
                    {control.label}
                    {control.where && <span className="block font-normal text-soft">{control.where}</span>}
                  </th>
                  <td className="py-1.5 pr-4">{PANEL_QUANTITY[control.sets].label}</td>
                  <td className="py-1.5">
                    {scaleOf(control)}
                    {!control.shown && <span className="block text-straw-deep">not shown on the panel</span>}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      {mode.programs.map((program) => (
        <div key={program.key} className="border-t border-hair px-4 py-3">
          <h3 className="font-medium">{program.label}</h3>
          <p className="text-soft">{[program.wires.join(', '), program.diameters.map((one) => `${one} mm`).join(', '), program.gases.join(', ')].filter(Boolean).join(' · ') || 'For which wire is not stated.'}</p>
          {program.measured.map((set, index) => (
            <div key={index} className="mt-2">
              <p>
                Measured with {set.wire}, {set.diameter} mm, {set.gas}
                {set.trim !== null && `, trim ${set.trim}`}
              </p>
              <PointsPlot points={set.points} title={`${set.wire}, ${set.gas}`} />
            </div>
          ))}
        </div>
      ))}
    </Sheet>
  )
}
