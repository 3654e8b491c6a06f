import type { RequestHandler } from 'express'
import { AppError } from '../../shared/errors.ts'

/**
 * Refuses what another site's page sends in the name of a person signed in here. Browsers say where a request comes
 * from by Sec-Fetch-Site, and by Origin where they are older; a caller that says neither is no browser.
 */
export const sameOrigin: RequestHandler = (request, _response, next) => {
  if (request.method === 'GET' || request.method === 'HEAD') return next()
  const site = request.get('sec-fetch-site')
  const origin = request.get('origin')
  const fromElsewhere =
    site !== undefined ? site !== 'same-origin' : origin !== undefined && hostOf(origin) !== request.get('host')
  if (fromElsewhere) throw new AppError('forbidden', 'This request came from another site, so it was not done')
  next()
}

function hostOf(origin: string): string | undefined {
  return URL.canParse(origin) ? new URL(origin).host : undefined
}
