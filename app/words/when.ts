const MINUTE = 60_000
const DAY = 24 * 60 * MINUTE
const WEEK = 7 * DAY

/**
 * When something happened, short: 'just now', '14:32', 'Tue 14:32', '3 Nov', '3 Nov 2024'. All in UTC, and the title
 * that goes with it says so: people of one budget sit in several time zones.
 * @param time, now milliseconds since 1970
 */
export function whenWords(time: number, now: number): string {
  const age = now - time
  if (age >= 0 && age < MINUTE) return 'just now'
  const date = new Date(time)
  const clock = date.toISOString().slice(11, 16)
  if (sameDay(time, now)) return clock
  if (age >= 0 && age < WEEK) return `${weekday(date)} ${clock}`
  const day = `${date.getUTCDate()} ${month(date)}`
  return date.getUTCFullYear() === new Date(now).getUTCFullYear() ? day : `${day} ${date.getUTCFullYear()}`
}

/** The whole time, for a title: '2025-11-03 14:32:07 UTC'. */
export const exactWhen = (time: number): string => `${new Date(time).toISOString().slice(0, 19).replace('T', ' ')} UTC`

const sameDay = (a: number, b: number) =>
  new Date(a).toISOString().slice(0, 10) === new Date(b).toISOString().slice(0, 10)
const weekday = (date: Date) => date.toLocaleDateString('en-GB', { weekday: 'short', timeZone: 'UTC' })
const month = (date: Date) => date.toLocaleDateString('en-GB', { month: 'short', timeZone: 'UTC' })
