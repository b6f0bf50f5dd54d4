import type { Metadata } from 'next'
import Link from 'next/link'
import form from './form/form.module.css'
import { Shell } from './shell/Shell'

export const metadata: Metadata = { title: 'Not found' }

export default function NotFound() {
  return (
    <Shell where={null} identity={null}>
      <div className={`${form.sheet} ${form.narrow}`}>
        <h1>There is nothing here</h1>
        <p>
          The address is wrong, or what it names is not yours to see. If somebody sent it to you, ask to be made a
          member.
        </p>
        <p>
          <Link href="/">To the budgets</Link>
        </p>
      </div>
    </Shell>
  )
}
