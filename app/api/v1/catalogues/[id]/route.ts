import { Problem } from '../../../problem'
import { change } from '../../../wrapper'
import { removeCatalogueEntry } from './declaration'

export const dynamic = 'force-dynamic'

export const DELETE = change(removeCatalogueEntry, async ({ services, identity, params }) => {
  const outcome = await services.catalogues.remove(identity, params.id)
  if (outcome === 'no-such-entry') throw new Problem('not-found')
  if (outcome === 'not-yours') {
    throw new Problem('not-allowed', { detail: 'Ask the person who added it, or the administrator of this server.' })
  }
  return {}
})
