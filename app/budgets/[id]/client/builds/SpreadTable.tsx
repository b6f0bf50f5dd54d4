'use client'
import type { AllowanceEvaluation } from '../../../../../lib/budget/evaluation'
import { decibels } from '../../../../words/decibels'
import { laneWords } from '../../../../words/judged'
import { useReading } from '../state/contexts'
import whole from '../whole/whole.module.css'
import css from './builds.module.css'
import { percentileRows } from './percentileRows'

/** Nominal, RSS, worst case and the percentiles of random builds, as they were evaluated. */
export function SpreadTable({ allowance }: { allowance: AllowanceEvaluation }) {
  const { budget } = useReading()
  const { nominalDb, rssDb, worstDb, builds } = allowance
  const lane = laneWords(allowance, budget)
  return (
    <table className={`${whole.table} ${css.figures}`}>
      <caption className="unseen">Loss by each way to look at the tolerances</caption>
      <thead>
        <tr>
          <th scope="col">way to look at it</th>
          <th scope="col">loss, dB</th>
        </tr>
      </thead>
      <tbody>
        {nominalDb !== null && (
          <tr>
            <th scope="row">nominal{lane && `, ${lane}`}</th>
            <td>{decibels(nominalDb)}</td>
          </tr>
        )}
        {rssDb !== null && (
          <tr>
            <th scope="row">RSS, grouped, three standard deviations beyond nominal</th>
            <td>+{decibels(rssDb)}</td>
          </tr>
        )}
        {worstDb !== null && (
          <tr>
            <th scope="row">worst case, every tolerance at its end</th>
            <td>{decibels(worstDb)}</td>
          </tr>
        )}
        {builds &&
          percentileRows(builds).map(({ share, words }) => (
            <tr key={share}>
              <th scope="row">{share} % of random builds lose at most</th>
              <td>{words}</td>
            </tr>
          ))}
      </tbody>
    </table>
  )
}
