import type { BudgetFile } from '../../../lib/budget/schema'
import { type Answer, callApi } from '../../form/client/callApi'

/** Sends a budget file; the API judges it once more. */
export function makeBudget(budget: BudgetFile): Promise<Answer> {
  return callApi('POST', '/api/v1/budgets', budget)
}

/** Opens what was made. The page is loaded anew, so that the list behind it knows of it too. */
export function openBudget(json: unknown): void {
  const id = typeof json === 'object' && json !== null && 'id' in json ? json.id : null
  window.location.assign(typeof id === 'string' ? `/budgets/${encodeURIComponent(id)}` : '/')
}
