import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import form from '../form/form.module.css'
import { services } from '../services'
import { Shell } from '../shell/Shell'
import { OwnerForm } from './client/OwnerForm'

export const metadata: Metadata = { title: 'First owner' }

export default async function OwnerPage() {
  if (!(await services().access.needsOwner())) redirect('/sign-in')
  return (
    <Shell where={null} identity={null}>
      <div className={`${form.sheet} ${form.narrow}`}>
        <h1>The first owner of this server</h1>
        <p>
          Nobody has an account here yet. The server printed a code when it started; whoever types it becomes the
          administrator and can add the others. The code works once.
        </p>
        <OwnerForm />
      </div>
    </Shell>
  )
}
