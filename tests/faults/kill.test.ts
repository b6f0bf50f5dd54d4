import { afterAll, beforeAll, expect, test } from 'vitest'
import { inspect, killOnce, type Prepared, prepare } from './killing'

let prepared: Prepared
beforeAll(async () => {
  prepared = await prepare()
})
afterAll(() => prepared?.remove())

test('[W5.9] five kills of the server while edits are in flight lose nothing that was acknowledged', async () => {
  const acknowledged = new Map<string, number>()
  let during = 0
  for (let kill = 0; kill < 5; kill += 1) {
    const how = kill === 2 ? { afterAcknowledgements: 40 } : { atAppend: 15 + 7 * kill, afterMicroseconds: 60 * kill }
    const { duringAppend, waiting } = await killOnce(prepared, acknowledged, how)
    expect(waiting).toBeGreaterThan(0)
    if (duringAppend) during += 1
  }
  const found = await inspect(prepared, acknowledged)
  expect(found).toMatchObject({ lost: [], twice: [], chain: null, problems: [] })
  expect(acknowledged.size).toBeGreaterThan(50)
  expect(during).toBeGreaterThanOrEqual(3)
}, 120_000)
