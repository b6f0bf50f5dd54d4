import { readdirSync, readFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { expect, test } from 'vitest'

const root = resolve(import.meta.dirname, '../..')

function idsIn(text: string, pattern: RegExp): Set<string> {
  return new Set([...text.matchAll(pattern)].map((match) => match[1] ?? ''))
}

const files = readdirSync(join(root, 'tests'), { recursive: true, encoding: 'utf8' }).filter((name) =>
  name.endsWith('.test.ts'),
)
const cited = idsIn(files.map((name) => readFileSync(join(root, 'tests', name), 'utf8')).join('\n'), /\[(W\d+\.\d+)\]/g)
const guide = idsIn(readFileSync(join(root, 'DEVELOPERS.md'), 'utf8'), /\b(W\d+\.\d+)\b/g)

test('every rule of the guide is cited by a test', () => {
  expect([...guide].filter((id) => !cited.has(id))).toEqual([])
})

test('every rule that a test cites stands in the guide', () => {
  expect([...cited].filter((id) => !guide.has(id))).toEqual([])
})
