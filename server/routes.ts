import type { AppDeps } from './http/deps.ts'
import type { Route } from './http/routeTable.ts'
import { catalogRoutes } from './modules/catalog/catalogRoutes.ts'
import { companyRoutes } from './modules/company/routes.ts'
import { exportRoutes } from './modules/exports/exportRoutes.ts'
import { jobRoutes } from './modules/jobs/jobRoutes.ts'
import { createJobsContext } from './modules/jobs/jobsContext.ts'
import { memberRoutes } from './modules/members/routes.ts'
import { sessionRoutes } from './modules/session/routes.ts'

/** Every route of the server. */
export function buildRoutes(deps: AppDeps): readonly Route[] {
  const jobs = createJobsContext(deps)
  return [
    ...sessionRoutes,
    ...companyRoutes,
    ...memberRoutes,
    ...catalogRoutes,
    ...jobRoutes(jobs),
    ...exportRoutes(jobs),
  ]
}
