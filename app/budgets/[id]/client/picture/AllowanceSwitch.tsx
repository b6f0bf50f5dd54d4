'use client'
import { VerdictMark } from '../../../../marks/VerdictMark'
import { judgedWords } from '../../../../words/judged'
import { useLook, useReading, useView } from '../state/contexts'
import css from './picture.module.css'

/** Which allowance the picture, the rows and the trail's chart show; nothing where there is only one. */
export function AllowanceSwitch() {
  const { budget, evaluation } = useReading()
  const { allowance } = useView()
  const { showAllowance } = useLook()
  if (evaluation.allowances.length < 2) return null
  return (
    <fieldset className={css.switch}>
      <legend>Allowance in view</legend>
      {evaluation.allowances.map((each) => (
        <label key={each.id}>
          <input
            type="radio"
            name="allowance-in-view"
            checked={each.id === allowance}
            onChange={() => showAllowance(each.id)}
          />
          <VerdictMark verdict={each.verdict} word={false} size={12} />
          {each.name || 'without a name'}, {judgedWords(each, budget)}
        </label>
      ))}
    </fieldset>
  )
}
