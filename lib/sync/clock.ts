export type Cancel = () => void

/** Timers, so that tests can hold them. Milliseconds. */
export type Timers = {
  after(delay: number, run: () => void): Cancel
  every(interval: number, run: () => void): Cancel
}

/** Time and timers; `now` in milliseconds since 1970. */
export type Clock = Timers & { now(): number }

/** The machine's own timers; they keep no process alive. */
export const systemTimers: Timers = {
  after(delay, run) {
    const timer = setTimeout(run, delay)
    timer.unref()
    return () => clearTimeout(timer)
  },
  every(interval, run) {
    const timer = setInterval(run, interval)
    timer.unref()
    return () => clearInterval(timer)
  },
}

export type Log = (message: string, error?: unknown) => void
