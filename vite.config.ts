/// <reference types="vitest/config" />
import { fileURLToPath } from 'node:url';
import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const fromRoot = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  plugins: [react(), tailwindcss()],
  publicDir: fromRoot('./src/public'),
  build: {
    outDir: fromRoot('./dist'),
    emptyOutDir: true,
    manifest: true,
    rollupOptions: {
      input: { app: fromRoot('./index.html'), arrival: fromRoot('./src/arrival.html') },
    },
  },
  server: {
    host: '127.0.0.1',
    proxy: Object.fromEntries(
      // Tiles only below an area and version: /tiles/layers.ts is a module of the client.
      ['/api', '^/tiles/[^/]+/[^/]+/', '/a/', '/hooks'].map((path) => [
        path,
        { target: process.env.FURLONG_DEV_SERVER ?? 'http://127.0.0.1:4173' },
      ]),
    ),
  },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          // Times belong to benches: a busy machine must not fail an answer that is right.
          testTimeout: 30_000,
          // The default leaves a core idle; on two cores that is half the machine.
          maxWorkers: '100%',
          include: [
            'shared/**/*.test.ts',
            'server/**/*.test.ts',
            'tiles/**/*.test.ts',
            'src/**/*.test.{ts,tsx}',
            'tests/*.test.ts',
          ],
        },
      },
      {
        extends: true,
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          testTimeout: 180_000,
          hookTimeout: 180_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
