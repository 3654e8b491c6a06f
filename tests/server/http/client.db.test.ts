import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { expectProblem } from '../../support/problem.ts'
import { startTestApp, type TestApp } from '../../support/testApp.ts'

let test: TestApp
const folder = mkdtempSync(join(tmpdir(), 'mudring-client-'))
beforeAll(async () => {
  mkdirSync(join(folder, 'assets'))
  writeFileSync(join(folder, 'index.html'), '<title>Mudring</title>')
  writeFileSync(join(folder, 'assets/index-1a2b3c.js'), 'export {}')
  writeFileSync(join(folder, 'sw.js'), 'self')
  writeFileSync(join(folder, '.built-from'), 'a digest')
  test = await startTestApp({ clientFolder: folder })
})
afterAll(async () => {
  await test.close()
  rmSync(folder, { recursive: true })
})

describe('the built client', () => {
  it('is kept for ever where the name carries a hash', async () => {
    const response = await request(test.app).get('/assets/index-1a2b3c.js')
    expect([response.status, response.headers['cache-control']]).toEqual([200, 'public, max-age=31536000, immutable'])
    expect(response.headers['content-type']).toContain('javascript')
  })
  it.each(['/', '/jobs', '/jobs/heron-point/riser', '/jobs/a.b/riser', '/index.html'])(
    'has its page at %s, asked for anew each time',
    async (path) => {
      const response = await request(test.app).get(path)
      expect([response.status, response.text, response.headers['cache-control']]).toEqual([
        200,
        '<title>Mudring</title>',
        'no-cache',
      ])
      expect(response.headers['content-security-policy']).toContain("script-src 'self'")
    },
  )
  it('has its other files asked for anew each time', async () => {
    expect((await request(test.app).get('/sw.js')).headers['cache-control']).toBe('no-cache')
  })
  it.each(['/assets/index-gone.js', '/assets/', '/favicon.ico', '/.built-from', '/..%2f..%2fpackage.json'])(
    'does not answer %s with a page',
    async (path) => {
      const response = await request(test.app).get(path)
      expect(response.text).not.toContain('<title>')
      expect([400, 403, 404]).toContain(response.status)
      expectProblem(response, response.status)
    },
  )
  it('does not stand in for the API', async () => {
    expectProblem(await request(test.app).get('/api/nothing'), 404)
    expectProblem(await request(test.app).post('/jobs').send({}), 404)
  })
})
