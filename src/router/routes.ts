import type { RouteRecordRaw } from 'vue-router';
import LabPage from '@/pages/LabPage.vue';

declare module 'vue-router' {
  interface RouteMeta {
    /** Of the browser's tab; a page without one names it itself. */
    title?: string;
    /** Who may come: only those signed in, only those who are not, or only in the demonstration. */
    for?: 'account' | 'visitor' | 'demo';
    /** Without the head of the other pages: it is shown to others or printed. */
    bare?: boolean;
  }
}

export const routes: RouteRecordRaw[] = [
  { path: '/', name: 'lab', component: LabPage, meta: { title: 'Lab' } },
  { path: '/studies/:studyId', name: 'study', component: LabPage, meta: { for: 'account' } },
  {
    path: '/studies',
    name: 'studies',
    component: () => import('@/pages/StudiesPage.vue'),
    meta: { title: 'Studies', for: 'account' },
  },
  {
    path: '/present',
    name: 'present',
    component: () => import('@/pages/PresentPage.vue'),
    meta: { title: 'Projector', bare: true },
  },
  {
    path: '/studies/:studyId/present',
    name: 'study-present',
    component: () => import('@/pages/PresentPage.vue'),
    meta: { title: 'Projector', for: 'account', bare: true },
  },
  {
    path: '/print',
    name: 'print',
    component: () => import('@/pages/PrintPage.vue'),
    meta: { title: 'Print', bare: true },
  },
  {
    path: '/studies/:studyId/print',
    name: 'study-print',
    component: () => import('@/pages/PrintPage.vue'),
    meta: { title: 'Print', for: 'account', bare: true },
  },
  {
    path: '/reference',
    name: 'reference',
    component: () => import('@/pages/ReferencePage.vue'),
    meta: { title: 'Reference' },
  },
  {
    path: '/mail',
    name: 'mail',
    component: () => import('@/pages/MailPage.vue'),
    meta: { title: 'Mail', for: 'demo' },
  },
  {
    path: '/sign-in',
    name: 'sign-in',
    component: () => import('@/pages/SignInPage.vue'),
    meta: { title: 'Sign in', for: 'visitor' },
  },
  {
    path: '/sign-up',
    name: 'sign-up',
    component: () => import('@/pages/SignUpPage.vue'),
    meta: { title: 'Sign up', for: 'visitor' },
  },
  {
    path: '/confirm',
    name: 'confirm',
    component: () => import('@/pages/ConfirmPage.vue'),
    meta: { title: 'Confirm your address' },
  },
  {
    path: '/forgotten-password',
    name: 'forgotten-password',
    component: () => import('@/pages/ForgottenPasswordPage.vue'),
    meta: { title: 'Forgotten password' },
  },
  {
    path: '/reset-password',
    name: 'reset-password',
    component: () => import('@/pages/ResetPasswordPage.vue'),
    meta: { title: 'Set a new password' },
  },
  {
    path: '/:missing(.*)*',
    name: 'missing',
    component: () => import('@/pages/NotFoundPage.vue'),
    meta: { title: 'Nothing here' },
  },
];
