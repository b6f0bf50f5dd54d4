/** Another person's last change, while it is still shown: where the margin was, and who moved it. */
export type Was = {
  readonly marginDb: number
  /** Who did what; a line break parts the two lines beside the pennant. */
  readonly words: string
  /** The line that was changed: from it on, the old level stays dotted. Without it only the landing shows the old margin. */
  readonly line?: string | null
  /** Colour of its author. */
  readonly colour?: number
}
