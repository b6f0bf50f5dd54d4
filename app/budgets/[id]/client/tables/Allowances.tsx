'use client'
import type { Allowance } from '../../../../../lib/budget/schema'
import { AllowanceCatalogue } from '../catalogue/AllowanceCatalogue'
import { SaveAllowance } from '../catalogue/SaveAllowance'
import { inOrder } from '../deeds/records'
import { FieldSlip } from '../slips/FieldSlip'
import { fieldSlip } from '../slips/spec'
import { useReading } from '../state/contexts'
import { AddRecord, TakenOut, TakeOut } from './recordDeeds'
import css from './tables.module.css'

type Field = keyof Allowance & string
const GROUPS: readonly { readonly title: string; readonly fields: readonly Field[] }[] = [
  { title: 'Limit', fields: ['name', 'limit', 'at', 'usedAt', 'from', 'to', 'requiredMargin'] },
  { title: 'Judged at', fields: ['judgedCorner', 'judgedStatistic', 'judgedLane'] },
  { title: 'Source', fields: ['body', 'clause', 'confidence', 'publishedFrom', 'publishedTo'] },
]
const MORE: readonly Field[] = ['leastLoss', 'returnLossFloor', 'curve', 'presumedPackage', 'presumes', 'note']

/** What the loss is judged by, in full: limits, planes, conditions and where the figure comes from. */
export function Allowances() {
  const { budget } = useReading()
  const allowances = inOrder(budget.allowances)
  const slip = (id: string, allowance: Allowance, field: Field) => (
    <FieldSlip key={field} spec={fieldSlip('allowances', id, field, allowance[field])} />
  )
  return (
    <section className={css.section} aria-label="Allowances" data-place="allowances//add" tabIndex={-1}>
      <h3>Allowances</h3>
      {allowances.map(([id, allowance]) => (
        <section key={id} className={css.card} aria-label={allowance.name || 'allowance without a name'}>
          {GROUPS.map(({ title, fields }) => (
            <fieldset key={title} className={css.group}>
              <legend>{title}</legend>
              <div className={css.slips}>{fields.map((field) => slip(id, allowance, field))}</div>
            </fieldset>
          ))}
          <details>
            <summary>More of this allowance</summary>
            <div className={css.slips}>{MORE.map((field) => slip(id, allowance, field))}</div>
          </details>
          <SaveAllowance allowance={allowance} />
          <TakeOut section="allowances" id={id} />
        </section>
      ))}
      <div className={css.adding}>
        <AddRecord section="allowances" fresh={{}} />
        <AllowanceCatalogue />
      </div>
      <TakenOut section="allowances" />
    </section>
  )
}
