'use client'
import type { SheetState } from '../state/sheet'
import css from './head.module.css'
import { savedWords } from './savedWords'

/** Whether everything is saved, in words; the mark beside them turns with nothing but what they say. */
export function SavedState({ state }: { state: SheetState }) {
  const { title, detail, tone } = savedWords(state)
  return (
    <p className={css.saved} data-tone={tone}>
      <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true" focusable="false">
        <circle cx="7" cy="7" r="5" />
      </svg>
      <span>
        <strong suppressHydrationWarning>{title}</strong>
        <span suppressHydrationWarning>{detail}</span>{' '}
        {state.connection.state === 'closed' && (
          <button type="button" className={css.plainButton} onClick={() => window.location.reload()}>
            Load the page anew
          </button>
        )}
      </span>
    </p>
  )
}
