import type { Express, RequestHandler } from 'express'
import { AppError } from '../../shared/errors.ts'
import { actions, can } from '../../shared/policy.ts'
import { readSignedIn } from '../modules/session/sessionRepo.ts'
import type { AppDeps } from './deps.ts'
import { absoluteMs } from './sessionStore.ts'
import { invalidInput } from './problem.ts'
import { answered, type Route, type SignedIn } from './routeTable.ts'

const nameOf = ({ method, path }: Pick<Route, 'method' | 'path'>) => `${method} ${path}`

/** Puts the whole route table into the application, and refuses to start with a route that is not fully described. */
export function registerRoutes(app: Express, routes: readonly Route[], deps: AppDeps): void {
  const seen = new Set<string>()
  for (const route of routes) {
    const name = nameOf(route)
    if (seen.has(name)) throw new Error(`Two routes are ${name}`)
    seen.add(name)
    if (route.action !== 'public' && !actions.includes(route.action))
      throw new Error(`${name} has no action of the policy`)
    for (const part of ['params', 'query', 'body'] as const)
      if (typeof route[part]?.safeParse !== 'function') throw new Error(`${name} has no schema for its ${part}`)
    app[route.method](route.path, handlerOf(route, deps))
  }
}

/**
 * What Express keeps of one entry of its stack: a route, or a middleware that may be a router with a stack of its own.
 */
interface Layer {
  readonly name: string
  readonly route?: { readonly path: unknown; readonly methods: Readonly<Record<string, boolean>> }
  readonly handle: { readonly stack?: readonly Layer[] }
}

/** Refuses to start when the application answers at an address that is not in the route table, however it got there. */
export function assertOnlyTable(app: Express, routes: readonly Route[]): void {
  const table = new Set(routes.map(nameOf))
  const found: string[] = []
  for (const { name, route, handle } of app.router.stack as unknown as readonly Layer[]) {
    if (handle.stack) throw new Error(`A router (${name}) is mounted beside the route table`)
    if (route) found.push(...Object.keys(route.methods).map((method) => `${method} ${String(route.path)}`))
  }
  const stray = found.find((name) => !table.has(name))
  if (stray !== undefined) throw new Error(`${stray} is not in the route table`)
  if (found.length !== table.size)
    throw new Error(`The route table has ${table.size} routes, the application ${found.length}`)
}

function handlerOf(route: Route, deps: AppDeps): RequestHandler {
  return async (request, response) => {
    const member = route.action === 'public' ? undefined : await whoAsks(request, deps)
    if (member && route.action !== 'public' && !can(member.role, route.action))
      throw new AppError('forbidden', `A ${member.role} may not do this. Ask the owner of the company`, {
        action: route.action,
      })
    if (request.method !== 'GET' && hasBody(request) && !request.is('application/json'))
      throw new AppError('media_type', 'Send JSON')
    const input = {
      params: parse(route.params, request.params, 'address'),
      query: parse(route.query, request.query, 'query'),
      body: parse(route.body, request.body ?? {}, 'body'),
    }
    const context = { db: deps.db, deps, request, response, ...(member ? { member } : {}) }
    const result = await route.handle(context, input)
    if (result === answered) return
    if (result === undefined) response.status(204).end()
    else response.json(route.response ? route.response.parse(result) : result)
  }
}

const hasBody = (request: Parameters<RequestHandler>[0]) =>
  Number(request.headers['content-length'] ?? 0) > 0 || request.headers['transfer-encoding'] !== undefined

function parse(schema: Route['body'], value: unknown, where: string): unknown {
  const parsed = schema.safeParse(value)
  if (!parsed.success) throw invalidInput(parsed.error, where)
  return parsed.data
}

/** The member of this session as the database knows them now. Throws AppError unauthenticated. */
export async function whoAsks(request: Parameters<RequestHandler>[0], deps: AppDeps): Promise<SignedIn> {
  const { companyId, memberId, startedAt } = request.session
  if (!companyId || !memberId || !startedAt || startedAt + absoluteMs < Date.now()) throw signInFirst()
  const member = await readSignedIn(deps.db, companyId, memberId)
  if (!member) throw signInFirst()
  return member
}

const signInFirst = () => new AppError('unauthenticated', 'Sign in to go on. What you have done is kept')
