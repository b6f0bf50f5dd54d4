import { randomUUID } from 'node:crypto'
import type { Identity } from '../access/identity'
import { type OwnEntry, ownEntry } from '../budget/catalogues/ownEntry'
import type { CatalogueRecord, Records } from '../records/types'
import type { CatalogueItem, CatalogueService } from './services'

/** The catalogues of this server: what its people add to what comes with the program. */
export function createCatalogueService(
  records: Pick<Records, 'catalogues' | 'people'>,
  now: () => number,
): CatalogueService {
  return {
    async list(identity) {
      const kept = await records.catalogues.all()
      const people = await records.people.byIds(kept.map(({ person }) => person))
      return kept.map((record) => ({
        ...shown(record),
        personName: people.get(record.person)?.name ?? 'Erased person',
        mayRemove: mayRemove(identity, record),
      }))
    },

    async add(identity, { kind, entry }) {
      const id = randomUUID()
      await records.catalogues.add({ id, kind, entry: JSON.stringify(entry), person: identity.person, time: now() })
      return { id }
    },

    async remove(identity, id) {
      const record = await records.catalogues.byId(id)
      if (!record) return 'no-such-entry'
      if (!mayRemove(identity, record)) return 'not-yours'
      return (await records.catalogues.remove(id)) ? 'done' : 'no-such-entry'
    },
  }
}

function mayRemove(identity: Identity, record: CatalogueRecord): boolean {
  return record.person === identity.person || identity.administrator
}

/** @throws where the records hold what no version of this program writes */
function shown({
  id,
  kind,
  entry,
  person,
  time,
}: CatalogueRecord): OwnEntry & Pick<CatalogueItem, 'id' | 'person' | 'time'> {
  const own = ownEntry.safeParse({ kind, entry: JSON.parse(entry) })
  if (!own.success) throw new Error(`The catalogue entry ${id} cannot be read; restore a backup. ${own.error.message}`)
  return { ...own.data, id, person, time }
}
