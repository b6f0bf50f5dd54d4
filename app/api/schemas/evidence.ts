import { z } from 'zod'
import type { StoredEvidence } from '../../../lib/sync/services'
import { component, sha256, time } from './components'

export const storedEvidence = component(
  'Evidence',
  z.strictObject({
    sha256,
    name: z.string(),
    mediaType: z.string(),
    size: z.number().int().meta({ description: 'Bytes.' }),
    person: z.string().meta({ description: 'Id of the person who attached it.' }),
    time,
  }) satisfies z.ZodType<StoredEvidence>,
)

/** What may be attached; a Touchstone file has no registered type and goes as octet-stream. */
export const EVIDENCE_TYPES = [
  'application/octet-stream',
  'application/pdf',
  'text/csv',
  'image/png',
  'image/jpeg',
] as const
