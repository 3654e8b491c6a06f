import { serve } from './serve.ts'
import { readSettings } from './settings.ts'
import { untilStopped } from './untilStopped.ts'

/** The server alone, on a database that exists: what npm run dev restarts. */
const say = (line: string) => console.log(line)
const { stop, databaseGone } = await serve(readSettings(), { clientFolder: null, say })
await untilStopped(stop, databaseGone, () => undefined)
