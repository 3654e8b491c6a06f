import { cableTypeFixtures } from '../../fixtures/catalog/cableTypes.ts'
import { deviceModelFixtures } from '../../fixtures/catalog/deviceModels.ts'
import { demoPassphrase } from '../../server/demo/demoCompany.ts'
import { command, freshId } from './jobOnServer.ts'
import type { Agent } from './testApp.ts'

/** What a probe may use: a job of the first company, and one of its owners to make whatever it needs. */
export interface ProbeWorld {
  readonly owner: Agent
  readonly jobId: string
}

/** A request that is right in every respect, so that only who sends it can be wrong. */
export interface Probe {
  readonly path: string
  readonly body?: object
  /** How it is answered for a member who may do it. */
  readonly status: number
  /** How it is answered where what it names does not exist or is another company's; not given: it names nothing. */
  readonly absent?: number
  /** The answer goes on until somebody hangs up. */
  readonly endless?: true
}

type MakeProbe = (world: ProbeWorld) => Probe | Promise<Probe>

const passphrase = 'a ladder in the hall'
const description = Object.values(deviceModelFixtures)[0]!
const cable = () => ({ ...cableTypeFixtures[0]!, code: freshId('X').slice(-16) })

async function made(response: PromiseLike<{ readonly status: number; readonly text: string; readonly body: unknown }>) {
  const { status, text, body } = await response
  if (status !== 200) throw new Error(`The probe could not make what it needs: ${status} ${text}`)
  return body as { readonly id: string; readonly version: number }
}
const addCable = ({ owner }: ProbeWorld) =>
  made(owner.post('/api/catalog/cable-types').send({ id: freshId('cable'), description: cable() }))
const addModel = ({ owner }: ProbeWorld) =>
  made(owner.post('/api/catalog/device-models').send({ id: freshId('model'), description }))
const addMember = ({ owner }: ProbeWorld, id = freshId('member')) =>
  made(
    owner
      .post('/api/members')
      .send({ id, name: 'Wren Alder', email: `${id}@larkhook.example`, role: 'technician', passphrase }),
  )

/** One for each route of the server, by method and path. A route without one fails the test that uses them. */
export const routeProbes: Readonly<Record<string, MakeProbe>> = {
  'post /api/session': () => ({
    path: '/api/session',
    body: { email: 'lead@larkhook.example', passphrase: demoPassphrase },
    status: 200,
  }),
  'get /api/session': () => ({ path: '/api/session', status: 200 }),
  'delete /api/session': () => ({ path: '/api/session', status: 204 }),
  // The same passphrase again: whoever may change theirs keeps it for the next probe.
  'put /api/session/passphrase': () => ({
    path: '/api/session/passphrase',
    body: { current: demoPassphrase, passphrase: demoPassphrase },
    status: 204,
  }),

  'get /api/company': () => ({ path: '/api/company', status: 200 }),
  'patch /api/company': async ({ owner }) => {
    const { version } = await made(owner.get('/api/company'))
    return { path: '/api/company', body: { version }, status: 200 }
  },

  'get /api/members': () => ({ path: '/api/members', status: 200 }),
  'post /api/members': () => {
    const id = freshId('member')
    return {
      path: '/api/members',
      body: { id, name: 'Wren Alder', email: `${id}@probe.example`, role: 'lead', passphrase },
      status: 200,
    }
  },
  'patch /api/members/:memberId': async (world) => ({
    path: `/api/members/${(await addMember(world)).id}`,
    body: { name: 'Wren Ash' },
    status: 200,
    absent: 404,
  }),

  'get /api/catalog': () => ({ path: '/api/catalog', status: 200 }),
  'post /api/catalog/cable-types': () => ({
    path: '/api/catalog/cable-types',
    body: { id: freshId('cable'), description: cable() },
    status: 200,
  }),
  'put /api/catalog/cable-types/:id': async (world) => ({
    path: `/api/catalog/cable-types/${(await addCable(world)).id}`,
    body: { version: 1, description: cable() },
    status: 200,
    absent: 404,
  }),
  // Removing what is gone already is as good as removing it.
  'delete /api/catalog/cable-types/:id': async (world) => ({
    path: `/api/catalog/cable-types/${(await addCable(world)).id}?version=1`,
    status: 204,
    absent: 204,
  }),
  'post /api/catalog/device-models': () => ({
    path: '/api/catalog/device-models',
    body: { id: freshId('model'), description },
    status: 200,
  }),
  'put /api/catalog/device-models/:id': async (world) => ({
    path: `/api/catalog/device-models/${(await addModel(world)).id}`,
    body: { version: 1, description },
    status: 200,
    absent: 404,
  }),
  'delete /api/catalog/device-models/:id': async (world) => ({
    path: `/api/catalog/device-models/${(await addModel(world)).id}?version=1`,
    status: 204,
    absent: 204,
  }),

  'get /api/jobs': () => ({ path: '/api/jobs', status: 200 }),
  'post /api/jobs': () => ({
    path: '/api/jobs',
    body: { id: freshId('job'), name: 'Tern Cottage', client: '', address: '' },
    status: 200,
  }),
  'get /api/jobs/:jobId': ({ jobId }) => ({ path: `/api/jobs/${jobId}`, status: 200, absent: 404 }),
  // A command that anybody may send is answered 200; what it may touch is judged on its change, and tested there.
  'post /api/jobs/:jobId/commands': ({ jobId }) => ({
    path: `/api/jobs/${jobId}/commands`,
    body: { baseVersion: 1, commands: [command({ verb: 'job.update', args: { set: { client: 'Somebody' } } }, 1)] },
    status: 200,
    absent: 404,
  }),
  'get /api/jobs/:jobId/changes': ({ jobId }) => ({
    path: `/api/jobs/${jobId}/changes?since=0`,
    status: 200,
    absent: 404,
  }),
  'get /api/jobs/:jobId/events': ({ jobId }) => ({
    path: `/api/jobs/${jobId}/events`,
    status: 200,
    absent: 404,
    endless: true,
  }),

  'get /api/jobs/:jobId/schedule.xlsx': ({ jobId }) => ({
    path: `/api/jobs/${jobId}/schedule.xlsx`,
    status: 200,
    absent: 404,
  }),
  'post /api/jobs/:jobId/labels.pdf': ({ jobId }) => ({
    path: `/api/jobs/${jobId}/labels.pdf`,
    body: {
      runIds: ['r1'],
      copiesAtRack: 1,
      copiesAtPlate: 1,
      choice: 'letter-30',
      startAt: 1,
      offsetXMm: 0,
      offsetYMm: 0,
    },
    status: 200,
    absent: 404,
  }),
}

/** The same request for something that never was. */
export const forNothing = (probe: Probe, world: ProbeWorld): Probe => ({
  ...probe,
  path: probe.path
    .replace(/(\/(?:members|cable-types|device-models)\/)[^/?]+/, '$1never-was')
    .replace(`/jobs/${world.jobId}`, '/jobs/never-was'),
})
