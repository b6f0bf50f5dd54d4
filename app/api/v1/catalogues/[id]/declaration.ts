import { declare } from '../../../declaration'

export const removeCatalogueEntry = declare({
  method: 'DELETE',
  path: '/api/v1/catalogues/{id}',
  operation: 'removeCatalogueEntry',
  summary: 'Remove an entry that one added oneself, or any as the administrator. What was taken from it stays.',
  admission: 'person',
  answer: { status: 204, description: 'Removed.' },
  problems: ['not-found', 'not-allowed'],
})
