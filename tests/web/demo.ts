import { type ChildProcess, spawn } from 'node:child_process'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import type { Browser, BrowserContext, Page } from 'playwright-core'
import { freePort } from '../support/freePort'
import { watchConsole } from './browser'

const root = resolve(import.meta.dirname, '../..')

export type Demo = {
  readonly url: string
  readonly passwords: ReadonlyMap<string, string>
  /** kill -9. */
  kill(): Promise<void>
  start(): Promise<void>
  remove(): Promise<void>
}

/** The built demo as `npm start` runs it, on a port and a data directory of its own. */
export async function startDemo(): Promise<Demo> {
  const directory = await mkdtemp(join(tmpdir(), 'halfbaud-web-'))
  const port = await freePort()
  const passwords = new Map<string, string>()
  let child: ChildProcess | null = null

  async function start() {
    const started = spawn(process.execPath, ['dist/server.mjs', 'demo'], {
      cwd: root,
      env: {
        ...process.env,
        NODE_ENV: 'production',
        NEXT_TELEMETRY_DISABLED: '1',
        HALFBAUD_DATA: directory,
        HALFBAUD_PORT: String(port),
      },
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    child = started
    let said = ''
    await new Promise<void>((done, failed) => {
      const listen = (bytes: Buffer) => {
        said += String(bytes)
        if (said.includes('Halfbaud answers at')) done()
      }
      started.stdout.on('data', listen)
      started.stderr.on('data', listen)
      started.once('exit', (code) => failed(new Error(`The demo ended with ${code}: ${said}`)))
    })
    for (const [, email, password] of said.matchAll(/^(\S+@\S+) {2}(\S+) {2}/gm))
      passwords.set(email ?? '', password ?? '')
  }

  async function kill() {
    const killed = child
    if (!killed || killed.exitCode !== null) return
    const gone = new Promise<void>((done) => killed.once('exit', () => done()))
    killed.kill('SIGKILL')
    await gone
  }

  await start()
  return {
    url: `http://127.0.0.1:${port}`,
    passwords,
    kill,
    start,
    remove: async () => {
      await kill()
      await rm(directory, { recursive: true, force: true })
    },
  }
}

/** A browser of its own for one person, signed in through the page. */
export async function signIn(
  browser: Browser,
  demo: Demo,
  email: string,
  options: Parameters<Browser['newContext']>[0] = {},
) {
  const context: BrowserContext = await browser.newContext({
    baseURL: demo.url,
    viewport: { width: 1440, height: 1000 },
    ...options,
  })
  const complaints = watchConsole(context)
  const page = await context.newPage()
  await page.goto('/sign-in')
  await page.getByLabel('E-mail address').fill(email)
  await page.getByLabel('Password', { exact: true }).fill(demo.passwords.get(email) ?? '')
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(`${demo.url}/`)
  return { context, page, complaints }
}

/** Opens a budget from the list and waits until it is live. */
export async function openBudget(page: Page, name: string): Promise<void> {
  await page.getByRole('link', { name }).click()
  await page.waitForURL(/\/budgets\//)
  await page.getByText(/Everything saved|Up to date/).waitFor()
}

export const cell = (page: Page, place: string) => page.locator(`[role=gridcell][data-place="${place}"]`)

/** Types a value into a cell of the rows as a person does: click, type over, Enter. */
export async function type(page: Page, place: string, text: string): Promise<void> {
  await cell(page, place).click()
  const control = cell(page, place).locator('input')
  await control.fill(text)
  await control.press('Enter')
}
