import type { Metadata } from 'next'
import Link from 'next/link'
import { Shell } from '../../shell/Shell'
import css from './closed.module.css'

export const metadata: Metadata = { title: 'No such budget' }

/** The same words for a budget that does not exist and for one that this person is no member of. */
export default function NoSuchBudget() {
  return (
    <Shell where={null} identity={null}>
      <div className={css.closed}>
        <h1>No such budget, or no access to it</h1>
        <p>Ask whoever sent you the address to make you a member, or look among your own budgets.</p>
        <p>
          <Link href="/">To the budgets</Link>
        </p>
      </div>
    </Shell>
  )
}
