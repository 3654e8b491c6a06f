import type { RouteRecordRaw } from 'vue-router'

export const companyRoutes: RouteRecordRaw[] = [{ path: '/company', component: () => import('./CompanyPage.vue') }]
