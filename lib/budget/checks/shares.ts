import { givenDb, targetOf } from '../allowance/shares'
import { linesWord, plainDb } from '../allowance/words'
import type { ShareUse } from '../evaluation'
import { LOSS, typedValue } from '../quantities'
import { inOrder, livingRecord, nameOf } from '../record'
import type { Budget } from '../schema'
import type { Check } from './check'

/** Shares that are passed, that leave no room for the required margin, or that are unclear. */
export const shares: Check = function* ({ context: { budget }, judged }) {
  for (const [id, share] of inOrder(budget, 'shares')) {
    const lacks =
      share.allowance === null
        ? 'does not say which allowance it is part of'
        : targetOf(share) === null
          ? 'is not given to exactly one of assembly, line and discipline'
          : typedValue(LOSS, share.loss) === null
            ? 'does not say how many decibels are given'
            : null
    if (lacks === null) continue
    yield {
      code: 'share-unclear',
      section: 'shares',
      id,
      field: null,
      message: `A share (${id}) ${lacks}; it does not count.`,
      todo: 'Complete it: an allowance, one receiver and decibels.',
    }
  }
  for (const { evaluation } of judged) {
    const { limitDb, requiredMarginDb, shares: uses } = evaluation
    const name = nameOf('allowances', evaluation.id, evaluation)
    for (const use of uses) {
      if (use.usedDb <= use.shareDb + 1e-9) continue
      const open = use.undecidedLines.length
      const although = open === 0 ? '' : `, although ${linesWord(open)} ${open === 1 ? 'is' : 'are'} undecided`
      yield {
        code: 'share-exceeded',
        section: 'shares',
        id: use.id,
        field: 'loss',
        message: `${receiver(budget, use)} uses ${plainDb(use.usedDb)} dB of ${plainDb(use.shareDb)} dB given in ${name}, ${plainDb(use.usedDb - use.shareDb)} dB too many${although}.`,
        todo: 'Bring the loss down, or agree on another partition.',
      }
    }
    const given = givenDb(budget, uses)
    if (uses.length === 0 || limitDb === null || given + requiredMarginDb <= limitDb + 1e-9) continue
    yield {
      code: 'shares-exceed-allowance',
      section: 'allowances',
      id: evaluation.id,
      field: 'requiredMargin',
      message: `${name}: ${plainDb(given)} dB are given away and ${plainDb(requiredMarginDb)} dB are to be kept, of ${plainDb(limitDb)} dB allowed.`,
      todo: 'Give less away, or accept a smaller margin.',
    }
  }
}

function receiver(budget: Budget, { of }: ShareUse): string {
  if (of.kind === 'discipline') return `The discipline '${of.ref}'`
  const section = of.kind === 'assembly' ? 'assemblies' : 'lines'
  return nameOf(section, of.ref, livingRecord(budget, section, of.ref))
}
