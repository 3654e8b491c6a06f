/** npm passes Ctrl-C on to a process that the terminal has told already: what comes within this time is one wish. */
const sameWishMs = 2000

/**
 * Waits for Ctrl-C, SIGTERM or a closed terminal, then stops everything in order. Asked again later, it ends at once.
 */
export async function untilStopped(
  stop: () => Promise<void>,
  gone: Promise<void>,
  say: (line: string) => void,
): Promise<never> {
  let askedAt: number | undefined
  const signal = new Promise<string>((received) => {
    for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const)
      process.on(name, () => {
        askedAt ??= Date.now()
        if (Date.now() - askedAt > sameWishMs) process.exit(130)
        received(name)
      })
    // A fault nobody caught: what was acknowledged is kept; the database is stopped in order all the same.
    process.once('uncaughtException', (error) => {
      console.error(error)
      received('a fault in the program')
    })
  })
  const reason = await Promise.race([signal, gone.then(() => 'the database: it has stopped by itself')])
  const wanted = reason.startsWith('SIG')
  say(wanted ? 'Stopping' : `Stopping, because of ${reason}`)
  await stop()
  process.exit(wanted ? 0 : 1)
}
