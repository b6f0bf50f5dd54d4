'use client'
import { useId, useState } from 'react'
import { callApi } from '../../form/client/callApi'
import { Field } from '../../form/client/Field'
import { Once } from '../../form/client/Once'
import { Outcome } from '../../form/client/Outcome'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'
import { LIFETIMES } from './token'

/** Makes a token; its secret is shown until the page is left or another one is made. */
export function TokenForm({ onMade }: { onMade: (token: unknown) => void }) {
  const [secret, setSecret] = useState<string | null>(null)
  const id = useId()
  const { busy, problem, onSubmit } = useSend(
    ({ name, lifetime }) => {
      const ms = LIFETIMES.find(({ words }) => words === lifetime)?.ms ?? null
      return callApi('POST', '/api/v1/tokens', { name, expiresAt: ms === null ? null : Date.now() + ms })
    },
    (json, sent) => {
      const made = json as { secret?: unknown; token?: unknown }
      setSecret(typeof made?.secret === 'string' ? made.secret : null)
      onMade(made?.token)
      sent.reset()
    },
  )
  return (
    <>
      {secret && (
        <Once
          label="The new token"
          secret={secret}
          note="Keep it now: it is shown this once, and the server keeps only its hash."
        />
      )}
      <form className={form.form} method="post" onSubmit={onSubmit} noValidate>
        <Field
          name="name"
          label="What the new token is for"
          maxLength={80}
          autoComplete="off"
          required
          problem={problem}
        />
        <div className={form.field}>
          <label htmlFor={id}>It ends after</label>
          <select id={id} name="lifetime">
            {LIFETIMES.map(({ words }) => (
              <option key={words}>{words}</option>
            ))}
          </select>
        </div>
        <Outcome problem={problem} />
        <button type="submit" className={form.first} disabled={busy}>
          Make a token
        </button>
      </form>
    </>
  )
}
