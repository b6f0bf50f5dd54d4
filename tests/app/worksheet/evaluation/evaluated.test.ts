import { expect, test } from 'vitest'
import { evaluated } from '../../../../app/budgets/[id]/client/state/evaluated'
import { readNetwork } from '../../../../lib/budget/evidence/readNetwork'
import { bytesOf, networkLink, THREE_DB } from './links'

const budget = networkLink({ sha256: 'aa' })
const unread = new Map()

test('a budget is evaluated once for each state of it', () => {
  expect(evaluated(budget, unread)).toBe(evaluated(budget, unread))
  expect(evaluated({ ...budget }, unread)).not.toBe(evaluated(budget, unread))
})

test('a line waits for its file, and counts 3 dB by it once it is read (−20 log10 |S21|)', () => {
  const before = evaluated(budget, unread)
  expect(before.flags.map(({ code }) => code)).toContain('evidence-not-read')
  expect(before.lines.line0?.loss.nominalDb).toBeNull()
  const after = evaluated(budget, new Map([['aa', readNetwork(bytesOf(THREE_DB), 'cable.s2p')]]))
  expect(after.flags.map(({ code }) => code)).not.toContain('evidence-not-read')
  expect(after.lines.line0?.loss.nominalDb).toBeCloseTo(3, 9)
})
