'use client'
import type { ReactNode } from 'react'
import type { Scalar } from '../../../../../lib/budget/schema'
import { inOrder } from '../deeds/records'
import { FieldSlip } from '../slips/FieldSlip'
import { fieldSlip, toleranceSlip } from '../slips/spec'
import { useReading } from '../state/contexts'
import { labelOf } from '../words/labels'
import { recordName } from '../words/say'
import { AddRecord, TakenOut, TakeOut } from './recordDeeds'
import type { TableSection } from './section'
import css from './tables.module.css'

type Flat = Readonly<Record<string, Scalar>> & { readonly order: string; readonly removed: boolean }

type Props = {
  readonly section: TableSection
  readonly title: string
  /** Fields as columns; 'tolerance' stands for both sides. */
  readonly columns: readonly string[]
  /** What a new record starts with. */
  readonly fresh?: Readonly<Record<string, Scalar>>
  readonly children?: ReactNode
}

/** Records of one section as a table of slips. */
export function RecordTable({ section, title, columns, fresh = {}, children }: Props) {
  const { budget } = useReading()
  const records = inOrder<Flat>(budget[section])
  return (
    <section className={css.section} aria-label={title} data-place={`${section}//add`} tabIndex={-1}>
      <h3>{title}</h3>
      {children}
      {records.length > 0 && (
        <div className={css.scroll}>
          <table className={css.table}>
            <thead>
              <tr>
                {columns.map((field) => (
                  <th key={field} scope="col">
                    {labelOf(section, field)}
                  </th>
                ))}
                <td />
              </tr>
            </thead>
            <tbody>
              {records.map(([id, record]) => (
                <tr key={id}>
                  {columns.map((field) => (
                    <td key={field} data-label={labelOf(section, field)}>
                      <FieldSlip
                        spec={specOf(section, id, field, record)}
                        hideLabel
                        of={recordName(budget, section, id)}
                      />
                    </td>
                  ))}
                  <td>
                    <TakeOut section={section} id={id} />
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      <AddRecord section={section} fresh={fresh} />
      <TakenOut section={section} />
    </section>
  )
}

function specOf(section: TableSection, id: string, field: string, record: Flat) {
  return section === 'lossClasses' && field === 'tolerance'
    ? toleranceSlip(section, id, {
        toleranceMinus: record.toleranceMinus ?? null,
        tolerancePlus: record.tolerancePlus ?? null,
      })
    : fieldSlip(section, id, field, record[field] ?? null)
}
