'use client'
import { useState } from 'react'
import { callApi } from '../../form/client/callApi'
import form from '../../form/form.module.css'

/** Ends this session everywhere at once, worksheets that are open in other tabs too. */
export function SignOut() {
  const [failed, setFailed] = useState<string | null>(null)
  const signOut = async () => {
    const answer = await callApi('DELETE', '/api/v1/session')
    if (answer.ok || answer.problem.code === 'not-signed-in') window.location.assign('/sign-in')
    else setFailed(answer.problem.sentence)
  }
  return (
    <>
      <button type="button" className={form.quiet} onClick={signOut}>
        Sign out
      </button>
      <span role="alert">{failed}</span>
    </>
  )
}
