import { and, eq, lt, sql } from 'drizzle-orm'
import { members } from '../../db/tables/companies.ts'
import { sessions, signInAttempts } from '../../db/tables/sessions.ts'
import type { Session } from '../../db/client.ts'
import { oncePerDatabase } from '../../db/oncePerDatabase.ts'

type SessionRow = typeof sessions.$inferSelect

const sessionByHash = oncePerDatabase((db) =>
  db.select().from(sessions).where(eq(sessions.idHash, sql.placeholder('idHash'))).prepare(),
)
export async function readSession(db: Session, idHash: string): Promise<SessionRow | undefined> {
  const [row] = await sessionByHash(db).execute({ idHash })
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

/**
 * Who an address belongs to, for signing in: the only query that is not scoped by a company, since it finds the
 * company.
 */
export async function findByEmail(db: Session, email: string) {
  const [row] = await db.select().from(members).where(eq(members.email, email))
  // The column's collation takes é for e, so that nobody can add a look-alike; signing in takes the address as it is
  // written.
  return row?.email === email ? row : undefined
}

export async function writePassphraseHash(
  db: Session,
  companyId: string,
  memberId: string,
  passphraseHash: string,
): Promise<void> {
  await db
    .update(members)
    .set({ passphraseHash })
    .where(and(eq(members.companyId, companyId), eq(members.id, memberId)))
}

const memberById = oncePerDatabase((db) =>
  db
    .select({
      companyId: members.companyId,
      id: members.id,
      name: members.name,
      email: members.email,
      role: members.role,
      disabled: members.disabled,
    })
    .from(members)
    .where(and(eq(members.companyId, sql.placeholder('companyId')), eq(members.id, sql.placeholder('memberId'))))
    .prepare(),
)
/** The member of a session with the company; undefined when disabled or gone. */
export async function readSignedIn(db: Session, companyId: string, memberId: string) {
  const [row] = await memberById(db).execute({ companyId, memberId })
  return row && !row.disabled ? row : undefined
}

/** Attempts of one who tries, known by a hash: the table names nobody. */
export interface AttemptCount {
  readonly attempts: number
  readonly windowEnds: number
}

/**
 * Counts an attempt before it is made and tells how many that makes within the window; one that has ended begins anew.
 * It is one statement, so that of a burst of attempts each gets a number of its own.
 */
export async function takeAttempt(db: Session, subject: string, now: number, windowMs: number): Promise<AttemptCount> {
  // MariaDB assigns from left to right: the count is decided before the window moves.
  const [rows] = (await db.execute(sql`
    insert into sign_in_attempts (subject, attempts, window_ends) values (${subject}, 1, ${now + windowMs})
    on duplicate key update
      attempts = if(window_ends <= ${now}, 1, attempts + 1),
      window_ends = if(window_ends <= ${now}, ${now + windowMs}, window_ends)
    returning attempts, window_ends as windowEnds`)) as unknown as [AttemptCount[]]
  return { attempts: Number(rows[0]!.attempts), windowEnds: Number(rows[0]!.windowEnds) }
}
/** Gives one attempt back: it fitted. */
export async function giveBackAttempt(db: Session, subject: string): Promise<void> {
  await db
    .update(signInAttempts)
    .set({ attempts: sql`greatest(${signInAttempts.attempts} - 1, 0)` })
    .where(eq(signInAttempts.subject, subject))
}
export async function clearAttempts(db: Session, subject: string): Promise<void> {
  await db.delete(signInAttempts).where(eq(signInAttempts.subject, subject))
}
