import type { TouchstoneWarning } from './file'

const MOST = 50

/** What is said about a file that is read all the same; no more than a person would read. */
export class Warnings {
  readonly list: TouchstoneWarning[] = []
  private left = 0

  /** @param message or what makes it, where many may be left out */
  add(line: number | null, message: string | (() => string)): void {
    if (this.list.length === MOST) this.left++
    else this.list.push({ line, message: typeof message === 'string' ? message : message() })
  }

  all(): readonly TouchstoneWarning[] {
    return this.left === 0
      ? this.list
      : [...this.list, { line: null, message: `There are ${this.left} more of these.` }]
  }
}
