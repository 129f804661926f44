import { ref, type Ref } from 'vue';

/**
 * The secret of a mailed link. It stands in the fragment, which no server and no log sees; here it is taken
 * out of the address as well, so that it stays in no history.
 */
export function useLinkSecret(): Ref<string> {
  const secret = location.hash.slice(1);
  if (secret) history.replaceState(history.state, '', location.pathname + location.search);
  return ref(secret);
}
