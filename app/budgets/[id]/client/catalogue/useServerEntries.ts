'use client'
import { useEffect, useState } from 'react'
import { callApi } from '../../../../form/client/callApi'
import { type ServerEntry, serverEntries } from './ownEntries'

export type ServerCatalogue = {
  readonly entries: readonly ServerEntry[]
  /** What could not be done, in a sentence. */
  readonly problem: string | null
  readonly remove: (id: string) => void
}

/** The entries of this server, read when the catalogue is opened. */
export function useServerEntries(): ServerCatalogue {
  const [entries, setEntries] = useState<readonly ServerEntry[]>([])
  const [problem, setProblem] = useState<string | null>(null)
  useEffect(() => {
    let open = true
    callApi('GET', '/api/v1/catalogues').then((answer) => {
      if (!open) return
      if (answer.ok) setEntries(serverEntries(answer.json))
      else setProblem(`The entries of this server are not shown. ${answer.problem.sentence}`)
    })
    return () => {
      open = false
    }
  }, [])
  const remove = async (id: string) => {
    const answer = await callApi('DELETE', `/api/v1/catalogues/${encodeURIComponent(id)}`)
    if (!answer.ok && answer.problem.code !== 'not-found') return setProblem(answer.problem.sentence)
    setProblem(null)
    setEntries((all) => all.filter((entry) => entry.id !== id))
  }
  return { entries, problem, remove }
}
