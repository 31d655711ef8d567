import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const apiTarget = process.env['LOAFMARK_API'] ?? 'http://127.0.0.1:4800';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: {
    outDir: 'dist',
    modulePreload: { polyfill: false },
    // The content policy allows no data: scripts or fonts, so nothing is inlined.
    assetsInlineLimit: 0,
  },
  server: { host: '127.0.0.1', proxy: { '/api': apiTarget } },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['tests/{shared,analysis,demo}/**/*.test.ts', 'tests/house/{imports,words}.test.ts'],
          environment: 'node',
        },
      },
      {
        extends: true,
        test: { name: 'component', include: ['tests/src/**/*.test.{ts,tsx}'], environment: 'jsdom', setupFiles: ['tests/support/component-setup.ts'] },
      },
      {
        extends: true,
        test: { name: 'api', include: ['tests/server/**/*.test.ts', 'tests/house/{tenancy,contract}.test.ts'], environment: 'node', testTimeout: 30_000, hookTimeout: 60_000 },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['tests/journeys/**/*.test.ts'],
          environment: 'node',
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
