import type { Conditions } from './corner'
import type { LineItem } from './lineItem'
import type { LineLoss } from './lineLoss'
import { rememberedLoss } from './lossMemory'

/** The losses that one evaluation asks for: each line, in each of its lanes, once per frequency and corner. */
export class Losses {
  private readonly known = new Map<
    LineItem,
    { readonly hz: number; readonly corner: Conditions | null; readonly loss: LineLoss }[]
  >()

  constructor(
    /** Ω, differential; null where the budget does not say it. */
    private readonly reference: number | null,
    /** Continues 'this is …' where a frequency is a well-known mistake for the Nyquist frequency, else null. */
    private readonly mistake: (hz: number) => string | null,
  ) {}

  at(item: LineItem, hz: number, corner: Conditions | null): LineLoss {
    const ofItem = this.known.get(item)
    const found = ofItem?.find((one) => one.hz === hz && one.corner === corner)
    if (found) return found.loss
    const loss = rememberedLoss(item, { hz, reference: this.reference, corner, mistake: this.mistake })
    if (ofItem) ofItem.push({ hz, corner, loss })
    else this.known.set(item, [{ hz, corner, loss }])
    return loss
  }
}
