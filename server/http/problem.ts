import type { ErrorRequestHandler, Request, Response } from 'express'
import { ZodError } from 'zod'
import { AppError, type ErrorCode } from '../../shared/errors.ts'
import { isUnavailable } from '../db/errors.ts'
import type { AppDeps } from './deps.ts'

const statusOf: Record<ErrorCode, number> = {
  invalid: 400,
  unauthenticated: 401,
  forbidden: 403,
  not_found: 404,
  conflict: 409,
  media_type: 415,
  too_large: 413,
  refused: 422,
  command_id_reused: 422,
  too_many: 429,
  unavailable: 503,
}

const titles: Record<ErrorCode, string> = {
  invalid: 'That is not valid',
  unauthenticated: 'Sign in first',
  forbidden: 'That is not yours to do',
  not_found: 'There is nothing here',
  conflict: 'Somebody else was quicker',
  media_type: 'That kind of content is not taken',
  too_large: 'That is too large',
  refused: 'That cannot be done',
  command_id_reused: 'That command was sent before with other content',
  too_many: 'Too many attempts',
  unavailable: 'Not available just now',
}

export const bodyLimitBytes = 1024 * 1024

/** Answers with problem details (RFC 9457). */
export function sendProblem(request: Request, response: Response, error: AppError): void {
  if (response.headersSent) {
    response.destroy()
    return
  }
  const status = statusOf[error.code]
  const retryAfter = (error.details as { retryAfterSeconds?: number } | undefined)?.retryAfterSeconds
  if (retryAfter !== undefined) response.setHeader('Retry-After', String(retryAfter))
  else if (error.code === 'unavailable') response.setHeader('Retry-After', '2')
  response
    .status(status)
    .type('application/problem+json')
    .json({ type: `/problems/${error.code.replaceAll('_', '-')}`, title: titles[error.code], status, detail: error.message, requestId: request.id, details: error.details })
}

/** Turns whatever went wrong into an error the product knows; undefined: it is a fault of ours. */
export function knownError(error: unknown): AppError | undefined {
  if (error instanceof AppError) return error
  if (error instanceof ZodError) return invalidInput(error, 'body')
  if (isUnavailable(error)) return new AppError('unavailable', 'The database does not answer just now. Nothing is lost; try again in a moment')
  const { type, status } = error as { type?: string; status?: number }
  if (type === 'entity.too.large') return new AppError('too_large', `A request carries at most ${bodyLimitBytes / 1024 / 1024} MB. Send it in smaller pieces`)
  if (type === 'entity.parse.failed') return new AppError('invalid', 'The request is not JSON that can be read')
  if (type === 'encoding.unsupported' || type === 'charset.unsupported') return new AppError('media_type', 'Send JSON in UTF-8')
  if (status === 400) return new AppError('invalid', 'The request cannot be read')
  return undefined
}

/** Says where input is not valid: at most ten places, never the input itself. */
export function invalidInput(error: ZodError, where: string): AppError {
  const errors = error.issues.slice(0, 10).map(({ path, message }) => ({ where: [where, ...path.map(String)].join('.'), message }))
  const first = errors[0]
  return new AppError('invalid', first ? `${first.message} (${first.where})` : 'That is not valid', { errors })
}

/** The one place where an error becomes an answer. Express knows it by its four parameters. */
export const problemHandler =
  ({ log }: Pick<AppDeps, 'log'>): ErrorRequestHandler =>
  (error, request, response, _next) => {
    const known = knownError(error)
    if (known) return sendProblem(request, response, known)
    log.error({ err: error, requestId: request.id, method: request.method, path: request.path }, 'unexpected error')
    if (response.headersSent) {
      response.destroy()
      return
    }
    response
      .status(500)
      .type('application/problem+json')
      .json({ type: '/problems/internal', title: 'Something went wrong', status: 500, detail: 'Something went wrong on our side. Nothing was half done; try again', requestId: request.id })
  }
