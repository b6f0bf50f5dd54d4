'use client'
import { type FocusEvent, type KeyboardEvent, useRef } from 'react'
import type { Cell } from '../../../../lib/sheet/wire'
import { BuildsPanel } from './builds/BuildsPanel'
import { Detail } from './detail/Detail'
import { FrequencyPanel } from './frequency/FrequencyPanel'
import { FlagsPanel } from './head/FlagsPanel'
import { Head } from './head/Head'
import { Headlines } from './head/Headline'
import { Proof } from './head/Proof'
import { RefusedList } from './head/RefusedList'
import { Signalling } from './head/Signalling'
import { useOutOfSight } from './head/useOutOfSight'
import { Picture } from './picture/Picture'
import { useWas } from './picture/useWas'
import { KeysHelp } from './rows/KeysHelp'
import { OpenLine } from './rows/OpenLine'
import { Rows } from './rows/Rows'
import css from './sheet.module.css'
import { formDraft } from './slips/FieldSlip'
import { LookContext, useBench, useReading, ViewContext } from './state/contexts'
import { placeOf } from './state/focusPlace'
import type { SheetState } from './state/sheet'
import type { FirstState } from './state/useSheet'
import { type Kept, useViewState } from './state/useView'
import { TakenOut } from './tables/recordDeeds'
import { Tables } from './tables/Tables'
import { TrailPanel } from './trail/TrailPanel'

type Props = {
  readonly first: FirstState
  readonly state: SheetState
  readonly kept: Kept
  readonly stand: ((cell: Cell | null) => void) | null
}

/** One generation of the worksheet: everything on the page, and what the page as a whole does with focus and keys. */
export function Sheet({ first, state, kept, stand }: Props) {
  const { budget, evaluation } = useReading()
  const bench = useBench()
  const root = useRef<HTMLDivElement>(null)
  const verdicts = useRef<HTMLDivElement>(null)
  const { view, look } = useViewState(first.budgetId, evaluation, root, kept)
  const { trail, people } = state
  const was = useWas({ trail, people, budget, person: first.person, allowance: view.allowance })

  const onFocus = (event: FocusEvent) => {
    const place = placeOf(event.target)
    kept.focus.current = place
    if (!place) return
    stand?.(place)
    const { section, id } = place
    if (id !== null && (section === 'lines' || section === 'planes')) look.select({ section, id })
  }
  const onBlur = () => {
    kept.focus.current = null
  }
  const onKeyDown = (event: KeyboardEvent) => {
    const key = event.key.toLowerCase()
    if (!(event.ctrlKey || event.metaKey) || event.altKey || (key !== 'z' && key !== 'y')) return
    // While a value is being typed, the keys take back letters; after that, edits.
    const typing = event.target instanceof Element ? event.target.closest<HTMLElement>('[data-place]') : null
    const place = typing?.dataset.place ?? ''
    if (bench.drafts.get(place) ?? bench.drafts.get(formDraft(place))) return
    event.preventDefault()
    if (key === 'y' || event.shiftKey) bench.redo()
    else bench.undo()
  }

  return (
    <ViewContext value={view}>
      <LookContext value={look}>
        <section
          ref={root}
          aria-label="Worksheet"
          className={css.sheet}
          onFocus={onFocus}
          onBlur={onBlur}
          onKeyDown={onKeyDown}
        >
          <Head state={state} glance={useOutOfSight(verdicts)} />
          <div aria-live="assertive">
            <RefusedList refused={state.refused} />
          </div>
          <div ref={verdicts} className={css.verdicts}>
            <Headlines />
            <Proof />
          </div>
          <Signalling />
          <Picture people={people} was={was} />
          <div className={css.bench}>
            <div className={css.rows}>
              <Rows />
              <OpenLine />
              <KeysHelp />
              <TakenOut section="lines" />
              <TakenOut section="planes" />
            </div>
            <div className={css.beside}>
              <Detail />
              <TrailPanel recent={trail} />
            </div>
          </div>
          <FlagsPanel />
          <FrequencyPanel />
          <BuildsPanel />
          <Tables />
        </section>
      </LookContext>
    </ViewContext>
  )
}
