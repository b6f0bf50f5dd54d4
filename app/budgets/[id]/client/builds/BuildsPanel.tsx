'use client'
import type { AllowanceEvaluation } from '../../../../../lib/budget/evaluation'
import { useReading } from '../state/contexts'
import { Facts } from '../whole/Facts'
import { WholePanel } from '../whole/WholePanel'
import whole from '../whole/whole.module.css'
import css from './builds.module.css'
import { type Builds, insideWords, noBuildsWords, sourceWords, trialsWords, worstLaneWords } from './buildsWords'
import { Ranked } from './Ranked'
import { SpreadDrawing } from './SpreadDrawing'
import { SpreadTable } from './SpreadTable'

/** What comes of the tolerances: random builds of the whole link, beside nominal, RSS and worst case. */
export function BuildsPanel() {
  return (
    <WholePanel title="Builds">
      {(allowance) => (
        <div className={whole.columns}>
          <div className={whole.words}>
            {allowance.builds ? (
              <Drawn allowance={allowance} builds={allowance.builds} />
            ) : (
              <p>{noBuildsWords(allowance)}</p>
            )}
          </div>
          <div className={whole.words}>
            <SpreadDrawing allowance={allowance} />
            <SpreadTable allowance={allowance} />
          </div>
          {allowance.sensitivity && <Ranked ranked={allowance.sensitivity} />}
        </div>
      )}
    </WholePanel>
  )
}

function Drawn({ allowance, builds }: { allowance: AllowanceEvaluation; builds: Builds }) {
  const { budget } = useReading()
  const named = (sources: readonly string[]) =>
    sources.map((source) => sourceWords(budget, source)).join(', ') || 'nothing'
  const lane = worstLaneWords(builds)
  return (
    <>
      <p className={css.inside}>{insideWords(builds, allowance.limitDb)}</p>
      {lane !== '' && <p>{lane}</p>}
      <p className={whole.quiet}>{trialsWords(builds)}</p>
      <Facts
        label="What is drawn"
        facts={[
          {
            term: builds.lanes > 1 ? `drawn once for a build, the same in all ${builds.lanes} lanes` : 'drawn together',
            value: named(builds.common),
          },
          { term: builds.lanes > 1 ? 'drawn for each lane apart' : 'drawn apart', value: named(builds.independent) },
        ]}
      />
    </>
  )
}
