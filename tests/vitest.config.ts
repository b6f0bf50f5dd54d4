import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

const tier = process.env.HALFBAUD_TIER ?? 'first'
const tiers: Record<string, { include: string[]; exclude: string[] }> = {
  first: { include: ['tests/**/*.test.ts'], exclude: ['tests/**/*.long.test.ts', 'tests/web/!(first-light).test.ts'] },
  web: { include: ['tests/web/*.test.ts'], exclude: ['tests/**/*.long.test.ts'] },
  long: { include: ['tests/**/*.long.test.ts'], exclude: [] },
}
const chosen = tiers[tier]
if (!chosen) throw new Error(`HALFBAUD_TIER is one of ${Object.keys(tiers).join(', ')}`)

export default defineConfig({
  root: fileURLToPath(new URL('..', import.meta.url)),
  resolve: { alias: { 'server-only': fileURLToPath(new URL('./serverOnly.ts', import.meta.url)) } },
  test: {
    ...chosen,
    testTimeout: tier === 'long' ? 600_000 : 20_000,
    hookTimeout: tier === 'first' ? 60_000 : 180_000,
    maxWorkers: 2,
  },
})
