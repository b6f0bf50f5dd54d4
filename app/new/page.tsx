import type { Metadata } from 'next'
import form from '../form/form.module.css'
import { services } from '../services'
import { Shell } from '../shell/Shell'
import { signedIn } from '../shell/signedIn'
import { BlankForm } from './client/BlankForm'
import { ExampleForm } from './client/ExampleForm'
import { FileForm } from './client/FileForm'
import css from './new.module.css'

export const metadata: Metadata = { title: 'New budget' }

export default async function NewBudgetPage() {
  const identity = await signedIn('/new')
  const examples = await services().examples.list()
  return (
    <Shell where="New budget" identity={identity}>
      <div className={form.sheet}>
        <div className={form.part}>
          <h1>New budget</h1>
          <p>One budget is one direction of one link. You become its owner and can add the others on its page.</p>
        </div>
        <div className={css.ways}>
          <section className={form.part} aria-labelledby="blank">
            <h2 id="blank">From nothing</h2>
            <BlankForm />
          </section>
          <section className={form.part} aria-labelledby="example">
            <h2 id="example">From an example link</h2>
            <ExampleForm examples={examples} />
          </section>
          <section className={form.part} aria-labelledby="file">
            <h2 id="file">From a budget file</h2>
            <FileForm />
          </section>
        </div>
      </div>
    </Shell>
  )
}
