'use client'
import { lazy, Suspense, useId, useMemo, useState } from 'react'
import type { TrailEntry } from '../../../../../lib/sheet/wire'
import { When } from '../../../../words/client/When'
import { decibels, plainDecibels } from '../../../../words/decibels'
import { useReading, useView } from '../state/contexts'
import { marginSteps, type Step } from './margins'
import css from './trail.module.css'

/** The chart's library is large and of use to those who look at the trail only. */
const MarginChart = lazy(() => import('./MarginChart'))

/** The margin turned on its side: each change a step towards the ground or away from it, with a readout and a table. */
export function MarginTrend({ entries }: { entries: readonly TrailEntry[] }) {
  const { evaluation } = useReading()
  const { allowance: inView } = useView()
  const id = useId()
  const [read, setRead] = useState<number | null>(null)
  const allowance = evaluation.allowances.find((each) => each.id === inView)
  const steps = useMemo(() => (inView === null ? [] : marginSteps(entries, inView)), [entries, inView])
  if (!allowance || steps.length < 2) return null
  const at = Math.min(read ?? steps.length - 1, steps.length - 1)
  const step = steps[at]
  return (
    <figure className={css.trend}>
      <figcaption>
        Margin of {allowance.name || 'the allowance'}, dB
        {allowance.requiredMarginDb > 0 && `; dotted: the ${plainDecibels(allowance.requiredMarginDb)} dB required`}
      </figcaption>
      <div aria-hidden="true" className={css.chart}>
        <Suspense fallback={null}>
          <MarginChart steps={steps} requiredDb={allowance.requiredMarginDb} read={at} onRead={setRead} />
        </Suspense>
      </div>
      {step && (
        <p className={css.readout}>
          <strong>{stepWords(step)}</strong> {step.personName} · <When time={step.time} />
        </p>
      )}
      <label className="unseen" htmlFor={id}>
        Entry of the trail
      </label>
      <input
        id={id}
        type="range"
        min={0}
        max={steps.length - 1}
        value={at}
        aria-valuetext={step && `entry ${step.seq}: ${stepWords(step)}, ${step.personName}`}
        onChange={(event) => setRead(Number(event.target.value))}
      />
      <details>
        <summary>As a table</summary>
        <table className={css.table}>
          <thead>
            <tr>
              <th scope="col">entry</th>
              <th scope="col">margin</th>
              <th scope="col">who</th>
              <th scope="col">when</th>
            </tr>
          </thead>
          <tbody>
            {[...steps].reverse().map((row) => (
              <tr key={row.seq}>
                <td>{row.seq}</td>
                <td>{stepWords(row)}</td>
                <td>{row.personName}</td>
                <td>
                  <When time={row.time} />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </details>
    </figure>
  )
}

const stepWords = (step: Step) => (step.marginDb === null ? 'undecided' : `${decibels(step.marginDb)} dB`)
