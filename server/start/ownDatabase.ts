import { holdDataFolder } from './dataFolder.ts'
import { ensureInstalled } from './installed.ts'
import { startMariadb } from './mariadb.ts'
import type { DatabaseUrls, Settings } from './settings.ts'

export interface DatabaseHere extends DatabaseUrls {
  readonly stop: () => Promise<void>
  /** Resolves when the server has stopped without being asked to. */
  readonly gone: Promise<void>
}

/**
 * The database of the settings: one that exists, or a server of our own on the data folder, which nobody else may hold.
 */
export async function databaseOf(settings: Settings, say: (line: string) => void): Promise<DatabaseHere> {
  if (settings.database)
    return { ...settings.database, stop: async () => undefined, gone: new Promise(() => undefined) }
  ensureInstalled([{ package: 'mariadb-server', program: 'mariadbd' }], say)
  const letGo = holdDataFolder(settings.dataFolder)
  try {
    const { url, migrationUrl, process: child, stop } = await startMariadb(settings.dataFolder)
    let asked = false
    return {
      url,
      migrationUrl,
      gone: new Promise<void>((gone) => child.once('exit', () => asked || gone())),
      stop: async () => {
        asked = true
        await stop()
        letGo()
      },
    }
  } catch (error) {
    letGo()
    throw error
  }
}
