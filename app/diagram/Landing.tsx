import { useId } from 'react'
import type { Evaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import { textureFill } from '../marks/AssemblyTexture'
import { personColour } from '../marks/Pennant'
import { VERDICT_WORD } from '../words/terms'
import css from './diagram.module.css'
import { type LandingBar, type LandingGeometry, layoutLanding } from './layoutLanding'
import { Patterns } from './Patterns'
import { px } from './path'
import { levelWidth, workWidth } from './text'
import type { Was } from './was'

type Props = {
  readonly budget: Budget
  readonly evaluation: Evaluation
  readonly allowance: string
  readonly was?: Was | null
  readonly width: number
  readonly height: number
  /** Without words it is a picture beside words that say the same, as in the list of budgets. */
  readonly words?: boolean
}

const HEAD = 24

/** The last decibels above the ground, enlarged: a bar for each judged condition. */
export function Landing({ budget, evaluation, allowance, was = null, width, height, words = true }: Props) {
  const id = useId()
  const head = words ? HEAD : 0
  const geometry = layoutLanding(evaluation, budget, allowance, { width, height: height - head }, was)
  if (!geometry) return null
  const frame = { width, height, viewBox: `0 0 ${width} ${height}`, className: css.drawing }
  const drawing = (
    <>
      <Patterns id={id} runs={[]} />
      <g transform={`translate(0 ${head})`}>
        <LandingDrawing id={id} geometry={geometry} words={words} was={was} />
      </g>
    </>
  )
  if (!words) {
    return (
      <svg {...frame} aria-hidden="true">
        {drawing}
      </svg>
    )
  }
  const said = geometry.bars
    .map((bar) => `${bar.words}: ${bar.figure} dB ${bar.suffix || 'margin'}, ${bar.verdict}`)
    .join('; ')
  return (
    <svg {...frame} role="img" aria-label={`The landing. ${said}.`}>
      {drawing}
    </svg>
  )
}

export function LandingDrawing({
  id,
  geometry,
  words,
  was,
}: {
  id: string
  geometry: LandingGeometry
  words: boolean
  was: Was | null
}) {
  const { width, height, surfaceY, requiredY } = geometry
  return (
    <>
      {requiredY !== null && requiredY < surfaceY && (
        <>
          <rect x={0} y={px(requiredY)} width={px(width)} height={px(surfaceY - requiredY)} fill={`url(#${id}-air)`} />
          <path d={`M0 ${px(requiredY)}H${px(width)}`} className={css.required} />
        </>
      )}
      <rect x={0} y={px(surfaceY)} width={px(width)} height={px(height - surfaceY)} fill={textureFill(id, 'strata')} />
      <path d={`M0 ${px(surfaceY)}H${px(width)}`} className={css.surface} />
      {words && requiredY !== null && (
        <text x={px(width - 8)} y={px(requiredY - 6)} className={css.required_}>
          {geometry.requiredWords}
        </text>
      )}
      {words && <Below text={geometry.belowWords} width={width} y={height - 8} />}
      {geometry.was && (
        <g key={was?.words} className={`${css.leaving} ${css[`p-${personColour(was?.colour ?? 0)}`]}`}>
          <path d={`M${px(geometry.was.x - 22)} ${px(geometry.was.y)}h68`} className={css.was} />
          {words && (
            <text x={px(geometry.was.x + 50)} y={px(geometry.was.wordsY)} className={css.wasWords}>
              {geometry.was.words}
            </text>
          )}
        </g>
      )}
      {geometry.bars.map((bar) => (
        <Bar key={bar.id} bar={bar} words={words} half={words ? 15 : 7} width={width} />
      ))}
    </>
  )
}

function Bar({ bar, words, half, width }: { bar: LandingBar; words: boolean; half: number; width: number }) {
  const { x, y, band, unknown } = bar
  const figureWidth = levelWidth(bar.figure, 22) + (bar.suffix ? 30 : 0) + 10
  const figureX = Math.min(x + half + 18, width - figureWidth)
  return (
    <g className={css[bar.tone]}>
      {band && (
        <rect x={px(x - half)} y={px(band[0])} width={half * 2} height={px(band[1] - band[0])} className={css.spread} />
      )}
      {unknown && (
        <>
          <path
            d={`M${px(x - half)} ${px(unknown[0])}V${px(unknown[1])}M${px(x + half)} ${px(unknown[0])}V${px(unknown[1])}`}
            className={css.unknownEdge}
          />
          <text x={px(x)} y={px((unknown[0] + unknown[1]) / 2 + 6)} className={words ? css.unknown : css.unknownSmall}>
            ?
          </text>
        </>
      )}
      {y !== null && <rect x={px(x - half * 1.75)} y={px(y - 3)} width={half * 3.5} height={6} className={css.bar} />}
      {words && (
        <>
          <text x={px(x - half * 1.75)} y={-9} className={css.barWords}>
            {bar.words} · <tspan className={css[bar.verdict]}>{VERDICT_WORD[bar.verdict].toLowerCase()}</tspan>
          </text>
          {y !== null && (
            <>
              <rect
                x={px(figureX - 4)}
                y={px(y - 13)}
                width={px(figureWidth)}
                height={26}
                className={css[`${bar.verdict}Plate`]}
              />
              <text x={px(figureX)} y={px(y + 8)} className={`${css.landed} ${css[bar.verdict]}`}>
                {bar.figure}
                {bar.suffix && <tspan className={css.suffix}> {bar.suffix}</tspan>}
              </text>
            </>
          )}
        </>
      )}
    </g>
  )
}

function Below({ text, width, y }: { text: string; width: number; y: number }) {
  const plate = workWidth(text, 13) + 10
  return (
    <>
      <rect x={px(width - plate - 2)} y={y - 13} width={px(plate)} height={18} className={css.runPlate} />
      <text x={px(width - 8)} y={y} className={css.below}>
        {text}
      </text>
    </>
  )
}
