'use client'
import { useState } from 'react'
import { allowanceToCatalogue } from '../../../../../lib/budget/catalogues/allowances'
import type { Allowance } from '../../../../../lib/budget/schema'
import { callApi } from '../../../../form/client/callApi'
import { useBench, useReading } from '../state/contexts'
import css from './catalogue.module.css'

/** Keeps an allowance of this budget in the catalogue of the server, for everybody who is signed in there. */
export function SaveAllowance({ allowance }: { allowance: Allowance }) {
  const { budget, evaluation } = useReading()
  const { canWrite } = useBench()
  const [outcome, setOutcome] = useState<string | null>(null)
  const [busy, setBusy] = useState(false)
  if (!canWrite) return null
  const save = async () => {
    if (busy) return
    setBusy(true)
    const entry = allowanceToCatalogue(allowance, budget, evaluation.signalling)
    const answer = await callApi('POST', '/api/v1/catalogues', { kind: 'allowance', entry })
    setBusy(false)
    setOutcome(
      answer.ok ? "Kept in this server's catalogue; everybody signed in here can take it." : answer.problem.sentence,
    )
  }
  return (
    <div className={css.save}>
      <button
        type="button"
        className={css.button}
        aria-label={`Save ${allowance.name?.trim() || 'this allowance'} to this server's catalogue`}
        onClick={save}
      >
        Save to this server's catalogue
      </button>
      <p className={css.quiet} role="status">
        {outcome}
      </p>
    </div>
  )
}
