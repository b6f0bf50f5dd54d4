import type { Metadata } from 'next'
import Link from 'next/link'
import { VERDICTS } from '../lib/budget/schema'
import form from './form/form.module.css'
import { BudgetRow } from './home/BudgetRow'
import css from './home/home.module.css'
import { worstFirst } from './home/rank'
import { VerdictMark } from './marks/VerdictMark'
import { services } from './services'
import { Shell } from './shell/Shell'
import { signedIn } from './shell/signedIn'
import { counted } from './words/count'
import { VERDICT_WORD } from './words/terms'

export const metadata: Metadata = { title: 'Budgets' }

export default async function BudgetsPage() {
  const identity = await signedIn('/')
  const { budgets } = services()
  const summaries = worstFirst(await budgets.list(identity))
  const read = await Promise.all(summaries.map(({ id, locked }) => (locked === null ? budgets.read(id) : null)))
  return (
    <Shell where={null} identity={identity}>
      <div className={css.top}>
        <h1>{counted(summaries.length, 'budget', 'budgets')}</h1>
        {summaries.length > 0 && (
          <ul className={css.counts}>
            {VERDICTS.map((verdict) => {
              const count = summaries.filter((one) => one.locked === null && one.verdict === verdict).length
              return count === 0 ? null : (
                <li key={verdict}>
                  <VerdictMark verdict={verdict} word={`${count} ${VERDICT_WORD[verdict].toLowerCase()}`} />
                </li>
              )
            })}
          </ul>
        )}
        {summaries.length > 1 && (
          <p className={css.aside}>The ones that need work come first. Each margin is at its own judged conditions.</p>
        )}
        <Link href="/new" className={`${form.first} ${css.make}`}>
          New budget
        </Link>
      </div>
      {summaries.length === 0 ? (
        <div className={css.none}>
          <p>You are not a member of any budget yet.</p>
          <p>
            <Link href="/new">Make one</Link> from nothing, from an example link or from a file; or ask the owner of a
            budget to add you ({identity.email}).
          </p>
        </div>
      ) : (
        <ul className={css.list}>
          {summaries.map((summary, at) => (
            <BudgetRow key={summary.id} summary={summary} budget={read[at]?.budget ?? null} />
          ))}
        </ul>
      )}
    </Shell>
  )
}
