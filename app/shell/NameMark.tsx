import Link from 'next/link'
import css from './shell.module.css'

/** Our own sign: a level that steps down towards the ground. */
export function NameMark() {
  return (
    <Link href="/" className={css.nameMark}>
      <svg width="30" height="20" viewBox="0 0 30 20" aria-hidden="true">
        <path d="M1 3h8l8 8h8" className={css.markLevel} />
        <path d="M1 17.5h28" className={css.markGround} />
      </svg>
      <span>Halfbaud</span>
    </Link>
  )
}
