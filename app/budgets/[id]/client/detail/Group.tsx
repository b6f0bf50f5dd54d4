'use client'
import { type ReactNode, useId } from 'react'
import css from './detail.module.css'

/** A titled part of the detail. */
export function Group({ title, children }: { title: string; children: ReactNode }) {
  const id = useId()
  return (
    <section className={css.group} aria-labelledby={id}>
      <h3 id={id} className={css.groupTitle}>
        {title}
      </h3>
      {children}
    </section>
  )
}
