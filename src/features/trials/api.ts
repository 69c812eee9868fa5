/** What the pages of the dial-in log read and change. */
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type { ArcRecordingRow } from '@shared/schemas/arc-data.ts'
import type { Machine, MachineMode } from '@shared/schemas/machines.ts'
import type { Bead, Trial } from '@shared/schemas/trials.ts'
import type { BodyOf } from '@shared/schemas/endpoints.ts'
import { call } from '@/lib/api.ts'
import { query } from '@/lib/query.ts'

export const trialQuery = (id: string) => query('readTrial', { params: { id } })

/** The machine and mode of a bead; undefined while they are read, null where none is named or it is gone. */
export function useMachineMode(machineId: string | null, modeKey: string | null): { machine: Machine | null | undefined; mode: MachineMode | null } {
  const read = useQuery({ ...query('readMachine', { params: { id: machineId ?? '' } }), enabled: machineId !== null, staleTime: 300_000 })
  const machine = machineId === null ? null : read.isError ? null : read.data
  return { machine, mode: machine?.content.modes.find(({ key }) => key === modeKey) ?? null }
}

/** Recordings of one bead's arc, the latest first; the same request as the sheet of recordings makes. */
export const useRecordings = (beadId: string | undefined): readonly ArcRecordingRow[] => useQuery({ ...query('listArcRecordings', { query: { beadId, limit: 100 } }), enabled: beadId !== undefined }).data?.items ?? []

/** What may happen to a trial and its beads, the form of a bead apart. */
export function useTrialActs(trial: Pick<Trial, 'id' | 'version'>) {
  const client = useQueryClient()
  const params = { id: trial.id }
  const refresh = () => Promise.all([client.invalidateQueries({ queryKey: trialQuery(trial.id).queryKey }), client.invalidateQueries({ queryKey: ['listTrials'] })])
  return {
    save: useMutation({
      mutationFn: (body: BodyOf<'saveTrial'>) => call('saveTrial', { params, body, ifMatch: trial.version }),
      onSuccess: (next) => {
        client.setQueryData(trialQuery(trial.id).queryKey, next)
        void client.invalidateQueries({ queryKey: ['listTrials'] })
      },
    }),
    discard: useMutation({ mutationFn: () => call('discardTrial', { params, ifMatch: trial.version }), onSuccess: () => client.invalidateQueries({ queryKey: ['listTrials'] }) }),
    removeBead: useMutation({ mutationFn: ({ id, version }: { id: string; version: number }) => call('removeBead', { params: { id }, ifMatch: version }), onSettled: refresh }),
    saveBead: useMutation({ mutationFn: ({ id, version, content }: Pick<Bead, 'id' | 'version' | 'content'>) => call('saveBead', { params: { id }, body: { content }, ifMatch: version }), onSettled: refresh }),
    removePhoto: useMutation({ mutationFn: (id: string) => call('removeBeadPhoto', { params: { id } }), onSettled: refresh }),
    promote: useMutation({
      mutationFn: (body: BodyOf<'promoteBead'>) => call('promoteBead', { params, body }),
      onSuccess: () => {
        void client.invalidateQueries({ queryKey: ['listProcedures'] })
        return refresh()
      },
    }),
  }
}
