import request from 'supertest'
import type { Role } from '@shared/api/accounts'

export type Who = Role | 'administrator'

/** Calls the server with one session's cookie and token. */
export type Agent = ReturnType<typeof request.agent>

/** An agent with a session of its own, not signed in. */
export async function anonymous(server: { url: string }): Promise<Agent> {
  const agent = request.agent(server.url)
  const { body } = await agent.get('/api/session')
  return agent.set('X-CSRF-Token', body.csrfToken)
}

/** An agent of whoever has this e-mail and password. */
export async function signIn(server: { url: string }, email: string, password: string): Promise<Agent> {
  const agent = await anonymous(server)
  const response = await agent.post('/api/session').send({ email, password })
  if (response.status !== 200) throw new Error(`Signing in as ${email}: ${JSON.stringify(response.body)}`)
  return agent.set('X-CSRF-Token', response.body.csrfToken)
}

/** An agent of a demo account. */
export const signInAs = (server: { url: string }, who: Who): Promise<Agent> =>
  signIn(server, `${who}@merrow.example`, `merrow-${who}`)
