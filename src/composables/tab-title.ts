const SITE = 'Siltline';

/** Names the browser's tab after what lies open. */
export function setTabTitle(title: string): void {
  document.title = `${title} · ${SITE}`;
}
