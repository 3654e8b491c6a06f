import { createHash } from 'node:crypto'
import session from 'express-session'
import type { Db } from '../db/client.ts'
import { deleteSession, readSession, touchSession, writeSession } from '../modules/session/sessionRepo.ts'

declare module 'express-session' {
  interface SessionData {
    companyId: string
    memberId: string
    /** When it began, ms since 1970: no session lives past its absolute end. */
    startedAt: number
  }
}

export const idleMs = 12 * 60 * 60 * 1000
export const absoluteMs = 30 * 24 * 60 * 60 * 1000
const touchEveryMs = 60_000

/** The table holds only hashes of session ids: whoever reads it cannot take a session over. */
const hashOf = (id: string) => createHash('sha256').update(id).digest('base64url')

/** Keeps express-session's sessions in MariaDB, so that any process may answer and a restart signs nobody out. */
export class DatabaseSessionStore extends session.Store {
  constructor(private readonly db: Db) {
    super()
  }

  override get(id: string, done: (error: unknown, data?: session.SessionData | null) => void): void {
    void this.loadSession(id).then((data) => done(null, data), done)
  }
  override set(id: string, data: session.SessionData, done?: (error?: unknown) => void): void {
    const now = Date.now()
    const row = {
      idHash: hashOf(id),
      companyId: data.companyId ?? null,
      memberId: data.memberId ?? null,
      data: JSON.stringify(data),
      createdAt: data.startedAt ?? now,
      idleUntil: now + idleMs,
    }
    writeSession(this.db, row).then(() => done?.(), done)
  }
  override destroy(id: string, done?: (error?: unknown) => void): void {
    deleteSession(this.db, hashOf(id)).then(() => done?.(), done)
  }
  override touch(_id: string, _data: session.SessionData, done?: () => void): void {
    done?.()
  }

  private async loadSession(id: string): Promise<session.SessionData | null> {
    const now = Date.now()
    const row = await readSession(this.db, hashOf(id))
    if (!row || row.idleUntil < now || row.createdAt + absoluteMs < now) return null
    if (row.idleUntil - now < idleMs - touchEveryMs) await touchSession(this.db, row.idHash, now + idleMs)
    return JSON.parse(row.data) as session.SessionData
  }
}
