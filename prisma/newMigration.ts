import { mkdir, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { nextMigration } from './nextMigration'

/** `npx tsx prisma/newMigration.ts <what-changes>`: writes the SQL that leads from the migrations to schema.prisma. */
const words = process.argv[2]
if (!words || !/^[a-z0-9-]+$/.test(words)) throw new Error('Name the change in a few words with hyphens.')
const folder = dirname(fileURLToPath(import.meta.url))
const migrations = join(folder, 'migrations')
const scratch = await mkdtemp(join(tmpdir(), 'halfbaud-migration-'))
try {
  const schema = await readFile(join(folder, 'schema.prisma'), 'utf8')
  const script = await nextMigration(join(scratch, 'records.sqlite'), migrations, schema)
  if (script === null) {
    console.error('The migrations already lead to schema.prisma; nothing to write.')
  } else {
    const stamp = new Date().toISOString().replace(/\D/g, '').slice(0, 14)
    await mkdir(join(migrations, `${stamp}_${words}`))
    await writeFile(join(migrations, `${stamp}_${words}`, 'migration.sql'), script)
    console.error(`Wrote prisma/migrations/${stamp}_${words}/migration.sql; read it before you commit it.`)
  }
} finally {
  await rm(scratch, { recursive: true })
}
