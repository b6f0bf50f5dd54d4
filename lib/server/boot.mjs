#!/usr/bin/env node
/**
 * The way from a fresh clone to a running command, with nothing but Node's built-ins: install, generate, build (each only
 * when its inputs have changed), then the command itself. Progress goes to stderr; stdout belongs to the command.
 */
import { spawn } from 'node:child_process'
import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { readConfig } from './boot/config.mjs'
import { requireNode, requireToolchain } from './boot/machine.mjs'
import { ROOT } from './boot/paths.mjs'
import { buildPages, bundleServer, generateClient, installPackages } from './boot/steps.mjs'

const [command = 'start', ...rest] = process.argv.slice(2)

const vitest = (tier) => async () => {
  const reports = process.env.HALFBAUD_REPORT
    ? ['--reporter=default', '--reporter=json', `--outputFile.json=${process.env.HALFBAUD_REPORT}`]
    : []
  return run(['node_modules/vitest/vitest.mjs', 'run', '--config', 'tests/vitest.config.ts', ...reports, ...rest], {
    HALFBAUD_TIER: tier,
  })
}

const COMMANDS = {
  start: {
    before: () => readConfig('demo', process.env, ROOT),
    steps: ['install', 'generate', 'build', 'bundle'],
    go: () => run(['dist/server.mjs', 'demo', ...rest], PRODUCTION),
  },
  serve: {
    before: () => readConfig('serve', process.env, ROOT),
    steps: ['install', 'generate', 'build', 'bundle'],
    go: () => run(['dist/server.mjs', 'serve', ...rest], PRODUCTION),
  },
  dev: { steps: ['install', 'generate'], go: () => run(['--import', 'tsx', 'lib/server/main.ts', 'dev', ...rest], {}) },
  build: { steps: ['install', 'generate', 'build', 'bundle'], go: async () => 0 },
  halfbaud: {
    steps: ['install', 'generate', 'bundle'],
    go: () => run([join(ROOT, 'dist/halfbaud.mjs'), ...rest], PRODUCTION, process.env.INIT_CWD),
  },
  test: { steps: ['install', 'generate', 'build', 'bundle'], go: vitest('first') },
  'test:web': { steps: ['install', 'generate', 'build', 'bundle'], go: vitest('web') },
  'test:long': { steps: ['install', 'generate', 'build', 'bundle'], go: vitest('long') },
  bench: { steps: ['install', 'generate'], go: () => run(['--import', 'tsx', 'tests/bench/run.ts', ...rest], {}) },
}

const PRODUCTION = { NODE_ENV: 'production' }
const STEPS = { install: installPackages, generate: generateClient, build: buildPages, bundle: bundleServer }

function run(args, environment, cwd = ROOT) {
  const child = spawn(process.execPath, args, {
    cwd: existsSync(cwd) ? cwd : ROOT,
    stdio: 'inherit',
    env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1', ...environment },
  })
  // The child closes its sockets and files in order; this process only passes the wish on.
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill(signal))
  return new Promise((resolve) => child.on('exit', (code, signal) => resolve(signal ? 1 : (code ?? 1))))
}

const chosen = COMMANDS[command]
if (!chosen) {
  process.stderr.write(`'${command}' is not a command; use one of ${Object.keys(COMMANDS).join(', ')}.\n`)
  process.exit(3)
}
try {
  requireNode()
  chosen.before?.()
  for (const step of chosen.steps) await STEPS[step]({ requireToolchain })
  process.exitCode = await chosen.go()
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
  process.exitCode = 1
}
