import { and, eq, lt, sql } from 'drizzle-orm'
import { members } from '../../db/tables/companies.ts'
import { sessions, signInAttempts } from '../../db/tables/sessions.ts'
import type { Session } from '../../db/client.ts'

type SessionRow = typeof sessions.$inferSelect

export async function readSession(db: Session, idHash: string): Promise<SessionRow | undefined> {
  const [row] = await db.select().from(sessions).where(eq(sessions.idHash, idHash))
  return row
}
export async function writeSession(db: Session, row: SessionRow): Promise<void> {
  const { idHash: _idHash, createdAt: _createdAt, ...set } = row
  await db.insert(sessions).values(row).onDuplicateKeyUpdate({ set })
}
export async function touchSession(db: Session, idHash: string, idleUntil: number): Promise<void> {
  await db.update(sessions).set({ idleUntil }).where(eq(sessions.idHash, idHash))
}
export async function deleteSession(db: Session, idHash: string): Promise<void> {
  await db.delete(sessions).where(eq(sessions.idHash, idHash))
}
export async function deleteSessionsOf(db: Session, companyId: string, memberId: string): Promise<void> {
  await db.delete(sessions).where(and(eq(sessions.companyId, companyId), eq(sessions.memberId, memberId)))
}
/** Sweeps away what has ended; called when somebody signs in, so that no timer is needed. */
export async function deleteEndedSessions(db: Session, now: number): Promise<void> {
  await db.delete(sessions).where(lt(sessions.idleUntil, now))
  await db.delete(signInAttempts).where(lt(signInAttempts.windowEnds, now))
}

/** Who an address belongs to, for signing in: the only query that is not scoped by a company, since it finds the company. */
export async function findByEmail(db: Session, email: string) {
  const [row] = await db.select().from(members).where(eq(members.email, email))
  return row
}

/** The member of a session with the company; undefined when disabled or gone. */
export async function readSignedIn(db: Session, companyId: string, memberId: string) {
  const [row] = await db
    .select({ companyId: members.companyId, id: members.id, name: members.name, email: members.email, role: members.role, disabled: members.disabled })
    .from(members)
    .where(and(eq(members.companyId, companyId), eq(members.id, memberId)))
  return row && !row.disabled ? row : undefined
}


/** Failures of these subjects within their windows that have not ended. */
export async function readFailures(db: Session, subject: string, now: number): Promise<{ failures: number; windowEnds: number }> {
  const [row] = await db.select().from(signInAttempts).where(eq(signInAttempts.subject, subject))
  return row && row.windowEnds > now ? row : { failures: 0, windowEnds: 0 }
}
/** Counts one failure; a window that has ended begins anew. One statement, so that two failures at once count two. */
export async function countFailure(db: Session, subject: string, now: number, windowMs: number): Promise<void> {
  await db
    .insert(signInAttempts)
    .values({ subject, failures: 1, windowEnds: now + windowMs })
    .onDuplicateKeyUpdate({ set: { failures: sql`if(${signInAttempts.windowEnds} <= ${now}, 1, ${signInAttempts.failures} + 1)`, windowEnds: sql`if(${signInAttempts.windowEnds} <= ${now}, ${now + windowMs}, ${signInAttempts.windowEnds})` } })
}
export async function clearFailures(db: Session, subject: string): Promise<void> {
  await db.delete(signInAttempts).where(eq(signInAttempts.subject, subject))
}
