import { and, eq, sql } from 'drizzle-orm'
import type { CompanyAnswer } from '../../../shared/api/company.ts'
import { limitsSchema } from '../../../shared/model/limits.ts'
import type { Session } from '../../db/client.ts'
import { companies } from '../../db/tables/companies.ts'

export async function readCompany(db: Session, companyId: string): Promise<CompanyAnswer | undefined> {
  const [row] = await db.select().from(companies).where(eq(companies.id, companyId))
  // A limit that was added since the row was written gets its default here.
  return row && { ...row, limits: limitsSchema.parse(row.limits) }
}

/** Writes what changed if nobody was quicker; false: somebody was. */
export async function writeCompany(
  db: Session,
  companyId: string,
  version: number,
  set: Partial<Omit<CompanyAnswer, 'id' | 'version'>>,
): Promise<boolean> {
  const [result] = await db
    .update(companies)
    .set({ ...set, version: sql`${companies.version} + 1` })
    .where(and(eq(companies.id, companyId), eq(companies.version, version)))
  return result.affectedRows === 1
}

export async function insertCompany(db: Session, company: Omit<CompanyAnswer, 'version'>): Promise<void> {
  await db.insert(companies).values(company)
}

export async function countCompanies(db: Session): Promise<number> {
  const [row] = await db.select({ count: sql<number>`count(*)` }).from(companies)
  return Number(row?.count ?? 0)
}
