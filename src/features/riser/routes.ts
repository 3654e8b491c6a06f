import type { RouteRecordRaw } from 'vue-router'

export const riserRoutes: RouteRecordRaw[] = [{ path: 'riser', name: 'riser', component: () => import('./RiserPage.vue') }]
