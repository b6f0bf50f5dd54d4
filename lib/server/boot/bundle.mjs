import { build } from 'esbuild'
import { ROOT } from './paths.mjs'

/** One bundle for the process that serves, one for the command line, one for the thread that evaluates; packages stay where npm put them. */
await build({
  absWorkingDir: ROOT,
  entryPoints: {
    server: 'lib/server/main.ts',
    halfbaud: 'lib/server/cli/entry.ts',
    evaluation: 'lib/server/evaluation/worker.ts',
  },
  outdir: 'dist',
  outExtension: { '.js': '.mjs' },
  bundle: true,
  platform: 'node',
  format: 'esm',
  target: 'node20',
  packages: 'external',
  sourcemap: true,
  logLevel: 'warning',
})
