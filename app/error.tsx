'use client'
import form from './form/form.module.css'
import { Footer } from './shell/Footer'
import { NameMark } from './shell/NameMark'
import css from './shell/shell.module.css'

type Props = { readonly error: Error & { readonly digest?: string }; readonly retry: () => void }

/** A page that failed. What was typed into a worksheet is safe: it lies in the browser's outbox or with the server. */
export default function PageFailed({ error, retry }: Props) {
  return (
    <>
      <header className={css.header}>
        <NameMark />
      </header>
      <main className={css.main}>
        <div className={`${form.sheet} ${form.narrow}`}>
          <h1>This page failed</h1>
          <p>Edits of a worksheet that were not yet saved are kept on this computer and sent when it opens again.</p>
          <button type="button" className={form.first} onClick={retry}>
            Try again
          </button>
          {error.digest && (
            <p className={form.hint}>
              If it fails again, tell the administrator this number; the server's log has it:{' '}
              <code>{error.digest}</code>
            </p>
          )}
        </div>
      </main>
      <Footer />
    </>
  )
}
