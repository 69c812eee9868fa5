import { useQuery, useQueryClient } from '@tanstack/react-query'
import { Papers } from '@/components/papers/PapersSheet.tsx'
import { ErrorState } from '@/components/states.tsx'
import { call, hrefOf, upload } from '@/lib/api.ts'
import { query } from '@/lib/query.ts'

/** Certificates and pictures of a machine, under its calibration. */
export function FilesSheet({ machineId, manages }: { machineId: string; manages: boolean }) {
  const client = useQueryClient()
  const options = query('listMachineFiles', { params: { id: machineId } })
  const files = useQuery(options)
  return (
    <div className="border-t border-hair">
      <h3 className="px-4 pt-3 font-medium">Certificates and pictures</h3>
      {files.isError && <ErrorState compact error={files.error} onRetry={() => void files.refetch()} />}
      {files.data && (
        <Papers
          none={manages ? 'Keep the certificate here: whoever doubts a figure finds what it rests on.' : 'No certificate is kept here.'}
          papers={files.data.items}
          hrefOf={(id) => hrefOf('readMachineFile', { id })}
          manages={manages}
          send={(chosen, progress) => upload('addMachineFiles', { params: { id: machineId }, files: [...chosen], ...progress })}
          remove={(id) => call('removeMachineFile', { params: { id } })}
          onChanged={() => client.invalidateQueries({ queryKey: options.queryKey })}
        />
      )}
    </div>
  )
}
