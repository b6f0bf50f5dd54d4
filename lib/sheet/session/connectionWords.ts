import { closeWords } from '../closeCodes'
import type { ConnectionState } from './types'

export const CONNECTING: ConnectionState = { state: 'connecting', words: 'Connecting.', code: null }
export const LIVE: ConnectionState = { state: 'live', words: 'Live.', code: null }

export function offline(code: number | null): ConnectionState {
  const why = (code !== null && closeWords(code)) || 'The server cannot be reached.'
  return { state: 'offline', words: `${why} Changes are kept in this browser and sent when it is back.`, code }
}

export function closed(code: number): ConnectionState {
  const why = closeWords(code) ?? `The connection was refused (code ${code}); reload the page.`
  return { state: 'closed', words: why, code }
}
