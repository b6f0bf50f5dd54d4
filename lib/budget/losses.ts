import { contentName } from './contentName'
import type { Conditions } from './corner'
import type { EvidenceData } from './evaluation'
import type { LineItem } from './lineItem'
import { type LineLoss, lineLoss } from './lineLoss'
import { rememberedLoss } from './lossMemory'
import { RESISTANCE, TEMPERATURE, typedValue } from './quantities'
import type { Budget } from './schema'
import type { Signalling } from './signalling'

/** The losses that one evaluation asks for: each line, in each of its lanes, at a frequency and in a corner. */
export class Losses {
  private readonly corners = new Map<Conditions | null, string>()
  private readonly places = new Map<Conditions | null, Map<number, string>>()
  /** Ω, differential; null where the budget does not say it. */
  readonly reference: number | null
  /** °C of the reference corner. */
  readonly referenceTemperature: number | null

  constructor(
    private readonly budget: Budget,
    private readonly evidence: EvidenceData,
    private readonly signalling: Signalling,
  ) {
    this.reference = typedValue(RESISTANCE, budget.head.reference)
    this.referenceTemperature = typedValue(TEMPERATURE, budget.head.referenceTemperature)
  }

  at(item: LineItem, hz: number, corner: Conditions | null): LineLoss {
    return rememberedLoss(item.content, this.place(hz, corner), () =>
      lineLoss(item, {
        budget: this.budget,
        evidence: this.evidence,
        hz,
        reference: this.reference,
        referenceTemperature: this.referenceTemperature,
        symbolRate: this.signalling.evaluation.symbolRate,
        corner,
        mistake: this.signalling.mistake,
      }),
    )
  }

  /** A name of everything that a line's loss rests on but the frequency. */
  nameOf(item: LineItem, corner: Conditions | null): string {
    return `${item.content}|${this.conditions(corner)}`
  }

  /** A name of everything but the line, the same string each time. */
  private place(hz: number, corner: Conditions | null): string {
    const places = this.places.get(corner) ?? new Map<number, string>()
    this.places.set(corner, places)
    const known = places.get(hz)
    if (known !== undefined) return known
    const name = `${this.conditions(corner)}|${hz}`
    places.set(hz, name)
    return name
  }

  private conditions(corner: Conditions | null): string {
    const known = this.corners.get(corner)
    if (known !== undefined) return known
    const own = corner === null ? '' : contentName('corner', '', corner)
    const name = `${this.reference}|${this.referenceTemperature}|${this.signalling.content}|${own}`
    this.corners.set(corner, name)
    return name
  }
}
