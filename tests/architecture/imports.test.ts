import { execFile } from 'node:child_process'
import { mkdir, mkdtemp, rm, symlink, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { dirname, join, resolve } from 'node:path'
import { promisify } from 'node:util'
import { afterAll, beforeAll, expect, test } from 'vitest'

const run = promisify(execFile)
const root = resolve(import.meta.dirname, '../..')

/** [importing file, what it imports, the rule that this breaks or null where it is allowed, type only]. */
const EDGES: [from: string, to: string, rule: string | null, typeOnly?: true][] = [
  ['lib/channel/a.ts', 'lib/budget/target.ts', 'channel-imports-only-to-its-right'],
  ['lib/budget/a.ts', 'lib/sheet/target.ts', 'budget-imports-only-to-its-right'],
  ['lib/sheet/a.ts', 'lib/records/target.ts', 'sheet-imports-only-to-its-right'],
  ['lib/records/a.ts', 'lib/access/target.ts', 'records-imports-only-to-its-right'],
  ['lib/access/a.ts', 'lib/sync/target.ts', 'access-imports-only-to-its-right'],
  ['lib/sync/a.ts', 'lib/report/target.ts', 'sync-imports-only-to-its-right'],
  ['lib/report/a.ts', 'lib/server/target.ts', 'report-imports-only-to-its-right'],
  ['lib/report/b.ts', 'app/target.ts', 'report-imports-only-to-its-right'],
  ['lib/server/a.ts', 'app/target.ts', 'server-does-not-import-app'],
  ['app/a.ts', 'lib/server/target.ts', 'app-does-not-import-server'],
  ['app/b.ts', 'lib/sync/target.ts', 'app-takes-only-types-from-the-server-side'],
  ['app/budgets/client/a.ts', 'lib/sync/target.ts', 'client-code-imports-only-sheet-budget-channel', true],
  ['app/budgets/client/b.ts', 'app/services.ts', 'client-code-does-not-reach-the-services'],
  ['lib/sync/b.ts', 'tests/target.ts', 'product-does-not-import-tests'],
  ['lib/sync/c.ts', 'lib/records/target.ts', null],
  ['lib/server/b.ts', 'lib/report/target.ts', null],
  ['app/c.ts', 'lib/sync/target.ts', null, true],
  ['app/budgets/client/c.ts', 'lib/sheet/target.ts', null],
  ['app/budgets/client/d.ts', 'lib/channel/target.ts', null],
]

const found = new Map<string, string[]>()
let folder: string

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'halfbaud-imports-'))
  await symlink(join(root, 'node_modules'), join(folder, 'node_modules'))
  await put('tsconfig.json', '{"compilerOptions":{"module":"esnext","moduleResolution":"bundler"}}')
  for (const [from, to, , typeOnly] of EDGES) {
    await put(to, 'export const x = 1\nexport type X = number\n')
    const specifier = `${'../'.repeat(from.split('/').length - 1) || './'}${to.replace('.ts', '')}`
    await put(
      from,
      typeOnly ? `import type { X } from '${specifier}'\nexport type Y = X` : `export { x } from '${specifier}'`,
    )
  }
  await put('lib/budget/circleA.ts', "import type { B } from './circleB'\nexport type A = B | 1")
  await put('lib/budget/circleB.ts', "import type { A } from './circleA'\nexport type B = A | 2")
  await put('lib/sync/driver.ts', "import sqlite3 from 'sqlite3'\nexport { sqlite3 }")
  const cruiser = join(root, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs')
  const args = [cruiser, '--config', join(root, '.dependency-cruiser.cjs'), '--output-type', 'json', 'app', 'lib']
  const { stdout } = await run(process.execPath, args, { cwd: folder, maxBuffer: 1e8 }).catch((failure) => failure)
  const report = JSON.parse(stdout) as {
    summary: { violations: { from: string; to: string; rule: { name: string } }[] }
  }
  for (const { from, to, rule } of report.summary.violations) {
    if (rule.name === 'no-orphans') continue
    for (const key of [from, `${from} → ${to}`]) found.set(key, [...(found.get(key) ?? []), rule.name])
  }
})
afterAll(() => rm(folder, { recursive: true, force: true }))

async function put(name: string, text: string) {
  await mkdir(dirname(join(folder, name)), { recursive: true })
  await writeFile(join(folder, name), text)
}

test.each(EDGES)('%s importing %s: %s', (from, to, rule) => {
  expect(found.get(`${from} → ${to}`) ?? []).toEqual(rule === null ? [] : [rule])
})

test('a circle is refused, also through types', () => {
  expect(found.get('lib/budget/circleA.ts')).toContain('no-circles')
})

test('a database driver outside lib/records is refused', () => {
  expect(found.get('lib/sync/driver.ts')).toContain('drivers-stay-in-records')
})
