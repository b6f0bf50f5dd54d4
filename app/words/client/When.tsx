'use client'
import { useEffect, useState } from 'react'
import { absoluteTime, readableTime } from './readerTime'

/** When something happened, in the reader's own zone; the whole time on hover. The server, which knows no zone, sends UTC. */
export function When({ time }: { time: number }) {
  const [now, setNow] = useState<number | null>(null)
  useEffect(() => {
    setNow(Date.now())
    const timer = setInterval(() => setNow(Date.now()), 60_000)
    return () => clearInterval(timer)
  }, [])
  const iso = new Date(time).toISOString()
  return (
    <time dateTime={iso} title={now === null ? iso : absoluteTime(time)}>
      {now === null ? `${iso.slice(0, 16).replace('T', ' ')} UTC` : readableTime(time, now)}
    </time>
  )
}
