import { z } from 'zod'
import { changePassphraseSchema, signInSchema, type SessionAnswer } from '../../../shared/api/session.ts'
import { AppError } from '../../../shared/errors.ts'
import { actionsOf } from '../../../shared/policy.ts'
import {
  answered,
  definePublicRoute,
  defineRoute,
  noInput,
  type PublicContext,
  type Route,
  type SignedIn,
} from '../../http/routeTable.ts'
import { sessionCookieName, sessionCookieOptions } from '../../http/sessionCookie.ts'
import { readCompany } from '../company/companyRepo.ts'
import { changePassphrase } from './changePassphrase.ts'
import { signIn } from './signIn.ts'
import { endSession, startSession } from './startSession.ts'

/** Signing in and out, who one is, and one's own passphrase. */
export const sessionRoutes: readonly Route[] = [
  definePublicRoute({
    method: 'post',
    path: '/api/session',
    params: noInput,
    query: noInput,
    body: signInSchema,
    handle: async (context, { body }) => {
      const member = await signIn(context, body)
      await startSession(context.request, member)
      return answer(context, member)
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/session',
    action: 'session.read',
    params: noInput,
    query: noInput,
    body: noInput,
    handle: (context) => answer(context, context.member),
  }),
  // Signing out twice, or after the session has ended, is still signing out.
  definePublicRoute({
    method: 'delete',
    path: '/api/session',
    params: noInput,
    query: noInput,
    body: z.unknown(),
    handle: async ({ deps, request, response }) => {
      await endSession(request)
      response.clearCookie(sessionCookieName(deps), sessionCookieOptions(deps)).status(204).end()
      return answered
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/session/passphrase',
    action: 'session.update',
    params: noInput,
    query: noInput,
    body: changePassphraseSchema,
    handle: (context, { body }) => changePassphrase(context, body),
  }),
]

async function answer({ db }: PublicContext, { companyId, id, name, email, role }: SignedIn): Promise<SessionAnswer> {
  const company = await readCompany(db, companyId)
  if (!company) throw new AppError('unauthenticated', 'Sign in to go on')
  const { version: _version, ...rest } = company
  return { member: { id, name, email, role }, company: rest, can: actionsOf(role) }
}
