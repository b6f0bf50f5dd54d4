import { join, resolve } from 'node:path'

/**
 * How this process runs, read once from the environment: before anything is built, so that a wrong setting is told at once.
 * @typedef {object} Config
 * @property {'demo' | 'serve' | 'dev'} mode
 * @property {string} directory databases, evidence and keys; nothing is ever written elsewhere
 * @property {string} host
 * @property {number} port
 * @property {string} publicUrl what people type to get here; the Origin that every change must come from
 * @property {boolean} pages false: no pages, only the socket (fault tests start the server so)
 */

export class ConfigError extends Error {}

const LOOPBACK = ['127.0.0.1', '::1', 'localhost']

/**
 * @param {string | undefined} mode
 * @param {Readonly<Record<string, string | undefined>>} environment
 * @param {string} root folder of the project, for the demo's own data directory
 * @returns {Readonly<Config>}
 * @throws {ConfigError} with a sentence that says what to set
 */
export function readConfig(mode, environment, root) {
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

/** @param {string} text */
function readPort(text) {
  const port = Number(text)
  if (!Number.isInteger(port) || port < 0 || port > 65535) {
    throw new ConfigError(`HALFBAUD_PORT is '${text}'; set a number from 0 to 65535.`)
  }
  return port
}

/**
 * @param {Config['mode']} mode
 * @param {string | undefined} given
 * @param {string} root
 */
function readDirectory(mode, given, root) {
  if (given) return resolve(given)
  if (mode === 'serve') {
    throw new ConfigError('Set HALFBAUD_DATA to the folder that shall hold the databases, evidence and keys.')
  }
  return join(root, '.data', mode)
}

/**
 * @param {string | undefined} given
 * @param {string} host
 * @param {number} port
 */
function readPublicUrl(given, host, port) {
  const text = given ?? `http://${host.includes(':') ? `[${host}]` : host}:${port}`
  const url = URL.canParse(text) ? new URL(text) : null
  if (!url || !['http:', 'https:'].includes(url.protocol)) {
    throw new ConfigError(`HALFBAUD_PUBLIC_URL is '${text}'; set a whole address such as https://budgets.example.com.`)
  }
  if (url.pathname !== '/' || url.search || url.hash || url.username) {
    throw new ConfigError(
      `HALFBAUD_PUBLIC_URL is '${text}'; set scheme, host and port only, such as https://budgets.example.com.`,
    )
  }
  return url.origin
}
