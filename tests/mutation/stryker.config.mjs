import { tmpdir } from 'node:os'
import { join } from 'node:path'

/** Outside of the repository: an interrupted run leaves nothing that lint, types or git would find. */
const away = join(tmpdir(), 'halfbaud-mutation')

export default {
  testRunner: 'vitest',
  vitest: { configFile: 'tests/mutation/vitest.config.ts', related: false },
  coverageAnalysis: 'perTest',
  ignoreStatic: true,
  mutate: [
    'lib/channel/networks/{cascade,renormalise,portwise}.ts',
    'lib/channel/fitting/{fittedLoss,leastSquares}.ts',
    'lib/channel/lines/{propagate,crowding}.ts',
    'lib/budget/allowance/{verdict,sum}.ts',
  ],
  concurrency: 1,
  // A loop that never ends is noticed by its count; a busy machine must not count as one.
  timeoutMS: 15_000,
  reporters: ['clear-text', 'html', 'json'],
  htmlReporter: { fileName: join(away, 'report.html') },
  jsonReporter: { fileName: join(away, 'report.json') },
  tempDirName: join(away, 'sandbox'),
  ignorePatterns: ['.next', 'dist', 'app', 'prisma'],
}
