import { mkdtemp, readFile, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { AT_NYQUIST } from '../../lib/budget/evaluate'
import { budgetSchema } from '../../lib/budget/schema'
import { openEvidence } from '../../lib/records/evidence'
import { openEvaluator } from '../../lib/server/evaluation/open'

const scenarios = new URL('../../seed-scenarios/', import.meta.url)

let directory: string
beforeEach(async () => {
  directory = await mkdtemp(join(tmpdir(), 'halfbaud-evaluator-'))
})
afterEach(() => rm(directory, { recursive: true }))

it('a stored budget counts by the evidence files of the server, one that is only sent without them', async () => {
  const larch = budgetSchema.parse(JSON.parse(await readFile(new URL('larch.json', scenarios), 'utf8')))
  const evaluator = openEvaluator(directory)
  const unread = (await evaluator.evaluate(larch, AT_NYQUIST)).flags.map(({ code }) => code)
  expect(unread).toContain('evidence-not-read')

  const files = await openEvidence(directory)
  for (const { name } of Object.values(larch.evidence)) {
    const bytes = await readFile(new URL(name ?? '', scenarios))
    await files.store(
      (async function* () {
        yield new Uint8Array(bytes)
      })(),
      bytes.length,
    )
  }
  const whole = await evaluator.evaluate(larch, AT_NYQUIST)
  expect(whole.flags).toEqual([])
  expect(whole.verdict).toBe('inside')
  expect(await evaluator.margins(larch)).toEqual(
    Object.fromEntries(
      whole.allowances.map(({ id, verdict, marginDb, knownDb }) => [id, { verdict, marginDb, knownDb }]),
    ),
  )
  const alone = await evaluator.evaluateAlone(larch, AT_NYQUIST)
  expect(alone.flags.map(({ code }) => code)).toContain('evidence-not-read')
  await evaluator.close()
})
