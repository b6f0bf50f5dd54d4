import { plainDb } from '../allowance/words'
import { nameOf } from '../record'
import type { Check } from './check'

/** Verdicts that rest on numbers which nobody has simulated, guaranteed or measured. */
export const guesses: Check = function* ({ judged }) {
  for (const { evaluation } of judged) {
    const { verdict, marginDb, byBasis } = evaluation
    const guessed = byBasis.target + byBasis.estimate + byBasis.unsaid
    if ((verdict !== 'inside' && verdict !== 'tight') || marginDb === null || guessed <= marginDb) continue
    yield {
      code: 'inside-on-guesses',
      section: 'allowances',
      id: evaluation.id,
      field: null,
      message: `${nameOf('allowances', evaluation.id, evaluation)} is ${verdict} with ${plainDb(marginDb)} dB of margin, while ${plainDb(guessed)} dB of loss are targets, estimates or of unsaid basis.`,
      todo: 'Have the largest of these simulated or measured, or say where they come from.',
    }
  }
}
