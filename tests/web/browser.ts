import { existsSync } from 'node:fs'
import { type Browser, type BrowserContext, chromium } from 'playwright-core'

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** A Chromium from CHROMIUM_PATH, from Debian, or from the package registry, in this order; none is a failure, not a skip. */
export async function launchBrowser(): Promise<Browser> {
  const named = process.env.CHROMIUM_PATH
  if (named && !existsSync(named)) throw new Error(`CHROMIUM_PATH is '${named}', and nothing is there.`)
  const executablePath = named ?? (existsSync('/usr/bin/chromium') ? '/usr/bin/chromium' : await packaged())
  return chromium.launch({ executablePath, args: FLAGS })
}

async function packaged(): Promise<string> {
  const { default: shipped } = await import('@sparticuz/chromium')
  return shipped.executablePath()
}

/** Collects what a page complains of, so that a journey can assert that it ran clean. */
export function watchConsole(context: BrowserContext): string[] {
  const complaints: string[] = []
  context.on('page', (page) => {
    page.on('pageerror', (error) => complaints.push(`${page.url()}: ${error.message}`))
    page.on('console', (message) => {
      if (message.type() === 'error' || message.type() === 'warning')
        complaints.push(`${page.url()}: ${message.text()}`)
    })
  })
  return complaints
}
