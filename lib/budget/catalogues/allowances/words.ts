/** Sentences that several entries share. */
export const CURVE_FROM_MEMORY = 'The curve is from memory.'
export const CHANGING_RETURN_LOSS = 'The return loss limit changes with frequency and is not in this entry.'
export const NO_CLAUSE_SEEN = 'The clause itself was not seen.'

/** Stands over every list of entries and in the note of every allowance that is taken from one. */
export const OWN_COPY_WINS = 'Figures are quoted from texts about the standards: your own copy of the standard wins.'
