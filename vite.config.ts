import { fileURLToPath } from 'node:url';
import { quasar, transformAssetUrls } from '@quasar/vite-plugin';
import vue from '@vitejs/plugin-vue';
import { defineConfig } from 'vite';

const apiPort = process.env.PORT ?? '3000';

export default defineConfig({
  plugins: [vue({ template: { transformAssetUrls } }), quasar({ sassVariables: false })],
  resolve: { alias: { '@': fileURLToPath(new URL('./src', import.meta.url)) } },
  optimizeDeps: { include: ['tone', 'chart.js', 'tonal'] },
  server: { proxy: { '/api': `http://127.0.0.1:${apiPort}` } },
  build: { sourcemap: false },
});
