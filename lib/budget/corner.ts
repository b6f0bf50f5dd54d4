import { PER_KELVIN, RATIO, TEMPERATURE, typedValue } from './quantities'
import { nameOf } from './record'
import type { Line, LossClass, RecordOf } from './schema'
import { isUniform } from './uniform'

/** The conditions that an allowance is judged in, as far as this version computes them. */
export type Conditions = {
  readonly name: string
  /** °C; null: the reference temperature. */
  readonly temperature: number | null
  readonly perKelvin: number | null
  readonly wet: boolean
  readonly lossWet: number | null
  /** °C that a number holds at which does not say its own. */
  readonly reference: number | null
}

/** Reads a corner. @returns why it cannot be judged, where it cannot, as half a sentence. */
export function conditionsOf(id: string, corner: RecordOf<'corners'>, reference: number | null): Conditions | string {
  const name = nameOf('corners', id, corner)
  if (corner.temperature === null && corner.humidity === null && corner.fabrication === null) {
    return `the corner ${name} says neither a temperature nor a humidity`
  }
  if (corner.fabrication !== null && corner.fabrication !== 'nominal') {
    return `the corner ${name} asks for an extreme of fabrication, which this version does not compute (the worst statistic is)`
  }
  return {
    name,
    temperature: typedValue(TEMPERATURE, corner.temperature),
    perKelvin: typedValue(PER_KELVIN, corner.lossPerKelvin),
    wet: corner.humidity === 'wet',
    lossWet: typedValue(RATIO, corner.lossWet),
    reference,
  }
}

/** In which conditions a number holds that does not say its own: its loss class's, else the reference corner's. */
export function holdsIn(line: Line, lossClass: LossClass | null) {
  return {
    temperature: typedValue(TEMPERATURE, line.conditionTemperature ?? lossClass?.conditionTemperature ?? null),
    humidity: line.conditionHumidity ?? lossClass?.conditionHumidity ?? null,
    grade: line.grade ?? lossClass?.grade ?? 'nominal',
  }
}

/**
 * By what a line's loss grows from the conditions that its number holds in to the corner: 1 + coefficient × kelvins for traces
 * and cable, and the typed growth from dry to wet for traces. What a number already contains is not added again: one that holds
 * at the corner's temperature does not move, one that holds wet does not grow, and a guaranteed maximum is never lowered.
 * @returns the factor, or what lacks, as half a sentence
 */
export function cornerFactor(line: Line, lossClass: LossClass | null, corner: Conditions): number | string {
  if (!isUniform(line)) return 1
  const holds = holdsIn(line, lossClass)
  const warm = temperatureFactor(holds.temperature, corner)
  if (typeof warm === 'string') return warm
  let factor = warm
  if (corner.wet && line.kind === 'trace' && holds.humidity !== 'wet') {
    if (corner.lossWet === null)
      return `the corner ${corner.name} is wet and does not say by how much the loss of traces grows`
    factor *= 1 + corner.lossWet
  }
  return holds.grade === 'maximum' ? Math.max(1, factor) : factor
}

function temperatureFactor(own: number | null, corner: Conditions): number | string {
  if (corner.temperature === null) return 1
  const from = own ?? corner.reference
  if (from === null)
    return `the temperature of the reference corner is not given, so how far it is to the corner ${corner.name} is unknown`
  if (from === corner.temperature) return 1
  if (corner.perKelvin === null) {
    return `the corner ${corner.name} does not say by how much the loss of traces and cable grows per kelvin`
  }
  const factor = 1 + corner.perKelvin * (corner.temperature - from)
  return factor > 0 ? factor : `the growth per kelvin of the corner ${corner.name} leaves no loss at all`
}
