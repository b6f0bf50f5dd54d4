'use client'
import { beside } from '../../form/client/beside'
import { callApi } from '../../form/client/callApi'
import { Field } from '../../form/client/Field'
import { Outcome } from '../../form/client/Outcome'
import { Passwords } from '../../form/client/Passwords'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'

/** Makes the first account, then signs in with it. */
export function OwnerForm() {
  const { busy, problem, onSubmit } = useSend(
    async ({ code = '', name = '', email = '', password = '' }) => {
      const person = { code: code.trim(), name: name.trim(), email: email.trim(), password }
      const made = await callApi('POST', '/api/v1/owner', person)
      return made.ok
        ? callApi('POST', '/api/v1/session', { email: person.email, password })
        : beside(made, { 'wrong-code': 'code', 'password-refused': 'password' })
    },
    () => window.location.assign('/'),
  )
  return (
    <form className={form.form} method="post" onSubmit={onSubmit} noValidate>
      <Field
        name="code"
        label="Code"
        autoComplete="one-time-code"
        spellCheck={false}
        autoFocus
        required
        problem={problem}
      />
      <Field
        name="name"
        label="Your name"
        hint="As signatures and the trail will show it."
        autoComplete="name"
        required
        problem={problem}
      />
      <Field name="email" label="E-mail address" type="email" autoComplete="username" required problem={problem} />
      <Passwords>
        {(type) => (
          <Field
            name="password"
            label="Password"
            hint="At least 12 characters; a few unrelated words do."
            type={type}
            autoComplete="new-password"
            required
            problem={problem}
          />
        )}
      </Passwords>
      <Outcome problem={problem} />
      <button type="submit" className={form.first} disabled={busy}>
        Become the owner
      </button>
    </form>
  )
}
