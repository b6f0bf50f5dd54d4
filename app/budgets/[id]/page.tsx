import type { Metadata } from 'next'
import { headers } from 'next/headers'
import { notFound } from 'next/navigation'
import { services } from '../../services'
import { Shell } from '../../shell/Shell'
import { signedIn } from '../../shell/signedIn'
import { Worksheet } from './client/Worksheet'
import { Locked } from './Locked'

/** How much of the trail the page brings along; older entries are asked for. */
const TRAIL = 50

type Props = { readonly params: Promise<{ id: string }> }

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { id } = await params
  const { access, budgets } = services()
  const identity = await access.identify(await headers())
  const role = identity && (await access.role(identity.person, id))
  const read = role ? await budgets.read(id) : null
  return { title: read ? (read.budget.head.name ?? 'Budget without a name') : 'No such budget' }
}

/** The worksheet of one budget: useful as sent, and live once its socket is open. */
export default async function BudgetPage({ params }: Props) {
  const { id } = await params
  const identity = await signedIn(`/budgets/${id}`)
  const { access, budgets } = services()
  const role = await access.role(identity.person, id)
  // A stranger learns nothing here, not even that the budget exists.
  if (!role) notFound()
  const read = await budgets.read(id)
  return (
    <Shell where="Worksheet" identity={identity}>
      {read ? (
        <Worksheet
          first={{
            budgetId: id,
            person: identity.person,
            role,
            budget: read.budget,
            trail: (await budgets.trail(id, { limit: TRAIL })) ?? [],
          }}
        />
      ) : (
        <Locked />
      )}
    </Shell>
  )
}
