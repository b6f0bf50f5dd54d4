import { DIMENSIONS, type Dimension, SPELLINGS } from './dimensions'

export type UnitFactor = { readonly unit: string; readonly factor: number }

/** Finds what a person wrote for a unit among the units of a dimension; null where it is none of them. */
export function unitOf(text: string, dimension: Dimension): UnitFactor | null {
  const units: Readonly<Record<string, number>> = DIMENSIONS[dimension].units
  const unit = spelled(text)
  if (Object.hasOwn(units, unit)) return { unit, factor: units[unit] as number }
  const folded = Object.keys(units).filter((known) => sameButForCase(known, unit, dimension))
  const [only] = folded
  return folded.length === 1 && only !== undefined ? { unit: only, factor: units[only] as number } : null
}

function spelled(text: string): string {
  const plain = text
    .normalize('NFC')
    .replaceAll('μ', 'µ')
    .replace(/\s+/g, ' ')
    .replace(/ ?\/ ?/g, '/')
  return (
    known(plain) ??
    plain
      .split('/')
      .map((side) => known(side) ?? side)
      .join('/')
  )
}

function known(spelling: string): string | undefined {
  return Object.hasOwn(SPELLINGS, spelling) ? SPELLINGS[spelling] : undefined
}

/**
 * 'ghz' is GHz and 'DB/IN' is dB/in. Where a capital changes the meaning it stays a mistake: M and m (mega, milli), and B
 * and b of a bit rate (byte, bit).
 */
function sameButForCase(known: string, typed: string, dimension: Dimension): boolean {
  if (typed === '' || known.toLowerCase() !== typed.toLowerCase()) return false
  const first = known.charAt(0)
  if (first.toLowerCase() === 'm' && first !== typed.charAt(0)) return false
  return dimension !== 'bitRate' || known.indexOf('b') === typed.indexOf('b')
}
