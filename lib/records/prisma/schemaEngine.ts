import { readFile } from 'node:fs/promises'
import { createRequire } from 'node:module'
import {
  bindMigrationAwareSqlAdapterFactory,
  type SqlMigrationAwareDriverAdapterFactory,
} from '@prisma/driver-adapter-utils'
import * as engine from '@prisma/schema-engine-wasm/schema_engine_bg'

/** The package's own entry imports the .wasm file as a module, which Node 20 cannot; so it is instantiated here, once. */
let instantiated: Promise<void> | null = null

async function instantiate(): Promise<void> {
  const entry = createRequire(import.meta.url).resolve('@prisma/schema-engine-wasm/schema_engine_bg')
  const bytes = await readFile(entry.replace(/\.js$/, '.wasm'))
  const { instance } = await WebAssembly.instantiate(bytes, { './schema_engine_bg.js': { ...engine } })
  engine.__wbg_set_wasm(instance.exports)
  const start = instance.exports.__wbindgen_start
  if (typeof start !== 'function')
    throw new Error('The schema engine does not start; install the pinned packages again.')
  start()
}

/** The schema engine over connections of this adapter; free it after use. */
export async function startSchemaEngine(adapter: SqlMigrationAwareDriverAdapterFactory): Promise<engine.SchemaEngine> {
  instantiated ??= instantiate()
  await instantiated
  return engine.SchemaEngine.new({ datamodels: undefined }, () => {}, bindMigrationAwareSqlAdapterFactory(adapter))
}
