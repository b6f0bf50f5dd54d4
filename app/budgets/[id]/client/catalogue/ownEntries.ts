import { type OwnEntry, ownEntry } from '../../../../../lib/budget/catalogues/ownEntry'

/** An entry that somebody on this server added. */
export type ServerEntry = OwnEntry & { readonly id: string; readonly personName: string; readonly mayRemove: boolean }

/** Reads the API's answer; what is no entry is left out, since anything may stand before our server. */
export function serverEntries(json: unknown): readonly ServerEntry[] {
  const entries: unknown = isObject(json) ? json.entries : null
  return Array.isArray(entries) ? entries.flatMap(serverEntry) : []
}

function serverEntry(item: unknown): ServerEntry[] {
  if (!isObject(item) || typeof item.id !== 'string' || typeof item.personName !== 'string') return []
  const own = ownEntry.safeParse({ kind: item.kind, entry: item.entry })
  return own.success
    ? [{ ...own.data, id: item.id, personName: item.personName, mayRemove: item.mayRemove === true }]
    : []
}

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null
