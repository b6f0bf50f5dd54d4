import { createHash } from 'node:crypto'
import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { generateKeyBetween } from 'fractional-indexing'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { evaluate, WHOLE } from '../../lib/budget/evaluate'
import { readNetwork } from '../../lib/budget/evidence/readNetwork'
import { SECTIONS } from '../../lib/budget/schema'
import { readScenarios } from '../../lib/server/scenarios'

const FOLDER = fileURLToPath(new URL('../../seed-scenarios', import.meta.url))

describe('the example links as they are handed out', () => {
  it('are four, with four people, one owner each', async () => {
    const { people, links } = await readScenarios(FOLDER)
    expect(links.map(({ id }) => id)).toEqual(['larch', 'osier', 'sedge', 'tamarack'])
    expect(people).toHaveLength(4)
    for (const { members } of links) expect(Object.values(members)).toContain('owner')
  })

  it('use e-mail addresses that nobody can own (RFC 2606)', async () => {
    const { people } = await readScenarios(FOLDER)
    for (const { email } of people) expect(email).toMatch(/@example\.(com|org|net)$/)
  })

  it('have order keys that the next insertion can build on, and no reference into nothing', async () => {
    const { links } = await readScenarios(FOLDER)
    for (const { budget } of links) {
      const rows = [...Object.values(budget.lines), ...Object.values(budget.planes)]
      expect(new Set(rows.map(({ order }) => order)).size).toBe(rows.length)
      for (const section of Object.keys(SECTIONS) as (keyof typeof SECTIONS)[]) {
        for (const record of Object.values(budget[section])) {
          expect(() => generateKeyBetween(record.order, null)).not.toThrow()
        }
      }
      for (const { assembly, lossClass } of Object.values(budget.lines)) {
        expect(Object.keys(budget.assemblies)).toContain(assembly)
        if (lossClass !== null) expect(budget.lossClasses[lossClass]?.assembly).toBe(assembly)
      }
      for (const { from, to } of Object.values(budget.allowances)) {
        expect(Object.keys(budget.planes)).toEqual(expect.arrayContaining([from, to]))
      }
    }
  })
})

describe('their evidence', () => {
  it('is the files beside them: SHA-256, size, ports and highest frequency are those of the file', async () => {
    const { links } = await readScenarios(FOLDER)
    const named = links.flatMap(({ budget }) => Object.values(budget.evidence))
    expect(named.map(({ name }) => name).sort()).toEqual(
      (await readdir(FOLDER)).filter((name) => /\.s\d+p$/.test(name)).sort(),
    )
    for (const { name, sha256, size, ports, highest } of named) {
      const bytes = await readFile(join(FOLDER, name ?? ''))
      expect(createHash('sha256').update(bytes).digest('hex'), name ?? '').toBe(sha256)
      expect(bytes.byteLength, name ?? '').toBe(size)
      const read = readNetwork(bytes, name ?? '')
      if (!('network' in read)) throw new Error(read.problem)
      expect(read.network.ports, name ?? '').toBe(ports)
      expect(`${(read.network.hz.at(-1) ?? 0) / 1e9} GHz`, name ?? '').toBe(highest)
    }
  })

  it.each([
    ['larch', 'inside'],
    ['osier', 'over'],
    ['sedge', 'inside'],
    ['tamarack', 'tight'],
  ])('%s is %s with its files, and nothing in it is a problem', async (id, verdict) => {
    const link = (await readScenarios(FOLDER)).links.find((one) => one.id === id)
    if (!link) throw new Error(`No link ${id}.`)
    const networks = new Map(link.files.map(({ sha256, name, bytes }) => [sha256, readNetwork(bytes, name)]))
    const evaluation = evaluate(link.budget, networks, WHOLE)
    expect(evaluation.verdict).toBe(verdict)
    expect(evaluation.flags.filter(({ severity }) => severity === 'problem')).toEqual([])
  })
})

describe('a folder of example links that is wrong', () => {
  let folder = ''
  const people = [
    { id: 'a', name: 'A', email: 'a@example.com', disciplines: ['layout'] },
    { id: 'b', name: 'B', email: 'b@example.com', disciplines: ['test'] },
  ]
  beforeEach(async () => {
    folder = await mkdtemp(join(tmpdir(), 'halfbaud-scenarios-'))
    await writeFile(join(folder, 'osier.json'), await readFile(join(FOLDER, 'osier.json')))
  })
  afterEach(() => rm(folder, { recursive: true }))
  const given = (content: object) => writeFile(join(folder, 'people.json'), JSON.stringify(content))

  it.each([
    [{ people, members: {} }, "Give 'osier' exactly one owner."],
    [{ people, members: { osier: { a: 'owner', b: 'owner' } } }, "Give 'osier' exactly one owner."],
    [{ people, members: { osier: { a: 'owner', c: 'viewer' } } }, "'c' of 'osier' is not among the people."],
    [{ people, members: { osier: { a: 'owner' }, birch: { a: 'owner' } } }, 'There is no file birch.json.'],
    [{ people: [people[0], people[0]], members: {} }, 'Two people have the same id.'],
    [{ people, members: { osier: { a: 'king' } } }, 'members.osier.a'],
  ])('%j: %s', async (content, message) => {
    await given(content)
    await expect(readScenarios(folder)).rejects.toThrow(message)
  })

  it('says where a file is no JSON, and which field is wrong', async () => {
    await given({ people, members: { osier: { a: 'owner' } } })
    await expect(readScenarios(folder)).resolves.toHaveProperty('links.length', 1)
    await writeFile(join(folder, 'osier.json'), '{"head": {"schemaVersion": 1},\n}')
    await expect(readScenarios(folder)).rejects.toThrow('osier.json:2:1: ')
    await writeFile(join(folder, 'osier.json'), '{"head": {"schemaVersion": 1, "reference": "85"}}')
    await expect(readScenarios(folder)).rejects.toThrow('head.reference')
  })

  it('says which file of the evidence is not beside the link, or is another one', async () => {
    await given({ people, members: { osier: { a: 'owner' } } })
    const record = { order: 'a0', name: 'a.s2p', mediaType: 'text/plain', sha256: '0'.repeat(64), size: 1 }
    const withEvidence = (change: object) =>
      writeFile(
        join(folder, 'osier.json'),
        JSON.stringify({ head: { schemaVersion: 1 }, evidence: { cable: { ...record, ...change } } }),
      )
    await withEvidence({})
    await expect(readScenarios(folder)).rejects.toThrow("evidence 'cable': there is no file a.s2p beside it.")
    await writeFile(join(folder, 'a.s2p'), 'x')
    await expect(readScenarios(folder)).rejects.toThrow(/a\.s2p has the SHA-256 [0-9a-f]{64} and 1 bytes/)
    await withEvidence({ name: '../a.s2p' })
    await expect(readScenarios(folder)).rejects.toThrow('give it a file name')
    await withEvidence({ sha256: createHash('sha256').update('x').digest('hex') })
    await expect(readScenarios(folder)).resolves.toMatchObject({ links: [{ files: [{ name: 'a.s2p' }] }] })
  })
})
