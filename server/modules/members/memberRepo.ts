import { and, eq, sql } from 'drizzle-orm'
import type { MemberAnswer } from '../../../shared/api/members.ts'
import type { Session, Tx } from '../../db/client.ts'
import { oncePerDatabase } from '../../db/oncePerDatabase.ts'
import { members } from '../../db/tables/companies.ts'

export type MemberRow = typeof members.$inferSelect
const shown = {
  id: members.id,
  name: members.name,
  email: members.email,
  role: members.role,
  disabled: members.disabled,
}

const membersOfCompany = oncePerDatabase((db) =>
  db.select(shown).from(members).where(eq(members.companyId, sql.placeholder('companyId'))).orderBy(members.name).prepare(),
)
export function listMembers(db: Session, companyId: string): Promise<MemberAnswer[]> {
  return membersOfCompany(db).execute({ companyId })
}
export async function readMember(db: Session, companyId: string, id: string): Promise<MemberAnswer | undefined> {
  const [row] = await db
    .select(shown)
    .from(members)
    .where(and(eq(members.companyId, companyId), eq(members.id, id)))
  return row
}
export async function insertMember(
  db: Session,
  row: Omit<MemberRow, 'disabled' | 'createdAt'> & { createdAt: string },
): Promise<void> {
  await db.insert(members).values(row)
}
export async function updateMember(
  db: Session,
  companyId: string,
  id: string,
  set: Partial<Pick<MemberRow, 'name' | 'role' | 'disabled' | 'passphraseHash'>>,
): Promise<void> {
  if (Object.keys(set).length)
    await db
      .update(members)
      .set(set)
      .where(and(eq(members.companyId, companyId), eq(members.id, id)))
}
/** Takes the turn over the company's owners, so that two of them cannot remove each other at once. */
export function lockOwners(tx: Tx, companyId: string) {
  return tx
    .select({ id: members.id, disabled: members.disabled })
    .from(members)
    .where(and(eq(members.companyId, companyId), eq(members.role, 'owner')))
    .for('update')
}
