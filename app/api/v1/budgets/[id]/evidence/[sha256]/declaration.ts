import { declare } from '../../../../../declaration'

export const fetchEvidence = declare({
  method: 'GET',
  path: '/api/v1/budgets/{id}/evidence/{sha256}',
  operation: 'fetchEvidence',
  summary: 'The bytes of an attached file, to be saved and never shown.',
  admission: { role: 'viewer' },
  answer: { status: 200, description: 'The file.', mediaType: 'application/octet-stream' },
})
