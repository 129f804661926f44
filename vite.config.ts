import { readFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { quasar, transformAssetUrls } from '@quasar/vite-plugin';
import vue from '@vitejs/plugin-vue';
import { PurgeCSS } from 'purgecss';
import { defineConfig, type Plugin } from 'vite';

/** While developing, the pages are one port below the server. */
const { PORT: serverPort = '3001', PAGES_PORT: pagesPort = '3000' } = process.env;

/** Classes whose names Quasar's components put together from parts. */
const PUT_TOGETHER = [/^q-/, /^(bg|text|justify|items|self|content|shadow|fixed|absolute)-[a-z-]+$/];

/** Quasar's style sheet without what neither its own components nor this program's pages can carry. */
const lighterQuasar: Plugin = {
  name: 'lighter-quasar',
  apply: 'build',
  async load(id) {
    if (!id.endsWith('/quasar/dist/quasar.css')) return null;
    const raw = await readFile(id, 'utf8');
    const content = ['src/**/*.{vue,ts}', 'node_modules/quasar/dist/quasar.client.js'];
    const [purged] = await new PurgeCSS().purge({ content, css: [{ raw }], safelist: PUT_TOGETHER });
    return purged?.css ?? raw;
  },
};

export default defineConfig({
  plugins: [vue({ template: { transformAssetUrls } }), quasar({ sassVariables: false }), lighterQuasar],
  resolve: { alias: { '@': fileURLToPath(new URL('./src', import.meta.url)) } },
  optimizeDeps: { include: ['tone', 'chart.js', 'tonal', 'vexflow/core', 'driver.js'] },
  server: {
    port: Number(pagesPort),
    strictPort: true,
    proxy: { '/api': `http://127.0.0.1:${serverPort}` },
  },
  build: { sourcemap: false },
});
