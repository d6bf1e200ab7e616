import type { Request, Router } from 'express'
import { acceptLink, getLink, getSession, signIn, signOut, type Session } from '@shared/api/accounts'
import { serve } from '../../platform/http/serve'
import { tokenOf } from '../../platform/http/session'
import { problem } from '../../platform/problem'
import type { AccountsService } from './accounts.service'
import { createLimits } from './limits'
import type { LinksService } from './links.service'
import { authenticate, enter, leave, type Passport } from './passport'

export function mountAccounts(
  router: Router,
  accounts: AccountsService,
  links: LinksService,
  passport: Passport,
): void {
  const limits = createLimits()
  const addressOf = ({ ip }: Request): string => ip ?? 'an unknown address'
  const sessionOf = (request: Request): Session => ({
    account: request.user ?? null,
    csrfToken: tokenOf(request),
    demoAccounts: accounts.listDemoAccounts(),
  })

  serve(router, getSession, ({ request }) => sessionOf(request))
  serve(router, signIn, async ({ body, request, response }) => {
    await limits.signIn(request, response)
    const account = await authenticate(passport, request, response)
    const tried = { email: body.email.trim().toLowerCase(), address: addressOf(request) }
    if (!account) {
      await accounts.keepEvent({ kind: 'sign-in-refused', ...tried }, null)
      throw problem('wrong-credentials', 'There is no account with this e-mail and this password.')
    }
    await accounts.keepEvent({ kind: 'sign-in', ...tried }, account.id)
    await enter(request, account)
    return sessionOf(request)
  })
  serve(router, signOut, async ({ account, request }) => {
    if (account) await accounts.keepEvent({ kind: 'sign-out', address: addressOf(request) }, account.id)
    await leave(request)
    return sessionOf(request)
  })
  serve(router, getLink, async ({ params, request, response }) => {
    await limits.links(request, response)
    return links.describe(params.token)
  })
  serve(router, acceptLink, async ({ params, body, request, response }) => {
    await limits.links(request, response)
    await enter(request, await links.accept(params.token, body))
    return sessionOf(request)
  })
}
