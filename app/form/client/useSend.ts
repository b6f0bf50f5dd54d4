'use client'
import { type FormEvent, useRef, useState } from 'react'
import type { Answer, ApiProblem } from './callApi'

export type Sending = {
  readonly busy: boolean
  readonly problem: ApiProblem | null
  readonly onSubmit: (event: FormEvent<HTMLFormElement>) => void
}

/**
 * One form that sends itself: the fields' names are the API's. After a refusal the focus goes to the first field that
 * is named in it, so that who cannot see the sentence lands beside it.
 * @param send gets the fields as typed; done gets what came back
 */
export function useSend(
  send: (fields: Readonly<Record<string, string>>) => Promise<Answer>,
  done: (json: unknown, form: HTMLFormElement) => void,
): Sending {
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<ApiProblem | null>(null)
  const underWay = useRef(false)
  const submit = async (form: HTMLFormElement) => {
    const fields: Record<string, string> = {}
    for (const [name, value] of new FormData(form)) if (typeof value === 'string') fields[name] = value
    const answer = await send(fields)
    if (answer.ok) {
      setProblem(null)
      done(answer.json, form)
      return
    }
    setProblem(answer.problem)
    const named = Object.keys(answer.problem.fields).find((name) => form.elements.namedItem(name))
    const field = named === undefined ? null : form.elements.namedItem(named)
    if (field instanceof HTMLElement) field.focus()
  }
  const onSubmit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    if (underWay.current) return
    underWay.current = true
    setBusy(true)
    submit(event.currentTarget).finally(() => {
      underWay.current = false
      setBusy(false)
    })
  }
  return { busy, problem, onSubmit }
}
