import { declare } from '../../../declaration'

export const revokeToken = declare({
  method: 'DELETE',
  path: '/api/v1/tokens/{id}',
  operation: 'revokeToken',
  summary: "End one of one's own tokens at once.",
  admission: 'person',
  answer: { status: 204, description: 'Revoked.' },
  problems: ['not-found'],
})
