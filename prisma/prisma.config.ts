import { defineConfig } from 'prisma/config'

// Paths are relative to this file. Migrations are run by lib/records/migrate.ts, not by the command line, so no address here.
export default defineConfig({ schema: 'schema.prisma', migrations: { path: 'migrations' } })
