import { readJson } from '../../../lib/budget/jsonText'
import { type BudgetIssue, parseBudget } from '../../../lib/budget/parse'
import type { Budget } from '../../../lib/budget/schema'

/** The API takes as much (4 MB), and no budget file that a person keeps comes near it. */
const MOST_BYTES = 4 * 1024 * 1024

export type FileRead = { readonly budget: Budget } | { readonly issues: readonly BudgetIssue[] }

/** Reads a budget file in the browser, so that what is wrong with it is said before anything is sent. */
export async function readBudgetFile(file: Blob): Promise<FileRead> {
  if (file.size > MOST_BYTES) return wrong('The file is larger than 4 MB; a budget file is not. Choose another one.')
  const json = readJson(await file.text())
  if ('problem' in json) {
    const { line, column, message } = json.problem
    return wrong(`The file is no JSON, at line ${line}, column ${column}: ${message}`)
  }
  return parseBudget(json.value)
}

const wrong = (message: string): FileRead => ({ issues: [{ path: '', message }] })
