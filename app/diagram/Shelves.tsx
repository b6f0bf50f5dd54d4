import css from './diagram.module.css'
import type { Shelf } from './geometry'
import { pathOf, px } from './path'

/** Shares: a shelf as long as its lines; past it, a post as tall as the excess. */
export function Shelves({ shelves }: { shelves: readonly Shelf[] }) {
  return (
    <>
      {shelves.map((shelf) => {
        const past = shelf.post ? css.past : ''
        return (
          <g key={shelf.id}>
            <path
              d={`M${px(shelf.from.x + 1)} ${px(shelf.from.y - 6)}v6H${px(shelf.to.x)}`}
              className={`${css.shelf} ${past}`}
            />
            {shelf.post && <path d={pathOf(shelf.post)} className={css.excess} />}
            {shelf.wordsAt &&
              shelf.words.map((word, at) => (
                <text
                  key={word}
                  x={px(shelf.wordsAt?.x ?? 0)}
                  y={px((shelf.wordsAt?.y ?? 0) + at * 15)}
                  className={`${css.shelfWords} ${at === 1 ? past : ''}`}
                >
                  {word}
                </text>
              ))}
          </g>
        )
      })}
    </>
  )
}
