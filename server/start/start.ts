import { demoSignIns } from '../demo/demoCompany.ts'
import { buildClientIfStale, clientFolder } from './buildClient.ts'
import { failStart } from './failStart.ts'
import { assertPortFree } from './ports.ts'
import { serve } from './serve.ts'
import { readSettings } from './settings.ts'
import { untilStopped } from './untilStopped.ts'

const say = (line: string) => console.log(line)

try {
  const settings = readSettings()
  await assertPortFree(settings.port)
  await buildClientIfStale(say)
  const { address, stop, databaseGone } = await serve(settings, { clientFolder, say })
  const kept = settings.database ? 'the database of DATABASE_URL' : settings.dataFolder
  say(`\nMudring is at ${address}\n\n${demoSignIns()}\n\nStop with Ctrl-C. Data is kept in ${kept}`)
  await untilStopped(stop, databaseGone, say)
} catch (error) {
  failStart(error)
}
