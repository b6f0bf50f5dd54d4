/** Numbers that come one after the other; the room doubles. */
export class Growing {
  private data = new Float64Array(1024)
  length = 0

  push(value: number): void {
    if (this.length === this.data.length) {
      const larger = new Float64Array(2 * this.data.length)
      larger.set(this.data)
      this.data = larger
    }
    this.data[this.length++] = value
  }

  /** The first `length` of them, in memory of their own. */
  all(): Float64Array {
    return this.data.slice(0, this.length)
  }

  at(index: number): number {
    return this.data[index] as number
  }
}
