import type { Scalar, SectionName } from '../budget/schema'

/** Where a value lives in the shared document. */
export type Place =
  | { readonly section: 'head'; readonly id: null; readonly field: string }
  | { readonly section: SectionName; readonly id: string; readonly field: string }
  /** id is the line, field is 'lane/field'. */
  | { readonly section: 'laneValues'; readonly id: string; readonly field: string }

/**
 * One row of what an edit did, as the trail keeps it.
 * set: a field went from before to after. add: a record was made with this field (one row for each field that is not
 * empty; before is null). text: a note was typed in (before and after whole).
 * overtaken: a write arrived that does not show, because another one won; after is the value kept, written is what was sent.
 */
export type Change = Place & {
  readonly kind: 'set' | 'add' | 'text' | 'overtaken'
  readonly before: Scalar
  readonly after: Scalar
  readonly written?: Scalar
  /** The author had not seen the value that was replaced. */
  readonly unseen?: true
}

/** What a person or a program wants done; lib/sheet/edits applies it, the outbox keeps it for applying again. */
export type Operation =
  | { readonly op: 'set'; readonly section: 'head'; readonly id: null; readonly field: string; readonly value: Scalar }
  | {
      readonly op: 'set'
      readonly section: SectionName
      readonly id: string
      readonly field: string
      readonly value: Scalar
    }
  | {
      readonly op: 'add'
      readonly section: SectionName
      readonly id: string
      readonly values: Readonly<Record<string, Scalar>>
    }
  | {
      readonly op: 'note'
      readonly section: SectionName
      readonly id: string
      readonly field: 'note'
      readonly text: string
      /** The text that the typing began with; what others typed meanwhile then stays. Without it, `text` is the whole note. */
      readonly base?: string
    }
  | {
      readonly op: 'lane'
      readonly line: string
      readonly lane: number
      readonly field: string
      readonly value: string | null
    }
