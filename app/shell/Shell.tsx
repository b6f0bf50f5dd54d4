import Link from 'next/link'
import type { ReactNode } from 'react'
import type { Identity } from '../../lib/access/identity'
import { KeepSignedIn } from './client/KeepSignedIn'
import { SignOut } from './client/SignOut'
import { ThemeSwitch } from './client/ThemeSwitch'
import { Footer } from './Footer'
import { NameMark } from './NameMark'
import css from './shell.module.css'
import { chosenTheme } from './theme'

type Props = {
  /** Where one is, in words or as links; null on the list of budgets and before signing in. */
  readonly where: ReactNode
  readonly identity: Identity | null
  readonly children: ReactNode
}

/** What is around every page: the skip link, the name, where one is, who one is, and the caution at the foot. */
export async function Shell({ where, identity, children }: Props) {
  return (
    <>
      <a href="#content" className={css.skip}>
        Skip to the content
      </a>
      <header className={css.header}>
        <NameMark />
        {where !== null && <div className={css.where}>{where}</div>}
        <div className={css.person}>
          {identity && (
            <nav aria-label="Pages" className={css.pages}>
              <Link href="/">Budgets</Link>
              <Link href="/people">People</Link>
              <Link href="/account">{identity.name}</Link>
            </nav>
          )}
          <ThemeSwitch theme={await chosenTheme()} />
          {identity && <SignOut />}
        </div>
      </header>
      <main id="content" tabIndex={-1} className={css.main}>
        {children}
      </main>
      <Footer />
      {identity && <KeepSignedIn />}
    </>
  )
}
