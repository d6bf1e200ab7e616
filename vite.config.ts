import { fileURLToPath } from 'node:url'
import vue from '@vitejs/plugin-vue'
import { defineConfig } from 'vitest/config'

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url))
const alias = { '@shared': here('./shared'), '@': here('./src') }
const api = process.env['SHEETWRIGHT_API'] ?? 'http://127.0.0.1:4310'

export default defineConfig({
  plugins: [vue()],
  resolve: { alias },
  publicDir: 'client-assets',
  worker: { format: 'es' },
  build: {
    outDir: 'dist/client',
    emptyOutDir: true,
    rolldownOptions: {
      output: { codeSplitting: { groups: [{ name: 'ol', test: /node_modules[\\/]ol[\\/]/, priority: 10 }] } },
    },
  },
  // A prefix alone would take /api-reference too, which is a page.
  server: { host: '127.0.0.1', proxy: { '^/api/': api } },
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          name: 'unit',
          environment: 'node',
          include: ['tests/unit/{shared,server}/**/*.test.ts'],
        },
      },
      {
        plugins: [vue()],
        resolve: { alias },
        test: {
          name: 'client',
          environment: 'happy-dom',
          include: ['tests/unit/src/**/*.test.ts'],
          setupFiles: ['tests/support/client-setup.ts'],
        },
      },
      {
        resolve: { alias },
        test: {
          name: 'integration',
          environment: 'node',
          include: ['tests/integration/**/*.test.ts'],
          globalSetup: ['tests/support/global-setup.ts'],
          fileParallelism: false,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: 'visual',
          environment: 'node',
          include: ['tests/visual/**/*.test.ts'],
          fileParallelism: false,
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        resolve: { alias },
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: ['tests/support/global-setup.ts'],
          fileParallelism: false,
          testTimeout: 240_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
})
