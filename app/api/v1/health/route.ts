import { Problem } from '../../problem'
import { read } from '../../wrapper'
import { health } from './declaration'

export const dynamic = 'force-dynamic'

export const GET = read(health, async ({ services }) => {
  const wrong = await services.ready()
  if (wrong !== null) throw new Problem('not-ready', { detail: wrong })
  return { json: { ready: true, engine: services.engine } }
})
