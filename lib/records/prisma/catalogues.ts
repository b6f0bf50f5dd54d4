import type { CatalogueEntry, PrismaClient } from '../generated/client'
import type { CatalogueRecord, CatalogueRecords } from '../types'
import { refusedKey } from './errors'

export function catalogueRecords(client: PrismaClient): CatalogueRecords {
  return {
    async add({ time, ...record }) {
      await client.catalogueEntry
        .create({ data: { ...record, time: new Date(time) } })
        .catch(refusedKey('catalogue entry', record.id))
    },

    async byId(id) {
      const found = await client.catalogueEntry.findUnique({ where: { id } })
      return found && toRecord(found)
    },

    async all() {
      const found = await client.catalogueEntry.findMany({ orderBy: [{ time: 'asc' }, { id: 'asc' }] })
      return found.map(toRecord)
    },

    async remove(id) {
      const { count } = await client.catalogueEntry.deleteMany({ where: { id } })
      return count > 0
    },
  }
}

function toRecord({ time, ...record }: CatalogueEntry): CatalogueRecord {
  return { ...record, time: time.getTime() }
}
