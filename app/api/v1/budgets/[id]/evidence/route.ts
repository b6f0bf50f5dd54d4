import { Problem } from '../../../../problem'
import { change, read } from '../../../../wrapper'
import { attachEvidence, listEvidence } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(listEvidence, async ({ services, params }) => ({
  json: { evidence: await services.evidence.list(params.id) },
}))

export const POST = change(attachEvidence, async ({ services, identity, params, query, body }) => {
  const stored = await services.evidence.store(params.id, identity, { name: query.name, ...body }).catch(refuseTooLarge)
  return { json: stored, headers: { location: `/api/v1/budgets/${params.id}/evidence/${stored.sha256}` } }
})

/** The store may keep less than this address takes; its error comes from another bundle, so only its name is known. */
function refuseTooLarge(error: unknown): never {
  const tooLarge = error instanceof Error && error.name === 'EvidenceTooLarge'
  throw tooLarge ? new Problem('too-large', { detail: error.message }) : error
}
