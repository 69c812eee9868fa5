/** The query cache and the option factories that loaders and hooks share. */
import { infiniteQueryOptions, QueryClient, queryOptions } from '@tanstack/react-query'
import type { Page } from '@shared/schemas/common.ts'
import type { EndpointName, ParamsOf, QueryOf, ResponseOf } from '@shared/schemas/endpoints.ts'
import { call, onSignedOut } from './api.ts'
import { ProblemError } from './problem.ts'

/** A refusal is an answer; only a lost connection or a failing server is worth asking again. */
const worthRetrying = (count: number, error: Error) => count < 2 && error instanceof ProblemError && (error.status === 0 || error.status >= 502)

/** A new cache; the program has one, each test its own. */
export function createQueryClient(): QueryClient {
  const client = new QueryClient({ defaultOptions: { queries: { staleTime: 15_000, retry: worthRetrying, refetchOnWindowFocus: true }, mutations: { retry: false } } })
  onSignedOut(() => void client.invalidateQueries({ queryKey: ['readSession'] }))
  return client
}

/**
 * Query options of any reading endpoint: `useQuery(query('readJob', { params: { id } }))`.
 * The key is [endpoint, params, query], so `invalidateQueries({ queryKey: ['readJob'] })` reaches every one.
 */
export const query = <N extends EndpointName>(name: N, options: { params?: ParamsOf<N>; query?: QueryOf<N> } = {}) =>
  queryOptions<ResponseOf<N>>({
    queryKey: [name, options.params ?? {}, options.query ?? {}],
    queryFn: ({ signal }) => call(name, { ...options, signal }),
  })

/** Endpoints that answer a page of rows. */
export type ListName = { [N in EndpointName]: ResponseOf<N> extends Page<unknown> ? N : never }[EndpointName]
export type RowOf<N extends ListName> = ResponseOf<N>['items'][number]

/** Infinite query options of a list endpoint; `data` comes flattened: `{ rows, total }`. */
export const listQuery = <N extends ListName>(name: N, options: { params?: ParamsOf<N>; query?: Omit<QueryOf<N>, 'cursor'> } = {}) =>
  infiniteQueryOptions({
    queryKey: [name, options.params ?? {}, options.query ?? {}, 'list'] as const,
    queryFn: ({ signal, pageParam }): Promise<Page<RowOf<N>>> =>
      call(name, { params: options.params, query: { ...options.query, cursor: pageParam ?? undefined } as unknown as QueryOf<N>, signal }) as unknown as Promise<Page<RowOf<N>>>,
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.next,
    select: (data) => ({ rows: data.pages.flatMap((page) => page.items), total: data.pages[0]?.total ?? 0 }),
  })

export const sessionQuery = queryOptions({ ...query('readSession'), staleTime: 60_000 })
