import { fileURLToPath } from 'node:url';
import { quasar, transformAssetUrls } from '@quasar/vite-plugin';
import vue from '@vitejs/plugin-vue';
import { defineConfig } from 'vite';

/** While developing, the pages are one port below the server. */
const { PORT: serverPort = '3001', PAGES_PORT: pagesPort = '3000' } = process.env;

export default defineConfig({
  plugins: [vue({ template: { transformAssetUrls } }), quasar({ sassVariables: false })],
  resolve: { alias: { '@': fileURLToPath(new URL('./src', import.meta.url)) } },
  optimizeDeps: { include: ['tone', 'chart.js', 'tonal'] },
  server: {
    port: Number(pagesPort),
    strictPort: true,
    proxy: { '/api': `http://127.0.0.1:${serverPort}` },
  },
  build: { sourcemap: false },
});
