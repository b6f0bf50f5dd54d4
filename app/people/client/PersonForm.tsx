'use client'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { beside } from '../../form/client/beside'
import { callApi } from '../../form/client/callApi'
import { Field } from '../../form/client/Field'
import { Once } from '../../form/client/Once'
import { Outcome } from '../../form/client/Outcome'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'

type Made = { readonly name: string; readonly password: string }

/** Gives somebody an account and shows the first password, to be handed over and changed. */
export function PersonForm() {
  const router = useRouter()
  const [made, setMade] = useState<Made | null>(null)
  const { busy, problem, onSubmit } = useSend(
    async ({ name, email = '' }) =>
      beside(await callApi('POST', '/api/v1/people', { name, email: email.trim() }), { 'e-mail-taken': 'email' }),
    (json, sent) => {
      const { person, password } = json as { person: { name: string }; password: string }
      setMade({ name: person.name, password })
      sent.reset()
      router.refresh()
    },
  )
  return (
    <>
      {made && (
        <Once
          label={`First password of ${made.name}`}
          secret={made.password}
          note="Hand it over now: it is shown this once. It should be changed on the account page after the first sign-in."
        />
      )}
      <form className={form.form} method="post" onSubmit={onSubmit} noValidate>
        <Field
          name="name"
          label="Name"
          hint="As signatures and the trail will show it."
          maxLength={120}
          autoComplete="off"
          required
          problem={problem}
        />
        <Field name="email" label="E-mail address" type="email" autoComplete="off" required problem={problem} />
        <Outcome problem={problem} />
        <button type="submit" className={form.first} disabled={busy}>
          Add the person
        </button>
      </form>
    </>
  )
}
