import fc from 'fast-check'
import { expect, test } from 'vitest'
import * as Y from 'yjs'
import { budgetSchema } from '../../lib/budget/schema'
import { applyEdit } from '../../lib/sheet/edits'
import { readBudget } from '../../lib/sheet/seed'
import { canonicalDoc, operations, sampleDoc } from './sample'

/** Who does what next: edits, or receives the next few edits of somebody else, in their order. */
const step = fc.record({
  who: fc.nat({ max: 4 }),
  from: fc.nat({ max: 4 }),
  edit: fc.option(fc.array(operations, { minLength: 1, maxLength: 3 }), { freq: 2, nil: null }),
  take: fc.integer({ min: 1, max: 4 }),
})

test('[W1.68] two to five people, edits in any order and delivery: the same budget everywhere, and it fits the schema', () => {
  let made = 0
  let refused = 0
  fc.assert(
    fc.property(
      fc.integer({ min: 2, max: 5 }),
      fc.array(step, { minLength: 10, maxLength: 60, size: 'max' }),
      (people, steps) => {
        const docs = Array.from({ length: people }, sampleDoc)
        const sent: Uint8Array[][] = docs.map(() => [])
        const received = docs.map(() => docs.map(() => 0))
        const deliver = (to: number, from: number, count: number) => {
          const seen = received[to] ?? []
          const updates = sent[from] ?? []
          const start = seen[from] ?? 0
          for (const update of updates.slice(start, start + count)) Y.applyUpdate(docs[to] as Y.Doc, update)
          seen[from] = Math.min(updates.length, start + count)
        }
        for (const { who, from, edit, take } of steps) {
          const to = who % people
          if (edit === null) {
            deliver(to, from % people, take)
            continue
          }
          const applied = applyEdit(docs[to] as Y.Doc, edit)
          if (!applied.ok) refused++
          else if (applied.update !== null) {
            made++
            sent[to]?.push(applied.update)
          }
        }
        for (const to of docs.keys())
          for (const from of docs.keys()) if (from !== to) deliver(to, from, Number.POSITIVE_INFINITY)

        const texts = new Set(docs.map(canonicalDoc))
        expect(texts.size).toBe(1)
        for (const doc of docs) {
          expect(doc.store.pendingStructs).toBeNull()
          expect(doc.store.pendingDs).toBeNull()
        }
        expect(budgetSchema.safeParse(readBudget(docs[0] as Y.Doc)).success).toBe(true)
      },
    ),
    { numRuns: 40 },
  )
  expect(made).toBeGreaterThan(200)
  expect(refused).toBeGreaterThan(5)
})
