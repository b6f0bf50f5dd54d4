/** Decibels as every screen shows them: two decimals, and a real minus sign. @param db losses and margins in dB. */
export function decibels(db: number, digits = 2): string {
  const text = Math.abs(db).toFixed(digits)
  return db < 0 && Number(text) !== 0 ? `−${text}` : text
}

/** A change in decibels, always with its sign; nothing changed is '±0.00'. */
export function signedDecibels(db: number, digits = 2): string {
  const text = decibels(db, digits)
  if (Number(Math.abs(db).toFixed(digits)) === 0) return `±${text}`
  return db > 0 ? `+${text}` : text
}

/** A limit as a person would write it: 28, 1.5, 25.25; at most two decimals. */
export function plainDecibels(db: number): string {
  return decibels(Number(db.toFixed(2)), (db.toFixed(2).replace(/0+$/, '').split('.')[1] ?? '').length)
}

/** @param hz frequency in Hz. @returns such as '26.5625 GHz'. */
export function frequencyWords(hz: number): string {
  if (hz >= 1e9) return `${Number((hz / 1e9).toPrecision(7))} GHz`
  return `${Number((hz / 1e6).toPrecision(7))} MHz`
}
