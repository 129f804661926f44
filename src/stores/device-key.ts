import { newId } from '@/stores/ids';

const DEVICE_KEY = 'siltline.device';

let forThisPage: string | null = null;

/** Names this browser, by nothing but chance: its saves in one stretch of editing show as one version. */
export function deviceKey(storage: Storage | null): string {
  const known = storage?.getItem(DEVICE_KEY) ?? forThisPage;
  if (known !== null) return known;
  forThisPage = newId();
  try {
    storage?.setItem(DEVICE_KEY, forThisPage);
  } catch {
    // A full store: the name lasts as long as the page.
  }
  return forThisPage;
}
