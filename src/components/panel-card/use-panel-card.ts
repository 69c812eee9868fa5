import { useQuery, type UseQueryResult } from '@tanstack/react-query'
import { modesFor, passesWithRanges } from '@shared/machines/panel-card.ts'
import type { Machine, MachineMode, MachineRow, PanelCard } from '@shared/schemas/machines.ts'
import type { ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { useMay } from '@/hooks/session.ts'
import { query } from '@/lib/query.ts'

/** What a card is asked for; whatever is left out is chosen. */
export interface CardChoice { machine: string | null; mode: string | null; program: string | null; pass: string | null }
export const NO_CHOICE: CardChoice = { machine: null, mode: null, program: null, pass: null }

export interface PanelCardState {
  /** Machines for the process; empty while read, and where the person may not read them. */
  machines: readonly MachineRow[]
  machine: Machine | undefined
  /** Modes of the machine for the process, the likeliest first. */
  modes: readonly MachineMode[]
  mode: MachineMode | undefined
  passes: readonly string[]
  card: UseQueryResult<PanelCard>
  /** A machine was chosen that has no mode for the process. */
  unfit: boolean
  error: Error | null
}

/**
 * The machines for a process, the chosen one with its modes, and its card for the revision.
 * @param block the process that is looked at
 */
export function usePanelCard(revision: { id: string; content: { variables: WeldingVariables } } | undefined, block: ProcessBlock | undefined, choice: CardChoice): PanelCardState {
  const may = useMay('machines.read')
  const list = useQuery({ ...query('listMachines', { query: { limit: 200, ...(block?.process && { process: block.process }) } }), enabled: may && block !== undefined })
  const machine = useQuery({ ...query('readMachine', { params: { id: choice.machine ?? '' } }), enabled: may && choice.machine !== null })
  const modes = modesFor(machine.data?.content.modes ?? [], block)
  const mode = modes.find(({ key }) => key === choice.mode) ?? modes[0]
  const asks = { machine: choice.machine ?? '', mode: mode?.key ?? '', process: block?.id, program: choice.program ?? undefined, pass: choice.pass ?? undefined }
  const card = useQuery({ ...query('readPanelCard', { params: { id: revision?.id ?? '' }, query: asks }), enabled: may && revision !== undefined && block !== undefined && mode !== undefined && choice.machine !== null, placeholderData: (before) => before })
  return {
    machines: list.data?.items ?? [],
    machine: machine.data,
    modes,
    mode,
    passes: revision ? passesWithRanges(revision.content.variables, block?.id ?? null) : [],
    card,
    unfit: machine.data !== undefined && modes.length === 0,
    error: list.error ?? machine.error ?? card.error,
  }
}
