'use client'
import { useEffect } from 'react'
import { callApi } from '../../form/client/callApi'

const HOUR = 3_600_000

/**
 * Renews the session while the page is looked at: a worksheet lives on its socket, which can set no cookie, so it would expire
 * under the hands of whoever works in it.
 */
export function KeepSignedIn() {
  useEffect(() => {
    let renewed = Date.now()
    const renew = () => {
      if (document.visibilityState !== 'visible' || Date.now() - renewed < HOUR) return
      renewed = Date.now()
      void callApi('PUT', '/api/v1/session')
    }
    const timer = setInterval(renew, HOUR / 12)
    document.addEventListener('visibilitychange', renew)
    return () => {
      clearInterval(timer)
      document.removeEventListener('visibilitychange', renew)
    }
  }, [])
  return null
}
