import { evaluate } from '../budget/evaluate'
import { readNetwork } from '../budget/evidence/readNetwork'
import type { BudgetService, Example, ExampleService } from '../sync/services'
import { attachedFiles, readScenarios, type ScenarioLink } from './scenarios'

/** The links of a folder of scenarios, read and evaluated once, when somebody first asks. */
export function createExampleService(folder: string, budgets: Pick<BudgetService, 'create'>): ExampleService {
  let once: Promise<readonly { link: ScenarioLink; example: Example }[]> | null = null
  const all = () => {
    once ??= readScenarios(folder)
      .then(({ links }) => links.map((link) => ({ link, example: exampleOf(link) })))
      .catch((cause) => {
        once = null
        throw cause
      })
    return once
  }
  return {
    list: async () => (await all()).map(({ example }) => example),
    async make(identity, door, id) {
      const found = (await all()).find(({ link }) => link.id === id)
      return found ? budgets.create(identity, door, found.link.budget, attachedFiles(found.link)) : null
    },
  }
}

function exampleOf({ id, budget, files }: ScenarioLink): Example {
  const networks = new Map(files.map(({ sha256, name, bytes }) => [sha256, readNetwork(bytes, name)]))
  const { verdict, allowances } = evaluate(budget, networks)
  const { name, protocol, description } = budget.head
  return {
    id,
    name: name ?? id,
    description: [protocol, description].filter(Boolean).join('. '),
    verdict,
    words: allowances.find((allowance) => allowance.verdict === verdict)?.words ?? verdict,
  }
}
