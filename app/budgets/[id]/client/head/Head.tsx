'use client'
import { VerdictMark } from '../../../../marks/VerdictMark'
import colour from '../../../../marks/verdictColour.module.css'
import { headline } from '../../../../words/judged'
import { FieldSlip } from '../slips/FieldSlip'
import { fieldSlip } from '../slips/spec'
import { useBench, useReading } from '../state/contexts'
import type { SheetState } from '../state/sheet'
import css from './head.module.css'
import { PeopleHere } from './PeopleHere'
import { SavedState } from './SavedState'

/** Stays in sight: the budget, its verdicts at one glance, what is saved, who is here. */
export function Head({ state, glance }: { state: SheetState; glance: boolean }) {
  const { budget } = useReading()
  const { canWrite, undo, redo } = useBench()
  const name = budget.head.name ?? 'Budget without a name'
  return (
    <header className={css.head} data-compact={glance || undefined}>
      <h1 className="unseen">{name}</h1>
      <div className={css.title}>
        <FieldSlip spec={fieldSlip('head', null, 'name', budget.head.name)} hideLabel of="the budget" />
      </div>
      {glance && <Glance />}
      <SavedState state={state} />
      <PeopleHere people={state.people} />
      {canWrite && (
        <div className={css.undo}>
          <button type="button" onClick={undo} disabled={!state.canUndo} title="Undo your own last edit (Ctrl+Z)">
            Undo
          </button>
          <button type="button" onClick={redo} disabled={!state.canRedo} title="Do it again (Ctrl+Shift+Z)">
            Redo
          </button>
        </div>
      )}
    </header>
  )
}

/** The verdicts at one glance, while the headlines are out of sight. */
function Glance() {
  const { evaluation } = useReading()
  return (
    <ul aria-label="Verdicts" className={css.glance}>
      {evaluation.allowances.map((allowance) => {
        const { figure, unit } = headline(allowance)
        return (
          <li key={allowance.id} title={allowance.words}>
            <VerdictMark verdict={allowance.verdict} size={14} />
            <span className={`${css.glanceFigure} ${colour[allowance.verdict]}`}>{figure}</span>
            <span className={css.glanceUnit}>{unit}</span>
          </li>
        )
      })}
    </ul>
  )
}
