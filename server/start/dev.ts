import { spawn } from 'node:child_process'
import { join } from 'node:path'
import { demoSignIns } from '../demo/demoCompany.ts'
import { failStart } from './failStart.ts'
import { databaseOf } from './ownDatabase.ts'
import { assertPortFree, freePort } from './ports.ts'
import { projectFolder, readSettings } from './settings.ts'
import { untilStopped } from './untilStopped.ts'

const say = (line: string) => console.log(line)

/** Database once, the server again whenever its code changes, the client with hot reload in front of it. */
try {
  const settings = readSettings()
  await assertPortFree(settings.port)
  const database = await databaseOf(settings, say)
  const apiPort = await freePort()
  const api = spawn(process.execPath, [join(projectFolder, 'node_modules/tsx/dist/cli.mjs'), 'watch', '--clear-screen=false', 'server/start/api.ts'], {
    cwd: projectFolder,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, PORT: String(apiPort), MUDRING_DATA: settings.dataFolder, DATABASE_URL: database.url, DATABASE_MIGRATION_URL: database.migrationUrl },
  })
  process.env['MUDRING_API'] = `http://127.0.0.1:${apiPort}`
  const { createServer } = await import('vite')
  const client = await createServer({ root: projectFolder, configFile: join(projectFolder, 'vite.config.ts'), server: { port: settings.port, strictPort: true, host: '127.0.0.1' } })
  await client.listen()
  say(`\nMudring, with hot reload, is at http://127.0.0.1:${settings.port}\n\n${demoSignIns()}`)
  const stop = async () => {
    await client.close()
    const gone = new Promise<void>((done) => api.once('exit', () => done()))
    if (api.exitCode === null && api.signalCode === null) {
      api.kill('SIGTERM')
      await gone
    }
    await database.stop()
  }
  await untilStopped(stop, database.gone, say)
} catch (error) {
  failStart(error)
}
