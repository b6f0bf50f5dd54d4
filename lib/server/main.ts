import { existsSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { ConfigError, readConfig } from './boot/config.mjs'
import { seedDemo } from './demo'
import { EXAMPLES, startServer } from './start'

const root = process.cwd()

try {
  const begun = Date.now()
  const config = readConfig(process.argv[2], process.env, root)
  const server = await startServer(config, root)
  const closing = async () => {
    await server.close()
    process.exit(0)
  }
  process.once('SIGINT', closing)
  process.once('SIGTERM', closing)

  if (config.mode !== 'serve' && server.ownerCode !== null) {
    const passwords = await seedDemo({
      access: server.access,
      budgets: server.budgets,
      ownerCode: server.ownerCode,
      directory: config.directory,
      folder: join(root, EXAMPLES),
    })
    process.stdout.write(
      `\nThe people of the demo, with their passwords (kept in ${resolve(config.directory, 'demo-passwords.txt')}):\n\n${passwords}`,
    )
  } else if (config.mode !== 'serve' && existsSync(join(config.directory, 'demo-passwords.txt'))) {
    process.stdout.write(`\nThe passwords of the demo are in ${resolve(config.directory, 'demo-passwords.txt')}.\n`)
  } else if (config.mode !== 'serve') {
    process.stdout.write(
      `\nThe first start of the demo was interrupted. Remove ${config.directory} and start again to have it whole.\n`,
    )
  } else if (server.ownerCode !== null) {
    process.stdout.write(
      `\nThis server has no owner yet. Enter this code at ${server.url}/owner: ${server.ownerCode}\n`,
    )
  }
  process.stdout.write(
    `\nHalfbaud answers at ${server.url} (ready after ${((Date.now() - begun) / 1000).toFixed(1)} s; Ctrl-C stops it).\n`,
  )
} catch (error) {
  // A wrong setting or a locked folder is the reader's to mend; anything else is ours, with its trace.
  const plain = error instanceof ConfigError || (error instanceof Error && 'plain' in error)
  process.stderr.write(`${error instanceof Error ? (plain ? error.message : error.stack) : String(error)}\n`)
  process.exit(1)
}
