import { existsSync } from 'node:fs'
import { readdir, readFile } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { MigrationList } from '@prisma/schema-engine-wasm/schema_engine_bg'

/** The project's migrations, found from this file or from the bundle it was built into. */
export function projectMigrations(): string {
  let folder = dirname(fileURLToPath(import.meta.url))
  while (!existsSync(join(folder, 'prisma', 'migrations'))) {
    const parent = dirname(folder)
    if (parent === folder) throw new Error('The folder prisma/migrations is missing; install Halfbaud again.')
    folder = parent
  }
  return join(folder, 'prisma', 'migrations')
}

/** The folder as the schema engine wants it: one directory per migration, oldest first. */
export async function readMigrations(folder: string): Promise<MigrationList> {
  const found = await readdir(folder, { withFileTypes: true })
  const names = found.filter((entry) => entry.isDirectory()).map((entry) => entry.name)
  return {
    baseDir: folder,
    lockfile: { path: 'migration_lock.toml', content: 'provider = "sqlite"\n' },
    shadowDbInitScript: '',
    migrationDirectories: await Promise.all(
      names.sort().map(async (name) => ({
        path: name,
        migrationFile: {
          path: 'migration.sql',
          content: { tag: 'ok' as const, value: await readFile(join(folder, name, 'migration.sql'), 'utf8') },
        },
      })),
    ),
  }
}
