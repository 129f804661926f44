import type { RouteRecordRaw } from 'vue-router';

declare module 'vue-router' {
  interface RouteMeta {
    /** Of the browser's tab. */
    title?: string;
    /** Who may come: only those signed in, or only in the demonstration. */
    for?: 'account' | 'demo';
  }
}

const lab = () => import('@/pages/LabPage.vue').then((module) => module.default);

export const routes: RouteRecordRaw[] = [
  { path: '/', name: 'lab', component: lab, meta: { title: 'Lab' } },
  {
    path: '/:missing(.*)*',
    name: 'missing',
    component: () => import('@/pages/NotFoundPage.vue'),
    meta: { title: 'Not found' },
  },
];
