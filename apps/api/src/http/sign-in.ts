import type { Request, Response } from 'express'
import { Passport } from 'passport'
import { Strategy } from 'passport-local'
import { promisify } from 'node:util'
import { AppError } from '../app-error'
import type { KnownPerson } from '../people/repository'
import type { PeopleService } from '../people/service'
import { asError } from './as-error'
import { personOf } from './context'

export type Authenticator = InstanceType<typeof Passport>

/** Knows a person by e-mail address and pass phrase, and by what a session remembers. */
export function createAuthenticator(people: PeopleService): Authenticator {
  const passport = new Passport()
  passport.use(
    new Strategy(
      { usernameField: 'email', passwordField: 'password', passReqToCallback: true },
      (req, email, password, done) => {
        const attempt = { email, password, address: req.ip ?? '', signedIn: personOf(req) }
        people.signIn(attempt).then((person) => done(null, person), done)
      },
    ),
  )
  passport.serializeUser((person, done) => done(null, person.id))
  passport.deserializeUser((id: number, done) => {
    people.find(id).then((person) => done(null, person ?? false), done)
  })
  return passport
}

/** Checks the body by the strategy, then moves to a session with a new id. */
export async function signIn(
  passport: Authenticator,
  req: Request,
  res: Response,
): Promise<KnownPerson> {
  const person = await new Promise<KnownPerson>((resolve, reject) => {
    const done = (error: unknown, found: KnownPerson | false | null | undefined): void => {
      if (error) reject(asError(error))
      else if (found) resolve(found)
      else reject(new AppError('sign-in-failed'))
    }
    const handler = passport.authenticate('local', done) as (
      req: Request,
      res: Response,
      next: (error: unknown) => void,
    ) => void
    handler(req, res, (error) => reject(asError(error)))
  })
  await new Promise<void>((resolve, reject) => {
    req.logIn(person, (error: unknown) => (error ? reject(asError(error)) : resolve()))
  })
  req.session.startedAt = Date.now()
  return person
}

/** Destroys the row at once; what the browser has kept of the pages goes too. */
export async function signOut(req: Request, res: Response, cookie: string): Promise<void> {
  await promisify(req.session.destroy.bind(req.session))()
  res.clearCookie(cookie, { path: '/' })
  res.set('Clear-Site-Data', '"cache", "storage"')
}
