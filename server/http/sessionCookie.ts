import type { CookieOptions } from 'express'
import type { AppDeps } from './deps.ts'

/** Behind HTTPS the prefix makes browsers refuse the cookie from any other host or path, and over plain HTTP. */
export const sessionCookieName = ({ secure }: Pick<AppDeps, 'secure'>) => (secure ? '__Host-mudring' : 'mudring')

/** How the cookie is set, and cleared: browsers clear one only when told with the same words. */
export const sessionCookieOptions = ({ secure }: Pick<AppDeps, 'secure'>) =>
  ({ httpOnly: true, sameSite: 'lax', secure, path: '/' }) as const satisfies CookieOptions
