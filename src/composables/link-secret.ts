import { ref, type Ref } from 'vue';
import { useRoute, useRouter } from 'vue-router';

/**
 * The secret of a mailed link. It stands in the fragment, which no server and no log sees; here it is taken
 * out of the address as well, so that it stays in no history.
 */
export function useLinkSecret(): Ref<string> {
  const [route, router] = [useRoute(), useRouter()];
  const secret = ref(route.hash.slice(1));
  if (secret.value) void router.replace({ path: route.path, query: route.query });
  return secret;
}
