'use client'
import { useReading } from '../state/contexts'
import { Allowances } from './Allowances'
import { RecordTable } from './RecordTable'
import { ShareUse } from './ShareUse'
import css from './tables.module.css'

/** What stands beneath the rows: what they are judged by, and what they are built on. */
export function Tables() {
  const { budget } = useReading()
  const firstAllowance = Object.entries(budget.allowances).find(([, { removed }]) => !removed)?.[0] ?? null
  return (
    <section className={css.tables} aria-labelledby="grounds">
      <h2 id="grounds">What the lines stand on</h2>
      <Allowances />
      <RecordTable
        section="assemblies"
        title="Assemblies"
        columns={['name', 'kind', 'owner', 'supplier', 'laminate', 'temperature', 'humidity', 'group']}
      />
      <RecordTable
        section="lossClasses"
        title="Loss classes"
        columns={[
          'assembly',
          'name',
          'layer',
          'width',
          'lossPerLength',
          'at',
          'tolerance',
          'basis',
          'grade',
          'evidence',
        ]}
      />
      <RecordTable
        section="corners"
        title="Corners"
        columns={[
          'name',
          'temperature',
          'humidity',
          'fabrication',
          'lossPerKelvin',
          'dielectricPerKelvin',
          'lossWet',
          'wetDk',
          'wetDf',
        ]}
      />
      <RecordTable
        section="shares"
        title="Shares"
        columns={['allowance', 'assembly', 'line', 'discipline', 'loss']}
        fresh={{ allowance: firstAllowance }}
      >
        <ShareUse />
      </RecordTable>
    </section>
  )
}
