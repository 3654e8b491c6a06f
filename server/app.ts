import { randomUUID } from 'node:crypto'
import express, { type Express, type RequestHandler } from 'express'
import session from 'express-session'
import pinoHttp from 'pino-http'
import { serveClient } from './http/client.ts'
import type { AppDeps } from './http/deps.ts'
import { redactedPaths } from './http/logger.ts'
import { bodyLimitBytes, nothingHere, problemHandler } from './http/problem.ts'
import { assertOnlyTable, registerRoutes } from './http/registerRoutes.ts'
import type { Route } from './http/routeTable.ts'
import { sameOrigin } from './http/sameOrigin.ts'
import { securityHeaders } from './http/securityHeaders.ts'
import { sessionCookieName, sessionCookieOptions } from './http/sessionCookie.ts'
import { absoluteMs, DatabaseSessionStore } from './http/sessionStore.ts'
import { buildRoutes } from './routes.ts'

/** The whole application, in the order a request meets it. It does not listen; whoever starts it does. */
export function createApp(deps: AppDeps, routes: readonly Route[] = buildRoutes(deps)): Express {
  const app = express()
  app.set('query parser', 'simple')
  app.set('x-powered-by', false)
  if (deps.secure) app.set('trust proxy', 1)
  app.use(requestLog(deps))
  app.use(lastAnswers(deps))
  app.use(securityHeaders(deps))
  app.use('/api', neverCached, sameOrigin, sessions(deps), express.json({ limit: bodyLimitBytes, strict: true }))
  registerRoutes(app, routes, deps)
  app.use('/api', nothing)
  if (deps.clientFolder) serveClient(app, deps.clientFolder)
  app.use(nothing)
  app.use(problemHandler(deps))
  assertOnlyTable(app, routes)
  return app
}

/**
 * While the server stops, each answer is the last on its connection, so that nobody asks on one that is about to close.
 */
const lastAnswers =
  ({ closing }: Pick<AppDeps, 'closing'>): RequestHandler =>
  (_request, response, next) => {
    if (closing.aborted) response.setHeader('Connection', 'close')
    next()
  }

const neverCached: RequestHandler = (_request, response, next) => {
  response.setHeader('Cache-Control', 'no-store')
  next()
}

const nothing: RequestHandler = () => {
  throw nothingHere()
}

/** Every request gets a number; a line for each is written at level info. */
const requestLog = ({ log }: Pick<AppDeps, 'log'>) =>
  pinoHttp({
    logger: log,
    genReqId: () => randomUUID(),
    quietReqLogger: true,
    redact: redactedPaths,
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'warn' : 'info'),
  })

const sessions = (deps: AppDeps) =>
  session({
    name: sessionCookieName(deps),
    secret: deps.sessionSecret,
    store: new DatabaseSessionStore(deps.db),
    resave: false,
    saveUninitialized: false,
    cookie: { ...sessionCookieOptions(deps), maxAge: absoluteMs },
  })
