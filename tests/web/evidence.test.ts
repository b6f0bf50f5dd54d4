import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchBrowser } from './browser'
import { type Demo, openBudget, signIn, startDemo } from './demo'

let demo: Demo
let browser: Browser
beforeAll(async () => {
  ;[demo, browser] = await Promise.all([startDemo(), launchBrowser()])
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await demo?.remove()
})

/** A matched pair saved as two ports that loses 3 dB everywhere: by definition −20 log10 |S21|. */
const CABLE = '! Invented\n# GHz S DB R 100\n1 -60 0 -3 0 -3 0 -60 0\n30 -60 0 -3 0 -3 0 -60 0\n'

test('a line counts by an attached file, which the page reads in its worker', async () => {
  const { page, context, complaints } = await signIn(browser, demo, 'ines@example.org')
  await openBudget(page, 'Sedge cabled backplane')
  const api = `/api/v1${new URL(page.url()).pathname}`
  const statuses = await page.evaluate(attachCable, { api, text: CABLE })
  expect(statuses).toEqual([201, 200])
  const row = page.locator('[data-row="measured-cable"]')
  await row.getByText('3.00').first().waitFor()
  await page.reload()
  await row.getByText('3.00').first().waitFor()
  expect(complaints).toEqual([])
  await context.close()
}, 60_000)

/** Runs in the page, as a program of the person who is signed in. */
async function attachCable({ api, text }: { api: string; text: string }): Promise<number[]> {
  const stored = await fetch(`${api}/evidence?name=cable.s2p`, {
    method: 'POST',
    headers: { 'content-type': 'application/octet-stream' },
    body: text,
  })
  const { sha256 } = (await stored.json()) as { sha256: string }
  const file = { order: 'aF', name: 'cable.s2p', sha256, modes: 'mixed-as-two-ports', fixtures: 'none' }
  const line = { order: 'aF', name: 'Measured cable', kind: 'cable', model: 'network', taken: 'discrete' }
  const edited = await fetch(`${api}/edits`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', 'idempotency-key': 'measured-cable' },
    body: JSON.stringify({
      edits: [
        { add: 'evidence', id: 'measured-file', values: file },
        { add: 'lines', id: 'measured-cable', values: { ...line, evidence: 'measured-file' } },
      ],
    }),
  })
  return [stored.status, edited.status]
}
