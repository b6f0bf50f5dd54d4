import type { Metadata } from 'next'
import form from '../form/form.module.css'
import { services } from '../services'
import { Shell } from '../shell/Shell'
import { signedIn } from '../shell/signedIn'
import { PersonForm } from './client/PersonForm'

export const metadata: Metadata = { title: 'People' }

export default async function PeoplePage() {
  const identity = await signedIn('/people')
  const people = await services().access.people()
  return (
    <Shell where="People" identity={identity}>
      <div className={form.sheet}>
        <section className={form.part} aria-labelledby="people">
          <h1 id="people">People of this server</h1>
          <p>Who is a member of a budget, and with which role, is set on the budget's own page.</p>
          <div className={form.scroll}>
            <table className={form.table}>
              <thead>
                <tr>
                  <th scope="col">Name</th>
                  <th scope="col">E-mail address</th>
                </tr>
              </thead>
              <tbody>
                {[...people]
                  .sort((a, b) => a.name.localeCompare(b.name))
                  .map(({ id, name, email }) => (
                    <tr key={id}>
                      <th scope="row">
                        {name}
                        {id === identity.person && ' (you)'}
                      </th>
                      <td>{email}</td>
                    </tr>
                  ))}
              </tbody>
            </table>
          </div>
        </section>
        <section className={form.part} aria-labelledby="add">
          <h2 id="add">Add a person</h2>
          {identity.administrator ? (
            <PersonForm />
          ) : (
            <p>The administrator of this server adds people; ask there for a colleague who is missing.</p>
          )}
        </section>
      </div>
    </Shell>
  )
}
