import { Problem } from '../../../../../problem'
import { read } from '../../../../../wrapper'
import { attachment } from './attachment'
import { fetchEvidence } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(fetchEvidence, async ({ services, params }) => {
  const found = /^[0-9a-f]{64}$/.test(params.sha256) && (await services.evidence.open(params.id, params.sha256))
  if (!found) throw new Problem('not-found')
  return new Response(found.stream, {
    headers: {
      // Never the stored type: what a person has uploaded is not for a browser to show under this server's name.
      'content-type': 'application/octet-stream',
      'content-length': String(found.evidence.size),
      'content-disposition': attachment(found.evidence.name),
      'content-security-policy': "default-src 'none'; sandbox",
    },
  })
})
