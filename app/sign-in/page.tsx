import type { Metadata } from 'next'
import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import form from '../form/form.module.css'
import { services } from '../services'
import { Shell } from '../shell/Shell'
import { samePath } from '../shell/samePath'
import { SignInForm } from './client/SignInForm'

export const metadata: Metadata = { title: 'Sign in' }

type Props = { readonly searchParams: Promise<{ readonly to?: string | string[] }> }

export default async function SignInPage({ searchParams }: Props) {
  const to = samePath((await searchParams).to)
  const { access, demo } = services()
  if (await access.needsOwner()) redirect('/owner')
  if (await access.identify(await headers())) redirect(to)
  return (
    <Shell where={null} identity={null}>
      <div className={`${form.sheet} ${form.narrow}`}>
        <h1>Sign in</h1>
        {demo && (
          <p>
            This is a demonstration with invented links and people. Their passwords were printed where it was started.
          </p>
        )}
        <SignInForm to={to} />
        <p className={form.hint}>
          Whoever runs this server adds people and hands out first passwords; ask there if you have none.
        </p>
      </div>
    </Shell>
  )
}
