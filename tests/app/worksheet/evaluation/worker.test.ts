import { expect, test, vi } from 'vitest'
import { answer, handedOver } from '../../../../app/budgets/[id]/client/evaluation/answer'
import { openEvaluator } from '../../../../app/budgets/[id]/client/evaluation/evaluator'
import { EvidenceLibrary, type FetchFile } from '../../../../app/budgets/[id]/client/evaluation/library'
import { EvaluationThread, type StartThread } from '../../../../app/budgets/[id]/client/evaluation/thread'
import { evaluate, WHOLE } from '../../../../lib/budget/evaluate'
import { readNetwork } from '../../../../lib/budget/evidence/readNetwork'
import { bytesOf, networkLink, THREE_DB } from './links'

const CABLE = { sha256: 'aa', name: 'cable.s2p' }
const budget = networkLink(CABLE)
const inPlace = new Map([['aa', readNetwork(bytesOf(THREE_DB), 'cable.s2p')]])
const server = (): FetchFile => vi.fn(async (_, { sha256 }) => (sha256 === 'aa' ? bytesOf(THREE_DB) : null))

/** A worker in this thread: what passes is copied and handed over as between threads. */
function workers(fetchFile: FetchFile) {
  const started: { lose(why: string): void; stopped: boolean }[] = []
  const start: StartThread = ({ heard, lost }) => {
    const library = new EvidenceLibrary(fetchFile)
    const worker = { lose: lost, stopped: false }
    started.push(worker)
    return {
      send: (question) => {
        void answer(library, structuredClone(question)).then((given) => {
          if (!worker.stopped) heard(structuredClone(given, { transfer: handedOver(given) }))
        })
      },
      stop: () => {
        worker.stopped = true
      },
    }
  }
  return { start, started }
}

test('a file is fetched and read once, handed to the page, and kept for whole evaluations', async () => {
  const fetchFile = server()
  const thread = new EvaluationThread('tamarack', workers(fetchFile).start)
  const [first, second] = await Promise.all([thread.read(CABLE), thread.read(CABLE)])
  expect(first).toEqual(inPlace.get('aa'))
  expect(second).toEqual(first)
  const evaluation = await thread.evaluate(budget)
  expect(evaluation).toEqual(evaluate(budget, inPlace, WHOLE))
  expect(evaluation.lines.line0?.loss.nominalDb).toBeCloseTo(3, 9)
  expect(evaluation.allowances[0]?.channel?.coveredDb).toBeCloseTo(3, 9)
  expect(fetchFile).toHaveBeenCalledTimes(1)
  expect(fetchFile).toHaveBeenCalledWith('tamarack', CABLE)
})

test('a file that the server does not have is null, and left out of a whole evaluation, which says so', async () => {
  const thread = new EvaluationThread('tamarack', workers(server()).start)
  const unknown = { sha256: 'bb', name: 'cable.s2p' }
  expect(await thread.read(unknown)).toBeNull()
  const { flags, lines } = await thread.evaluate(networkLink(unknown))
  expect(flags.map(({ code }) => code)).toContain('evidence-not-read')
  expect(lines.line0?.loss.nominalDb).toBeNull()
})

test('a file that cannot be fetched fails in words, and is fetched again', async () => {
  const fetchFile = vi.fn(server()).mockRejectedValueOnce(new Error("The file 'cable.s2p' could not be fetched."))
  const thread = new EvaluationThread('tamarack', workers(fetchFile).start)
  await expect(thread.evaluate(budget)).rejects.toThrow("The file 'cable.s2p' could not be fetched.")
  expect(await thread.read(CABLE)).toEqual(inPlace.get('aa'))
})

test('a worker that dies fails what it was asked; the next question gets a new one, none after closing', async () => {
  const { start, started } = workers(server())
  const thread = new EvaluationThread('tamarack', start)
  expect(started).toHaveLength(0)
  const asked = [thread.read(CABLE), thread.evaluate(budget)]
  started[0]?.lose('out of memory')
  for (const each of asked) await expect(each).rejects.toThrow('stopped (out of memory)')
  expect(started[0]?.stopped).toBe(true)
  expect(await thread.read(CABLE)).toEqual(inPlace.get('aa'))
  expect(started).toHaveLength(2)
  thread.close()
  await expect(thread.read(CABLE)).rejects.toThrow('closed')
  expect(started).toHaveLength(2)
  expect(started[1]?.stopped).toBe(true)
})

test('no worker is started for a budget without files that nobody looks at', () => {
  const { start, started } = workers(server())
  const evaluator = openEvaluator('tamarack', start)
  evaluator.show(networkLink())
  expect(started).toHaveLength(0)
  evaluator.whole.look()
  expect(started).toHaveLength(1)
  evaluator.close()
  expect(started[0]?.stopped).toBe(true)
})

test('the page follows: the file is read first, then the whole is evaluated once', async () => {
  const { start } = workers(server())
  const evaluator = openEvaluator('tamarack', start)
  const evaluations: unknown[] = []
  const done = new Promise<void>((finished) => {
    evaluator.whole.subscribe(() => {
      const { evaluation, working } = evaluator.whole.getSnapshot()
      if (evaluation) evaluations.push(evaluation)
      if (!working) finished()
    })
  })
  evaluator.whole.look()
  evaluator.show(budget)
  await done
  expect(evaluator.evidence.getSnapshot().networks).toEqual(inPlace)
  expect(evaluations).toEqual([evaluate(budget, inPlace, WHOLE)])
  evaluator.close()
})
