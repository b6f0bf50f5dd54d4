import type { CLOSE } from '../sheet/closeCodes'

/** Why a socket is closed: one of our own table, or a fault of the protocol. */
export type CloseReason = { readonly code: number; readonly words: string }

/** Faults of RFC 6455 that a client does not come back from. */
export const FAULT = {
  text: { code: 1003, words: 'This server takes binary messages only.' },
  unreadable: { code: 1007, words: 'A message could not be read.' },
  flood: { code: 1008, words: 'Too many messages.' },
} as const satisfies Record<string, CloseReason>

/** The same close with other words; a reason has at most 123 bytes of UTF-8. */
export function because(close: (typeof CLOSE)[keyof typeof CLOSE], words: string): CloseReason {
  let text = words
  while (Buffer.byteLength(text) > 123) text = text.slice(0, -1)
  return { code: close.code, words: text }
}
