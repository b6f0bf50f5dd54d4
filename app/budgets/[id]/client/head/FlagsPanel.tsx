'use client'
import type { Flag } from '../../../../../lib/budget/evaluation'
import { RECORD_WORDS } from '../../../../../lib/budget/record'
import { useLook, useReading } from '../state/contexts'
import { recordName } from '../words/say'
import css from './flags.module.css'

const ORDER: readonly Flag['severity'][] = ['problem', 'warning', 'notice']
const WORD: Readonly<Record<Flag['severity'], string>> = {
  problem: 'leaves something undecided',
  warning: 'a number may be wrong',
  notice: 'to be known',
}

/** What to look at in the whole budget, the heaviest first, each with what to do and the way there. */
export function FlagsPanel() {
  const { budget, evaluation } = useReading()
  const { goTo } = useLook()
  const flags = ORDER.flatMap((severity) => evaluation.flags.filter((flag) => flag.severity === severity))
  return (
    <section className={css.panel} aria-labelledby="flags-title">
      <h2 id="flags-title">What to look at {flags.length > 0 && <span className={css.count}>{flags.length}</span>}</h2>
      {flags.length === 0 && <p className={css.quiet}>Nothing that the worksheet can catch by itself.</p>}
      <ul className={css.list}>
        {flags.map((flag) => (
          <li
            key={`${flag.code} ${flag.section} ${flag.id} ${flag.field} ${flag.message}`}
            data-severity={flag.severity}
          >
            <strong title={WORD[flag.severity]}>{flag.severity}</strong> {flag.message} {flag.todo}{' '}
            <button type="button" onClick={() => goTo({ section: flag.section, id: flag.id, field: flag.field })}>
              Go there
              <span className="unseen">
                : {flag.section !== 'shares' && `${RECORD_WORDS[flag.section]} `}
                {recordName(budget, flag.section, flag.id)}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </section>
  )
}
