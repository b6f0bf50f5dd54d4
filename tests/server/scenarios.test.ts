import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { generateKeyBetween } from 'fractional-indexing'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { SECTIONS } from '../../lib/budget/schema'
import { readScenarios } from '../../lib/server/scenarios'

const FOLDER = fileURLToPath(new URL('../../seed-scenarios', import.meta.url))

describe('the example links as they are handed out', () => {
  it('are three, with four people, one owner each', async () => {
    const { people, links } = await readScenarios(FOLDER)
    expect(links.map(({ id }) => id)).toEqual(['osier', 'sedge', 'tamarack'])
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
})
