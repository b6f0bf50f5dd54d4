import { spawn } from 'node:child_process'
import { existsSync, mkdtempSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { ROOT } from './paths.mjs'
import { isFresh, stamp } from './stamp.mjs'

const COMPILED = [
  { name: 'sqlite3', result: 'node_modules/sqlite3/build/Release/node_sqlite3.node' },
  { name: 'better-sqlite3', result: 'node_modules/better-sqlite3/build/Release/better_sqlite3.node' },
]
const INSTALL = ['package-lock.json']
const GENERATE = ['prisma', 'package-lock.json']
const BUILD = ['app', 'lib', 'seed-scenarios', 'next.config.js', 'tsconfig.json', 'package-lock.json']
const BUNDLE = ['lib', 'package-lock.json']

export async function installPackages({ requireToolchain }) {
  if (isFresh('install', INSTALL, ['node_modules/next/package.json', ...COMPILED.map((addon) => addon.result)])) return
  requireToolchain()
  const nodeHeaders = dirname(dirname(process.execPath))
  const environment = { npm_config_build_from_source: 'true', PRISMA_SKIP_POSTINSTALL_GENERATE: '1' }
  // node-gyp would fetch Node's headers; they lie beside Node itself in every ordinary installation.
  if (existsSync(join(nodeHeaders, 'include/node/node.h'))) environment.npm_config_nodedir = nodeHeaders
  if (!process.env.HOME) environment.npm_config_cache = mkdtempSync(join(tmpdir(), 'halfbaud-npm-'))
  await step('install', 'Installing packages; SQLite is compiled twice (3 to 6 minutes on two cores)', INSTALL, {
    command: 'npm',
    args: ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'],
    environment,
    doing: () => {
      if (!existsSync(join(ROOT, 'node_modules/sqlite3/package.json'))) return 'fetching packages'
      const left = COMPILED.filter((addon) => !existsSync(join(ROOT, addon.result))).map((addon) => addon.name)
      return left.length > 0 ? `compiling ${left.join(' and ')}` : 'finishing'
    },
  })
}

export async function generateClient() {
  if (isFresh('generate', GENERATE, ['lib/records/generated'])) return
  await step('generate', "Generating the records file's client", GENERATE, {
    command: process.execPath,
    args: ['node_modules/prisma/build/index.js', 'generate', '--config', 'prisma/prisma.config.ts'],
    // Prisma looks for a native engine that nothing here uses; migrations run through the WebAssembly one.
    environment: {
      PRISMA_SCHEMA_ENGINE_BINARY: process.execPath,
      PRISMA_HIDE_UPDATE_MESSAGE: '1',
      CHECKPOINT_DISABLE: '1',
    },
  })
}

export async function buildPages() {
  if (isFresh('build', BUILD, ['.next/BUILD_ID'])) return
  await step('build', 'Building the pages (about a minute)', BUILD, {
    command: process.execPath,
    args: ['node_modules/next/dist/bin/next', 'build'],
    environment: { NODE_ENV: 'production' },
  })
}

export async function bundleServer() {
  if (isFresh('bundle', BUNDLE, ['dist/server.mjs', 'dist/halfbaud.mjs'])) return
  await step('bundle', 'Bundling the server', BUNDLE, {
    command: process.execPath,
    args: ['lib/server/boot/bundle.mjs'],
    environment: {},
  })
}

/** Runs one command with its output on stderr, says every 10 s what it is at, and stamps its inputs when it succeeds. */
async function step(name, title, inputs, { command, args, environment, doing }) {
  const begun = Date.now()
  const seconds = () => `${Math.round((Date.now() - begun) / 1000)} s`
  process.stderr.write(`${title} …\n`)
  const timer = setInterval(() => process.stderr.write(`  … ${seconds()}${doing ? `, ${doing()}` : ''}\n`), 10_000)
  const code = await new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd: ROOT,
      stdio: ['ignore', 2, 2],
      env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1', ...environment },
    })
    child.on('error', reject)
    child.on('exit', resolve)
  }).finally(() => clearInterval(timer))
  if (code !== 0) throw new Error(`${title}: failed after ${seconds()}. What went wrong stands above.`)
  stamp(name, inputs)
  process.stderr.write(`  done in ${seconds()}\n`)
}
