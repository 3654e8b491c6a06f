import vue from '@vitejs/plugin-vue'
import { defineConfig } from 'vitest/config'

const apiTarget = process.env['MUDRING_API'] ?? 'http://127.0.0.1:4310'

export default defineConfig({
  plugins: [vue()],
  build: { outDir: 'dist', target: 'es2022' },
  server: { host: '127.0.0.1', proxy: { '/api': { target: apiTarget } } },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['tests/shared/**/*.test.ts', 'tests/server/**/*.test.ts', 'tests/support/**/*.test.ts'],
          exclude: ['**/*.db.test.ts'],
          environment: 'node',
        },
      },
      {
        extends: true,
        test: { name: 'components', include: ['tests/src/**/*.test.ts'], environment: 'jsdom' },
      },
      {
        extends: true,
        test: {
          name: 'db',
          include: ['tests/**/*.db.test.ts'],
          environment: 'node',
          globalSetup: ['tests/support/mariadb.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.e2e.ts'],
          environment: 'node',
          testTimeout: 180_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
})
