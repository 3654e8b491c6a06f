import { randomUUID } from 'node:crypto'
import { join } from 'node:path'
import express, { type Express } from 'express'
import session from 'express-session'
import helmet from 'helmet'
import pinoHttp from 'pino-http'
import { AppError } from '../shared/errors.ts'
import type { AppDeps } from './http/deps.ts'
import { bodyLimitBytes, problemHandler } from './http/problem.ts'
import { registerRoutes } from './http/registerRoutes.ts'
import type { Route } from './http/routeTable.ts'
import { sameOrigin } from './http/sameOrigin.ts'
import { absoluteMs, DatabaseSessionStore } from './http/sessionStore.ts'
import { buildRoutes } from './routes.ts'

/** The whole application, in the order a request meets it. It does not listen; whoever starts it does. */
export function createApp(deps: AppDeps, routes: readonly Route[] = buildRoutes(deps)): Express {
  const app = express()
  app.set('query parser', 'simple')
  app.set('x-powered-by', false)
  if (deps.secure) app.set('trust proxy', 1)
  app.use(pinoHttp({ logger: deps.log, genReqId: () => randomUUID(), quietReqLogger: true, autoLogging: false, redact: ['req.headers.cookie', 'res.headers["set-cookie"]'] }))
  app.use(securityHeaders(deps.secure))
  app.use('/api', (_request, response, next) => {
    response.setHeader('Cache-Control', 'no-store')
    next()
  })
  app.use('/api', sameOrigin)
  app.use('/api', sessionMiddleware(deps))
  app.use('/api', express.json({ limit: bodyLimitBytes, strict: true }))
  registerRoutes(app, routes, deps)
  app.use('/api', () => {
    throw new AppError('not_found', 'There is nothing at this address')
  })
  if (deps.clientFolder) serveClient(app, deps.clientFolder)
  app.use(problemHandler(deps))
  return app
}

function securityHeaders(secure: boolean) {
  return helmet({
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
}

function sessionMiddleware(deps: AppDeps) {
  return session({
    name: deps.secure ? '__Host-mudring' : 'mudring',
    secret: deps.sessionSecret,
    store: new DatabaseSessionStore(deps.db),
    resave: false,
    saveUninitialized: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure: deps.secure, path: '/', maxAge: absoluteMs },
  })
}

/** Built files carry their hash in the name and never change; the page itself is asked for anew each time. */
function serveClient(app: Express, folder: string) {
  app.use('/assets', express.static(join(folder, 'assets'), { immutable: true, maxAge: '365d', fallthrough: false }))
  app.use(express.static(folder, { index: false, maxAge: 0 }))
  app.get('/{*path}', (_request, response) => {
    response.setHeader('Cache-Control', 'no-cache')
    response.sendFile(join(folder, 'index.html'))
  })
}
