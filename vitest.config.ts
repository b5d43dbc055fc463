import { existsSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const root = fileURLToPath(new URL('.', import.meta.url))

/**
 * Starts the PostgreSQL cluster of the test run once and hands its address to the test files; needed by one
 * project only.
 */
const postgresqlCluster = 'test/support/postgresql-cluster.ts'

/** Suites wait for servers, databases and simulations on two shared cores: generous, yet not endless. */
const slow = { testTimeout: 60_000, hookTimeout: 120_000 }

/** Zones far east and far west of Greenwich: code that reads the machine's zone by mistake gives itself away. */
const east = process.env.LEDGERLINE_TEST_TZ ?? 'Pacific/Auckland'
const west = process.env.LEDGERLINE_TEST_TZ ?? 'America/Los_Angeles'

export default defineConfig({
  resolve: {
    alias: [
      { find: /^@\//, replacement: root },
      // `server-only` throws outside the framework's own bundler.
      { find: /^server-only$/, replacement: `${root}test/support/empty.ts` },
    ],
  },
  test: {
    // Forks, not threads: only a process of its own takes its time zone from the environment.
    pool: 'forks',
    maxWorkers: 2,
    passWithNoTests: false,
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          environment: 'node',
          include: ['test/unit/**/*.test.{ts,tsx}', 'test/support/**/*.test.ts'],
          setupFiles: ['test/support/no-noise.ts', 'test/support/seed.ts', 'test/support/near.ts'],
          env: { TZ: east },
          testTimeout: 20_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'ui',
          environment: 'jsdom',
          include: ['test/ui/**/*.test.{ts,tsx}'],
          setupFiles: [
            'test/support/no-noise.ts',
            'test/support/seed.ts',
            'test/support/near.ts',
            'test/support/ui.ts',
          ],
          env: { TZ: west },
          testTimeout: 20_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'integration',
          environment: 'node',
          include: ['test/integration/**/*.test.ts'],
          setupFiles: ['test/support/no-noise.ts', 'test/support/seed.ts', 'test/support/near.ts'],
          env: { TZ: east, LEDGERLINE_TEST_ENGINE: 'sqlite' },
          ...slow,
        },
      },
      {
        extends: true,
        test: {
          name: 'integration-postgresql',
          environment: 'node',
          include: ['test/integration/**/*.test.ts'],
          // Say so in the file's name when a promise is about one engine's file or pragma.
          exclude: ['test/integration/**/*.sqlite.test.ts'],
          setupFiles: ['test/support/no-noise.ts', 'test/support/seed.ts', 'test/support/near.ts'],
          globalSetup: existsSync(`${root}${postgresqlCluster}`) ? [postgresqlCluster] : [],
          env: { TZ: west, LEDGERLINE_TEST_ENGINE: 'postgresql' },
          ...slow,
        },
      },
      {
        extends: true,
        test: {
          name: 'rules',
          environment: 'node',
          include: ['test/architecture.test.ts', 'test/rules/**/*.test.ts'],
          setupFiles: ['test/support/no-noise.ts'],
          env: { TZ: east },
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          // Long proofs: whole with `npm run test:long`, a twentieth of each within `npm test` (LEDGERLINE_SHARE).
          name: 'long',
          environment: 'node',
          include: ['test/long/**/*.test.ts'],
          setupFiles: ['test/support/near.ts'],
          env: { TZ: east },
          fileParallelism: false,
          testTimeout: 3_600_000,
          hookTimeout: 600_000,
        },
      },
    ],
  },
})
