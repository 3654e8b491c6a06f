import { failStart } from './failStart.ts'
import { serve } from './serve.ts'
import { readSettings } from './settings.ts'
import { untilStopped } from './untilStopped.ts'

/** The server without the client: what npm run dev restarts, with the client's own server in front of it. */
const say = (line: string) => console.log(line)
try {
  const { address, stop, databaseGone } = await serve(readSettings(), { clientFolder: null, say })
  say(`The API is at ${address}`)
  await untilStopped(stop, databaseGone, () => undefined)
} catch (error) {
  failStart(error)
}
