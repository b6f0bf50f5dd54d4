'use client'
import { SCHEMA_VERSION } from '../../../lib/budget/schema'
import { Field } from '../../form/client/Field'
import { Outcome } from '../../form/client/Outcome'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'
import { makeBudget, openBudget } from './makeBudget'

export function BlankForm() {
  const { busy, problem, onSubmit } = useSend(async ({ name = '', description = '' }) => {
    if (name.trim() === '') {
      const fields = { name: 'Give the budget a name.' }
      return { ok: false, problem: { code: 'no-name', sentence: 'The budget has no name yet.', fields } }
    }
    return makeBudget({
      head: { schemaVersion: SCHEMA_VERSION, name: name.trim(), description: description.trim() || null },
    })
  }, openBudget)
  return (
    <form className={form.form} method="post" onSubmit={onSubmit} noValidate>
      <Field name="name" label="Name" maxLength={120} autoComplete="off" required problem={problem} />
      <Field
        name="description"
        label="The link in a few words"
        hint="Such as: fabric link, line card to switch card."
        maxLength={400}
        autoComplete="off"
        problem={problem}
      />
      <Outcome problem={problem} />
      <button type="submit" className={form.first} disabled={busy}>
        Make an empty budget
      </button>
    </form>
  )
}
