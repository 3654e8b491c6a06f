import helmet from 'helmet'
import type { AppDeps } from './deps.ts'

/** What a page of ours may load and who may frame it. */
export const securityHeaders = ({ secure }: Pick<AppDeps, 'secure'>) =>
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        'default-src': ["'none'"],
        'script-src': ["'self'"],
        // Naive UI writes its styles into the page, so inline styles cannot be refused.
        'style-src': ["'self'", "'unsafe-inline'"],
        'img-src': ["'self'", 'data:', 'blob:'],
        'font-src': ["'self'", 'data:'],
        'connect-src': ["'self'"],
        'worker-src': ["'self'", 'blob:'],
        'manifest-src': ["'self'"],
        // A PDF that the page made is shown in a frame of its own.
        'object-src': ["'self'", 'blob:'],
        'frame-src': ["'self'", 'blob:'],
        'base-uri': ["'none'"],
        'form-action': ["'self'"],
        'frame-ancestors': ["'none'"],
      },
    },
    strictTransportSecurity: secure ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    referrerPolicy: { policy: 'no-referrer' },
  })
