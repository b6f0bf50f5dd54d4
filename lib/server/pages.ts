import type { RequestListener } from 'node:http'
import type { Config } from './boot/config.mjs'

/** Starts Next inside this process. Imported only where pages are wanted: it takes a second and 100 MB. */
export async function openPages(
  config: Config,
  root: string,
): Promise<{ handle: RequestListener; close(): Promise<void> }> {
  const { default: next } = await import('next')
  const app = next({ dev: config.mode === 'dev', dir: root, hostname: config.host, port: config.port })
  await app.prepare()
  const handler = app.getRequestHandler()
  return {
    handle: (request, response) => {
      handler(request, response).catch((error: unknown) => {
        process.stderr.write(`A request failed: ${error instanceof Error ? error.stack : String(error)}\n`)
        if (!response.headersSent) response.writeHead(500)
        response.end()
      })
    },
    close: () => app.close(),
  }
}
