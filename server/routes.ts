import type { Route } from './http/routeTable.ts'
import { companyRoutes } from './modules/company/routes.ts'
import { memberRoutes } from './modules/members/routes.ts'
import { sessionRoutes } from './modules/session/routes.ts'

/** Every route of the server. */
export const allRoutes: readonly Route[] = [...sessionRoutes, ...companyRoutes, ...memberRoutes]
