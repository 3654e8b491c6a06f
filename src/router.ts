import { createRouter, createWebHistory } from 'vue-router'
import { catalogRoutes } from './features/catalog/routes.ts'
import { checksRoutes } from './features/checks/routes.ts'
import { companyRoutes } from './features/company/routes.ts'
import { fieldRoutes } from './features/field/routes.ts'
import { jobsRoutes } from './features/jobs/routes.ts'
import { labelsRoutes } from './features/labels/routes.ts'
import { riserRoutes } from './features/riser/routes.ts'
import { scheduleRoutes } from './features/schedule/routes.ts'
import { sessionRoutes } from './features/session/routes.ts'
import { useSessionStore } from './features/session/sessionStore.ts'

/** The address of every page. A job's sections stand below its frame, which opens the job once for all of them. */
export const router = createRouter({
  history: createWebHistory(),
  routes: [
    ...sessionRoutes,
    ...jobsRoutes,
    ...companyRoutes,
    ...catalogRoutes,
    {
      path: '/jobs/:jobId',
      component: () => import('./features/job/JobFrame.vue'),
      props: true,
      redirect: (to) => `/jobs/${String(to.params['jobId'])}/riser`,
      children: [...riserRoutes, ...scheduleRoutes, ...checksRoutes, ...labelsRoutes, ...fieldRoutes],
    },
    { path: '/', redirect: '/jobs' },
    { path: '/:rest(.*)*', component: () => import('./app/NotFoundPage.vue'), meta: { isPublic: true } },
  ],
})

/** Nobody sees a page before it is known who asks; where one wanted to go is kept for after signing in. */
router.beforeEach(async (to) => {
  if (to.meta['isPublic'] === true) return true
  const session = useSessionStore()
  if (await session.know()) return true
  return { path: '/sign-in', query: { to: to.fullPath } }
})
