import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import type { Account, Role } from '#shared/contracts/accounts';
import { ApiError } from '@/api/api-error';
import * as api from '@/api/accounts';
import type { LoadStatus } from '@/api/load-status';
import { browserStorage } from '@/stores/draft-storage';

/** Set where somebody left while the server was away: their session ends as soon as it is back. */
const OWED_KEY = 'siltline.sign-out-owed';

/** Who is signed in. */
export const useSessionStore = defineStore('session', () => {
  const account = ref<Account | null>(null);
  const demo = ref(false);
  const status = ref<LoadStatus>('idle');
  const storage = browserStorage();
  let pending: Promise<void> | null = null;

  const role = computed<Role | 'visitor'>(() => account.value?.role ?? 'visitor');

  async function read(): Promise<void> {
    status.value = 'loading';
    try {
      if (storage?.getItem(OWED_KEY)) await endSession();
      const session = await api.readSession();
      account.value = session.account;
      demo.value = session.demo;
      status.value = 'ready';
    } catch {
      // The Lab works without a server; the pages that need one say so when they ask it.
      status.value = 'error';
    }
  }

  /** Asks who is signed in, once; asked again after a failure. */
  function load(): Promise<void> {
    if (status.value === 'ready') return Promise.resolve();
    pending ??= read().finally(() => {
      pending = null;
    });
    return pending;
  }

  function entered(who: Account): Account {
    storage?.removeItem(OWED_KEY);
    account.value = who;
    status.value = 'ready';
    return who;
  }

  async function signIn(email: string, password: string): Promise<Account> {
    return entered((await api.signIn({ email, password })).account);
  }

  /** Confirms the address by the link's secret, and signs in. */
  async function confirm(token: string, password: string): Promise<Account> {
    return entered((await api.confirmAccount({ token, password })).account);
  }

  async function endSession(): Promise<void> {
    await api.signOut();
    storage?.removeItem(OWED_KEY);
  }

  /** Forgets who was signed in, without asking the server. */
  function forget(): void {
    account.value = null;
  }

  /** Leaves, even where the server is away: then the session is ended when it is back. */
  async function signOut(): Promise<void> {
    await endSession().catch((error: unknown) => {
      if (!(error instanceof ApiError)) throw error;
      storage?.setItem(OWED_KEY, 'yes');
      status.value = 'idle';
    });
    forget();
  }

  /** Asks anew who is signed in, after another tab has said that it changed. */
  function reload(): Promise<void> {
    status.value = 'idle';
    return load();
  }

  return { account, demo, status, role, load, reload, signIn, confirm, signOut, forget };
});
