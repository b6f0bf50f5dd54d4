import { fileURLToPath } from 'node:url'
import type { Identity } from '../../../lib/access/identity'
import { ENGINE } from '../../../lib/budget/engine'
import { createExampleService } from '../../../lib/server/examples'
import { evaluatorHere } from '../../../lib/sync/evaluator'
import { openSync } from '../../../lib/sync/open'
import type { Services } from '../../../lib/sync/services'
import { OWNER, ownedWorld, signedIn } from '../../access/world'
import { PUBLIC_URL, publish } from './caller'

const EXAMPLES = fileURLToPath(new URL('../../../seed-scenarios', import.meta.url))

/** Everything behind the API as the server puts it together, on a directory of its own, and published for the handlers. */
export async function openWorksheet() {
  const world = await ownedWorld({ publicUrl: PUBLIC_URL })
  const evaluator = evaluatorHere(new Map())
  const sync = await openSync({
    store: world.store,
    sessions: world.access,
    publicUrl: PUBLIC_URL,
    engine: ENGINE,
    evaluator,
    clock: world.now,
    log: (message, error) => world.logged.push(`${message}: ${error}`),
  })
  const { budgets, evidence, catalogues, submit } = sync
  const services: Services = {
    publicUrl: PUBLIC_URL,
    demo: false,
    evaluate: evaluator.evaluate,
    engine: ENGINE,
    access: world.access,
    budgets,
    evidence,
    catalogues,
    examples: createExampleService(EXAMPLES, budgets),
    submit,
    ready: async () => null,
  }
  publish(services)
  return {
    ...world,
    services,
    /** Headers of somebody who is signed in; made anew they are another session. */
    async as(email: string = OWNER.email, password: string = OWNER.password) {
      const { headers, identity } = await signedIn(world.access, email, password)
      return { cookie: headers.get('cookie') ?? '', identity }
    },
    async close() {
      publish(undefined)
      await sync.close()
      await world.close()
    },
  }
}

export type Person = { readonly cookie: string; readonly identity: Identity }
