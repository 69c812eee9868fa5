import type { QueryClient } from '@tanstack/react-query'
import { redirect, type LoaderFunctionArgs } from 'react-router-dom'
import { sessionQuery } from '@/lib/query.ts'
import { signInPath } from './paths.ts'

/** Loads the session before any page; without a person the way leads to sign-in and back. */
export const signedIn =
  (client: QueryClient) =>
  async ({ request }: LoaderFunctionArgs): Promise<Response | null> => {
    const session = await client.ensureQueryData(sessionQuery)
    return session.person ? null : redirect(signInPath(new URL(request.url)))
  }

/** Loads the session, whoever it is. */
export const anyone = (client: QueryClient) => async (): Promise<null> => {
  await client.ensureQueryData(sessionQuery)
  return null
}
