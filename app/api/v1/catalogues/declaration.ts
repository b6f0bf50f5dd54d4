import { z } from 'zod'
import { declare } from '../../declaration'
import { catalogueItem, newEntry } from '../../schemas/catalogues'

export const listCatalogues = declare({
  method: 'GET',
  path: '/api/v1/catalogues',
  operation: 'listCatalogues',
  summary: 'What the people of this server added to its catalogues of allowances, laminates and packages.',
  admission: 'person',
  answer: {
    status: 200,
    description: 'The entries, oldest first.',
    json: z.strictObject({ entries: z.array(catalogueItem) }),
  },
})

export const addCatalogueEntry = declare({
  method: 'POST',
  path: '/api/v1/catalogues',
  operation: 'addCatalogueEntry',
  summary: 'Add an entry to a catalogue of this server; everybody who is signed in here can then take it.',
  admission: 'person',
  body: { json: newEntry },
  answer: { status: 201, description: 'Added; Location names it.', json: z.strictObject({ id: z.string() }) },
})
