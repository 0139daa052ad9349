import { fileURLToPath } from 'node:url'
import { quasar, transformAssetUrls } from '@quasar/vite-plugin'
import vue from '@vitejs/plugin-vue'
import { defineConfig } from 'vitest/config'

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url))

/** Where the development server finds the application's own server. */
const apiTarget = process.env.LISTEL_API ?? 'http://127.0.0.1:4700'

const alias = {
  '@shared': at('./shared'),
  '@server': at('./src-server'),
  '@': at('./src'),
}

export default defineConfig({
  plugins: [
    vue({ template: { transformAssetUrls } }),
    quasar({ sassVariables: at('./src/css/quasar-variables.sass') }),
  ],
  resolve: { alias },
  server: { host: '127.0.0.1', proxy: { '/api': apiTarget } },
  build: { target: 'es2022', outDir: 'dist/client', emptyOutDir: true },
  test: {
    // A stray warning or an unhandled rejection is a fault, not noise.
    dangerouslyIgnoreUnhandledErrors: false,
    env: { TZ: 'UTC' },
    projects: [
      {
        extends: true,
        // Property tests are heavy; on a busy machine a test is slow, not wrong.
        test: {
          name: 'unit',
          include: ['tests/unit/**/*.test.ts'],
          environment: 'node',
          setupFiles: ['tests/helpers/fast-check-setup.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'reference',
          include: ['tests/reference/**/*.test.ts'],
          environment: 'node',
          setupFiles: ['tests/helpers/fast-check-setup.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts'],
          environment: 'node',
          setupFiles: ['tests/helpers/fast-check-setup.ts'],
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          environment: 'node',
          testTimeout: 300_000,
          hookTimeout: 300_000,
          fileParallelism: false,
        },
      },
    ],
  },
})
