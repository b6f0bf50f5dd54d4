import { openapiDocument } from '../../openapi'
import { read } from '../../wrapper'
import { openapi } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(openapi, ({ services }) => ({ json: openapiDocument(services.publicUrl, services.engine) }))
