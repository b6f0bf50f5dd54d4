'use client'
import { Outcome } from '../../form/client/Outcome'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'
import { VerdictMark } from '../../marks/VerdictMark'
import css from '../new.module.css'
import type { Scenario } from '../scenarios'
import { makeBudget, openBudget } from './makeBudget'

export function ScenarioForm({ scenarios }: { scenarios: readonly Scenario[] }) {
  const { busy, problem, onSubmit } = useSend(async ({ scenario }) => {
    const chosen = scenarios.find(({ id }) => id === scenario)
    if (chosen) return makeBudget(chosen.budget)
    return { ok: false, problem: { code: 'none-chosen', sentence: 'Choose one of the links.', fields: {} } }
  }, openBudget)
  return (
    <form className={form.form} method="post" onSubmit={onSubmit}>
      <fieldset className={css.choices}>
        <legend className={form.hint}>Invented links that show how a budget is kept; change them freely.</legend>
        {scenarios.map(({ id, name, description, verdict, words }, at) => (
          <label key={id} className={css.choice}>
            <input type="radio" name="scenario" value={id} defaultChecked={at === 0} />
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
