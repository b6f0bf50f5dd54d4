/** Version of the evaluation. It changes whenever a number, a verdict or a flag may come out differently for the same budget. */
export const ENGINE = '2.0.0'
