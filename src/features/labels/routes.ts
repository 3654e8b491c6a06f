import type { RouteRecordRaw } from 'vue-router'

export const labelsRoutes: RouteRecordRaw[] = [{ path: 'labels', component: () => import('./LabelsPage.vue') }]
