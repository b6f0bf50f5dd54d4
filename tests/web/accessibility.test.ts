import AxeBuilder from '@axe-core/playwright'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchBrowser } from './browser'
import { type Demo, openBudget, signIn, startDemo } from './demo'

// axe-core's rules for WCAG 2.0, 2.1 and 2.2, levels A and AA: an outside reference, though no proof of conformance.
const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

let demo: Demo
let browser: Browser
beforeAll(async () => {
  ;[demo, browser] = await Promise.all([startDemo(), launchBrowser()])
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await demo?.remove()
})

async function violations(page: Page): Promise<string[]> {
  // A fade that has not ended would be judged by the colour of the moment.
  await page.evaluate(() =>
    Promise.all(document.getAnimations().map((animation) => animation.finished.catch(() => undefined))),
  )
  const { violations: found } = await new AxeBuilder({ page }).withTags(RULES).analyze()
  return found.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')}: ${node.failureSummary?.split('\n')[1]?.trim() ?? ''}`),
  )
}

for (const colorScheme of ['light', 'dark'] as const) {
  for (const width of [1440, 390]) {
    test(`every page, ${colorScheme}, ${width} px`, async () => {
      const options = { colorScheme, viewport: { width, height: 900 }, reducedMotion: 'reduce' as const }
      const signedOut = await browser.newContext({ baseURL: demo.url, ...options })
      const first = await signedOut.newPage()
      const found: Record<string, string[]> = {}
      for (const path of ['/sign-in', '/owner']) {
        await first.goto(path)
        found[path] = await violations(first)
      }
      await signedOut.close()

      const { context, page, complaints } = await signIn(browser, demo, 'maren@example.com', options)
      for (const path of ['/', '/new', '/account', '/people', '/nothing-here']) {
        await page.goto(path)
        found[path] = await violations(page)
      }
      for (const name of [
        'Larch mezzanine',
        'Tamarack fabric link',
        'Osier accelerator slot',
        'Sedge cabled backplane',
      ]) {
        await page.goto('/')
        await openBudget(page, name)
        found[name] = await violations(page)
      }
      // With a line selected and a value asked back, the page shows most of what it can.
      await page.locator('[role=gridcell][data-place="lines/bga-via-a/loss"]').click()
      const control = page.locator('[role=gridcell][data-place="lines/bga-via-a/loss"] input')
      await control.fill('1,234')
      await control.press('Enter')
      await page
        .getByText(/1,234 mean/)
        .first()
        .waitFor()
      found['a value asked back'] = await violations(page)
      await context.close()
      expect(Object.fromEntries(Object.entries(found).filter(([, list]) => list.length > 0))).toEqual({})
      expect(complaints.filter((complaint) => !/404/.test(complaint))).toEqual([])
    }, 180_000)
  }
}
