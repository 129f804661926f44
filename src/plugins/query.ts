import { QueryClient, VueQueryPlugin } from '@tanstack/vue-query';
import type { App } from 'vue';
import { ApiError } from '@/api/api-error';

const MAX_ATTEMPTS = 3;

/** A refusal stays a refusal however often one asks; only what did not get through is asked again. */
function worthAskingAgain(failures: number, error: Error): boolean {
  return error instanceof ApiError && error.isPassing && failures < MAX_ATTEMPTS;
}

export const queryClient = new QueryClient({
  defaultOptions: { queries: { retry: worthAskingAgain, refetchOnWindowFocus: true } },
});

export function installQueries(app: App): void {
  app.use(VueQueryPlugin, { queryClient });
}
