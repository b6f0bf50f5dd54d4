import css from './closed.module.css'

/** A member's budget whose journal cannot be read: shown as what it is, and not as missing. */
export function Locked() {
  return (
    <div className={css.closed}>
      <h1>This budget is locked</h1>
      <p>
        Its journal is damaged or missing, so the server does not serve it. Tell the server's administrator; the list of
        budgets says what to do.
      </p>
    </div>
  )
}
