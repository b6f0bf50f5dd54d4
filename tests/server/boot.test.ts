import { spawnSync } from 'node:child_process'
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { afterEach, expect, test } from 'vitest'

const root = resolve(import.meta.dirname, '../..')
const folders: string[] = []
afterEach(() => {
  for (const folder of folders.splice(0)) rmSync(folder, { recursive: true, force: true })
})

function folderWith(tools: readonly string[]): string {
  const folder = mkdtempSync(join(tmpdir(), 'halfbaud-boot-'))
  folders.push(folder)
  for (const tool of tools) writeFileSync(join(folder, tool), '#!/bin/sh\nexit 0\n', { mode: 0o755 })
  return folder
}

/** A clone without node_modules, in which only these tools are found. */
function bootInFreshClone(tools: readonly string[]) {
  const clone = folderWith([])
  mkdirSync(join(clone, 'lib/server'), { recursive: true })
  for (const part of ['lib/server/boot.mjs', 'lib/server/boot', 'package-lock.json'])
    symlinkSync(join(root, part), join(clone, part))
  const path = folderWith(tools)
  return spawnSync(
    process.execPath,
    ['--preserve-symlinks', '--preserve-symlinks-main', join(clone, 'lib/server/boot.mjs'), 'start'],
    {
      env: { PATH: path, HOME: '', NODE_ENV: 'test' },
      encoding: 'utf8',
    },
  )
}

test.each([
  ['npm', ['g++', 'make', 'python3']],
  ['a C++ compiler', ['npm', 'make', 'python3']],
  ['make', ['npm', 'clang++', 'python3']],
  ['python3', ['npm', 'c++', 'make']],
])('without %s the first install stops with a plain sentence before it begins', (missing, tools) => {
  const { status, stderr } = bootInFreshClone(tools)
  expect(status).toBe(1)
  expect(stderr).toMatch(/^The first install compiles SQLite and needs /)
  expect(stderr).toContain(missing)
  expect(stderr.trim().split('\n')).toHaveLength(1)
})

test('an unknown command names the ones there are', () => {
  const { status, stderr } = spawnSync(process.execPath, [join(root, 'lib/server/boot.mjs'), 'strat'], {
    encoding: 'utf8',
  })
  expect(status).toBe(3)
  expect(stderr).toContain("'strat' is not a command; use one of start, serve")
})
