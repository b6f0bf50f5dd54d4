import { decibels } from '../../../../words/decibels'
import css from '../whole/whole.module.css'
import { shortFrequency } from './cascadeFacts'
import type { ChartRow } from './chartRows'
import { tableRows } from './readoutWords'

const COLUMNS = [
  ['loss', 'loss'],
  ['fitted', 'fitted'],
  ['limit', 'limit'],
  ['back', 'return loss'],
] as const

type Props = { readonly rows: readonly ChartRow[]; readonly marks: readonly (number | null | undefined)[] }

/** The drawings as a table, at some frequencies; a column without any value is left out. */
export function ReadTable({ rows, marks }: Props) {
  const shown = tableRows(rows, marks)
  const columns = COLUMNS.filter(([key]) => shown.some((row) => row[key] !== null))
  return (
    <details className={css.more}>
      <summary>As a table</summary>
      <table className={css.table}>
        <thead>
          <tr>
            <th scope="col">frequency</th>
            {columns.map(([key, title]) => (
              <th key={key} scope="col">
                {title}, dB
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {shown.map((row) => (
            <tr key={row.hz}>
              <th scope="row">{shortFrequency(row.hz)}</th>
              {columns.map(([key]) => (
                <td key={key}>{row[key] === null ? 'none' : decibels(row[key])}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </details>
  )
}
