import type { Metadata } from 'next'
import form from '../form/form.module.css'
import { services } from '../services'
import { Shell } from '../shell/Shell'
import { signedIn } from '../shell/signedIn'
import { PasswordForm } from './client/PasswordForm'
import { Tokens } from './client/Tokens'

export const metadata: Metadata = { title: 'Account' }

export default async function AccountPage() {
  const identity = await signedIn('/account')
  return (
    <Shell where="Account" identity={identity}>
      <div className={form.sheet}>
        <section className={form.part} aria-labelledby="who">
          <h1 id="who">{identity.name}</h1>
          <p>
            {identity.email}
            {identity.administrator && ', administrator of this server'}
          </p>
          <p className={form.hint}>The name is what signatures and the trail show.</p>
        </section>
        <section className={form.part} aria-labelledby="password">
          <h2 id="password">Password</h2>
          <p>
            Changing it ends every other session of yours: other browsers and open worksheets ask you to sign in again.
            That is also how to sign out everywhere.
          </p>
          <PasswordForm email={identity.email} />
        </section>
        <section className={form.part} aria-labelledby="tokens">
          <h2 id="tokens">Personal tokens</h2>
          <p>
            A token lets a program act as you: it may do what you may do, but makes no tokens and changes no password.
            What it changes stands in the trail under your name.
          </p>
          <Tokens tokens={await services().access.tokens(identity.person)} />
        </section>
      </div>
    </Shell>
  )
}
