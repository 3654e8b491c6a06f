import type { RouteRecordRaw } from 'vue-router'

export const catalogRoutes: RouteRecordRaw[] = [{ path: '/catalog', component: () => import('./CatalogPage.vue') }]
