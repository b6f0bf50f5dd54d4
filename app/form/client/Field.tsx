'use client'
import { type InputHTMLAttributes, useId } from 'react'
import css from '../form.module.css'
import type { ApiProblem } from './callApi'

type Props = Omit<InputHTMLAttributes<HTMLInputElement>, 'name' | 'id'> & {
  /** The API's name of the field. */
  readonly name: string
  readonly label: string
  readonly hint?: string
  readonly problem?: ApiProblem | null
}

/** A labelled field with its hint, and the sentence about it after a refusal. */
export function Field({ name, label, hint, problem, ...input }: Props) {
  const id = useId()
  const wrong = problem?.fields[name]
  const described = [hint && `${id}-hint`, wrong && `${id}-wrong`].filter(Boolean).join(' ')
  return (
    <div className={css.field}>
      <label htmlFor={id}>{label}</label>
      <input
        {...input}
        id={id}
        name={name}
        aria-invalid={wrong ? true : undefined}
        aria-describedby={described || undefined}
      />
      {hint && (
        <p id={`${id}-hint`} className={css.hint}>
          {hint}
        </p>
      )}
      {wrong && (
        <p id={`${id}-wrong`} className={css.wrong}>
          {wrong}
        </p>
      )}
    </div>
  )
}
