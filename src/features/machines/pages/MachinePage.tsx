import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { Breadcrumb, RecordError, Skeleton } from '@/components/states.tsx'
import { query } from '@/lib/query.ts'
import { MachineForm } from '../components/MachineForm.tsx'
import { MachineReading } from '../components/MachineReading.tsx'

/** One machine: its form for those who keep the register, else as text. */
export function MachinePage() {
  const { id = '' } = useParams()
  const machine = useQuery(query('readMachine', { params: { id } }))
  if (machine.isPending) return <Skeleton label="Reading the machine" />
  return (
    <>
      <Breadcrumb trail={[{ label: 'Machines', to: '/machines' }, { label: machine.data?.number ?? 'Machine' }]} />
      {machine.isError && !machine.data ? <RecordError title="The machine can’t be shown" error={machine.error} onRetry={() => void machine.refetch()} /> : machine.data && (machine.data.may.includes('save') ? <MachineForm key={machine.data.id} machine={machine.data} /> : <MachineReading machine={machine.data} />)}
    </>
  )
}
