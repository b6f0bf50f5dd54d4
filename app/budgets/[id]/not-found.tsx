import Link from 'next/link'
import css from './closed.module.css'

/** The same words for a budget that does not exist and for one that this person is no member of. */
export default function NoSuchBudget() {
  return (
    <main className={css.closed}>
      <h1>No such budget, or no access to it</h1>
      <p>Ask whoever sent you the address to make you a member, or look among your own budgets.</p>
      <p>
        <Link href="/">Your budgets</Link>
      </p>
    </main>
  )
}
