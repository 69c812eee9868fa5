import type pg from 'pg'
import { HttpProblem } from '../middleware/problem.ts'
import { countAttempts, forgetAttempts, noteAttempt, noteSuccess, type Attempt, type AttemptKind } from './directory.ts'

interface Limit {
  by: 'email' | 'address'
  tries: number
  windowSeconds: number
}

const QUARTER_HOUR = 900
const HOUR = 3600

/** How many failed tries are let through. An address may stand for a whole works behind one router, hence the higher figure. */
export const LIMITS: Readonly<Record<AttemptKind, readonly Limit[]>> = {
  'sign-in': [
    { by: 'email', tries: 10, windowSeconds: QUARTER_HOUR },
    { by: 'address', tries: 100, windowSeconds: QUARTER_HOUR },
  ],
  confirm: [{ by: 'email', tries: 10, windowSeconds: QUARTER_HOUR }],
  reset: [
    { by: 'email', tries: 5, windowSeconds: HOUR },
    { by: 'address', tries: 30, windowSeconds: HOUR },
  ],
}

const spoken = (seconds: number): string => {
  const minutes = Math.ceil(seconds / 60)
  return minutes <= 1 ? 'a minute' : `${minutes} minutes`
}

/** 429, with the seconds to wait. */
function tooManyTries(kind: AttemptKind, retryAfter: number): HttpProblem {
  const what = kind === 'reset' ? 'links have been asked for' : 'tries have failed'
  const orElse = kind === 'sign-in' ? ', or ask for a link to set a new password' : ''
  return new HttpProblem(429, 'Too many tries', `Too many ${what} of late. Wait ${spoken(retryAfter)} and try again${orElse}.`, { retryAfter })
}

/**
 * Counts a try against its e-mail address and its network address.
 * @returns what to call when the try turns out right
 * @throws HttpProblem 429 before any password is looked at
 */
export async function countTry(owner: pg.Pool, attempt: Attempt): Promise<() => Promise<void>> {
  const id = await noteAttempt(owner, attempt)
  for (const { by, tries, windowSeconds } of LIMITS[attempt.kind]) {
    const { failed, retryAfter } = await countAttempts(owner, by, attempt, id, windowSeconds, tries)
    if (failed >= tries) {
      // A refused try is not a guess: it must not push the end of the wait further away.
      await noteSuccess(owner, id)
      throw tooManyTries(attempt.kind, retryAfter)
    }
  }
  return async () => {
    await noteSuccess(owner, id)
    if (Number(id) % 100 === 0) await forgetAttempts(owner)
  }
}
