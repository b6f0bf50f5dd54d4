/** Ports that this reader takes. */
export const MOST_PORTS = 16

/** @returns the ports that a version 1 file has by its ending (.s1p, .s4p, also .y2p and the like), null where it says none */
export function portsByName(fileName: string): number | null {
  const digits = /\.[syzhg](\d{1,9})p$/i.exec(fileName.trim())?.[1]
  return digits === undefined ? null : Number(digits)
}
