import type { FetchFile } from './library'

/** Fetches an attached file from this server, as the person who is signed in. */
export const fetchFile: FetchFile = async (budgetId, { sha256, name }) => {
  const address = `/api/v1/budgets/${encodeURIComponent(budgetId)}/evidence/${encodeURIComponent(sha256)}`
  const response = await fetch(address, { credentials: 'same-origin' }).catch(() => null)
  if (response?.status === 404) return null
  const bytes = response?.ok ? await response.arrayBuffer().catch(() => null) : null
  if (bytes) return new Uint8Array(bytes)
  const why = response ? `status ${response.status}` : 'no answer'
  throw new Error(
    `The file '${name}' could not be fetched from the server (${why}); see whether you are still signed in.`,
  )
}
