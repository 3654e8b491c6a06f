import type { Logger } from 'pino'
import type { Db } from '../db/client.ts'

/** What the application is given by whoever starts it. It keeps no state of its own between requests. */
export interface AppDeps {
  readonly db: Db
  readonly log: Logger
  readonly sessionSecret: string
  /** Behind HTTPS: cookies are then marked so. */
  readonly secure: boolean
  /** The built client; null: the API alone. */
  readonly clientFolder: string | null
  /** Work factor for new passphrases. */
  readonly bcryptCost: number
  /** Set off when the server stops: open streams end. */
  readonly closing: AbortSignal
}
