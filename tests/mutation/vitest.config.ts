import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

/** Only the tests of the mutated files: a mutant that another test would kill by chance should live, so that its own test is written. */
export default defineConfig({
  root: fileURLToPath(new URL('../..', import.meta.url)),
  test: {
    include: [
      'tests/channel/networks/*.test.ts',
      'tests/channel/fitting/*.test.ts',
      'tests/channel/lines/propagate.test.ts',
      'tests/published/{fit,lines,networksCascade,networksReferences,networksConversions}.test.ts',
      'tests/budget/allowance/{verdict,sum}.test.ts',
    ],
    setupFiles: [fileURLToPath(new URL('./seed.ts', import.meta.url))],
    testTimeout: 20_000,
  },
})
