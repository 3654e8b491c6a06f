import { join } from 'node:path'
import express, { type Express, type RequestHandler } from 'express'

const reads = new Set(['GET', 'HEAD'])
const isFile = /\.[^/]*$|^\/assets\//

/**
 * Serves the built client. Files under assets carry their hash in the name and never change; the rest is asked for
 * anew each time. Any other address is a page of the client, so it gets index.html; an address with a dot in its last
 * part is a file, and one that is not there is not answered with a page in its place.
 */
export function serveClient(app: Express, folder: string): void {
  const page: RequestHandler = (request, response, next) => {
    if (!reads.has(request.method) || isFile.test(request.path)) return next()
    response.setHeader('Cache-Control', 'no-cache')
    response.sendFile(join(folder, 'index.html'))
  }
  app.use('/assets', express.static(join(folder, 'assets'), { immutable: true, maxAge: '365d', index: false }))
  app.use(
    express.static(folder, { index: false, setHeaders: (response) => response.setHeader('Cache-Control', 'no-cache') }),
  )
  app.use(page)
}
