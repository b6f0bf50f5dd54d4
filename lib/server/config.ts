import { join, resolve } from 'node:path'

/** How this process runs, read once from the environment. */
export type Config = {
  readonly mode: 'demo' | 'serve' | 'dev'
  /** Databases, evidence and keys; nothing is ever written elsewhere. */
  readonly directory: string
  readonly host: string
  readonly port: number
  /** What people type to get here; the Origin that every change must come from. */
  readonly publicUrl: string
  /** False: no pages, only the socket (fault tests start the server so). */
  readonly pages: boolean
}

export class ConfigError extends Error {}

const LOOPBACK = ['127.0.0.1', '::1', 'localhost']

/**
 * @param root folder of the project, for the demo's own data directory
 * @throws ConfigError with a sentence that says what to set
 */
export function readConfig(mode: string | undefined, environment: Readonly<Record<string, string | undefined>>, root: string): Config {
  if (mode !== 'demo' && mode !== 'serve' && mode !== 'dev')
    throw new ConfigError("Start with 'demo', 'serve' or 'dev'.")
  const host = environment.HALFBAUD_HOST ?? '127.0.0.1'
  if (mode !== 'serve' && !LOOPBACK.includes(host)) {
    throw new ConfigError(
      `The demo serves on loopback only, not on ${host}. Unset HALFBAUD_HOST, or use 'npm run serve'.`,
    )
  }
  const port = readPort(environment.HALFBAUD_PORT ?? '3000')
  return {
    mode,
    directory: readDirectory(mode, environment.HALFBAUD_DATA, root),
    host,
    port,
    publicUrl: readPublicUrl(environment.HALFBAUD_PUBLIC_URL, host, port),
    pages: environment.HALFBAUD_PAGES !== 'off',
  }
}

function readPort(text: string): number {
  const port = Number(text)
  if (!Number.isInteger(port) || port < 0 || port > 65535)
    throw new ConfigError(`HALFBAUD_PORT is '${text}'; set a number from 0 to 65535.`)
  return port
}

function readDirectory(mode: Config['mode'], given: string | undefined, root: string): string {
  if (given) return resolve(given)
  if (mode === 'serve')
    throw new ConfigError('Set HALFBAUD_DATA to the folder that shall hold the databases, evidence and keys.')
  return join(root, '.data', mode)
}

function readPublicUrl(given: string | undefined, host: string, port: number): string {
  const text = given ?? `http://${host.includes(':') ? `[${host}]` : host}:${port}`
  let url: URL
  try {
    url = new URL(text)
  } catch {
    throw new ConfigError(`HALFBAUD_PUBLIC_URL is '${text}'; set a whole address such as https://budgets.example.com.`)
  }
  if (!['http:', 'https:'].includes(url.protocol) || url.pathname !== '/' || url.search || url.hash || url.username) {
    throw new ConfigError(
      `HALFBAUD_PUBLIC_URL is '${text}'; set scheme, host and port only, such as https://budgets.example.com.`,
    )
  }
  return url.origin
}
