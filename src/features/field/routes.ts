import type { RouteRecordRaw } from 'vue-router'

export const fieldRoutes: RouteRecordRaw[] = [
  {
    path: 'field',
    component: () => import('./FieldFrame.vue'),
    children: [
      { path: '', redirect: (to) => `/jobs/${String(to.params['jobId'])}/field/pull` },
      { path: 'pull', component: () => import('./FieldPullPage.vue') },
      { path: 'pull/:runId', component: () => import('./FieldRunPage.vue'), props: true },
      { path: 'trace', component: () => import('./FieldFindPage.vue') },
      { path: 'trace/:runId', component: () => import('./FieldTracePage.vue'), props: true },
    ],
  },
]
