import { readFileSync } from 'node:fs';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { VitePWA } from 'vite-plugin-pwa';
import { defineConfig } from 'vitest/config';

const ground = '#0B0B0C';

function packageVersion(): string {
  const parsed: unknown = JSON.parse(readFileSync(new URL('./package.json', import.meta.url), 'utf8'));
  if (
    typeof parsed === 'object' &&
    parsed !== null &&
    'version' in parsed &&
    typeof parsed.version === 'string'
  ) {
    return parsed.version;
  }
  throw new Error('package.json names no version');
}

const timeZoneIndependent = { TZ: 'Etc/UTC' };

export default defineConfig({
  define: {
    __APP_VERSION__: JSON.stringify(packageVersion()),
    __BUILD_TIME__: JSON.stringify(process.env['HOLDOFF_BUILD_TIME'] ?? new Date().toISOString()),
  },
  plugins: [
    react(),
    tailwindcss(),
    VitePWA({
      // Nothing may reload a page under a hand that is typing: the app itself asks, and registers itself.
      registerType: 'prompt',
      injectRegister: false,
      strategies: 'generateSW',
      manifest: {
        id: '/',
        name: 'Holdoff',
        short_name: 'Holdoff',
        description: 'The bench book for small pulsed gas lasers and the pulsed high voltage around them',
        lang: 'en',
        start_url: '/bench',
        scope: '/',
        display: 'standalone',
        orientation: 'any',
        background_color: ground,
        theme_color: ground,
        icons: [
          { src: '/icon.svg', sizes: 'any', type: 'image/svg+xml', purpose: 'any' },
          { src: '/icon-maskable.svg', sizes: 'any', type: 'image/svg+xml', purpose: 'maskable' },
        ],
      },
      workbox: {
        // The icons come in by the manifest; naming them here too would list them twice, which no worker installs.
        globPatterns: ['**/*.{js,css,html,woff2}'],
        navigateFallback: '/index.html',
        navigateFallbackDenylist: [/^\/api/],
        cleanupOutdatedCaches: true,
      },
      devOptions: { enabled: false },
    }),
  ],
  build: {
    target: 'es2023',
    // The page's policy forbids inline script and data: fonts.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
    // Read by the bundle size check.
    manifest: true,
    reportCompressedSize: false,
  },
  server: {
    host: '127.0.0.1',
    port: Number(process.env['HOLDOFF_PORT'] ?? 8320),
    strictPort: true,
    proxy: {
      '/api': {
        target: `http://127.0.0.1:${process.env['HOLDOFF_API_PORT'] ?? '8321'}`,
        // The server checks Host and Origin against the address that the browser sees.
        changeOrigin: false,
      },
    },
  },
  test: {
    passWithNoTests: false,
    pool: 'threads',
    // One worker less than there are cores would leave half of a small machine idle.
    maxWorkers: 2,
    projects: [
      {
        extends: true,
        test: {
          name: 'domain',
          env: timeZoneIndependent,
          environment: 'node',
          include: ['{src/domain,tests/reference}/**/*.test.ts'],
          setupFiles: ['tests/support/setup-unit.ts'],
          // Pure code leaves nothing behind for the next file.
          isolate: false,
        },
      },
      {
        extends: true,
        test: {
          name: 'unit',
          env: timeZoneIndependent,
          environment: 'node',
          include: ['{src,server,migrations,seeds,tests}/**/*.test.ts'],
          exclude: ['src/domain/**', 'tests/reference/**', '**/*.api.test.ts', '**/node_modules/**'],
          setupFiles: ['tests/support/setup-unit.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'unit-dom',
          env: timeZoneIndependent,
          environment: 'happy-dom',
          include: ['{src,tests}/**/*.test.tsx'],
          setupFiles: ['tests/support/setup-unit.ts', 'tests/support/setup-dom.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'api',
          env: timeZoneIndependent,
          environment: 'node',
          include: ['{server,tests}/**/*.api.test.ts'],
          globalSetup: ['tests/support/mariadb-global-setup.ts'],
          testTimeout: 20_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.e2e.ts'],
          // Each file owns a browser, a server and a database: two at once starve two cores.
          fileParallelism: false,
          maxWorkers: 1,
          testTimeout: 180_000,
          hookTimeout: 180_000,
        },
      },
    ],
  },
});
