import { execFile } from 'node:child_process'
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Evaluation } from '../../../lib/budget/evaluation'
import type { BudgetFile } from '../../../lib/budget/schema'
import { main } from '../../../lib/server/cli/main'

const ROOT = fileURLToPath(new URL('../../..', import.meta.url))
const SCENARIO = (name: string) => join(ROOT, 'seed-scenarios', `${name}.json`)

async function run(argv: string[], typed: string | Uint8Array = '') {
  let out = ''
  let err = ''
  const status = await main(argv, {
    stdin: (async function* () {
      yield typed
    })(),
    stdout: { write: (text: string) => (out += text) },
    stderr: { write: (text: string) => (err += text) },
  })
  return { status, out, err }
}

const link = (change: Partial<BudgetFile>): string =>
  JSON.stringify({ head: { schemaVersion: 1, bitRate: '10 Gb/s', rateType: 'line', code: 'NRZ' }, ...change })

describe('halfbaud evaluate', () => {
  let folder = ''
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'halfbaud-cli-'))
  })
  afterAll(() => rm(folder, { recursive: true }))

  it.each([
    ['larch', 'inside', 0],
    ['sedge', 'inside', 0],
    ['tamarack', 'tight', 1],
    ['osier', 'over', 1],
  ])('prints the evaluation of %s, %s, with status %i', async (name, verdict, status) => {
    const result = await run(['evaluate', SCENARIO(name)])
    expect(result).toMatchObject({ status, err: '' })
    const evaluation = JSON.parse(result.out) as Evaluation
    expect(evaluation.verdict).toBe(verdict)
    expect(evaluation.engine).toMatch(/\d/)
  })

  it('answers 2 where nothing can be decided', async () => {
    const result = await run(['evaluate', '-'], link({}))
    expect(result).toMatchObject({ status: 2, err: '' })
    expect((JSON.parse(result.out) as Evaluation).signalling.nyquist).toBe(5e9)
  })

  it('reads the standard input like a file', async () => {
    const text = await readFile(SCENARIO('osier'), 'utf8')
    expect(await run(['evaluate', '-'], text)).toEqual(await run(['evaluate', SCENARIO('osier')]))
  })

  it('names the line, the field and what to do', async () => {
    const file = join(folder, 'budget.json')
    await writeFile(
      file,
      link({
        lines: {
          'slot-via': { order: 'a0', name: 'Slot via', loss: '-0.55 dB' },
          other: { order: 'a1', at: '16', colour: 'red' } as object & { order: string },
        },
        laneValues: { 'slot-via/1/length': '5' },
      }),
    )
    const { status, out, err } = await run(['evaluate', file])
    expect({ status, out }).toEqual({ status: 3, out: '' })
    const complaints = err.trimEnd().split('\n')
    expect(complaints).toHaveLength(4)
    for (const complaint of complaints) expect(complaint.startsWith(`${file}: `)).toBe(true)
    expect(complaints[0]).toContain("'Slot via' (lines.slot-via), stated loss: A loss is typed as a positive number")
    expect(complaints[1]).toMatch(/lines\.other.*frequency of the stated loss: Add a unit: Hz, kHz, MHz, GHz\./)
    expect(complaints[2]).toMatch(/lines\.other.*'colour'.*take it out/)
    expect(complaints[3]).toContain("'Slot via' (lines.slot-via), lane 1, length: Add a unit")
  })

  it.each([
    ['{"head": {"schemaVersion": 1},\n "lines": }', ':2:11: This is not JSON. Put a value here'],
    ['', ':1:1: This is not JSON. The text ends too early.'],
    ['{"head": {"schemaVersion": 1, "name": "a", "name": "b"}}', "The name 'name' stands twice here"],
  ])('says where JSON is bad: %j', async (text, message) => {
    const { status, err } = await run(['evaluate', '-'], text)
    expect(status).toBe(3)
    expect(err).toMatch(/^standard input:/)
    expect(err).toContain(message)
  })

  it.each([
    ['[]', 'schemaVersion'],
    ['{"head": {"schemaVersion": 2}}', 'newer version'],
  ])('refuses what is JSON but no budget: %s', async (text, message) => {
    const { status, err } = await run(['evaluate', '-'], text)
    expect(status).toBe(3)
    expect(err).toContain(message)
  })

  it('says why a file cannot be read', async () => {
    const missing = join(folder, 'missing.json')
    expect(await run(['evaluate', missing])).toEqual({
      status: 3,
      out: '',
      err: `${missing}: There is no such file; check the name.\n`,
    })
    expect((await run(['evaluate', folder])).err).toBe(`${folder}: This is a folder; name a file in it.\n`)
    const latin = await run(['evaluate', '-'], new Uint8Array([0x7b, 0xb5, 0x7d]))
    expect(latin).toMatchObject({ status: 3, err: 'standard input: This is not UTF-8 text; save it as UTF-8.\n' })
  })

  it.each([
    [[], 'Name a command.'],
    [['evalaute', 'x.json'], "'evalaute' is not a command."],
    [['constructor'], "'constructor' is not a command."],
    [['evaluate'], 'Name one budget file'],
    [['evaluate', 'a.json', 'b.json'], 'Name one budget file'],
    [['evaluate', '--verbose'], 'Name one budget file'],
  ])('answers the words %j with its usage and status 3', async (words, message) => {
    const { status, out, err } = await run(words)
    expect({ status, out }).toEqual({ status: 3, out: '' })
    expect(err).toContain(message)
    expect(err).toContain('evaluate FILE')
  })

  it('prints its usage when asked', async () => {
    const result = await run(['help'])
    expect(result).toMatchObject({ status: 0, err: '' })
    expect(result.out).toContain('evaluate FILE')
  })

  it('runs as a process of its own, with the verdict as its exit status', async () => {
    const args = ['--import', 'tsx', 'lib/server/cli/entry.ts', 'evaluate', SCENARIO('osier')]
    const ended = await new Promise<{ code: unknown; stdout: string; stderr: string }>((resolve) => {
      execFile(process.execPath, args, { cwd: ROOT }, (error, stdout, stderr) =>
        resolve({ code: error?.code ?? 0, stdout, stderr }),
      )
    })
    expect({ code: ended.code, stderr: ended.stderr }).toEqual({ code: 1, stderr: '' })
    expect(ended.stdout).toBe((await run(['evaluate', SCENARIO('osier')])).out)
  })
})
