import { useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query'
import type { Session } from '@shared/schemas/people.ts'
import type { BodyOf } from '@shared/schemas/endpoints.ts'
import { call } from '@/lib/api.ts'
import { sessionQuery } from '@/lib/query.ts'

/** Who is signed in and what they may do; suspends until known. `person` is null when nobody is. */
export const useSession = (): Session => useSuspenseQuery(sessionQuery).data

/** Whether the policies allow the person this action, e.g. `procedures.draft`. Hides what the server would refuse anyway. */
export const useMay = (action: string): boolean => useSession().may.includes(action)

/** Changes the person's own name, units or theme; shown at once, taken back when the server refuses. */
export function useChangeAccount() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (body: BodyOf<'changeAccount'>) => call('changeAccount', { body }),
    onMutate: (body) => {
      const before = client.getQueryData(sessionQuery.queryKey)
      client.setQueryData(sessionQuery.queryKey, (session) => (session?.person ? { ...session, person: { ...session.person, ...body } } : session))
      return { before }
    },
    onError: (_error, _body, context) => context?.before && client.setQueryData(sessionQuery.queryKey, context.before),
    onSuccess: (session) => client.setQueryData(sessionQuery.queryKey, session),
  })
}
