import { formatScaled } from '../units'

/** Why there is no answer, as a sentence for a person. */
export type Refusal = { readonly reason: string }

/** @param hz the frequency at which the answer fails, Hz; @param why what is the matter there, without capital and full stop */
export function refusedAt(hz: number, why: string): Refusal {
  return { reason: `At ${hz === 0 ? '0 Hz' : formatScaled(hz, 'frequency')} ${why}.` }
}
