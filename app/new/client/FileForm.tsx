'use client'
import { useState } from 'react'
import type { BudgetIssue } from '../../../lib/budget/parse'
import { callApi } from '../../form/client/callApi'
import { Field } from '../../form/client/Field'
import { Outcome } from '../../form/client/Outcome'
import { useSend } from '../../form/client/useSend'
import form from '../../form/form.module.css'
import css from '../new.module.css'
import { openBudget } from './makeBudget'
import { readBudgetFile } from './readBudgetFile'

/** A budget file from this computer; all that is wrong with it is listed, with the record and the field. */
export function FileForm() {
  const [file, setFile] = useState<File | null>(null)
  const [issues, setIssues] = useState<readonly BudgetIssue[]>([])
  const { busy, problem, onSubmit } = useSend(async () => {
    setIssues([])
    if (!file) {
      const fields = { file: 'Choose a budget file: JSON, as a worksheet saves it.' }
      return { ok: false, problem: { code: 'no-file', sentence: 'No file has been chosen.', fields } }
    }
    const read = await readBudgetFile(file)
    if ('budget' in read) return callApi('POST', '/api/v1/budgets', read.budget)
    setIssues(read.issues)
    const fields = { file: 'Correct the file as listed here, then choose it again.' }
    return { ok: false, problem: { code: 'bad-file', sentence: 'This file cannot be taken.', fields } }
  }, openBudget)
  return (
    <form className={form.form} method="post" onSubmit={onSubmit} noValidate>
      <Field
        name="file"
        label="File"
        hint="JSON, as the worksheet or the API gives it. Attached evidence files do not travel with it."
        type="file"
        accept=".json,application/json"
        problem={problem}
        onChange={(event) => setFile(event.target.files?.[0] ?? null)}
      />
      <Outcome problem={problem} />
      {issues.length > 0 && (
        <ol className={css.issues}>
          {issues.map(({ path, message }) => (
            <li key={`${path} ${message}`}>{message}</li>
          ))}
        </ol>
      )}
      <button type="submit" className={form.first} disabled={busy}>
        Make it from this file
      </button>
    </form>
  )
}
