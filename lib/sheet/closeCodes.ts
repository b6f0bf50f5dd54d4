/** Why the server closes a socket. Final: trying again cannot help until somebody does something. */
export const CLOSE = {
  signInAgain: { code: 4401, final: true, words: 'Sign in again.' },
  notAllowed: { code: 4403, final: true, words: 'You may not open this budget.' },
  notFound: { code: 4404, final: true, words: 'This budget does not exist.' },
  otherPerson: { code: 4406, final: true, words: 'This browser is signed in as somebody else.' },
  reload: { code: 4409, final: true, words: 'The worksheet has been renewed; reload the page.' },
  refused: { code: 4422, final: true, words: 'Too many refused edits; reload the page.' },
  lostHistory: {
    code: 4423,
    final: true,
    words: 'The server knows less than it had acknowledged; tell the administrator.',
  },
  slowHello: { code: 4408, final: true, words: 'The page did not say who it is in time; reload it.' },
  notReady: { code: 4503, final: false, words: 'The server is not ready or cannot write.' },
  restart: { code: 1012, final: false, words: 'The server restarts.' },
} as const

const PROTOCOL_FAULTS = [1002, 1003, 1007, 1008, 1009]

/** The client's own predicate: whether to connect again after a close with this code. */
export function shouldReconnect(code: number): boolean {
  if (PROTOCOL_FAULTS.includes(code)) return false
  if (code >= 4400 && code <= 4499) return false
  return true
}

export function closeWords(code: number): string | null {
  return Object.values(CLOSE).find((close) => close.code === code)?.words ?? null
}
