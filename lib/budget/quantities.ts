import {
  DIMENSIONS,
  type Dimension,
  isQuantity,
  parseQuantity,
  type Quantity,
  type QuantityRefusal,
} from '../channel/units'

/** Reads the text of one kind of field; the same text is parsed once. */
export type Reader = {
  readonly dimensions: readonly Dimension[]
  readonly read: (text: string) => Quantity | QuantityRefusal
}

/** Texts kept per reader; a worksheet of 500 lines and 256 lanes has fewer different ones. */
const KEPT = 20_000

function reader(...dimensions: readonly Dimension[]): Reader {
  const kept = new Map<string, Quantity | QuantityRefusal>()
  return {
    dimensions,
    read(text) {
      const known = kept.get(text)
      if (known) return known
      if (kept.size >= KEPT) kept.clear()
      const result = parseQuantity(text, dimensions)
      kept.set(text, result)
      return result
    },
  }
}

export const LOSS = reader('loss')
export const FREQUENCY = reader('frequency')
export const LENGTH = reader('length')
export const LOSS_PER_LENGTH = reader('lossPerLength')
export const DELAY_PER_LENGTH = reader('delayPerLength')
export const CAPACITANCE = reader('capacitance')
export const INDUCTANCE = reader('inductance')
export const RESISTANCE = reader('resistance')
export const TIME = reader('time')
export const TEMPERATURE = reader('temperature')
export const TOLERANCE = reader('loss', 'ratio')
export const BIT_RATE = reader('bitRate')
export const NUMBER = reader('number')
export const RATIO = reader('ratio')
export const PER_KELVIN = reader('perKelvin')

/** The value in SI units, or null where nothing was typed or it cannot be read. */
export function typedValue(reader: Reader, text: string | null): number | null {
  if (text === null) return null
  const result = reader.read(text)
  return isQuantity(result) ? result.value : null
}

/** Units that a person may type for it, as they stand in messages. */
export function unitsOf(reader: Reader): string {
  const units = reader.dimensions.flatMap((dimension) => Object.keys(DIMENSIONS[dimension].units))
  return units.filter((unit) => unit !== '').join(', ')
}
