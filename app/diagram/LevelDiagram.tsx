import { useId } from 'react'
import type { Evaluation } from '../../lib/budget/evaluation'
import type { Budget } from '../../lib/budget/schema'
import type { Present } from '../../lib/sheet/wire'
import { BasisList } from './BasisList'
import { Choice } from './Choice'
import { describeLevels } from './describe'
import css from './diagram.module.css'
import { Landing, LandingDrawing } from './Landing'
import { LevelDrawing } from './LevelDrawing'
import { layoutLanding } from './layoutLanding'
import { layoutLevels, NARROW } from './layoutLevels'
import { Patterns } from './Patterns'
import { Wedge } from './Wedge'
import type { Was } from './was'

export type LevelDiagramProps = {
  readonly budget: Budget
  readonly evaluation: Evaluation
  /** Id of the allowance in view. */
  readonly allowance: string
  readonly selected: string | null
  readonly onSelect: (line: string) => void
  readonly present: readonly Present[]
  readonly was?: Was | null
  /** px; under 640 the landing comes first and the drawing thins out. */
  readonly width: number
  /** px of the drawing itself; under 200 it is a strip without decibels by basis. */
  readonly height?: number
}

const STRIP = 200

/** The heart of the screen: the level against the ground, and its landing enlarged. */
export function LevelDiagram(props: LevelDiagramProps) {
  const { budget, evaluation, allowance, selected, onSelect, present, was = null, width } = props
  const id = useId()
  const narrow = width < NARROW
  const height = props.height ?? (narrow ? 300 : 380)
  const landingWidth = narrow ? width : Math.min(Math.max(width * 0.19, 200), 280)
  const wedge = narrow ? 0 : Math.min(width * 0.065, 92)
  const levelWidth = narrow ? width : Math.floor(width - landingWidth - wedge)
  const levels = layoutLevels(evaluation, budget, allowance, { width: levelWidth, height }, { selected, present, was })
  const words = describeLevels(levels, evaluation, budget, allowance)
  const landing = narrow
    ? null
    : layoutLanding(evaluation, budget, allowance, { width: landingWidth, height: height - 24 }, was)

  return (
    <figure className={css.figure}>
      <figcaption className="unseen">{words}</figcaption>
      {narrow && (
        <Landing evaluation={evaluation} budget={budget} allowance={allowance} was={was} width={width} height={150} />
      )}
      <div className={css.stage}>
        <svg
          width={width}
          height={height}
          viewBox={`0 0 ${width} ${height}`}
          className={css.drawing}
          aria-hidden="true"
        >
          <Patterns id={id} runs={levels.runs} />
          <LevelDrawing id={id} geometry={levels} evaluation={evaluation} allowance={allowance} was={was} />
          {landing && (
            <>
              <Wedge levels={levels} landing={landing} x={levelWidth + wedge} y={24} />
              <g transform={`translate(${levelWidth + wedge} 24)`}>
                <LandingDrawing id={id} geometry={landing} words was={was} />
              </g>
            </>
          )}
        </svg>
        <Choice geometry={levels} onSelect={onSelect} selected={selected} width={width} />
      </div>
      {!levels.legend && height >= STRIP && <BasisList evaluation={evaluation} allowance={allowance} />}
    </figure>
  )
}
