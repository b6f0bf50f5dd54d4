import { contentName } from './contentName'
import type { Conditions } from './corner'
import type { LineItem } from './lineItem'
import { type LineLoss, lineLoss } from './lineLoss'
import { rememberedLoss } from './lossMemory'
import type { Signalling } from './signalling'

/** The losses that one evaluation asks for: each line, in each of its lanes, at a frequency and in a corner. */
export class Losses {
  private readonly corners = new Map<Conditions | null, string>()

  constructor(
    /** Ω, differential; null where the budget does not say it. */
    private readonly reference: number | null,
    private readonly signalling: Signalling,
  ) {}

  at(item: LineItem, hz: number, corner: Conditions | null): LineLoss {
    const content = `${item.content}|${hz}|${this.conditions(corner)}`
    const { reference } = this
    const { mistake } = this.signalling
    return rememberedLoss(content, () => lineLoss(item, { hz, reference, corner, mistake }))
  }

  /** A name of what the loss depends on beside the line and the frequency. */
  private conditions(corner: Conditions | null): string {
    const known = this.corners.get(corner)
    if (known !== undefined) return known
    const name = `${this.reference}|${this.signalling.content}|${corner === null ? '' : contentName('corner', corner)}`
    this.corners.set(corner, name)
    return name
  }
}
