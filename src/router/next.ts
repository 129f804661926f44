/**
 * Where to go after signing in: an address of this very site, or nothing. Whatever a browser would take
 * for another site (`//e.test`, `/\e.test`, a tab between the slashes, `javascript:`) is dropped.
 * @param wanted as it stood in the address, from anybody
 * @param origin of this site, e.g. `https://siltline.example`
 * @returns path, query and fragment, or `null`
 * @example nextPath('/studies?x=1', 'https://a.example') // '/studies?x=1'
 */
export function nextPath(wanted: unknown, origin: string): string | null {
  if (typeof wanted !== 'string' || !URL.canParse(wanted, origin)) return null;
  const url = new URL(wanted, origin);
  const path = url.pathname + url.search + url.hash;
  return url.origin === origin && !path.startsWith('//') ? path : null;
}
