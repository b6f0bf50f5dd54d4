import { change, read } from '../../wrapper'
import { addCatalogueEntry, listCatalogues } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(listCatalogues, async ({ services, identity }) => ({
  json: { entries: await services.catalogues.list(identity) },
}))

export const POST = change(addCatalogueEntry, async ({ services, identity, body }) => {
  const { id } = await services.catalogues.add(identity, body)
  return { json: { id }, headers: { location: `/api/v1/catalogues/${id}` } }
})
