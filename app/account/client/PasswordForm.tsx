'use client'
import { useState } from 'react'
import { beside } from '../../form/client/beside'
import { callApi } from '../../form/client/callApi'
import { Field } from '../../form/client/Field'
import { Outcome } from '../../form/client/Outcome'
import { Passwords } from '../../form/client/Passwords'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'

/** @param email for password keepers, which want to know whose password it is */
export function PasswordForm({ email }: { email: string }) {
  const [done, setDone] = useState<string | null>(null)
  const { busy, problem, onSubmit } = useSend(
    async ({ current, next }) => {
      setDone(null)
      const answer = await callApi('POST', '/api/v1/password', { current, next })
      return beside(answer, { 'wrong-password': 'current', 'password-refused': 'next' })
    },
    (_, sent) => {
      sent.reset()
      setDone('The password has been changed; every other session has ended.')
    },
  )
  return (
    <form className={form.form} method="post" onSubmit={onSubmit} noValidate>
      <input type="hidden" name="username" autoComplete="username" value={email} readOnly />
      <Passwords>
        {(type) => (
          <>
            <Field
              name="current"
              label="Current password"
              type={type}
              autoComplete="current-password"
              required
              problem={problem}
            />
            <Field
              name="next"
              label="New password"
              hint="At least 12 characters; a few unrelated words do."
              type={type}
              autoComplete="new-password"
              required
              problem={problem}
            />
          </>
        )}
      </Passwords>
      <Outcome problem={problem} done={done} />
      <button type="submit" className={form.first} disabled={busy}>
        Change the password
      </button>
    </form>
  )
}
