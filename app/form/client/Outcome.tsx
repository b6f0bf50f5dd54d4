'use client'
import css from '../form.module.css'
import type { ApiProblem } from './callApi'

/** What became of the form, said aloud. Always on the page, so that a change of it is announced. */
export function Outcome({ problem, done }: { problem: ApiProblem | null; done?: string | null }) {
  const shown = problem?.fields.body ?? problem?.sentence
  return (
    <div role="alert">
      {shown && <p className={css.wrong}>{shown}</p>}
      {!shown && done && <p className={css.done}>{done}</p>}
    </div>
  )
}
