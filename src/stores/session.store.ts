import { defineStore } from 'pinia';
import { computed, ref } from 'vue';
import type { Account, Role } from '#shared/contracts/accounts';
import * as api from '@/api/accounts';

export type LoadStatus = 'idle' | 'loading' | 'ready' | 'error';

/** Who is signed in. */
export const useSessionStore = defineStore('session', () => {
  const account = ref<Account | null>(null);
  const demo = ref(false);
  const status = ref<LoadStatus>('idle');
  let pending: Promise<void> | null = null;

  const role = computed<Role | 'visitor'>(() => account.value?.role ?? 'visitor');

  async function read(): Promise<void> {
    status.value = 'loading';
    try {
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

  async function signIn(email: string, password: string): Promise<Account> {
    const answer = await api.signIn({ email, password });
    account.value = answer.account;
    status.value = 'ready';
    return answer.account;
  }

  /** Forgets who was signed in, without asking the server. */
  function forget(): void {
    account.value = null;
  }

  async function signOut(): Promise<void> {
    await api.signOut();
    forget();
  }

  return { account, demo, status, role, load, signIn, signOut, forget };
});
