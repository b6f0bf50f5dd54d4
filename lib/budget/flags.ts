import type { SectionName } from './schema'

export type Severity = 'problem' | 'warning' | 'notice'

/**
 * Every flag that an evaluation may raise. A problem leaves a number or a verdict undecided, a warning says that a number may
 * be wrong, a notice is to be known.
 */
export const FLAGS = {
  'signalling-incomplete': ['problem', 'The Nyquist frequency cannot be found.'],
  'signalling-impossible': ['problem', 'The signalling contradicts itself.'],
  'rate-type-not-said': ['warning', 'Whether the rate contains coding and FEC is not said.'],
  'no-allowance': ['problem', 'Nothing to judge against.'],
  'model-missing': ['problem', 'A line does not say how its loss is found.'],
  'model-not-computed': ['problem', 'A model that this version does not compute.'],
  'field-missing': ['problem', 'A field that the number needs is empty.'],
  'unreadable-value': ['problem', 'A field cannot be read.'],
  'class-missing': ['problem', 'A line has no loss class, or one that was taken out.'],
  'frequency-too-far': ['problem', 'A number stands at a frequency that it cannot be moved from.'],
  'outside-table': ['problem', 'The frequency lies outside the points of a table.'],
  'outside-validity': ['problem', 'The frequency lies outside the range that the terms hold in.'],
  'skew-too-large': ['problem', 'The skew inside the pair reaches half a period.'],
  'overlap-unnamed': ['problem', 'An overlap does not name two lines that both contain the part.'],
  'limit-missing': ['problem', 'An allowance has no limit.'],
  'plane-missing': ['problem', 'An allowance does not know where it starts or ends.'],
  'planes-reversed': ['problem', 'An allowance ends before it starts.'],
  'planes-differ': ['problem', 'The limit was published between other planes.'],
  'corner-not-judged': ['problem', 'The corner cannot be judged.'],
  'judged-lane-missing': ['problem', 'The lane to be judged does not exist.'],
  'moved-with-spread': ['warning', 'A number was moved in frequency, and its tolerance grew.'],
  'usual-wrong-frequency': ['warning', 'A frequency is a well-known mistake for the Nyquist frequency.'],
  'coarse-table': ['warning', 'The points of a table lie far apart.'],
  'dangling-reference': ['warning', 'A record refers to one that does not exist or was taken out.'],
  'class-of-other-assembly': ['warning', "A line uses another assembly's loss class."],
  'overlap-outside-planes': ['warning', 'An overlap names a line outside the planes and does not count there.'],
  'overlap-too-large': ['warning', 'An overlap is larger than a line that contains it.'],
  'reserve-and-corner': ['warning', 'A reserve and a corner or a tolerance stand for the same thing.'],
  'maximum-with-tolerance': ['warning', 'A guaranteed maximum has a tolerance on top.'],
  'maximum-through-corner': ['warning', 'A maximum without its temperature was put through a corner.'],
  'process-with-tolerance': ['warning', 'A number that contains the spread of fabrication has a tolerance on top.'],
  'typical-not-maximum': ['warning', 'A typical value stands where a maximum is needed.'],
  'group-off-without-note': ['warning', 'A line is said to vary on its own without a reason.'],
  'counted-twice': ['warning', 'Two neighbours count the same item.'],
  'nobody-counts': ['warning', 'No neighbour counts an item.'],
  'fixtures-in': ['warning', 'Test fixtures are contained in a number.'],
  'package-between-balls': ['warning', 'A package is counted in an allowance from ball to ball.'],
  'die-outside-planes': ['warning', 'A die is counted in an allowance that does not reach it.'],
  'no-package-from-bump': ['warning', 'An allowance from bump or die has no package at that end.'],
  'package-above-presumed': ['warning', 'A package is lossier than the limit presumes.'],
  'allowance-frequency-missing': ['warning', 'An allowance does not say its frequency.'],
  'allowance-at-other-frequency': ['warning', 'An allowance is judged away from the Nyquist frequency.'],
  'share-exceeded': ['warning', 'More is used than was given.'],
  'shares-exceed-allowance': ['warning', 'The shares and the required margin are more than the limit.'],
  'share-unclear': ['warning', 'A share does not say what it is or whom it is given to.'],
  'other-conditions': ['notice', 'A number holds in other conditions than the reference corner.'],
  'covers-not-said': ['notice', 'What a number includes is not said.'],
  'covers-not-of-kind': ['notice', 'What a number includes does not belong to its kind.'],
  'curve-not-judged': ['notice', 'The limit curve is not judged.'],
  'floor-not-judged': ['notice', 'The return loss is not judged.'],
  'lane-beyond-count': ['notice', 'A value is given for a lane that the link does not have.'],
  'lane-value-not-used': ['notice', "A lane's value is not read by the model of its line."],
  'count-not-used': ['notice', 'How many alike is not used by this model.'],
  'skew-adds': ['notice', 'Skew of several lines may add up to more than its parts.'],
} as const satisfies Record<string, readonly [Severity, string]>

export type FlagCode = keyof typeof FLAGS

/** A flag before its severity, which its code decides. */
export type FlagDraft = {
  readonly code: FlagCode
  readonly section: SectionName | 'head'
  readonly id: string | null
  readonly field: string | null
  readonly message: string
  readonly todo: string
}

export function flagOf(draft: FlagDraft): FlagDraft & { readonly severity: Severity } {
  const message = draft.message.charAt(0).toUpperCase() + draft.message.slice(1)
  return { ...draft, message, severity: FLAGS[draft.code][0] }
}
