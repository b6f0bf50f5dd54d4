import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { afterEach, expect, test } from 'vitest'

const script = resolve(import.meta.dirname, '../../.ci/sum.mjs')
let folder: string
afterEach(() => rmSync(folder, { recursive: true, force: true }))

const green = { numPassedTests: 3, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults: [] }

function sum(reports: Record<string, unknown>, failedSteps: string[] = []) {
  folder = mkdtempSync(join(tmpdir(), 'halfbaud-sum-'))
  for (const [suite, report] of Object.entries(reports))
    writeFileSync(join(folder, `${suite}.json`), JSON.stringify(report))
  const { status, stdout } = spawnSync(process.execPath, [script, folder, 'first', 'web', '--', ...failedSteps], {
    encoding: 'utf8',
  })
  return { status, last: stdout.trimEnd().split('\n').at(-1) }
}

test('the runners are added up', () => {
  expect(sum({ first: green, web: green })).toEqual({ status: 0, last: '6 passed, 0 failed' })
})

test('a runner that wrote no report is a failure', () => {
  expect(sum({ first: green })).toEqual({ status: 1, last: '3 passed, 1 failed' })
})

test('a skipped test of the browser suite is a failure', () => {
  expect(sum({ first: green, web: { ...green, numPendingTests: 1 } })).toEqual({
    status: 1,
    last: '6 passed, 1 failed',
  })
})

test('a failed step that no report explains is a failure', () => {
  expect(sum({ first: green, web: green }, ['types', 'import rules'])).toEqual({
    status: 1,
    last: '6 passed, 2 failed',
  })
})

test('a runner that failed with a green report is a failure', () => {
  expect(sum({ first: green, web: green }, ['test'])).toEqual({ status: 1, last: '6 passed, 1 failed' })
})

test('a file that failed before its first test is a failure', () => {
  const broken = { ...green, testResults: [{ status: 'failed', assertionResults: [] }] }
  expect(sum({ first: broken, web: green }, ['test'])).toEqual({ status: 1, last: '6 passed, 1 failed' })
})
