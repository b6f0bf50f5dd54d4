import { createServer } from 'node:http'
import { join } from 'node:path'
import { openAccess } from '../access/open'
import { ENGINE } from '../budget/engine'
import { openStore } from '../records/open'
import type { Store } from '../records/types'
import { openSync } from '../sync/open'
import type { Config } from './boot/config.mjs'
import { openEvaluator } from './evaluation/open'
import { createExampleService } from './examples'
import { guard } from './guard'
import { openPages } from './pages'
import { publish } from './publish'
import { readSecret } from './secret'

/** The folder of the invented links, below the project's own. */
export const EXAMPLES = 'seed-scenarios'

export type RunningServer = {
  readonly url: string
  /** The one-time code of the first owner; null where there is one already. */
  readonly ownerCode: string | null
  readonly access: Awaited<ReturnType<typeof openAccess>>
  readonly budgets: Awaited<ReturnType<typeof openSync>>['budgets']
  /** Stops taking requests, writes what is accepted, closes the files. */
  close(): Promise<void>
}

/** Puts the parts together and listens. `open` is replaced by fault tests that watch or stall the journal. */
export async function startServer(
  config: Config,
  root: string,
  open: (directory: string) => Promise<Store> = openStore,
): Promise<RunningServer> {
  const log = (message: string, error?: unknown) =>
    process.stderr.write(
      `${message}${error === undefined ? '' : `: ${error instanceof Error ? error.stack : String(error)}`}\n`,
    )
  const store = await open(config.directory)
  const secret = await readSecret(config.directory)
  const { publicUrl } = config
  const access = await openAccess({ records: store.records, publicUrl, secret, clock: Date.now, log })
  const evaluator = openEvaluator(join(config.directory, 'evidence'))
  const sync = await openSync({ store, sessions: access, publicUrl, engine: ENGINE, evaluator, clock: Date.now, log })
  publish({
    publicUrl,
    demo: config.mode === 'demo',
    engine: ENGINE,
    access,
    budgets: sync.budgets,
    evidence: sync.evidence,
    catalogues: sync.catalogues,
    examples: createExampleService(join(root, EXAMPLES), sync.budgets),
    evaluate: evaluator.evaluateAlone.bind(evaluator),
    ready: () => ready(store),
    submit: sync.submit,
  })
  const pages = config.pages ? await openPages(config, root) : null
  const http = createServer((request, response) => {
    if (!guard(request, response, { publicUrl, policy: config.mode !== 'dev' })) return
    if (pages) pages.handle(request, response)
    else response.writeHead(404).end()
  })
  sync.attach(http)
  http.on('upgrade', (request, socket) => {
    // Next answers its own upgrades while pages are compiled; anything else that is not the worksheet's is nobody's.
    const path = request.url ?? ''
    if (!path.startsWith('/collab/') && !(config.mode === 'dev' && path.startsWith('/_next/'))) socket.destroy()
  })
  await new Promise<void>((resolve, reject) => {
    http.once('error', reject)
    http.listen(config.port, config.host, resolve)
  })
  return {
    url: publicUrl,
    ownerCode: await access.ownerCode(),
    access,
    budgets: sync.budgets,
    close: async () => {
      const closed = new Promise((resolve) => http.close(resolve))
      await sync.close()
      http.closeAllConnections()
      await closed
      await pages?.close()
      access.close()
      await evaluator.close()
      await store.close()
    },
  }
}

/** Whether both databases answer: what the health page tells whoever watches the server. */
async function ready(store: Store): Promise<string | null> {
  try {
    await Promise.all([store.records.people.count(), store.journal.budgets()])
    return null
  } catch {
    return "A database does not answer; see the server's log and the free space of its disk."
  }
}
