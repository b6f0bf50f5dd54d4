import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchBrowser } from './browser'
import { cell, type Demo, openBudget, signIn, startDemo } from './demo'

let demo: Demo
let browser: Browser
beforeAll(async () => {
  ;[demo, browser] = await Promise.all([startDemo(), launchBrowser()])
}, 120_000)
afterAll(async () => {
  await browser?.close()
  await demo?.remove()
})

const focusedPlace = (page: Page) =>
  page.evaluate(() => document.activeElement?.closest('[data-place]')?.getAttribute('data-place') ?? null)

test('1,234 is asked back, a minus is refused, 3,2 in is taken; Escape restores', async () => {
  const { page, context } = await signIn(browser, demo, 'ines@example.org')
  await openBudget(page, 'Sedge cabled backplane')
  const place = 'lines/controller-trace/length'
  await cell(page, place).click()
  const control = cell(page, place).locator('input')
  await control.fill('1,234 in')
  await control.press('Enter')
  await page.getByText('Does 1,234 mean 1234 or 1.234?').first().waitFor()
  expect(await control.inputValue()).toBe('1,234 in')
  expect(await control.getAttribute('aria-invalid')).toBe('true')
  await control.fill('3,2 in')
  await control.press('Enter')
  await page
    .getByRole('region', { name: 'Trail' })
    .getByRole('listitem')
    .filter({ hasText: '3,2 in' })
    .first()
    .waitFor()
  expect(await cell(page, place).textContent()).toContain('3,2 in')

  await cell(page, 'lines/bga-via-a/loss').click()
  const loss = cell(page, 'lines/bga-via-a/loss').locator('input')
  await loss.fill('-1.2 dB')
  await loss.press('Enter')
  await page
    .getByText(/typed as a positive number/)
    .first()
    .waitFor()
  await loss.press('Escape')
  expect(await cell(page, 'lines/bga-via-a/loss').textContent()).toContain('0.15 dB')
  await context.close()
}, 90_000)

