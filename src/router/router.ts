import { nextTick } from 'vue';
import { createRouter, createWebHistory, type RouteLocationNormalized, type Router } from 'vue-router';
import { setTabTitle } from '@/composables/tab-title';
import { nextPath } from '@/router/next';
import { routes } from '@/router/routes';
import { useSessionStore } from '@/stores/session.store';

async function admit(to: RouteLocationNormalized) {
  const session = useSessionStore();
  const asked = session.load();
  // A page that is open to all does not wait to know who comes.
  if (!to.meta.for) return true;
  await asked;
  // Without an answer nobody is turned away: the page itself says what it cannot do.
  if (session.status !== 'ready') return true;
  if (to.meta.for === 'account' && !session.account) return { name: 'sign-in', query: { next: to.fullPath } };
  if (to.meta.for === 'visitor' && session.account) {
    return nextPath(to.query.next, location.origin) ?? { name: 'lab' };
  }
  if (to.meta.for === 'demo' && !session.demo) {
    return { name: 'missing', params: { missing: to.path.split('/').slice(1) } };
  }
  return true;
}

/** Begins the new page where its heading is, for those who cannot see that it changed. */
async function focusHeading(): Promise<void> {
  await nextTick();
  const heading = document.querySelector<HTMLElement>('main h1');
  heading?.setAttribute('tabindex', '-1');
  heading?.focus({ preventScroll: true });
}

/** A step that only gives the page in view its address leaves the focus where it is. */
function staysInPlace(): boolean {
  const state: unknown = history.state;
  return typeof state === 'object' && state !== null && 'inPlace' in state && state.inPlace === true;
}

export function createSiltlineRouter(): Router {
  const router = createRouter({
    history: createWebHistory(),
    routes,
    scrollBehavior: (to, from, saved) => {
      if (saved) return saved;
      const part = document.getElementById(to.hash.slice(1));
      if (part) return { el: part };
      return to.path === from.path ? false : { top: 0 };
    },
  });
  router.beforeEach(admit);
  router.afterEach((to, from, failure) => {
    if (failure) return;
    if (to.meta.title) setTabTitle(to.meta.title);
    const isFirstPage = from.matched.length === 0;
    if (!isFirstPage && to.path !== from.path && !staysInPlace()) void focusHeading();
  });
  return router;
}
