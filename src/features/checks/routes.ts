import type { RouteRecordRaw } from 'vue-router'

export const checksRoutes: RouteRecordRaw[] = [{ path: 'checks', component: () => import('./ChecksPage.vue') }]
