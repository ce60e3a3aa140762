import tailwindcss from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

const globalSetup = ['tests/support/global-setup.ts']

/** What the API answers itself; `npm run dev` passes it on from Vite's port. */
const answeredByApi = ['/api', '/pay', '/healthz', '/readyz', '/metrics']
const api = `http://127.0.0.1:${process.env.API_PORT ?? '4300'}`

export default defineConfig({
  plugins: [react(), tailwindcss()],
  server: {
    proxy: Object.fromEntries(answeredByApi.map((path) => [path, { target: api, xfwd: true }])),
    watch: { ignored: ['**/.data/**', '**/.build/**'] },
  },
  build: {
    outDir: '.build/client',
    emptyOutDir: true,
    manifest: true,
    // The content security policy allows neither inline script nor data: addresses.
    assetsInlineLimit: 0,
    modulePreload: { polyfill: false },
  },
  test: {
    projects: [
      { test: { name: 'unit', environment: 'node', include: ['tests/{shared,standards,architecture,fakes}/**/*.test.ts'], testTimeout: 60_000 } },
      {
        test: {
          name: 'server',
          environment: 'node',
          include: ['tests/{api,server,worker,faults}/**/*.test.ts'],
          pool: 'forks',
          maxWorkers: 2,
          globalSetup,
          setupFiles: ['tests/support/setup-database.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        plugins: [react()],
        test: { name: 'src', environment: 'jsdom', include: ['tests/src/**/*.test.{ts,tsx}'], globalSetup, testTimeout: 30_000, hookTimeout: 60_000 },
      },
      {
        test: {
          name: 'browser',
          environment: 'node',
          include: ['tests/browser/**/*.test.ts'],
          fileParallelism: false,
          globalSetup,
          testTimeout: 180_000,
          hookTimeout: 180_000,
        },
      },
    ],
  },
})
