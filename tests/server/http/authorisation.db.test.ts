import request, { type Response } from 'supertest'
import { sql } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { IncomingMessage } from 'node:http'
import { createApp } from '../../../server/app.ts'
import { openDatabase, type Database } from '../../../server/db/client.ts'
import type { Route } from '../../../server/http/routeTable.ts'
import { demoPassphrase } from '../../../server/demo/demoCompany.ts'
import { buildRoutes } from '../../../server/routes.ts'
import { can, roles, type Action } from '../../../shared/policy.ts'
import { expectProblem, withoutId } from '../../support/problem.ts'
import { signInAt, startJob } from '../../support/jobOnServer.ts'
import { forNothing, routeProbes, type Probe, type ProbeWorld } from '../../support/routeProbes.ts'
import { unscoped } from '../../support/statements.ts'
import { startTestApp, type Agent, type TestApp } from '../../support/testApp.ts'

let test: TestApp
let database: Database
let world: ProbeWorld
let app: ReturnType<typeof createApp>
let routes: readonly Route[]
const statements: string[] = []
const canary = 'Heron Point'

beforeAll(async () => {
  test = await startTestApp()
  database = openDatabase(test.url, 10, (statement) => statements.push(statement))
  const deps = { ...test.deps, db: database.db }
  routes = buildRoutes(deps)
  app = createApp(deps, routes)
  const first = await signInAt(app, 'owner@larkhook.example')
  const maker = {
    id: 'maker',
    name: 'Merle Oak',
    email: 'maker@larkhook.example',
    role: 'owner',
    passphrase: demoPassphrase,
  }
  await first.post('/api/members').send(maker)
  // Whoever makes things is none of those who try things: trying ends sessions.
  const owner = await signInAt(app, maker.email)
  world = { owner, jobId: await startJob(owner) }
})
afterAll(async () => {
  await database.close()
  await test.close()
})

const table = () => routes.map((route) => [`${route.method} ${route.path}`, route] as const)
const guarded = () => table().filter(([, route]) => route.action !== 'public')

function send(
  agent: Agent | ReturnType<typeof request>,
  route: Route,
  { path, body, endless }: Probe,
): Promise<Response> {
  const sent = agent[route.method](path)
  if (body) void sent.send(body)
  if (!endless) return Promise.resolve(sent)
  // Hangs up at the first word of an answer that would go on; a refusal is read to its end.
  return new Promise((done, fail) => {
    sent
      .buffer(true)
      .parse((response, parsed) => {
        let text = ''
        response.setEncoding('utf8')
        response.on('data', (part: string) => {
          text += part
          if (response.headers['content-type']?.includes('event-stream'))
            (response as unknown as IncomingMessage).destroy()
        })
        response.on('close', () => parsed(null, text.startsWith('{') ? JSON.parse(text) : text))
      })
      .then(done, fail)
  })
}

describe('every route', () => {
  it('has a request here that is right in every respect, and nothing else has', () => {
    expect(Object.keys(routeProbes).sort()).toEqual(
      table()
        .map(([name]) => name)
        .sort(),
    )
  })

  it('answers nobody with 401, unless it is for anybody', async () => {
    for (const [name, route] of table()) {
      const probe = await routeProbes[name]!(world)
      const response = await send(request(app), route, probe)
      if (route.action === 'public') expect(response.status, name).toBe(probe.status)
      else expectProblem(response, 401)
    }
  })

  it.each(roles)('answers a %s as the policy says, exactly', async (role) => {
    const agent = await signInAt(app, `${role}@larkhook.example`)
    const refused: string[] = []
    for (const [name, route] of guarded()) {
      const probe = await routeProbes[name]!(world)
      const response = await send(agent, route, probe)
      if (can(role, route.action as Action))
        expect(response.status, `${role} ${name}: ${response.text}`).toBe(probe.status)
      else {
        refused.push(name)
        expect(expectProblem(response, 403).details).toEqual({ action: route.action })
      }
    }
    expect(refused).toEqual(
      guarded()
        .filter(([, route]) => !can(role, route.action as Action))
        .map(([name]) => name),
    )
  })

  it('answers a member of another company as if there were nothing, whatever their role', async () => {
    for (const email of ['owner@quoinbatten.example', 'designer@quoinbatten.example'] as const) {
      const stranger = await signInAt(app, email)
      const role = email.startsWith('owner') ? 'owner' : 'designer'
      for (const [name, route] of guarded()) {
        if (!can(role, route.action as Action)) continue
        const probe = await routeProbes[name]!(world)
        const theirs = await send(stranger, route, probe)
        expect(theirs.text ?? '', `${email} ${name}`).not.toContain(canary)
        expect(theirs.text ?? '', `${email} ${name}`).not.toMatch(/larkhook/i)
        if (probe.absent === undefined) continue
        const nothing = await send(stranger, route, forNothing(probe, world))
        expect([theirs.status, nothing.status], `${email} ${name}`).toEqual([probe.absent, probe.absent])
        if (probe.absent >= 400)
          expect(withoutId(expectProblem(theirs, 404)), name).toEqual(withoutId(expectProblem(nothing, 404)))
      }
    }
  })

  it('left what is the first company’s as it was, whoever asked from the second', async () => {
    const entry = await routeProbes['delete /api/catalog/cable-types/:id']!(world)
    const stranger = await signInAt(app, 'owner@quoinbatten.example')
    await stranger.delete(entry.path)
    const id = entry.path.split('/').at(-1)!.split('?')[0]!
    const { cableTypes } = (await world.owner.get('/api/catalog')).body as { cableTypes: { id: string }[] }
    expect(cableTypes.map((each) => each.id)).toContain(id)
  })

  it('names the company in every statement on a company’s table', async () => {
    const [rows] = (await database.db.execute(
      sql`select distinct table_name as name from information_schema.columns
        where table_schema = database() and column_name = 'company_id'`,
    )) as unknown as [{ name: string }[]]
    // A session is found by the hash of its id, before it is known whose it is.
    const companyTables = new Set(rows.map((row) => row.name).filter((name) => name !== 'sessions'))
    expect(companyTables.size).toBeGreaterThan(10)
    expect(statements.length).toBeGreaterThan(200)
    expect([...new Set(unscoped(statements, companyTables))]).toEqual([])
  })
})

describe('the check on statements', () => {
  it('sees one that forgets the company', () => {
    const tables = new Set(['jobs', 'members'])
    const forgetful = [
      'select `company_id`, `name` from `jobs` where `jobs`.`id` = ?',
      'update `jobs` set `name` = ?',
      'delete from `members` where `members`.`id` = ?',
      'insert into `jobs` (`id`) values (?)',
    ]
    expect(
      unscoped(
        [...forgetful, 'select `id` from `jobs` where `jobs`.`company_id` = ?', 'select 1 from `sessions`'],
        tables,
      ),
    ).toEqual(forgetful)
  })
})
