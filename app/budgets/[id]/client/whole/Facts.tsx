import type { Term } from '../../../../words/beside'
import css from './whole.module.css'

/** What a full evaluation says, term by term. */
export function Facts({ facts, label }: { facts: readonly Term[]; label: string }) {
  return (
    <dl className={css.facts} aria-label={label}>
      {facts.map(({ term, value }) => (
        <div key={term}>
          <dt>{term}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  )
}
