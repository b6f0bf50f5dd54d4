/** Line codes and the number of levels that each sends. RZ sends two levels, one of them only for half of the symbol. */
export const LEVELS = { NRZ: 2, RZ: 2, PAM3: 3, PAM4: 4, PAM6: 6, PAM8: 8, PAM16: 16 } as const
export type LineCode = keyof typeof LEVELS

/** Coded PAM: so many bits travel in one group of so many symbols, such as 11 bits in 7 ternary symbols. */
export type CodedGroup = { readonly bits: number; readonly symbols: number }

/**
 * Bits that one symbol carries: log2 of the number of levels, or what the code says where bits are grouped.
 * It is never the number of levels: that agrees with log2 only for 2 and 4 levels.
 * @returns null where the group claims more bits than its symbols can tell apart.
 */
export function bitsPerSymbol(code: LineCode, group: CodedGroup | null): number | null {
  const ideal = Math.log2(LEVELS[code])
  if (group === null) return ideal
  const coded = group.bits / group.symbols
  return coded > ideal + 1e-12 ? null : coded
}
