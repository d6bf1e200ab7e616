import type { Request, Response } from 'express'
import { Authenticator } from 'passport'
import { Strategy } from 'passport-local'
import type { SignedIn } from '../../platform/http/access'
import { run } from '../../platform/http/read-body'
import type { AccountsService } from './accounts.service'

/** Passport with e-mail and password, for one application. */
export function createPassport(accounts: AccountsService) {
  const passport = new Authenticator()
  passport.use(
    new Strategy({ usernameField: 'email' }, (email, password, done) => {
      accounts.verify(email, password).then((account) => done(null, account ?? false), done)
    }),
  )
  passport.serializeUser<string>((account, done) => done(null, account.id))
  passport.deserializeUser<string>((id, done) => {
    accounts.findSignedIn(id).then((account) => done(null, account ?? false), done)
  })
  return passport
}

export type Passport = ReturnType<typeof createPassport>

/** The person whose e-mail and password the request's body holds; undefined if they are not right. */
export const authenticate = (
  passport: Passport,
  request: Request,
  response: Response,
): Promise<SignedIn | undefined> =>
  new Promise((resolve, reject) => {
    const strategy = passport.authenticate(
      'local',
      (fault: unknown, account: SignedIn | false | undefined) => {
        if (fault) reject(fault)
        else resolve(account || undefined)
      },
    )
    run(strategy, request, response).catch(reject)
  })

/** Begins a session for a person, under a new session id. */
export async function enter(request: Request, account: SignedIn): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    request.logIn(account, (fault) => (fault ? reject(fault) : resolve()))
  })
  request.session.signedInAt = Date.now()
}

/** Ends the session and begins an empty one, under a new session id. */
export const leave = (request: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    request.logOut((fault) => (fault ? reject(fault) : resolve()))
  })
