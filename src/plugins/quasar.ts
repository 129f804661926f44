import { Notify, Quasar } from 'quasar';
import iconSet from 'quasar/icon-set/svg-mdi-v7';
import type { App } from 'vue';

const NOTICE_MS = 6000;

/** Forms, dialogs, notices and layout; their look is set in assets/quasar-theme.css. */
export function installQuasar(app: App): void {
  app.use(Quasar, {
    plugins: { Notify },
    iconSet,
    config: { ripple: false, notify: { position: 'bottom', timeout: NOTICE_MS } },
  });
}
