'use client'
import css from './announcer.module.css'

type Props = {
  /** What others did; read out politely, shown by the sheet itself. */
  readonly said: string
  /** Why one's own deed was not done; read out at once and shown. */
  readonly refusal: string | null
  readonly onHeard: () => void
}

/** The live regions of the worksheet. */
export function Announcer({ said, refusal, onHeard }: Props) {
  return (
    <>
      <p aria-live="polite" className="unseen">
        {said}
      </p>
      <div role="alert" className={refusal === null ? 'unseen' : css.refusal}>
        {refusal !== null && (
          <>
            {refusal}{' '}
            <button type="button" onClick={onHeard}>
              Understood
            </button>
          </>
        )}
      </div>
    </>
  )
}
