import { Problem } from '../../problem'
import { change, read } from '../../wrapper'
import { addPerson, listPeople } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(listPeople, async ({ services }) => ({ json: { people: await services.access.people() } }))

export const POST = change(addPerson, async ({ services, body }) => {
  const added = await services.access.addPerson(body)
  if (!added) throw new Problem('e-mail-taken')
  return { json: added }
})
