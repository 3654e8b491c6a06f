import type { RouteRecordRaw } from 'vue-router'

export const jobsRoutes: RouteRecordRaw[] = [{ path: '/jobs', component: () => import('./JobsPage.vue') }]
