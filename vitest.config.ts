import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'
import { defineVitestProject } from '@nuxt/test-utils/config'

const root = fileURLToPath(new URL('.', import.meta.url))
const alias = [{ find: /^#shared\/(.*)$/, replacement: `${root}shared/$1.ts` }]

export default defineConfig(async () => ({
  test: {
    projects: [
      {
        resolve: { alias },
        test: {
          name: 'unit',
          environment: 'node',
          include: ['tests/unit/**/*.spec.ts', 'tests/published/**/*.spec.ts', 'tests/meta/static/**/*.spec.ts'],
          env: { TZ: 'UTC' },
        },
      },
      {
        // The same rules on the other side of the day: nothing may depend on where the machine stands.
        resolve: { alias },
        test: {
          name: 'elsewhere',
          environment: 'node',
          include: ['tests/unit/{torque,wrench,vehicle,statistics,fastener,format,server}/**/*.spec.ts', 'tests/published/**/*.spec.ts'],
          env: { TZ: 'Pacific/Auckland' },
        },
      },
      {
        resolve: { alias: [...alias, { find: '#imports', replacement: `${root}tests/server/support/imports.ts` }] },
        test: {
          name: 'server',
          server: { deps: { inline: ['nuxt-auth-utils'] } },
          environment: 'node',
          include: ['tests/server/**/*.spec.ts', 'tests/meta/database/**/*.spec.ts'],
          env: { TZ: 'UTC' },
          testTimeout: 30_000,
          hookTimeout: 60_000,
          maxWorkers: 2,
        },
      },
      await defineVitestProject({
        test: {
          name: 'nuxt',
          environment: 'nuxt',
          include: ['tests/nuxt/**/*.spec.ts'],
          environmentOptions: { nuxt: { domEnvironment: 'happy-dom' } },
        },
      }),
      {
        resolve: { alias },
        test: {
          name: 'e2e',
          environment: 'node',
          include: ['tests/e2e/**/*.spec.ts'],
          env: { TZ: 'UTC' },
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
}))
