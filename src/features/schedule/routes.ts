import type { RouteRecordRaw } from 'vue-router'

export const scheduleRoutes: RouteRecordRaw[] = [{ path: 'schedule', component: () => import('./SchedulePage.vue') }]
