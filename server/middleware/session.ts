import connectPgSimple from 'connect-pg-simple'
import type { Request, RequestHandler, Response } from 'express'
import session from 'express-session'
import passport from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import { z } from 'zod'
import type { Services } from '../routes/mount.ts'
import { checkCredentials } from '../services/accounts.ts'
import { findSignedIn, type SignedIn } from '../services/directory.ts'

declare module 'express-session' {
  interface SessionData {
    /** When the session was last prolonged, in milliseconds since 1970. */
    prolonged?: number
  }
}

const DAY = 86_400_000
const LIFETIME = 14 * DAY
export const COOKIE = 'sidebend'

/** What a session keeps: whose it is and since when it is valid. Name and roles are read afresh for every request. */
const keptSchema = z.object({ id: z.uuid(), organizationId: z.uuid(), sessionEpoch: z.number().int() })

export type Authenticate = (req: Request, res: Response, credentials: { email: string; password: string }) => Promise<SignedIn>

/**
 * Sessions in PostgreSQL with passport on top.
 * @returns the handlers to use in order, and what signs somebody in
 */
export function sessions(services: Services): { handlers: RequestHandler[]; authenticate: Authenticate } {
  const { env, database, log } = services
  const PgStore = connectPgSimple(session)
  const store = new PgStore({
    pool: database.owner,
    tableName: 'session',
    pruneSessionInterval: env.NODE_ENV === 'test' ? false : 900,
    // A write for every read would be wasteful; `prolong` below does it once a day.
    disableTouch: true,
    errorLog: (...parts: unknown[]) => log.error({ parts: parts.map(String) }, 'the session store met an error'),
  })
  const authenticator = new passport.Passport()
  authenticator.use(
    new LocalStrategy({ usernameField: 'email', passReqToCallback: true }, (req, email, password, done) => {
      checkCredentials(services, email, password, req.ip ?? '').then((person) => done(null, person), done)
    }),
  )
  authenticator.serializeUser((user, done) => done(null, keptSchema.parse(user)))
  authenticator.deserializeUser((kept: unknown, done) => {
    const read = keptSchema.safeParse(kept)
    if (!read.success) {
      done(null, false)
      return
    }
    findSignedIn(database.owner, read.data).then((person) => done(null, person ?? false), done)
  })
  const prolong: RequestHandler = (req, _res, next) => {
    if (req.user && Date.now() - (req.session.prolonged ?? 0) > DAY) {
      req.session.prolonged = Date.now()
      req.session.touch()
    }
    next()
  }
  return {
    handlers: [
      session({
        store,
        name: COOKIE,
        secret: env.SESSION_SECRET,
        resave: false,
        saveUninitialized: false,
        cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', maxAge: LIFETIME, path: '/' },
      }),
      authenticator.session() as RequestHandler,
      prolong,
    ],
    authenticate: (req, res, credentials) =>
      new Promise((resolve, reject) => {
        // The strategy reads the body: give it the e-mail address as parsed, not as typed.
        req.body = credentials
        const settle = (error: unknown, person: SignedIn | false | undefined): void => {
          if (error) reject(error instanceof Error ? error : new Error('sign-in failed', { cause: error }))
          else if (person) resolve(person)
          else reject(new Error('the sign-in strategy gave neither a person nor a reason'))
        }
        const handler = authenticator.authenticate('local', { session: false }, settle) as RequestHandler
        void handler(req, res, reject)
      }),
  }
}

/** Begins a session under a new id, so that an id planted beforehand is worth nothing. */
export const beginSession = (req: Request, person: SignedIn): Promise<void> =>
  new Promise((resolve, reject) => {
    req.logIn(person, (error: unknown) => {
      if (error) {
        reject(error instanceof Error ? error : new Error('the session could not begin', { cause: error }))
        return
      }
      req.session.prolonged = Date.now()
      resolve()
    })
  })

/** Ends the browser's session, if it has one, and takes its cookie back. */
export const endSession = (req: Request, res: Response): Promise<void> =>
  new Promise((resolve, reject) => {
    req.session.destroy((error: unknown) => {
      if (error) {
        reject(error instanceof Error ? error : new Error('the session could not end', { cause: error }))
        return
      }
      res.clearCookie(COOKIE, { httpOnly: true, sameSite: 'lax', path: '/' })
      resolve()
    })
  })
