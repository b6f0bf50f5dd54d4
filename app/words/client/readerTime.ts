/** Times in the reader's own zone. The server renders none of these: it does not know the zone (see When.tsx). */
const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', second: '2-digit' })
const minute = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' })
const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short' })
const dayAndYear = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' })
const whole = new Intl.DateTimeFormat('en-GB', { dateStyle: 'full', timeStyle: 'long' })

/** 14:32:07 */
export const clockTime = (time: number) => clock.format(time)

/** The whole of it, with the zone's name, for those who hover or ask. */
export const absoluteTime = (time: number) => whole.format(time)

/** 'just now', '14:31 today', '14:31 yesterday', '28 Nov', '28 Nov 2024'. Both in milliseconds since 1970. */
export function readableTime(time: number, now: number): string {
  const minutes = Math.floor((now - time) / 60_000)
  if (minutes < 1) return 'just now'
  const then = new Date(time)
  const today = new Date(now)
  const days = Math.round((startOfDay(today) - startOfDay(then)) / 86_400_000)
  if (days <= 0) return `${minute.format(time)} today`
  if (days === 1) return `${minute.format(time)} yesterday`
  return (then.getFullYear() === today.getFullYear() ? day : dayAndYear).format(time)
}

const startOfDay = (date: Date) => new Date(date.getFullYear(), date.getMonth(), date.getDate()).getTime()
