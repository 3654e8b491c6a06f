/** Waits for Ctrl-C or SIGTERM, then stops everything in order. A second signal ends the process at once. */
export async function untilStopped(stop: () => Promise<void>, gone: Promise<void>, say: (line: string) => void): Promise<void> {
  const signal = new Promise<string>((received) => {
    for (const name of ['SIGINT', 'SIGTERM'] as const) process.once(name, () => received(name))
  })
  const reason = await Promise.race([signal, gone.then(() => 'the database has stopped')])
  process.once('SIGINT', () => process.exit(130))
  say(reason.startsWith('SIG') ? 'Stopping' : `Stopping, because ${reason}`)
  await stop()
  process.exit(reason.startsWith('SIG') ? 0 : 1)
}
