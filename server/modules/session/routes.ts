import { z } from 'zod'
import { signInSchema, type SessionAnswer } from '../../../shared/api/session.ts'
import { AppError } from '../../../shared/errors.ts'
import { actionsOf } from '../../../shared/policy.ts'
import { answered, definePublicRoute, defineRoute, noInput, type PublicContext, type SignedIn } from '../../http/routeTable.ts'
import { sessionCookieName, sessionCookieOptions } from '../../http/sessionCookie.ts'
import { readCompany } from '../company/companyRepo.ts'
import { signIn } from './signIn.ts'

export const sessionRoutes = [
  definePublicRoute({
    method: 'post',
    path: '/api/session',
    params: noInput,
    query: noInput,
    body: signInSchema,
    handle: async (context, { body }) => {
      const member = await signIn(context, body)
      await startSession(context, member)
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
      await new Promise<void>((done, fail) => request.session.destroy((error: unknown) => (error ? fail(asError(error)) : done())))
      response.clearCookie(sessionCookieName(deps), sessionCookieOptions(deps))
      response.status(204).end()
      return answered
    },
  }),
]

/** A new id at sign-in, so that a session planted beforehand is worth nothing. */
function startSession({ request }: PublicContext, member: SignedIn): Promise<void> {
  return new Promise((done, fail) => {
    request.session.regenerate((error: unknown) => {
      if (error) return fail(asError(error))
      request.session.companyId = member.companyId
      request.session.memberId = member.id
      request.session.startedAt = Date.now()
      request.session.save((fault: unknown) => (fault ? fail(asError(fault)) : done()))
    })
  })
}

async function answer({ db }: PublicContext, { companyId, id, name, email, role }: SignedIn): Promise<SessionAnswer> {
  const company = await readCompany(db, companyId)
  if (!company) throw new AppError('unauthenticated', 'Sign in to go on')
  const { version: _version, ...rest } = company
  return { member: { id, name, email, role }, company: rest, can: actionsOf(role) }
}

const asError = (error: unknown) => (error instanceof Error ? error : new Error(String(error)))
