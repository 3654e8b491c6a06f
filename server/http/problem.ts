import type { ErrorRequestHandler, Request, Response } from 'express'
import type { ZodError } from 'zod'
import type { Problem } from '../../shared/api/problem.ts'
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
const secondsToWait = 2

/** The one sentence for what does not exist, was deleted, or belongs to another company. */
export const nothingHere = () => new AppError('not_found', 'There is nothing at this address')

/** Answers with problem details (RFC 9457). */
function sendProblem(request: Request, response: Response, problem: Omit<Problem, 'requestId'>): void {
  response
    .status(problem.status)
    .type('application/problem+json')
    .json({ ...problem, requestId: String(request.id) } satisfies Problem)
}

function problemOf(error: AppError): Omit<Problem, 'requestId'> {
  const { errors, ...details } = (error.details ?? {}) as { errors?: Problem['errors'] }
  return {
    type: `/problems/${error.code.replaceAll('_', '-')}`,
    title: titles[error.code],
    status: statusOf[error.code],
    detail: error.message,
    ...(errors ? { errors } : {}),
    ...(Object.keys(details).length ? { details } : {}),
  }
}

function setRetryAfter(response: Response, error: AppError): void {
  const { retryAfterSeconds } = (error.details ?? {}) as { retryAfterSeconds?: number }
  const seconds = retryAfterSeconds ?? (error.code === 'unavailable' ? secondsToWait : undefined)
  if (seconds !== undefined) response.setHeader('Retry-After', String(seconds))
}

/** Turns whatever went wrong into an error the product knows; undefined: it is a fault of ours. */
function knownError(error: unknown): AppError | undefined {
  if (error instanceof AppError) return error
  if (isUnavailable(error))
    return new AppError('unavailable', 'The database does not answer just now. Nothing is lost; try again in a moment')
  const { type, status, expose } = error as { type?: string; status?: number; expose?: boolean }
  if (type === 'entity.too.large')
    return new AppError(
      'too_large',
      `A request carries at most ${bodyLimitBytes / 1024 / 1024} MB. Send it in smaller pieces`,
    )
  if (type === 'entity.parse.failed') return new AppError('invalid', 'The request is not JSON that can be read')
  if (type === 'encoding.unsupported' || type === 'charset.unsupported')
    return new AppError('media_type', 'Send JSON in UTF-8, and not compressed in a way the server does not know')
  // What Express and its parsers refuse carries `expose`; an error of ours that happens to have a status does not.
  if (expose && status === 404) return nothingHere()
  if (expose && status !== undefined && status >= 400 && status < 500)
    return new AppError('invalid', 'The request cannot be read')
  if (error instanceof URIError) return new AppError('invalid', 'The address cannot be read')
  return undefined
}

/** Says where input is not valid: at most ten places, never the input itself. */
export function invalidInput(error: ZodError, where: string): AppError {
  const errors = error.issues
    .slice(0, 10)
    .map(({ path, message }) => ({ where: [where, ...path.map(String)].join('.'), message }))
  const first = errors[0]
  return new AppError('invalid', first ? `${first.message} (${first.where})` : 'That is not valid', { errors })
}

/** The one place where an error becomes an answer. Express knows it by its four parameters. */
export const problemHandler =
  ({ log }: Pick<AppDeps, 'log'>): ErrorRequestHandler =>
  (error: unknown, request, response, _next) => {
    const known = knownError(error)
    const about = { requestId: request.id, method: request.method, path: request.path }
    if (!known) log.error({ err: error, ...about }, 'unexpected error')
    else if (known.code === 'unavailable') log.warn({ err: error, ...about }, 'not available')
    else if (known.code === 'forbidden') log.info({ ...about, reason: known.message }, 'forbidden')
    if (response.headersSent) {
      response.destroy()
      return
    }
    // What was to be a file is now a refusal.
    response.removeHeader('Content-Disposition')
    if (!known) {
      sendProblem(request, response, {
        type: '/problems/internal',
        title: 'Something went wrong',
        status: 500,
        detail: 'Something went wrong on our side. Try again; if it happens again, tell us the number of this request',
      })
      return
    }
    setRetryAfter(response, known)
    sendProblem(request, response, problemOf(known))
  }
