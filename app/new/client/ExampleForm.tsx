'use client'
import type { Verdict } from '../../../lib/budget/schema'
import { callApi } from '../../form/client/callApi'
import { Outcome } from '../../form/client/Outcome'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'
import { VerdictMark } from '../../marks/VerdictMark'
import css from '../new.module.css'
import { openBudget } from './makeBudget'

type Example = {
  readonly id: string
  readonly name: string
  readonly description: string
  readonly verdict: Verdict
  readonly words: string
}

export function ExampleForm({ examples }: { examples: readonly Example[] }) {
  const { busy, problem, onSubmit } = useSend(
    ({ example = '' }) => callApi('POST', `/api/v1/examples/${encodeURIComponent(example)}`),
    openBudget,
  )
  return (
    <form className={form.form} method="post" onSubmit={onSubmit}>
      <fieldset className={css.choices}>
        <legend className={form.hint}>
          Invented links that show how a budget is kept, with the files that they count by; change them freely.
        </legend>
        {examples.map(({ id, name, description, verdict, words }, at) => (
          <label key={id} className={css.choice}>
            <input type="radio" name="example" value={id} defaultChecked={at === 0} />
            <span className={css.name}>{name}</span>
            <span className={css.words}>{description}</span>
            <span className={css.words}>
              <VerdictMark verdict={verdict} size={13} word={words} />
            </span>
          </label>
        ))}
      </fieldset>
      <Outcome problem={problem} />
      <button type="submit" className={form.first} disabled={busy}>
        Make it from this link
      </button>
    </form>
  )
}
