import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { AT_NYQUIST } from '../../lib/budget/evaluate'
import { type Budget, budgetSchema } from '../../lib/budget/schema'
import { EvaluationQueue } from '../../lib/server/evaluation/queue'

/** Answers with how many questions it has had; a budget named 'die' ends the thread, one named 'fail' is a failed evaluation. */
const THREAD = `
import { parentPort, workerData } from 'node:worker_threads'
let count = 0
parentPort.on('message', ({ id, budget, asked, files }) => {
  const { name } = budget.head
  if (name === 'die') process.exit(1)
  if (name === 'fail') return parentPort.postMessage({ id, failed: 'it failed' })
  count++
  const said = { name, count, files, directory: workerData }
  parentPort.postMessage(asked === null ? { id, margins: said } : { id, evaluation: said })
})
`

const budget = (name: string): Budget => budgetSchema.parse({ head: { schemaVersion: 1, name } })

let directory: string
let queue: EvaluationQueue
beforeEach(async () => {
  directory = await mkdtemp(join(tmpdir(), 'halfbaud-queue-'))
  const file = join(directory, 'thread.mjs')
  await writeFile(file, THREAD)
  queue = new EvaluationQueue(pathToFileURL(file), '/evidence')
})
afterEach(async () => {
  await queue.close()
  await rm(directory, { recursive: true })
})

describe('the queue of evaluations', () => {
  it('asks one thread, margins for the trail before whole evaluations', async () => {
    const answers = await Promise.all([
      queue.evaluate(budget('first'), AT_NYQUIST),
      queue.evaluate(budget('second'), AT_NYQUIST),
      queue.margins(budget('urgent')),
      queue.evaluateAlone(budget('stranger'), AT_NYQUIST),
    ])
    expect(answers).toEqual([
      { name: 'first', count: 1, files: true, directory: '/evidence' },
      { name: 'second', count: 3, files: true, directory: '/evidence' },
      { name: 'urgent', count: 2, files: true, directory: '/evidence' },
      { name: 'stranger', count: 4, files: false, directory: '/evidence' },
    ])
  })

  it('an evaluation that fails fails alone', async () => {
    const failing = queue.evaluate(budget('fail'), AT_NYQUIST)
    const next = queue.evaluate(budget('next'), AT_NYQUIST)
    await expect(failing).rejects.toThrow('it failed')
    expect(await next).toMatchObject({ name: 'next', count: 1 })
  })

  it('a thread that dies fails the question that it was at; the next gets a new thread', async () => {
    expect(await queue.evaluate(budget('before'), AT_NYQUIST)).toMatchObject({ count: 1 })
    const dying = queue.evaluate(budget('die'), AT_NYQUIST)
    const next = queue.margins(budget('after'))
    await expect(dying).rejects.toThrow()
    expect(await next).toMatchObject({ name: 'after', count: 1 })
  })

  it('closed, it answers nothing more and says so', async () => {
    const waiting = [queue.evaluate(budget('a'), AT_NYQUIST), queue.evaluate(budget('b'), AT_NYQUIST)]
    const settled = Promise.allSettled(waiting)
    await queue.close()
    for (const one of await settled) expect(one.status).toBe('rejected')
    await expect(queue.margins(budget('c'))).rejects.toThrow('The server stops.')
  })
})
