'use client'
import { type ReactNode, useState } from 'react'
import css from '../form.module.css'

/** Password fields of one form, hidden or shown together: typing one's own is safer than typing it twice. */
export function Passwords({ children }: { children: (type: 'password' | 'text') => ReactNode }) {
  const [shown, setShown] = useState(false)
  return (
    <>
      {children(shown ? 'text' : 'password')}
      <label className={css.check}>
        <input type="checkbox" checked={shown} onChange={(event) => setShown(event.target.checked)} />
        Show what I type
      </label>
    </>
  )
}
