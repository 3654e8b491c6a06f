import { demoSignIns } from '../demo/demoCompany.ts'
import { buildClientIfStale, clientFolder } from './buildClient.ts'
import { serve } from './serve.ts'
import { readSettings } from './settings.ts'
import { untilStopped } from './untilStopped.ts'

const say = (line: string) => console.log(line)

try {
  const settings = readSettings()
  await buildClientIfStale(say)
  const { address, stop, databaseGone } = await serve(settings, { clientFolder, say })
  say(`\nMudring is at ${address}\n\n${demoSignIns()}\n\nStop with Ctrl-C. Data is kept in ${settings.dataFolder}`)
  await untilStopped(stop, databaseGone, say)
} catch (error) {
  console.error(error instanceof Error ? error.message : error)
  if (process.env['LOG_LEVEL'] === 'debug') console.error(error)
  process.exit(1)
}
