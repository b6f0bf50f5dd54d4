import css from './diagram.module.css'
import type { LevelGeometry } from './geometry'
import type { LandingGeometry } from './layoutLanding'
import { px } from './path'

/** From the last decibels of the level to their enlargement. @param x, y px of the landing's upper left corner */
export function Wedge({
  levels,
  landing,
  x,
  y,
}: {
  levels: LevelGeometry
  landing: LandingGeometry
  x: number
  y: number
}) {
  const { surface, plot, scale, height } = levels
  if (!surface) return null
  const [high, low] = landing.span
  const from = plot.x + plot.width + 1
  const top = Math.max(surface.y - high * scale, plot.y)
  const bottom = Math.min(surface.y - low * scale, height)
  const outline = `M${px(from)} ${px(top)}L${px(x)} ${y}V${px(y + landing.height)}L${px(from)} ${px(bottom)}`
  return (
    <>
      <path d={outline} className={css.wedge} />
      <path d={outline} className={css.wedgeEdge} />
    </>
  )
}
