import 'quasar/dist/quasar.css';
import '@/assets/fonts.css';
import '@/assets/tokens.css';
import '@/assets/base.css';
import '@/assets/quasar-theme.css';
import { createPinia } from 'pinia';
import { createApp } from 'vue';
import App from '@/App.vue';
import { installQuasar } from '@/plugins/quasar';
import { installQueries } from '@/plugins/query';
import { configureZod } from '@/plugins/zod';
import { createSiltlineRouter } from '@/router/router';

configureZod();

const app = createApp(App);
app.use(createPinia());
installQuasar(app);
installQueries(app);
app.use(createSiltlineRouter());
app.mount('#app');
