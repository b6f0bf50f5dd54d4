import { describe, expect, it } from 'vitest'
import { readBudget } from '../../../lib/sheet/seed'
import type { Queued } from '../../../lib/sync/room/queued'
import { Bench, fuzzIntake } from '../support/fuzzIntake'
import { copyOf, editOf, recordOf } from '../support/sheet'

describe('accepted and not yet committed', () => {
  it('[W4.5] the shadow equals live plus what is accepted, through refusals, commits and failures (seeds 1 to 12)', () => {
    const counts = fuzzIntake(1, 12)
    // The run did try what it is about.
    expect(Object.keys(counts).sort()).toEqual(['accepted', 'bad-value', 'failures', 'gap', 'invalid-result'])
    expect(counts.accepted).toBeGreaterThan(500)
  })

  it('[W3.25] taking one edit out gates again what was built on it, and keeps the rest', () => {
    const bench = new Bench()
    const [one, two] = [copyOf(bench.live, 10), copyOf(bench.live, 20)]
    bench.offer(
      editOf(one, (doc) => recordOf(doc, 'lines', 'trace').set('loss', '1 dB')),
      10,
    )
    bench.offer(
      editOf(two, (doc) => recordOf(doc, 'lines', 'cable').set('loss', '7 dB')),
      20,
    )
    bench.offer(
      editOf(one, (doc) => recordOf(doc, 'lines', 'trace').set('loss', '2 dB')),
      10,
    )
    const isFirst = (item: Queued) => item.kind === 'edit' && item.changes[0]?.after === '1 dB'
    const dropped = bench.intake.sift(
      (item) => (isFirst(item) ? { code: 'not-allowed', reason: 'test' } : null),
      () => true,
    )
    expect(dropped.map(({ refusal: { code } }) => code)).toEqual(['not-allowed', 'gap'])
    bench.begin(10)
    bench.finish()
    expect(readBudget(bench.live).lines.trace?.loss).toBe('5 dB')
    expect(readBudget(bench.live).lines.cable?.loss).toBe('7 dB')
  })
})
