import type { ChannelEvaluation } from '../../../../../lib/budget/evaluation'
import css from '../whole/whole.module.css'

type Props = {
  readonly channel: Pick<ChannelEvaluation, 'fit' | 'curve'>
  /** The limit stands at one frequency only. */
  readonly ledge: boolean
}

/** What the strokes of the loss chart are, each beside its word. */
export function LossLegend({ channel, ledge }: Props) {
  return (
    <ul className={css.legend}>
      <li>
        <Sample>
          <path d="M0 5h24" stroke="var(--signal)" strokeWidth="2.5" />
        </Sample>
        cascade
      </li>
      {channel.fit !== null && (
        <li>
          <Sample>
            <path d="M0 5h24" stroke="var(--ink)" strokeWidth="1" />
          </Sample>
          fitted
        </li>
      )}
      {(channel.curve !== null || ledge) && (
        <li>
          <Sample>
            <path d="M0 3h24v7H0z" fill="var(--ground)" />
            <path d="M0 3h24" stroke="var(--ground-ink)" strokeWidth="2" />
          </Sample>
          {ledge ? 'ground: the limit, at its one frequency' : 'ground: the limit curve'}
        </li>
      )}
    </ul>
  )
}

function Sample({ children }: { children: React.ReactNode }) {
  return (
    <svg width="24" height="10" viewBox="0 0 24 10" aria-hidden="true" focusable="false">
      {children}
    </svg>
  )
}
