/** One entry as the catalogue shows it, whatever it is of. */
export type CatalogueRow<E> = {
  readonly id: string
  readonly entry: E
  readonly title: string
  /** What decides the choice, such as '35 dB at 12.890625 GHz'. */
  readonly figure: string
  readonly facts: readonly string[]
  readonly caution: string | null
  /** It belongs to this link, by its Nyquist frequency. */
  readonly fits: boolean
  /** Null: it came with the program. */
  readonly own: { readonly personName: string; readonly mayRemove: boolean } | null
}

/** The rows in which every word of the filter occurs somewhere; what belongs to this link first. */
export function matching<E>(rows: readonly CatalogueRow<E>[], filter: string): readonly CatalogueRow<E>[] {
  const words = filter.toLowerCase().split(/\s+/).filter(Boolean)
  const found = rows.filter(({ title, figure, facts, own }) => {
    const text = [title, figure, ...facts, own?.personName ?? ''].join(' ').toLowerCase()
    return words.every((word) => text.includes(word))
  })
  return [...found.filter(({ fits }) => fits), ...found.filter(({ fits }) => !fits)]
}

/** What is said, one fact behind the other. */
export const said = (facts: readonly (string | null)[]): readonly string[] =>
  facts.filter((fact) => fact !== null && fact !== '') as readonly string[]
