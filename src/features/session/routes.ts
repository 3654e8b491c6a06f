import type { RouteRecordRaw } from 'vue-router'

export const sessionRoutes: RouteRecordRaw[] = [{ path: '/sign-in', component: () => import('./SignInPage.vue'), meta: { isPublic: true } }]
