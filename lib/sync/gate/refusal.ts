import type { RefusalCode } from '../../sheet/wire'

/** Why an edit is not taken, in a sentence that says what to do; `missing` names the first clock of a gap. */
export type Refusal = {
  readonly code: RefusalCode
  readonly reason: string
  readonly missing?: { readonly clientId: number; readonly clock: number }
}

/** Thrown inside the gate and caught at its edge: the gate itself never throws. */
export class Refuse extends Error {
  constructor(readonly refusal: Refusal) {
    super(refusal.reason)
  }
}

export function refuse(code: RefusalCode, reason: string): never {
  throw new Refuse({ code, reason })
}

export function gap(clientId: number, clock: number): never {
  throw new Refuse({
    code: 'gap',
    reason: `An earlier edit of this page is missing here (client ${clientId} from clock ${clock}); send it again first.`,
    missing: { clientId, clock },
  })
}
