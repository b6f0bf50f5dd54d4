import type { RefusalCode, Refused } from '../../../../../../lib/sheet/wire'
import { Problem } from '../../../../problem'
import type { ProblemCode } from '../../../../problems'

/** What a refusal of the gate is to a caller of the API; the page knows the gate's own codes (lib/sheet/wire). */
const AS_PROBLEM = {
  conflict: 'conflict',
  'edit-id-reused': 'key-reused',
  'not-allowed': 'not-allowed',
  'read-only': 'not-allowed',
  'not-stored': 'not-stored',
  epoch: 'not-stored',
  gap: 'not-stored',
  'too-large': 'too-large',
  malformed: 'edit-refused',
  'foreign-client-id': 'edit-refused',
  'outside-layout': 'edit-refused',
  'bad-value': 'edit-refused',
  'invalid-result': 'edit-refused',
} as const satisfies Record<RefusalCode, ProblemCode>

export function problemOf({ code, reason }: Refused): Problem {
  return new Problem(AS_PROBLEM[code], { detail: reason, refusal: code })
}
