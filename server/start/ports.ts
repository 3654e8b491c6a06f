import { createServer } from 'node:net'

/** A port of this machine that nobody listens on just now. */
export const freePort = () =>
  new Promise<number>((done, fail) => {
    const server = createServer()
    server.once('error', fail)
    server.listen(0, '127.0.0.1', () => {
      const address = server.address()
      server.close(() =>
        address && typeof address === 'object' ? done(address.port) : fail(new Error('No free port')),
      )
    })
  })

const isFree = (port: number) =>
  new Promise<boolean>((done) => {
    const server = createServer()
    server.once('error', () => done(false))
    server.listen(port, '127.0.0.1', () => server.close(() => done(true)))
  })

/** Throws an Error that says what to do when somebody listens on this port. */
export async function assertPortFree(port: number): Promise<void> {
  if (await isFree(port)) return
  const another = port < 65_535 ? port + 1 : port - 1
  throw new Error(
    `Port ${port} is in use. If Mudring runs there already, open http://127.0.0.1:${port}; ` +
      `otherwise choose another port, for instance PORT=${another} npm start`,
  )
}

/** The port that was used before if it is free, else another. */
export const samePortIfFree = async (port: number | undefined) =>
  port !== undefined && (await isFree(port)) ? port : freePort()
