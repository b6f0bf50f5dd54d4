import { afterAll, beforeAll, expect, test } from 'vitest'
import { inspect, killOnce, type Prepared, prepare } from './killing'

let prepared: Prepared
beforeAll(async () => {
  prepared = await prepare()
})
afterAll(() => prepared?.remove())

const KILLS = 30
const seed = Number(process.env.SEED ?? 20261201)

/** mulberry32: a small seeded generator, so that a failing run can be had again. */
function randomFrom(state: number): () => number {
  let a = state
  return () => {
    a = (a + 0x6d2b79f5) | 0
    let t = Math.imul(a ^ (a >>> 15), 1 | a)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
}

test(`[W5.9] ${KILLS} kills, two thirds during an append, lose nothing that was acknowledged (seed ${seed})`, async () => {
  const random = randomFrom(seed)
  const acknowledged = new Map<string, number>()
  let during = 0
  for (let kill = 0; kill < KILLS; kill += 1) {
    const how =
      kill % 5 === 4
        ? { afterAcknowledgements: 1 + Math.floor(random() * 80) }
        : { atAppend: 2 + Math.floor(random() * 60), afterMicroseconds: Math.floor(random() * 400) }
    const { duringAppend } = await killOnce(prepared, acknowledged, how)
    if (duringAppend) during += 1
  }
  const found = await inspect(prepared, acknowledged)
  console.log(
    `${KILLS} kills, ${during} during an append, ${acknowledged.size} acknowledged edits, ${found.entries} entries`,
  )
  expect(found).toMatchObject({ lost: [], twice: [], chain: null, problems: [] })
  expect(during).toBeGreaterThanOrEqual((KILLS * 2) / 3)
})
