'use client'
import type { ShareUse as Use } from '../../../../../lib/budget/evaluation'
import type { Budget, Discipline } from '../../../../../lib/budget/schema'
import { decibels } from '../../../../words/decibels'
import { OWNER_WORD } from '../../../../words/terms'
import { useReading } from '../state/contexts'
import { recordName } from '../words/say'
import css from './tables.module.css'

/** How much of each share is used, to be read; the table under it is to be typed in. */
export function ShareUse() {
  const { budget, evaluation } = useReading()
  const used = evaluation.allowances.flatMap((allowance) =>
    allowance.shares.map((share) => ({ ...share, allowance: allowance.name || 'the allowance' })),
  )
  if (used.length === 0) return null
  return (
    <ul className={css.uses}>
      {used.map((share) => (
        <li key={`${share.allowance} ${share.id}`} data-past={share.usedDb > share.shareDb || undefined}>
          <strong>{nameOf(share, budget)}</strong>: {decibels(share.usedDb)} of {decibels(share.shareDb)} dB of{' '}
          {share.allowance} used
          {share.usedDb > share.shareDb && ', past it'}
          {share.undecidedLines.length > 0 && `; ${share.undecidedLines.length} without a number`}
        </li>
      ))}
    </ul>
  )
}

function nameOf({ of }: Use, budget: Budget): string {
  if (of.kind === 'discipline') return OWNER_WORD[of.ref as Discipline] ?? of.ref
  return recordName(budget, of.kind === 'assembly' ? 'assemblies' : 'lines', of.ref)
}
