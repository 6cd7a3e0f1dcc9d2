/** How the tests run: every `*.test.ts` under tests, in the plain Node environment, on the built program. */
import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

/** What `npm test` hands to vitest. */
export default defineConfig({
  root: fileURLToPath(new URL('..', import.meta.url)),
  test: {
    include: ['tests/**/*.test.ts'],
    environment: 'node',
    pool: 'forks',
    testTimeout: 30_000,
    hookTimeout: 60_000,
    globalSetup: [fileURLToPath(new URL('app/command/built.ts', import.meta.url))],
  },
})
