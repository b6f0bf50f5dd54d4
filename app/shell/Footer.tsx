import css from './shell.module.css'

/** The caution that every page carries. */
export function Footer() {
  return (
    <footer className={css.footer}>
      An estimate of loss, not a compliance test. Laminate values come from the fabricator; your own copy of the
      standard wins.
    </footer>
  )
}
