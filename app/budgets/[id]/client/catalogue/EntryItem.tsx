'use client'
import css from './catalogue.module.css'
import type { CatalogueRow } from './row'

type Props = {
  readonly row: CatalogueRow<unknown>
  readonly onTake: () => void
  readonly onRemove: () => void
}

/** One entry of a catalogue: what it says, where it comes from, what to mind, and the button that takes it. */
export function EntryItem({ row, onTake, onRemove }: Props) {
  const { title, figure, facts, caution, fits, own } = row
  return (
    <li className={css.entry}>
      <div className={css.words}>
        <h3>{title}</h3>
        <p className={css.figure}>{figure}</p>
        <p className={css.quiet}>
          {fits && <strong>Rate of this link · </strong>}
          {facts.join(' · ')}
        </p>
        {caution !== null && <p className={css.caution}>{caution}</p>}
        {own && <p className={css.quiet}>Added on this server by {own.personName}.</p>}
      </div>
      <div className={css.deeds}>
        <button type="button" className={css.button} data-take="" aria-label={`Take ${title}`} onClick={onTake}>
          Take
        </button>
        {own?.mayRemove && (
          <button
            type="button"
            className={css.button}
            aria-label={`Remove ${title} from this server's catalogue`}
            onClick={onRemove}
          >
            Remove
          </button>
        )}
      </div>
    </li>
  )
}