test('by keyboard alone: sign in, open, change a line, undo, redo, add, move and take out a line', async () => {
  const context = await browser.newContext({ baseURL: demo.url, viewport: { width: 1440, height: 1000 } })
  const page = await context.newPage()
  await page.goto('/sign-in')
  const tabTo = async (what: () => Promise<boolean>) => {
    for (let presses = 0; presses < 200; presses += 1) {
      if (await what()) return
      await page.keyboard.press('Tab')
    }
    throw new Error('Tab does not reach it.')
  }
  const focused = (selector: string) => () =>
    page.evaluate((wanted) => document.activeElement?.matches(wanted) ?? false, selector)
  const focusedLink = (text: string) => () =>
    page
      .evaluate(
        (wanted) => document.activeElement?.matches('a') && document.activeElement.textContent?.includes(wanted),
        text,
      )
      .then(Boolean)

  await tabTo(focused('input[name=email]'))
  await page.keyboard.type('tolga@example.com')
  await tabTo(focused('input[name=password]'))
  await page.keyboard.type(demo.passwords.get('tolga@example.com') ?? '')
  await page.keyboard.press('Enter')
  await page.waitForURL(`${demo.url}/`)
  await tabTo(focusedLink('Sedge cabled backplane'))
  await page.keyboard.press('Enter')
  await page.waitForURL(/\/budgets\//)
  await page.getByText('Everything saved').waitFor()

  await tabTo(
    async () =>
      (await focusedPlace(page)) !== null &&
      (await page.evaluate(
        () =>
          document.activeElement?.getAttribute('role') === 'gridcell' ||
          document.activeElement?.closest('[role=grid]') !== null,
      )),
  )
  for (let presses = 0; (await focusedPlace(page)) !== 'lines/bga-via-a/loss' && presses < 40; presses += 1) {
    await page.keyboard.press(presses % 8 === 7 ? 'ArrowDown' : presses < 8 ? 'ArrowRight' : 'ArrowLeft')
  }
  expect(await focusedPlace(page)).toBe('lines/bga-via-a/loss')
  await page.keyboard.press('Enter')
  await page.keyboard.type('0.35')
  await page.keyboard.press('Enter')
  await shows(page, 'lines/bga-via-a/loss', '0.35 dB')
  await page.keyboard.press('Control+z')
  await shows(page, 'lines/bga-via-a/loss', '0.15 dB')
  await page.keyboard.press('Control+Shift+z')
  await shows(page, 'lines/bga-via-a/loss', '0.35 dB')

  const order = () =>
    page
      .locator('[role=gridcell][data-target=loss], [role=gridcell][data-target=length]')
      .evaluateAll((cells) => cells.map((one) => one.getAttribute('data-place')))
  const before = await order()
  await page.keyboard.press('Alt+ArrowDown')
  await expect.poll(order).not.toEqual(before)
  expect(await focusedPlace(page)).toBe('lines/bga-via-a/loss')
  await page.keyboard.press('Alt+ArrowUp')
  await expect.poll(order).toEqual(before)

  await page.keyboard.press('Insert')
  await expect.poll(async () => (await order()).length).toBe(before.length + 1)
  await page.keyboard.press('Control+z')
  await expect.poll(async () => (await order()).length).toBe(before.length)
  await context.close()
}, 120_000)

test('the open line adds what is typed, and says what it did not understand', async () => {
  const { page, context } = await signIn(browser, demo, 'ines@example.org')
  await openBudget(page, 'Sedge cabled backplane')
  const open = page.getByLabel(/New line or plane/)
  await open.fill('via 0.60 dB')
  await open.press('Enter')
  await page
    .getByRole('region', { name: 'Trail' })
    .getByRole('listitem')
    .filter({ hasText: 'Ines Fioprata' })
    .filter({ hasText: /via/i })
    .first()
    .waitFor()
  await open.fill('flux capacitor 88 mph')
  await open.press('Enter')
  await page
    .getByText(/mph|flux/)
    .last()
    .waitFor()
  expect(await open.inputValue()).toBe('flux capacitor 88 mph')
  await context.close()
}, 60_000)

test('a viewer reads everything and can change nothing', async () => {
  const { page, context } = await signIn(browser, demo, 'tolga@example.com')
  await openBudget(page, 'Osier accelerator slot')
  await page.getByText('you may read this budget').waitFor()
  const loss = page.locator('[role=gridcell][data-target=loss]').first()
  await loss.click()
  expect(await loss.locator('input').count()).toBe(0)
  expect(await loss.getAttribute('aria-readonly')).toBe('true')
  await context.close()
}, 60_000)

test('who is not a member does not learn that a budget exists', async () => {
  const owner = await signIn(browser, demo, 'maren@example.com')
  await openBudget(owner.page, 'Sedge cabled backplane')
  const address = owner.page.url()
  await owner.context.close()
  const context = await browser.newContext({ baseURL: demo.url })
  const page = await context.newPage()
  await page.goto(address)
  await page.waitForURL(/\/sign-in\?/)
  const other = await signIn(browser, demo, 'pavel@example.net')
  const hidden = await other.page.goto(address)
  const hiddenText = await other.page.locator('main').textContent()
  const missing = await other.page.goto(address.replace(/[^/]+$/, 'no-such-budget'))
  expect([hidden?.status(), missing?.status()]).toEqual([404, 404])
  expect(await other.page.locator('main').textContent()).toBe(hiddenText)
  await context.close()
  await other.context.close()
}, 60_000)

test('a budget is made from nothing, from an example and from a file; a wrong file says what is wrong', async () => {
  const { page, context } = await signIn(browser, demo, 'pavel@example.net')
  await page.goto('/new')
  const choose = (name: string, text: string) =>
    page.setInputFiles('input[type=file]', { name, mimeType: 'application/json', buffer: Buffer.from(text) })
  const make = page.getByRole('button', { name: 'Make it from this file' })
  await choose('broken.json', '{"head": {"schemaVersion": 1,}}')
  await make.click()
  await page
    .getByText(/line 1, column/i)
    .first()
    .waitFor()
  await choose('negative.json', JSON.stringify(fileWith('-0.5 dB')))
  await make.click()
  await page
    .getByText(/'Via'.*positive number/)
    .first()
    .waitFor()
  await choose('good.json', JSON.stringify(fileWith('0.5 dB')))
  await make.click()
  await page.waitForURL(/\/budgets\//)
  await page.getByText('Everything saved').waitFor()
  await shows(page, 'lines/via/loss', '0.5 dB')
  await context.close()
}, 60_000)

async function shows(page: Page, place: string, text: string) {
  await expect.poll(() => cell(page, place).textContent(), { timeout: 10_000 }).toContain(text)
}

const fileWith = (loss: string) => ({
  head: { schemaVersion: 1, name: 'From a file' },
  lines: { via: { order: 'a0', name: 'Via', kind: 'via', model: 'stated', loss, at: '10 GHz' } },
})
