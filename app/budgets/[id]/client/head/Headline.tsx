'use client'
import type { AllowanceEvaluation } from '../../../../../lib/budget/evaluation'
import { VerdictMark } from '../../../../marks/VerdictMark'
import colour from '../../../../marks/verdictColour.module.css'
import { decibels, frequencyWords } from '../../../../words/decibels'
import { headline, judgedWords, movedWords } from '../../../../words/judged'
import { planeWords } from '../../../../words/terms'
import { useLook, useReading } from '../state/contexts'
import css from './head.module.css'

/** The verdict of each allowance: mark, margin, words, and the conditions that it is judged at. */
export function Headlines() {
  const { evaluation } = useReading()
  if (evaluation.allowances.length === 0) return <NoAllowance />
  return (
    <div className={css.headlines}>
      {evaluation.allowances.map((allowance) => (
        <Headline key={allowance.id} allowance={allowance} />
      ))}
    </div>
  )
}

function Headline({ allowance }: { allowance: AllowanceEvaluation }) {
  const { budget } = useReading()
  const { figure, unit, sentence } = headline(allowance)
  const { verdict } = allowance
  const moved = movedWords(allowance)
  // The words name the first reasons themselves.
  const reasons = allowance.reasons.filter((reason) => !allowance.words.includes(reason))
  return (
    <section className={css.headline} aria-label={`Verdict of ${allowance.name || 'an allowance without a name'}`}>
      <p className={css.margin}>
        <VerdictMark verdict={verdict} size={28} stacked />
        <span className={`${css.marginFigure} ${colour[verdict]}`}>{figure}</span>
        <span className={`${css.marginUnit} ${colour[verdict]}`}>{unit}</span>
      </p>
      <p className={css.strong}>{judgedWords(allowance, budget)}</p>
      {moved !== '' && <p className={css.quiet}>{moved}</p>}
      <p className={css.quiet}>{[allowance.name, sentence, span(allowance, budget)].filter(Boolean).join(' · ')}</p>
      {allowance.words !== verdict && <p className={css.strong}>{allowance.words}</p>}
      {reasons.length > 0 && (
        <ul className={css.reasons}>
          {reasons.map((reason) => (
            <li key={reason}>{reason}</li>
          ))}
        </ul>
      )}
      <Spread allowance={allowance} />
    </section>
  )
}

/** ± of the grouped sum, and the worst case: a margin alone says nothing about builds. */
function Spread({ allowance }: { allowance: AllowanceEvaluation }) {
  const { rssDb, worstDb, undecidedLines } = allowance
  const parts = [
    rssDb !== null && `±${decibels(rssDb)} dB, grouped, 3 σ`,
    worstDb !== null && `worst case ${decibels(worstDb)} dB`,
    undecidedLines.length > 0 && `of the lines that have a number`,
  ].filter(Boolean)
  return rssDb === null && worstDb === null ? null : <p className={css.quiet}>{parts.join('; ')}</p>
}

function span({ from, to, atHz }: AllowanceEvaluation, budget: ReturnType<typeof useReading>['budget']): string {
  const name = (id: string | null) => (id === null ? null : budget.planes[id])
  const [start, end] = [name(from), name(to)]
  const planes = start && end ? `${planeWords(start)} to ${planeWords(end)}` : 'its planes are not all there'
  return [planes, atHz === null ? 'no frequency' : frequencyWords(atHz)].join(' · ')
}

function NoAllowance() {
  const { goTo } = useLook()
  return (
    <div className={css.headline}>
      <p className={css.margin}>
        <VerdictMark verdict="undecided" size={28} stacked />
      </p>
      <p className={css.strong}>There is no allowance yet, so there is nothing to judge the loss by.</p>
      <button
        type="button"
        className={css.plainButton}
        onClick={() => goTo({ section: 'allowances', id: null, field: 'add' })}
      >
        Go to the allowances
      </button>
    </div>
  )
}
