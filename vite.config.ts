import { svelte } from '@sveltejs/vite-plugin-svelte';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig(({ mode }) => ({
  root: mode === 'test' ? here('.') : here('web'),
  // The plugin looks for its settings file in vite's root, so they are given here.
  plugins: [svelte({ configFile: false })],
  build: { outDir: here('dist'), emptyOutDir: true, target: 'es2022', sourcemap: true },
  worker: { format: 'es' as const },
  preview: { host: 'localhost' },
  test: {
    include: ['tests/**/*.test.ts'],
    exclude: ['tests/browser/**', 'node_modules/**'],
    environment: 'node',
    testTimeout: 30_000,
  },
}));
