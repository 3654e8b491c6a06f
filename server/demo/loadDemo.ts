import type { Role } from '../../shared/policy.ts'
import { cableTypeFixtures } from '../../fixtures/catalog/cableTypes.ts'
import { deviceModelFixtures } from '../../fixtures/catalog/deviceModels.ts'
import { jobFixtures } from '../../fixtures/jobs/allJobs.ts'
import { inTransaction } from '../db/transaction.ts'
import type { AppDeps } from '../http/deps.ts'
import { seedCatalog } from '../modules/catalog/seedCatalog.ts'
import { countCompanies, insertCompany } from '../modules/company/companyRepo.ts'
import { createJobsContext } from '../modules/jobs/jobsContext.ts'
import { insertMember } from '../modules/members/memberRepo.ts'
import { hashPassphrase } from '../modules/session/passphrase.ts'
import { demoCompanies, demoPassphrase } from './demoCompany.ts'
import { playJob } from './playJob.ts'

/** Loads the demo companies into an empty database; one that holds anything is left as it is. */
export async function loadDemo(deps: AppDeps, say: (line: string) => void): Promise<void> {
  if ((await countCompanies(deps.db)) > 0) return
  say('Loading the demo company')
  // All of it or nothing: a start that is broken off half-way begins anew the next time.
  await inTransaction(deps.db, async (tx) => {
    await insertDemoCompanies({ ...deps, db: tx })
    await playDemoJobs({ ...deps, db: tx })
  })
}

/** The first company's jobs, told as the commands of its members. */
export async function playDemoJobs(deps: AppDeps): Promise<void> {
  const [company] = demoCompanies
  const context = createJobsContext(deps)
  const memberOf = (role: Role) => company!.members.find((member) => member.role === role)!.id
  for (const write of jobFixtures) await playJob(context, company!.id, memberOf, write())
}

/** The companies, their members and their catalogues, without jobs. */
export async function insertDemoCompanies(deps: Pick<AppDeps, 'db' | 'bcryptCost'>): Promise<void> {
  const passphraseHash = await hashPassphrase(demoPassphrase, deps.bcryptCost)
  await inTransaction(deps.db, async (tx) => {
    for (const { id, name, rules, members } of demoCompanies) {
      await insertCompany(tx, { id, name, ...rules })
      await seedCatalog(tx, id, { cableTypes: cableTypeFixtures, deviceModels: deviceModelFixtures })
      for (const member of members) await insertMember(tx, { ...member, companyId: id, passphraseHash, createdAt: '2026-01-05 08:00:00.000' })
    }
  })
}
