'use client'
import { callApi } from '../../form/client/callApi'
import { Field } from '../../form/client/Field'
import { Outcome } from '../../form/client/Outcome'
import { Passwords } from '../../form/client/Passwords'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'

/** @param to path of ours to go to; the page is loaded anew, so that nothing of another person's session stays */
export function SignInForm({ to }: { to: string }) {
  const { busy, problem, onSubmit } = useSend(
    (fields) => callApi('POST', '/api/v1/session', { email: fields.email?.trim(), password: fields.password }),
    () => window.location.assign(to),
  )
  return (
    // method: without scripts a form would put the password into the address
    <form className={form.form} method="post" onSubmit={onSubmit} noValidate>
      <Field
        name="email"
        label="E-mail address"
        type="email"
        autoComplete="username"
        autoFocus
        required
        problem={problem}
      />
      <Passwords>
        {(type) => (
          <Field
            name="password"
            label="Password"
            type={type}
            autoComplete="current-password"
            required
            problem={problem}
          />
        )}
      </Passwords>
      <Outcome problem={problem} />
      <button type="submit" className={form.first} disabled={busy}>
        Sign in
      </button>
    </form>
  )
}
