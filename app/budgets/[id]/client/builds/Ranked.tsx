'use client'
import type { Sensitivity } from '../../../../../lib/budget/sensitivity'
import { useLook, useReading } from '../state/contexts'
import whole from '../whole/whole.module.css'
import { labelOf } from '../words/labels'
import { recordName } from '../words/say'
import css from './builds.module.css'
import { perUnitWords, toleranceWords } from './rankedWords'

/** So many are shown; the rest is unfolded. */
const FIRST = 8

/** Which tolerance is worth working on: dB of the whole for each input's tolerance, the largest first. */
export function Ranked({ ranked }: { ranked: readonly Sensitivity[] }) {
  const most = Math.abs(ranked[0]?.toleranceDb ?? 0)
  const rest = ranked.slice(FIRST)
  return (
    <div>
      <h3 className={whole.part}>What each tolerance does to the whole</h3>
      {ranked.length === 0 ? (
        <p className={whole.quiet}>No line between the planes has a tolerance, or says what varies.</p>
      ) : (
        <p className={whole.quiet}>
          To first order, with the input at the upper end of its tolerance; the largest first.
        </p>
      )}
      <ol className={css.ranked}>
        {ranked.slice(0, FIRST).map((one) => (
          <Input key={`${one.line} ${one.input}`} one={one} most={most} />
        ))}
      </ol>
      {rest.length > 0 && (
        <details className={whole.more}>
          <summary>{rest.length} smaller ones</summary>
          <ol className={css.ranked} start={FIRST + 1}>
            {rest.map((one) => (
              <Input key={`${one.line} ${one.input}`} one={one} most={most} />
            ))}
          </ol>
        </details>
      )}
    </div>
  )
}

function Input({ one, most }: { one: Sensitivity; most: number }) {
  const { budget } = useReading()
  const { goTo } = useLook()
  const { line, input, toleranceDb } = one
  const each = perUnitWords(one)
  // A parameter's tolerance is typed in what varies; a tolerance in dB has a slip of its own.
  const field = input.startsWith('tolerance') ? input : 'varies'
  return (
    <li>
      <span className={css.input}>
        <button type="button" className={whole.plainButton} onClick={() => goTo({ section: 'lines', id: line, field })}>
          {recordName(budget, 'lines', line)}
        </button>
        , {labelOf('lines', input)}
        {each && <span className={css.each}> {each}</span>}
      </span>
      <span className={css.effect}>{toleranceWords(one)}</span>
      <svg className={css.length} viewBox="0 0 100 6" preserveAspectRatio="none" aria-hidden="true" focusable="false">
        <path d={`M0 3h${most > 0 ? (100 * Math.abs(toleranceDb)) / most : 0}`} />
      </svg>
    </li>
  )
}
