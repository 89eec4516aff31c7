import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

/** Components on static figures, to be looked at while drawing them. Development only: nothing here is ever built. */
export default defineConfig({
  root: import.meta.dirname,
  cacheDir: '../../node_modules/.vite-gallery',
  plugins: [react(), tailwindcss()],
  server: { host: '127.0.0.1', port: 18200, strictPort: true },
});
