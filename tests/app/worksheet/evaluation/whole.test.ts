import { afterEach, beforeEach, expect, test, vi } from 'vitest'
import type { ReadEvidence } from '../../../../app/budgets/[id]/client/evaluation/reader'
import { WholeEvaluation } from '../../../../app/budgets/[id]/client/evaluation/whole'
import { evaluate } from '../../../../lib/budget/evaluate'
import type { Evaluation } from '../../../../lib/budget/evaluation'
import type { Budget } from '../../../../lib/budget/schema'
import { link } from '../../../budget/links'
import { pending } from './links'

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())

const READ: ReadEvidence = { networks: new Map(), reading: false }
const budgets = ['a', 'b', 'c', 'd'].map((name): Budget => {
  const budget = link({})
  return { ...budget, head: { ...budget.head, name } }
})
const [a, b, c, d] = budgets as [Budget, Budget, Budget, Budget]
const evaluations = new Map(budgets.map((budget) => [budget, evaluate(budget, new Map())]))
const of = (budget: Budget) => evaluations.get(budget) as Evaluation

/** A whole evaluation whose worker the test plays. */
function whole() {
  const asked: (ReturnType<typeof pending<Evaluation>> & { budget: Budget })[] = []
  const opened = new WholeEvaluation((budget) => {
    const answer = { ...pending<Evaluation>(), budget }
    asked.push(answer)
    return answer.promise
  })
  const names = () => asked.map(({ budget }) => budget.head.name).join(' ')
  const finish = async (k: number, failed?: string) => {
    const one = asked[k]
    if (failed !== undefined) one?.reject(new Error(failed))
    else if (one) one.resolve(of(one.budget))
    await vi.advanceTimersByTimeAsync(0)
  }
  return { opened, names, finish, state: opened.getSnapshot, pass: (ms: number) => vi.advanceTimersByTimeAsync(ms) }
}

test('nothing is computed while nobody looks, and at once when somebody does', async () => {
  const { opened, names, finish, state, pass } = whole()
  opened.show(a, READ)
  opened.show(b, READ)
  await pass(10_000)
  expect(names()).toBe('')
  const leave = opened.look()
  expect(names()).toBe('b')
  expect(state()).toEqual({ evaluation: null, working: true, failed: null })
  await finish(0)
  expect(state()).toEqual({ evaluation: of(b), working: false, failed: null })
  leave()
  opened.show(c, READ)
  await pass(10_000)
  expect(names()).toBe('b')
})

test('edits are waited for: one evaluation 250 ms after the last of them, the old one staying meanwhile', async () => {
  const { opened, names, finish, state, pass } = whole()
  opened.look()
  opened.show(a, READ)
  await finish(0)
  opened.show(b, READ)
  await pass(200)
  opened.show(c, READ)
  await pass(249)
  expect(names()).toBe('a')
  expect(state()).toEqual({ evaluation: of(a), working: true, failed: null })
  await pass(1)
  expect(names()).toBe('a c')
  await finish(1)
  expect(state()).toEqual({ evaluation: of(c), working: false, failed: null })
})

test('one at a time; of the states that come while it works only the last is evaluated', async () => {
  const { opened, names, finish, state, pass } = whole()
  opened.look()
  opened.show(a, READ)
  opened.show(b, READ)
  await pass(300)
  opened.show(c, READ)
  await pass(300)
  opened.show(d, READ)
  await pass(300)
  expect(names()).toBe('a')
  await finish(0)
  expect(names()).toBe('a d')
  expect(state()).toEqual({ evaluation: of(a), working: true, failed: null })
  await finish(1)
  expect(state()).toEqual({ evaluation: of(d), working: false, failed: null })
})

test('an evaluation that ends within the pause of a newer edit does not cut it short', async () => {
  const { opened, names, finish, pass } = whole()
  opened.look()
  opened.show(a, READ)
  opened.show(b, READ)
  await pass(100)
  await finish(0)
  expect(names()).toBe('a')
  await pass(150)
  expect(names()).toBe('a b')
})

test('it waits for files that are being read, and follows one that was read later', async () => {
  const { opened, names, finish, state } = whole()
  opened.look()
  opened.show(a, { ...READ, reading: true })
  expect(names()).toBe('')
  expect(state().working).toBe(true)
  opened.show(a, READ)
  await finish(0)
  opened.show(a, READ)
  expect(names()).toBe('a')
  opened.show(a, { networks: new Map(), reading: false })
  expect(names()).toBe('a a')
})

test('a failure is said in words, the last evaluation stays; the next edit or the next look tries again', async () => {
  const { opened, names, finish, state, pass } = whole()
  const leave = opened.look()
  opened.show(a, READ)
  await finish(0)
  opened.show(b, READ)
  await pass(250)
  await finish(1, 'Too large.')
  expect(state()).toEqual({ evaluation: of(a), working: false, failed: 'Too large.' })
  await pass(10_000)
  expect(names()).toBe('a b')
  leave()
  opened.look()
  expect(names()).toBe('a b b')
  expect(state()).toEqual({ evaluation: of(a), working: true, failed: null })
  await finish(2, 'Too large.')
  opened.show(c, READ)
  await pass(250)
  expect(names()).toBe('a b b c')
})

test('the failure of a state that is gone is not told', async () => {
  const { opened, names, finish, state, pass } = whole()
  opened.look()
  opened.show(a, READ)
  opened.show(b, READ)
  await pass(250)
  await finish(0, 'Too large.')
  expect(names()).toBe('a b')
  expect(state().failed).toBeNull()
})

test('an edit whose pause nobody waits for is not evaluated, but is when somebody looks again', async () => {
  const { opened, names, finish, pass } = whole()
  const leave = opened.look()
  opened.show(a, READ)
  await finish(0)
  opened.show(b, READ)
  leave()
  await pass(10_000)
  expect(names()).toBe('a')
  opened.look()
  expect(names()).toBe('a b')
})
