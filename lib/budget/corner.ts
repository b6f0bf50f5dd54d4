import { NUMBER, PER_KELVIN, RATIO, TEMPERATURE, typedValue } from './quantities'
import { nameOf } from './record'
import type { Line, LossClass, RecordOf } from './schema'

/** The conditions that an allowance is judged in, as far as this version computes them. */
export type Conditions = {
  readonly name: string
  /** °C; null: the reference temperature. */
  readonly temperature: number | null
  readonly perKelvin: number | null
  /** Growth of the loss tangent per kelvin. */
  readonly dielectricPerKelvin: number | null
  readonly wet: boolean
  readonly lossWet: number | null
  /** What moisture adds to Dk and Df. */
  readonly wetDk: number | null
  readonly wetDf: number | null
  readonly fabrication: 'nominal' | 'low-loss' | 'high-loss'
  /** °C that a number holds at which does not say its own. */
  readonly reference: number | null
}

/** Reads a corner. @returns why it cannot be judged, where it cannot, as half a sentence. */
export function conditionsOf(id: string, corner: RecordOf<'corners'>, reference: number | null): Conditions | string {
  const name = nameOf('corners', id, corner)
  if (corner.temperature === null && corner.humidity === null && corner.fabrication === null) {
    return `the corner ${name} says neither a temperature, nor a humidity, nor an extreme of fabrication`
  }
  return {
    name,
    temperature: typedValue(TEMPERATURE, corner.temperature),
    perKelvin: typedValue(PER_KELVIN, corner.lossPerKelvin),
    dielectricPerKelvin: typedValue(PER_KELVIN, corner.dielectricPerKelvin),
    wet: corner.humidity === 'wet',
    lossWet: typedValue(RATIO, corner.lossWet),
    wetDk: typedValue(NUMBER, corner.wetDk),
    wetDf: typedValue(NUMBER, corner.wetDf),
    fabrication: corner.fabrication ?? 'nominal',
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
