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
  'field-missing': ['problem', 'A field that the number needs is empty.'],
  'unreadable-value': ['problem', 'A field cannot be read.'],
  'class-missing': ['problem', 'A line has no loss class, or one that was taken out.'],
  'frequency-too-far': ['problem', 'A number stands at a frequency that it cannot be moved from.'],
  'outside-table': ['problem', 'The frequency lies outside the points of a table.'],
  'outside-validity': ['problem', 'A value or the frequency lies outside the range that a model or its terms hold in.'],
  'nothing-passes': ['problem', 'A model gives no number with the values typed.'],
  'varies-beyond-model': ['problem', 'A model gives no number at the ends of what varies.'],
  'skew-too-large': ['problem', 'The skew inside the pair reaches half a period.'],
  'below-copper-floor': ['problem', 'An attenuation that smooth copper of its width exceeds.'],
  'overlap-unnamed': ['problem', 'An overlap does not name two lines that both contain the part.'],
  'limit-missing': ['problem', 'An allowance has no limit.'],
  'plane-missing': ['problem', 'An allowance does not know where it starts or ends.'],
  'planes-reversed': ['problem', 'An allowance ends before it starts.'],
  'planes-differ': ['problem', 'The limit was published between other planes.'],
  'corner-not-judged': ['problem', 'The corner cannot be judged.'],
  'judged-lane-missing': ['problem', 'The lane to be judged does not exist.'],
  'evidence-missing': ['problem', 'A line rests on a file that is not attached.'],
  'evidence-not-read': ['problem', 'A file has not been read.'],
  'evidence-unreadable': ['problem', 'A file cannot be read.'],
  'port-map-missing': ['problem', 'Which ports of a file are its two ends is not known.'],
  'port-map-unreadable': ['problem', 'The ports of a file cannot be read.'],
  'fixtures-not-removed': ['problem', 'Test fixtures could not be removed from a file.'],
  'not-fitted': ['problem', 'A loss cannot be fitted over the band.'],
  'modes-missing': ['problem', 'Whether the two ports of a file are a pair is not said.'],
  'moved-with-spread': ['warning', 'A number was moved in frequency, and its tolerance grew.'],
  'usual-wrong-frequency': ['warning', 'A frequency is a well-known mistake for the Nyquist frequency.'],
  'stub-resonance-near': ['warning', 'A stub resonates under three times the frequency asked for.'],
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
  'fixtures-removed-twice': ['warning', 'Test fixtures may be taken out of a number twice.'],
  'fixtures-removed-within-planes': ['warning', 'Fixtures were taken out where the limit contains them.'],
  'delay-longer-than-length': ['warning', 'A file takes longer than its length: fixtures may be in it.'],
  'loss-at-low-end': ['warning', 'A file loses where nothing loses: at the lowest frequencies.'],
  'rises-after-removal': ['warning', 'A file loses less at higher frequencies after its fixtures were removed.'],
  'gain-after-removal': ['warning', 'A file gives out more than goes in after its fixtures were removed.'],
  'impedance-differs': ['warning', 'A line has another impedance than the link.'],
  'reference-differs': ['warning', 'A file is written in another reference than that of the link.'],
  'renormalised-differs': ['warning', "A loss depends on whether it is read in the file's reference or the link's."],
  'two-port-not-answered': ['warning', 'Whether a file of two ports is one conductor or one pair is not said.'],
  'port-pairs-doubtful': ['warning', 'The ports of a file look joined otherwise than its port map says.'],
  'anchor-far': ['warning', 'Dk and Df were measured far from the Nyquist frequency.'],
  'smooth-copper': ['warning', 'A foil is computed as smooth where it is not.'],
  'model-below-coupon': ['warning', 'A computed trace loses less than its measured coupon.'],
  'unit-suspected': ['warning', 'Another unit would make a value a usual one.'],
  'per-length-unusual': ['warning', 'An attenuation per length is far from what its kind loses.'],
  'class-of-other-layer': ['warning', "A line uses another layer's loss class."],
  'layer-not-in-assembly': ['warning', 'A layer does not exist in the stack-up of its assembly.'],
  'stub-depth-mismatch': ['warning', 'Used depth and stub of a via do not make up the thickness of its board.'],
  'lane-outlier': ['warning', 'A lane lies far from the others.'],
  'inside-on-guesses': ['warning', 'A verdict rests on targets, estimates or numbers of unsaid basis.'],
  'package-between-balls': ['warning', 'A package is counted in an allowance from ball to ball.'],
  'die-outside-planes': ['warning', 'A die is counted in an allowance that does not reach it.'],
  'no-package-from-bump': ['warning', 'An allowance from bump or die has no package at that end.'],
  'no-die-from-die': ['warning', 'An allowance from die has no pad of a die at that end.'],
  'package-above-presumed': ['warning', 'A package is lossier than the limit presumes.'],
  'allowance-frequency-missing': ['warning', 'An allowance does not say its frequency.'],
  'allowance-at-other-frequency': ['warning', 'An allowance is judged away from the Nyquist frequency.'],
  'share-exceeded': ['warning', 'More is used than was given.'],
  'shares-exceed-allowance': ['warning', 'The shares and the required margin are more than the limit.'],
  'share-unclear': ['warning', 'A share does not say what it is or whom it is given to.'],
  'single-ended-taken-as-differential': ['warning', 'A single-ended file stands for a pair.'],
  'port-map-doubtful': ['warning', 'The ports of a file were taken by a doubtful guess.'],
  'fixtures-differ': ['warning', 'Fixtures have another impedance than the thru that they are removed by.'],
  'not-passive': ['warning', 'A file gives out more than it takes in.'],
  'not-reciprocal': ['warning', 'A file loses differently in its two directions.'],
  'coarse-file': ['warning', 'The points of a file lie far apart.'],
  'fit-differs': ['warning', 'The fitted loss and the loss at the frequency differ.'],
  'other-conditions': ['notice', 'A number holds in other conditions than the reference corner.'],
  'covers-not-said': ['notice', 'What a number includes is not said.'],
  'fixtures-not-said': ['notice', 'Whether test fixtures are in a file is not said.'],
  'laminate-unproven': ['notice', 'What Dk and Df hold for is not said.'],
  'covers-not-of-kind': ['notice', 'What a number includes does not belong to its kind.'],
  'limit-not-moved': ['problem', 'A limit is asked for at a frequency that its own curve does not give.'],
  'limit-moved': ['warning', 'A limit was moved along its own curve.'],
  'cascade-differs': ['warning', 'The sum and the fitted cascade of the same lines differ.'],
  'corner-does-not-move': ['notice', 'A corner cannot move a line.'],
  'curve-not-judged': ['notice', 'The limit curve is not judged.'],
  'floor-not-judged': ['notice', 'The return loss is not judged.'],
  'lane-beyond-count': ['notice', 'A value is given for a lane that the link does not have.'],
  'lane-value-not-used': ['notice', "A lane's value is not read by the model of its line."],
  'varies-not-used': ['notice', 'What varies is not read by the model of its line.'],
  'count-not-used': ['notice', 'How many alike is not used by this model.'],
  'skew-adds': ['notice', 'Skew of several lines may add up to more than its parts.'],
  'not-causal': ['notice', 'The phase of a file mostly turns backwards.'],
  'port-map-guessed': ['notice', 'The ports of a file were found at low frequency.'],
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
