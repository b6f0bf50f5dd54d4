import Link from 'next/link'
import type { AllowanceEvaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import type { BudgetSummary } from '../../lib/sync/services'
import { BasisStrip } from '../diagram/BasisStrip'
import { Landing } from '../diagram/Landing'
import { VerdictMark } from '../marks/VerdictMark'
import colour from '../marks/verdictColour.module.css'
import { When } from '../words/client/When'
import { headline, judgedWords } from '../words/judged'
import css from './home.module.css'
import { pastShares } from './pastShares'
import { decidingAllowance } from './rank'

type Props = {
  readonly summary: BudgetSummary
  /** For the names of corners and planes; null where it cannot be read. */
  readonly budget: Budget | null
}

/** One budget at one glance: where the bar lies, by how much, in which conditions, and how proven that is. */
export function BudgetRow({ summary, budget }: Props) {
  const { id, name, description, locked, lastChange } = summary
  const title = name.trim() || 'Budget without a name'
  if (locked !== null || budget === null) {
    return (
      <li className={css.row}>
        <p className={css.locked}>Locked</p>
        <div className={css.names}>
          <h2>{title}</h2>
          {description && <p>{description}</p>}
        </div>
        <p className={css.reason}>{locked ?? 'This budget cannot be read at the moment. Reload the page.'}</p>
      </li>
    )
  }
  const deciding = decidingAllowance(summary.evaluation)
  return (
    <li className={css.row}>
      <VerdictMark verdict={summary.verdict} size={20} stacked />
      <div className={css.names}>
        <h2>
          <Link href={`/budgets/${id}`} className={css.open}>
            {title}
          </Link>
        </h2>
        {description && <p>{description}</p>}
        {lastChange && (
          <p className={css.last}>
            {lastChange.personName}, <When time={lastChange.time} />
          </p>
        )}
      </div>
      {deciding ? (
        <Deciding allowance={deciding} summary={summary} budget={budget} />
      ) : (
        <p className={css.conditions}>No allowance yet, so there is nothing to hold the loss against.</p>
      )}
    </li>
  )
}

function Deciding({
  allowance,
  summary,
  budget,
}: {
  allowance: AllowanceEvaluation
  summary: BudgetSummary
  budget: Budget
}) {
  const { figure, unit, sentence } = headline(allowance)
  const others = summary.evaluation.allowances
    .filter((one) => one !== allowance && one.verdict !== 'inside')
    .slice(0, 2)
  return (
    <>
      <div className={css.margin}>
        <p className={colour[summary.verdict]}>
          <span className={css.figure}>{figure}</span> {unit}
        </p>
        <p className={css.conditions}>{judgedWords(allowance, budget)}</p>
        <p className={css.conditions}>{sentence}</p>
        {[...allowance.reasons, ...pastShares(allowance, budget)].slice(0, 3).map((reason) => (
          <p key={reason} className={css.conditions}>
            {reason}
          </p>
        ))}
        {others.map((one) => (
          <p key={one.id} className={css.conditions}>
            {one.name}: {one.words}
          </p>
        ))}
      </div>
      <div className={css.picture}>
        <Landing
          budget={budget}
          evaluation={summary.evaluation}
          allowance={allowance.id}
          width={96}
          height={72}
          words={false}
        />
      </div>
      <BasisStrip allowance={allowance} width={230} />
    </>
  )
}
