import { createServer } from 'node:http'
import pino from 'pino'
import { createApp } from '../../server/app.ts'
import { openDatabase } from '../../server/db/client.ts'

// A server of its own process on a database that is ready, to be killed by a test. It says "ready" when it listens.
const { DATABASE_URL, PORT } = process.env
const database = openDatabase(DATABASE_URL!)
const app = createApp({
  db: database.db, log: pino({ level: 'silent' }), sessionSecret: 'a secret of the tests', secure: false, clientFolder: null, bcryptCost: 4, closing: new AbortController().signal,
})
createServer(app).listen(Number(PORT), '127.0.0.1', () => process.stdout.write('ready\n'))
