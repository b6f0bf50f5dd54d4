import type { AllowanceEntry } from './entry'

/** An entry that comes with the program. */
export type PublishedAllowance = AllowanceEntry & { readonly id: string }

/** What every published entry says; the rest is left out where it says nothing. */
type Said =
  | 'name'
  | 'clause'
  | 'bitRate'
  | 'code'
  | 'nyquist'
  | 'limit'
  | 'at'
  | 'publishedFrom'
  | 'publishedTo'
  | 'confidence'
  | 'status'
type Given = Pick<AllowanceEntry, Said> & Partial<Omit<AllowanceEntry, Said | 'body'>>

const UNSAID = {
  leastLoss: null,
  returnLossFloor: null,
  curve: null,
  presumedPackage: null,
  presumes: null,
  codedBits: null,
  codedSymbols: null,
  eitherWay: null,
  caution: null,
}

/** The entries of one body, with null for what is not said. */
export function publishedBy(body: string, entries: Readonly<Record<string, Given>>): readonly PublishedAllowance[] {
  return Object.entries(entries).map(([id, given]) => ({ ...UNSAID, split: [], ...given, body, id }))
}

/** A part of a split. */
export const part = (what: string, loss: string) => ({ what, loss, overlap: null })
/** What two parts of a split both contain: counted once too often, so subtracted, and typed positive. */
export const overlap = (what: string, loss: string) => ({ what, loss, overlap: true })
