/** Decibels with two decimals; what would round to nothing shows its first digit. */
export function plainDb(db: number): string {
  if (db === 0) return '0.00'
  return Math.abs(db) < 0.005 ? String(Number(db.toPrecision(1))) : db.toFixed(2)
}

export function linesWord(count: number): string {
  return `${count} ${count === 1 ? 'line' : 'lines'}`
}
